package bedmark.index;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Fault;
import bedmark.journal.FileLayer;
import bedmark.journal.Progress;
import bedmark.vault.Passphrase;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.UUID;
import java.util.stream.Stream;

/**
 * Makes a store of a backup on this device, which keeps an identity of its own: beside the place where it is to stand,
 * and moved there in one step once it is whole.
 */
final class Restoring {
    private final Path backup;
    private final Path store;
    private final StoreOptions options;
    private final FileLayer files;

    Restoring(Path backup, Path store, StoreOptions options) {
        this.backup = backup;
        this.store = store;
        this.options = options;
        this.files = options.files();
    }

    /** Whether there is room for a new store: no folder, or an empty one. */
    static boolean isFree(Path folder) throws IOException {
        if (!Files.isDirectory(folder)) {
            return !Files.exists(folder);
        }
        try (DirectoryStream<Path> there = Files.newDirectoryStream(folder)) {
            return !there.iterator().hasNext();
        }
    }

    /**
     * Makes it.
     *
     * @param passphrase where the backup is sealed; proved before anything is written
     */
    Restored run(Optional<Passphrase> passphrase, Progress progress) throws IOException {
        BackupList list = Backups.prove(backup, files, progress);
        List<UUID> surveys = new BackupContent(backup, list, files, passphrase).surveys();
        Path work = store.resolveSibling("." + store.getFileName() + ".restoring");
        remove(work);
        try {
            files.createFolder(work.resolve(Ledger.JOURNAL));
            files.createFolder(work.resolve(PhotoShelf.FOLDER));
            for (BackupList.Item item : list.items()) {
                copy(backup.resolve(item.as()), work.resolve(item.file()));
            }
            files.forceFolder(work.resolve(Ledger.JOURNAL));
            files.forceFolder(work.resolve(PhotoShelf.FOLDER));
            new DeviceFile(work, files).write(Optional.empty(), options.deviceName());
            put(work);
        } catch (IOException e) {
            throw new Refused(Fault.defect("restore", e, files, store.getParent()), e);
        } finally {
            remove(work);
        }
        return new Restored(true, surveys, List.of(), List.of());
    }

    private void copy(Path from, Path to) throws IOException {
        byte[] chunk = new byte[1 << 18];
        try (LayerStream content = new LayerStream(files.read(from)); FileLayer.Output output = files.create(to)) {
            for (int count = content.read(chunk); count > 0; count = content.read(chunk)) {
                output.write(ByteBuffer.wrap(chunk, 0, count));
            }
            output.force();
        }
    }

    private void put(Path work) throws IOException {
        if (!isFree(store)) {
            throw new Refused(Defect.in(store.toString(), "restore-not-empty"));
        }
        Files.deleteIfExists(store);
        try {
            Files.move(work, store, StandardCopyOption.ATOMIC_MOVE);
        } catch (AtomicMoveNotSupportedException e) {
            Files.move(work, store);
        }
        files.forceFolder(store.getParent());
    }

    /** What an attempt left that was cut short. */
    private static void remove(Path folder) throws IOException {
        if (!Files.exists(folder)) {
            return;
        }
        try (Stream<Path> all = Files.walk(folder)) {
            for (Path file : all.sorted(Comparator.reverseOrder()).toList()) {
                Files.delete(file);
            }
        }
    }
}
