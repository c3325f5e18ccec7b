package bedmark.journal;

import bedmark.document.Defect;
import java.io.IOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.FileSystemException;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * Why a folder could not be written. The system's own message is not the same in every language, so the folder is
 * asked first.
 */
public enum Fault {
    /** Nothing more fits onto the volume. */
    DISK_FULL("disk-full"),
    /** The folder is there, but nothing may be written. */
    READ_ONLY("read-only"),
    /** The folder or its volume is gone. */
    VANISHED("vanished"),
    /** The medium did not confirm that it holds what was written. */
    FORCE_FAILED("force-failed"),
    /** Anything else; the system's message is all that is known. */
    FAILED("failed");

    private static final long NEXT_TO_NOTHING = 64 << 10;

    private final String code;

    Fault(String code) {
        this.code = code;
    }

    /** The failure of a force, told apart from that of a write. */
    static final class ForceFailed extends IOException {
        ForceFailed(IOException cause) {
            super(cause.getMessage(), cause);
        }
    }

    /** What a failure under a folder comes from. */
    public static Fault of(IOException failure, FileLayer files, Path folder) {
        String message = String.valueOf(failure.getMessage()).toLowerCase(Locale.ROOT);
        if (!files.exists(folder)) {
            // One that could not be made in a folder where nothing may be written was never there.
            return failure instanceof AccessDeniedException ? READ_ONLY : VANISHED;
        }
        if (says(message, "no space left", "not enough space", "quota") || full(files, folder)) {
            return DISK_FULL;
        }
        if (says(message, "read-only file system", "permission denied") || !files.writable(folder)
                || failure instanceof AccessDeniedException) {
            return READ_ONLY;
        }
        if (failure instanceof NoSuchFileException) {
            return VANISHED;
        }
        return failure instanceof ForceFailed ? FORCE_FAILED : FAILED;
    }

    /**
     * The defect in words to come.
     *
     * @param prefix what the failure means for the person, such as {@code not-saved}
     */
    public static Defect defect(String prefix, IOException failure, FileLayer files, Path folder, String... details) {
        Fault fault = of(failure, files, folder);
        String[] told = fault == FAILED
                ? Stream.concat(Stream.of(details), Stream.of(reason(failure))).toArray(String[]::new) : details;
        return Defect.in(folder.toString(), prefix + "-" + fault.code, told);
    }

    /** The system's own reason, without the path that a sentence names anyway; the kind of failure without one. */
    public static String reason(Exception failure) {
        Optional<String> given = failure instanceof FileSystemException file
                ? Optional.ofNullable(file.getReason()) : Optional.ofNullable(failure.getMessage());
        return given.flatMap(text -> text.lines().findFirst()).filter(text -> !text.isBlank())
                .orElse(failure.getClass().getSimpleName());
    }

    private static boolean says(String message, String... parts) {
        return Stream.of(parts).anyMatch(message::contains);
    }

    private static boolean full(FileLayer files, Path folder) {
        try {
            return files.usableSpace(folder) < NEXT_TO_NOTHING;
        } catch (IOException e) {
            return false;
        }
    }
}
