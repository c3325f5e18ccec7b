package bedmark.site;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;

/** {@code mvn test -Dtest=FormatReferenceTest -Dbedmark.site.write=true} makes the page anew. */
class FormatReferenceTest {
    private static final Path PAGE = Path.of("src/site/documents.md");

    @Test
    void pageSaysWhatTheSchemasSay() throws IOException {
        if (Boolean.getBoolean("bedmark.site.write")) {
            Files.writeString(PAGE, FormatReference.page());
        }
        assertEquals(FormatReference.page(), Files.readString(PAGE));
    }
}
