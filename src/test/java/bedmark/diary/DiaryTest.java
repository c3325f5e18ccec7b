package bedmark.diary;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class DiaryTest {
    private static final Clock CLOCK = Clock.fixed(Instant.parse("2026-03-02T06:30:00Z"), ZoneOffset.UTC);

    @TempDir
    private Path folder;

    @Test
    void happeningsStandInOrderWithTheirCounts() {
        Diary diary = new Diary(folder, CLOCK);
        diary.note(Happening.STORE_OPENED, Map.of("entries", 12L, "defects", 0L));
        diary.note(Happening.STORE_CLOSED, Map.of());
        assertEquals(List.of("2026-03-02T06:30Z store-opened defects=0 entries=12", "2026-03-02T06:30Z store-closed"),
                Diary.read(folder));
    }

    @Test
    void failureLeavesItsPlacesAndNothingThatAPersonWrote() {
        new Diary(folder, CLOCK).note(new IllegalStateException("answered by A. Vale",
                new IllegalArgumentException("depth 117 mm at TP-08")));
        String noted = String.join("\n", Diary.read(folder));
        assertTrue(noted.contains("failed java.lang.IllegalStateException"), noted);
        assertTrue(noted.contains("because java.lang.IllegalArgumentException"), noted);
        assertTrue(noted.contains(DiaryTest.class.getName() + ".failureLeavesItsPlaces"), noted);
        for (String written : List.of("Vale", "117", "TP-08")) {
            assertFalse(noted.contains(written), noted);
        }
    }

    @Test
    void longServiceLeavesABoundedDiaryThatEndsWithTheNewest() throws IOException {
        Diary diary = new Diary(folder, CLOCK);
        for (long i = 0; i < 6000; i++) {
            diary.note(new IllegalStateException());
        }
        diary.note(Happening.STORE_CLOSED, Map.of("last", 1L));
        long size = 0;
        try (Stream<Path> files = Files.list(folder)) {
            for (Path file : files.toList()) {
                size += Files.size(file);
            }
        }
        assertTrue(size < 2 * Diary.LARGEST + 10_000, "the diary takes " + size + " bytes");
        List<String> lines = Diary.read(folder);
        assertTrue(lines.get(lines.size() - 1).endsWith("store-closed last=1"));
    }

    @Test
    void folderThatCannotBeWrittenDoesNotStopTheWork() {
        new Diary(folder.resolve("gone"), CLOCK).note(Happening.STORE_OPENED, Map.of());
        assertEquals(List.of(), Diary.read(folder.resolve("gone")));
    }
}
