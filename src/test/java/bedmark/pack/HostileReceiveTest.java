package bedmark.pack;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;

import bedmark.journal.Digest;
import bedmark.office.OfficeOptions;
import bedmark.office.OfficeStore;
import bedmark.office.Received;
import bedmark.survey.merge.Clash;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.junit.jupiter.api.io.TempDir;

/**
 * Every hostile pack of {@link HostilePacks}, sent to an office that trusts its sender: each is turned away for its one
 * reason, and not a byte of the store differs afterwards.
 */
class HostileReceiveTest {
    private static final Clock NOW = Clock.fixed(Instant.parse("2026-10-01T08:00:00Z"), ZoneOffset.UTC);
    private static final String PERSON = "Ida Marsh";

    @TempDir
    static Path folder;
    private static HostilePacks packs;
    private static OfficeStore office;

    @BeforeAll
    static void openOffice() throws IOException {
        DeviceKey key = DeviceKey.of(folder.resolve("tablet"));
        packs = new HostilePacks(key, DeviceKey.of(folder.resolve("stranger")));
        office = OfficeStore.open(folder.resolve("office"), OfficeOptions.of(NOW));
        office.trust(key.fingerprint().text(), "tablet 7", PERSON);
        assertInstanceOf(Received.Taken.class, receive("sound", packs.sound()));
    }

    @AfterAll
    static void closeOffice() {
        office.close();
    }

    private static Received receive(String name, byte[] pack) throws IOException {
        return office.receive(Files.write(folder.resolve(Digest.of(pack).hex() + ".zip"), pack), PERSON);
    }

    private static Map<String, String> everyByte() throws IOException {
        Map<String, String> files = new TreeMap<>();
        try (Stream<Path> all = Files.walk(folder.resolve("office"))) {
            for (Path file : all.filter(Files::isRegularFile).toList()) {
                files.put(file.toString(), Digest.of(Files.readAllBytes(file)).hex());
            }
        }
        return files;
    }

    @TestFactory
    Stream<DynamicTest> hostilePacksAreTurnedAwayAndLeaveNothing() {
        return packs.all().entrySet().stream().map(hostile -> DynamicTest.dynamicTest(hostile.getKey(), () -> {
            Map<String, String> before = everyByte();
            Received received = receive(hostile.getKey(), hostile.getValue().bytes());
            Received.Turned turned = assertInstanceOf(Received.Turned.class, received);
            assertEquals(hostile.getValue().code(), turned.why().code());
            assertEquals(before, everyByte());
        }));
    }

    /** Nothing is overwritten by it: both contents are there, and a person is shown that they clash. */
    @Test
    void theSameIdWithOtherContentIsAConflictThatIsShown() throws IOException {
        Received.Taken taken = assertInstanceOf(Received.Taken.class,
                receive("other content", packs.sameIdWithOtherContent()));
        assertEquals(1, taken.fresh());
        assertEquals(1, taken.clashes().size());
        assertEquals(Clash.Kind.SAME_REVISION, taken.clashes().get(0).kind());
        assertEquals(2, taken.clashes().get(0).sides().size());
        Map<String, String> before = everyByte();
        assertInstanceOf(Received.AlreadyHere.class, receive("again", packs.sameIdWithOtherContent()));
        assertInstanceOf(Received.AlreadyHere.class, receive("again", packs.sound()));
        assertEquals(before, everyByte());
    }

    @Test
    void aDeviceThatIsTrustedNowIsTrustedAfterOpeningAgain() throws IOException {
        Path home = folder.resolve("another office");
        try (OfficeStore first = OfficeStore.open(home, OfficeOptions.of(NOW))) {
            first.trust(packs.fingerprint(), "tablet 7", PERSON);
        }
        Path pack = Files.write(folder.resolve("first.zip"), packs.sound());
        try (OfficeStore again = OfficeStore.open(home, OfficeOptions.of(NOW))) {
            assertInstanceOf(Received.Taken.class, again.receive(pack, PERSON));
        }
    }

}
