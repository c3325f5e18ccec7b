package bedmark.pack;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import bedmark.document.Refused;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class FileKindTest {
    @TempDir
    private Path folder;

    private Path file(String name, String text) throws Exception {
        return Files.write(folder.resolve(name), text.getBytes(StandardCharsets.UTF_8));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {"march|PK..|PACK", "PACK.ZIP|not a ZIP file|PACK", "empty.zip|''|PACK",
        "next.json|{\"format\": \"bedmark.round\"}|ROUND", "a.round.json|{\"format\": \"bedm|ROUND",
        "seen.json|{\"version\": 1, \"format\": \"bedmark.receipt\"}|RECEIPT", "a.receipt.json|torn|RECEIPT",
        "a.round.json|{\"format\": \"bedmark.receipt\"}|RECEIPT"})
    void fileIsToldByWhatItHoldsElseByItsName(String name, String text, FileKind kind) throws Exception {
        assertEquals(kind, FileKind.of(file(name, text)));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {"bundle.json|{\"format\": \"bedmark.bundle\"}", "letter.txt|Dear Ida", "none|''",
        "list.json|[1, 2]"})
    void whatNeitherTabletNorOfficeSendsIsRefused(String name, String text) throws Exception {
        Path file = file(name, text);
        assertEquals("file-kind-unknown", assertThrows(Refused.class, () -> FileKind.of(file)).defect().code());
    }

    @Test
    void fileThatIsGoneIsRefused() {
        assertEquals("file-unreadable", assertThrows(Refused.class, () -> FileKind.of(folder.resolve("gone.zip")))
                .defect().code());
    }
}
