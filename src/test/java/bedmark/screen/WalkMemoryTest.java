package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.index.Store;
import bedmark.survey.Act;
import bedmark.survey.Round;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.OffsetDateTime;
import java.time.ZoneId;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The walk that a program which starts anew goes on with. */
class WalkMemoryTest {
    private static final ZoneId HERE = ZoneId.of("America/Santiago");
    private static final Branch NAMED = Branch.EMPTY.with("id", "r-1").with("name", "North");
    private static final Round ROUND = new Round(NAMED);
    private static final Site SITE = Site.of(Branch.EMPTY.with("rounds", new Node.Series(List.of(NAMED))));
    private static final String PERSON = "A. Vale";

    @TempDir
    private Path temp;

    private Store store;

    @BeforeEach
    void open() {
        store = Store.open(temp.resolve("store"), BedmarkApp.options(at("2026-09-14T06:00:00-03:00")));
        store.append(PERSON, new Act.WalkStarted(ROUND.id()));
    }

    @AfterEach
    void close() {
        store.close();
    }

    private static Clock at(String time) {
        return Clock.fixed(OffsetDateTime.parse(time).toInstant(), HERE);
    }

    private WalkMemory memory(String time) {
        return new WalkMemory(store, at(time));
    }

    private Optional<String> goingOn(String time) {
        return memory(time).goingOn(SITE, PERSON).map(Round::id);
    }

    @Test
    void aWalkGoesOnOnTheSameDayAndThroughTheNight() {
        memory("2026-09-14T00:10:00-03:00").begin(ROUND, PERSON);
        assertEquals(Optional.of("r-1"), goingOn("2026-09-14T00:10:00-03:00"));
        assertEquals(Optional.of("r-1"), goingOn("2026-09-14T23:50:00-03:00"));
        memory("2026-09-14T18:00:00-03:00").begin(ROUND, PERSON);
        assertEquals(Optional.of("r-1"), goingOn("2026-09-15T10:00:00-03:00"));
    }

    @Test
    void theNextDayIsAnotherWalk() {
        memory("2026-09-14T18:00:00-03:00").begin(ROUND, PERSON);
        assertEquals(Optional.empty(), goingOn("2026-09-15T10:00:01-03:00"));
        assertEquals(Optional.empty(), goingOn("2026-10-14T18:00:00-03:00"));
    }

    @Test
    void aCardAcknowledgedOnADayThatIsStillToComeCountsForNothing() {
        memory("2026-09-14T18:00:00-03:00").begin(ROUND, PERSON);
        assertEquals(Optional.empty(), goingOn("2026-09-13T23:00:00-03:00"));
    }

    @Test
    void anotherPersonStartsAWalkOfTheirOwn() {
        memory("2026-09-14T08:00:00-03:00").begin(ROUND, PERSON);
        assertEquals(Optional.empty(), memory("2026-09-14T09:00:00-03:00").goingOn(SITE, "B. Ortiz"));
    }

    @Test
    void aRoundThatThePlantNoLongerHasIsNotOpened() {
        memory("2026-09-14T08:00:00-03:00").begin(ROUND, PERSON);
        assertEquals(Optional.empty(),
                memory("2026-09-14T09:00:00-03:00").goingOn(Site.of(Branch.EMPTY), PERSON));
    }

    @Test
    void aWalkThatTheJournalHasFinishedIsNotOpened() {
        memory("2026-09-14T08:00:00-03:00").begin(ROUND, PERSON);
        store.append(PERSON, new Act.WalkFinished(ROUND.id()));
        assertEquals(Optional.empty(), goingOn("2026-09-14T09:00:00-03:00"));
    }

    @Test
    void aWalkThatSomebodyElseHasTakenUpIsNotOpened() {
        memory("2026-09-14T08:00:00-03:00").begin(ROUND, PERSON);
        store.append("B. Ortiz", new Act.WalkStarted(ROUND.id()));
        assertEquals(Optional.empty(), goingOn("2026-09-14T09:00:00-03:00"));
    }

    @Test
    void anEndedWalkIsForgotten() {
        memory("2026-09-14T08:00:00-03:00").begin(ROUND, PERSON);
        memory("2026-09-14T08:30:00-03:00").end();
        assertEquals(Optional.empty(), goingOn("2026-09-14T09:00:00-03:00"));
        memory("2026-09-14T08:30:00-03:00").end();
    }

    @Test
    void aDamagedFileIsAsGoodAsNone() throws Exception {
        memory("2026-09-14T08:00:00-03:00").begin(ROUND, PERSON);
        Path file = temp.resolve("store").resolve(WalkMemory.FILE);
        String whole = Files.readString(file);
        for (String damaged : List.of("", "{", "[]", "{}", whole.substring(0, whole.length() / 2),
                whole.replace("2026", "year"), whole.replace("\"r-1\"", "7"), whole.replace("\"A. Vale\"", "null"),
                "\0".repeat(whole.length()))) {
            Files.writeString(file, damaged);
            assertEquals(Optional.empty(), goingOn("2026-09-14T09:00:00-03:00"), damaged);
        }
        Files.writeString(file, whole);
        assertEquals(Optional.of("r-1"), goingOn("2026-09-14T09:00:00-03:00"));
    }
}
