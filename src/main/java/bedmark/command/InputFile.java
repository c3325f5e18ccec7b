package bedmark.command;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.io.IOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;

/** A file that the person named, read whole. */
final class InputFile {
    private InputFile() {
    }

    /** The bytes of a file; refused in words where it is not there, no file, or not readable. */
    static byte[] read(Path file) {
        if (Files.isDirectory(file)) {
            throw new Refused(Defect.in(file.toString(), "file-is-folder"));
        }
        try {
            return Files.readAllBytes(file);
        } catch (NoSuchFileException e) {
            throw new Refused(Defect.in(file.toString(), "file-absent"), e);
        } catch (AccessDeniedException e) {
            throw new Refused(Defect.in(file.toString(), "file-forbidden"), e);
        } catch (IOException e) {
            throw new Refused(Defect.in(file.toString(), "file-unreadable"), e);
        }
    }
}
