package bedmark.json;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;

/** A form or a reference file, as large as somebody may have written it. */
final class JsonFile {
    /** Megabytes (MiB). */
    private static final int MOST = 64;

    private JsonFile() {
    }

    /**
     * Reads it strictly.
     *
     * @throws Refused {@code file-too-large}, or what {@link JsonReader#read} refuses
     */
    static Document read(Path file) throws IOException {
        try (InputStream in = Files.newInputStream(file)) {
            byte[] bytes = in.readNBytes((MOST << 20) + 1);
            if (bytes.length > MOST << 20) {
                throw new Refused(Defect.in(file.getFileName().toString(), "file-too-large", Integer.toString(MOST)));
            }
            return JsonReader.read(bytes);
        }
    }
}
