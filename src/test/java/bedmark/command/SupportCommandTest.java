package bedmark.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.diary.Diary;
import bedmark.document.Branch;
import bedmark.index.Store;
import bedmark.index.StoreOptions;
import bedmark.survey.Act;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class SupportCommandTest {
    @TempDir
    private Path folder;

    @Test
    void fileTellsOfTheStoreAndItsFailuresWithoutAnswersOrNames() throws Exception {
        Path store = folder.resolve("store");
        try (Store open = Store.open(store, StoreOptions.of("tablet of A. Vale"))) {
            open.append("A. Vale", new Act.RegisterTaken(Branch.EMPTY.with("id", "PL-1").with("name", "Quarry of A. Vale")));
            new Diary(store, Clock.systemUTC()).note(new IllegalStateException("A. Vale wrote this"));
        }
        Path file = folder.resolve("support.txt");
        Terminal.Result result = Terminal.run("support", store.toString(), "--out", file.toString());
        assertEquals(0, result.code(), result.err());
        List<String> lines = Files.readAllLines(file);
        assertTrue(lines.stream().anyMatch(line -> line.startsWith("java.version ")), lines.toString());
        assertTrue(lines.stream().anyMatch(line -> line.matches("segments 1 entries \\d+ photos 0 torn 0 defects 0")),
                lines.toString());
        assertTrue(lines.stream().anyMatch(line -> line.contains("failed java.lang.IllegalStateException")));
        assertFalse(String.join("\n", lines).contains("Vale"), lines.toString());
    }

    @Test
    void fileThatCannotBeWrittenIsNamed() throws Exception {
        Path store = folder.resolve("store");
        Store.open(store, StoreOptions.of("tablet")).close();
        Terminal.Result result = Terminal.run("support", store.toString(), "--out",
                folder.resolve("gone/support.txt").toString());
        assertEquals(3, result.code());
        assertEquals(1, result.err().lines().count(), result.err());
        assertTrue(result.err().contains("gone/support.txt"), result.err());
        Terminal.Result onFolder = Terminal.run("support", store.toString(), "--out", folder.toString());
        assertEquals(3, onFolder.code());
        assertTrue(onFolder.err().contains(folder + ": this is a folder; name a file."), onFolder.err());
    }

    @Test
    void folderWithoutAStoreIsNamed() {
        Terminal.Result result = Terminal.run("support", folder.resolve("none").toString(), "--out", "unused.txt");
        assertEquals(3, result.code());
        assertTrue(result.err().contains("none"), result.err());
    }
}
