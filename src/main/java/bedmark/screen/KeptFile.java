package bedmark.screen;

import bedmark.document.Branch;
import bedmark.document.Refused;
import bedmark.json.JsonReader;
import bedmark.json.JsonWriter;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.OpenOption;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.Stream;

/** A small document beside the store that is a convenience: losing it loses no survey and stops nothing. */
final class KeptFile {
    private static final OpenOption[] ANEW = {StandardOpenOption.CREATE, StandardOpenOption.TRUNCATE_EXISTING,
        StandardOpenOption.WRITE};

    private final Path file;

    KeptFile(Path file) {
        this.file = file;
    }

    /**
     * What was kept; a file that is missing or damaged is as good as none.
     *
     * @param reader makes something of the document, or refuses
     */
    <T> Optional<T> read(Function<Branch, T> reader) {
        try {
            return Files.exists(file) ? Optional.of(reader.apply(JsonReader.read(Files.readAllBytes(file)).root()))
                    : Optional.empty();
        } catch (IOException | Refused e) {
            return Optional.empty();
        }
    }

    /**
     * Keeps a document in the place of the one before, in one step; returns whether that went well.
     *
     * @param how more options to write with, such as {@link StandardOpenOption#SYNC}
     */
    boolean write(Branch document, OpenOption... how) {
        Path next = file.resolveSibling(file.getFileName() + ".next");
        try {
            Files.write(next, JsonWriter.indented(document),
                    Stream.of(ANEW, how).flatMap(Stream::of).toArray(OpenOption[]::new));
            Files.move(next, file, StandardCopyOption.REPLACE_EXISTING);
            return true;
        } catch (IOException e) {
            return false;
        }
    }

    /** Keeps nothing any more; returns whether that went well. */
    boolean forget() {
        try {
            Files.deleteIfExists(file);
            return true;
        } catch (IOException e) {
            return false;
        }
    }
}
