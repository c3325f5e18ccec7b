package bedmark.index;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.FileLayer;
import bedmark.journal.Progress;
import java.io.IOException;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** A backup as it is found somewhere, proved before anything is taken from it. */
final class Backups {
    private Backups() {
    }

    /**
     * The backup's own folder, where the given one is it or holds exactly one.
     *
     * @throws Refused {@code backup-absent}, {@code backup-several}
     */
    static Path find(Path given, FileLayer files) throws IOException {
        if (files.exists(given.resolve(BackupList.NAME))) {
            return given;
        }
        List<Path> found = new ArrayList<>();
        if (Files.isDirectory(given)) {
            try (DirectoryStream<Path> folders = Files.newDirectoryStream(given, "bedmark-backup-*")) {
                for (Path folder : folders) {
                    if (files.exists(folder.resolve(BackupList.NAME))) {
                        found.add(folder);
                    }
                }
            }
        }
        if (found.size() > 1) {
            throw new Refused(Defect.in(given.toString(), "backup-several", Integer.toString(found.size())));
        }
        return found.stream().findFirst().orElseThrow(() ->
                new Refused(Defect.in(given.toString(), "backup-absent")));
    }

    /**
     * Proves every file of a backup.
     *
     * @throws Refused {@code backup-absent}, {@code backup-list-damaged}, {@code backup-file-damaged},
     *                 {@code work-cancelled}
     */
    static BackupList prove(Path folder, FileLayer files, Progress progress) throws IOException {
        BackupList list = BackupList.read(folder, files).orElseThrow(() ->
                new Refused(Defect.in(folder.toString(), "backup-absent")));
        long total = Math.max(1, list.items().stream().mapToLong(BackupList.Item::bytes).sum());
        long done = 0;
        for (BackupList.Item item : list.items()) {
            Path file = folder.resolve(item.as());
            if (!files.exists(file) || Sealed.digest(files, file, Optional.empty())
                    .filter(digest -> digest.hex().equals(item.sha256())).isEmpty()) {
                throw new Refused(Defect.in(file.toString(), "backup-file-damaged"));
            }
            done += item.bytes();
            progress.at(done, total);
            if (progress.cancelled()) {
                throw new Refused(Defect.in("", "work-cancelled"));
            }
        }
        return list;
    }
}
