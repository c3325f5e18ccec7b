package bedmark.office;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.index.Desk;
import bedmark.index.DeviceFile;
import bedmark.journal.Fault;
import bedmark.journal.FileLayer;
import bedmark.pack.DeviceKey;
import java.io.Closeable;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import java.util.Set;

/** Opens an office store in its folder, or begins one there where nothing else is. */
final class OfficeOpening {
    static final String OFFICE = "office.json";
    private static final String LOCK = "store.lock";
    /** What an opening that was cut off may leave, and a key that packs were signed with. */
    private static final Set<String> BEGUN = Set.of(LOCK, OfficeStore.PACKS, OfficeStore.PASSING, FolderBooks.JOURNAL,
            FolderBooks.INDEX, DeviceKey.FILE);

    private OfficeOpening() {
    }

    static boolean isOffice(Path folder) {
        return FileLayer.disk().exists(folder.resolve(OFFICE));
    }

    /**
     * Opens it.
     *
     * @param url    of a database server; nothing where the folder holds everything
     * @param index  the name of the folder of the tables
     * @param afresh whether these are made anew
     */
    static OfficeStore of(Path folder, Optional<String> url, OfficeOptions options, String index,
                          boolean afresh) {
        Path home = folder.toAbsolutePath().normalize();
        Desk desk = new Desk("bedmark-office");
        try {
            return desk.call(() -> openLocked(home, url, options, desk, index, afresh));
        } catch (RuntimeException e) {
            desk.close();
            throw OfficeStore.refused(e);
        }
    }

    private static OfficeStore openLocked(Path folder, Optional<String> url, OfficeOptions options, Desk desk,
                                          String index, boolean afresh) {
        FileLayer files = options.files();
        try {
            if (!files.exists(folder.resolve(OFFICE))) {
                checkFree(folder, files);
            }
            files.createFolder(folder);
            Closeable lock = files.lock(folder.resolve(LOCK))
                    .orElseThrow(() -> new Refused(Defect.in(folder.toString(), "store-locked")));
            try {
                return new OfficeStore(folder, url, options, desk, lock, index, afresh);
            } catch (IOException | RuntimeException e) {
                lock.close();
                throw e;
            }
        } catch (IOException e) {
            throw new Refused(Fault.defect("store", e, files, folder), e);
        }
    }

    /** An office is begun only where nothing else is. */
    private static void checkFree(Path folder, FileLayer files) throws IOException {
        if (files.exists(folder.resolve(DeviceFile.NAME))) {
            throw new Refused(Defect.in(folder.toString(), "store-of-tablet"));
        } else if (Files.exists(folder) && !Files.isDirectory(folder)) {
            throw new Refused(Defect.in(folder.toString(), "store-is-file"));
        } else if (files.exists(folder) && files.list(folder).stream().map(file -> file.getFileName().toString())
                .anyMatch(name -> !BEGUN.contains(name) && !name.startsWith(OFFICE) && !name.startsWith("."))) {
            throw new Refused(Defect.in(folder.toString(), "office-folder-other"));
        }
    }
}
