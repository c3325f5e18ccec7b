package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.io.IOException;
import java.nio.channels.ClosedByInterruptException;
import java.nio.file.AccessDeniedException;
import java.nio.file.FileSystemException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.ReadOnlyFileSystemException;
import java.util.Locale;
import java.util.Optional;

/** Finds out why a folder took no pack, so that the person can be told what to do. */
final class WriteFailure {

    /** With less room than this left (bytes), a failed write is put down to the full disk. */
    private static final long FULL = 1 << 16;

    private WriteFailure() {
    }

    static Refused of(Exception failure, Path folder, Disk disk) {
        String where = folder.toString();
        if (failure instanceof ClosedByInterruptException) {
            return new Refused(Defect.in("", "pack-cancelled"), failure);
        }
        if (!Files.isDirectory(folder)) {
            return new Refused(Defect.in(where, "pack-folder-missing"), failure);
        }
        String reason = reason(failure);
        String lower = reason.toLowerCase(Locale.ROOT);
        if (lower.contains("no space left") || lower.contains("not enough space") || isFull(folder, disk)) {
            return new Refused(Defect.in(where, "pack-disk-full"), failure);
        }
        if (failure instanceof AccessDeniedException || failure instanceof ReadOnlyFileSystemException
                || lower.contains("read-only")) {
            return new Refused(Defect.in(where, "pack-folder-read-only"), failure);
        }
        return new Refused(Defect.in(where, "pack-not-saved", reason), failure);
    }

    private static boolean isFull(Path folder, Disk disk) {
        try {
            return disk.free(folder) < FULL;
        } catch (IOException e) {
            return false;
        }
    }

    /** The system's own reason, without the path that the sentence names anyway. */
    static String reason(Exception failure) {
        Optional<String> given = failure instanceof FileSystemException file
                ? Optional.ofNullable(file.getReason()) : Optional.ofNullable(failure.getMessage());
        return given.flatMap(text -> text.lines().findFirst()).filter(text -> !text.isBlank())
                .orElse(failure.getClass().getSimpleName());
    }
}
