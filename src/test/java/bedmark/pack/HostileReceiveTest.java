package bedmark.pack;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.journal.Digest;
import bedmark.office.OfficeOptions;
import bedmark.office.OfficeStore;
import bedmark.office.Received;
import bedmark.office.Sender;
import bedmark.survey.merge.Clash;
import bedmark.words.Words;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Map;
import java.util.Optional;
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
 * reason, and not a byte of what the store keeps differs afterwards; its tables note the refusal.
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
            for (Path file : all.filter(Files::isRegularFile).filter(one -> !one.getParent().endsWith("index"))
                    .toList()) {
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

    private static Sender senderOf(String hostile) throws IOException {
        return sender(packs.all().get(hostile).bytes());
    }

    private static Sender sender(byte[] refused) throws IOException {
        Sender sender = assertInstanceOf(Received.Turned.class, receive("refused", refused)).sender().orElseThrow();
        Words.LANGUAGES.forEach(language ->
                assertTrue(new Words(language).has("office.sender." + sender.code()), sender.code()));
        return sender;
    }

    @Test
    void whichTabletARefusedPackIsFromIsToldAsFarAsItsSignatureProvesIt() throws IOException {
        for (String damaged : List.of("wrong digest", "bad CRC", "nested archive", "unknown unit", "future version")) {
            assertEquals(new Sender(Optional.of("tablet 7"), Optional.of(packs.fingerprint()), true),
                    senderOf(damaged), damaged);
        }
        for (String unproved : List.of("bad signature", "manifest made anew under an old signature", "junk before",
                "weak digest alone")) {
            assertEquals(Sender.UNPROVED, senderOf(unproved), unproved);
        }
        assertEquals("trusted-nameless", senderOf("trailing text").code());
        assertEquals(Optional.empty(), assertInstanceOf(Received.Turned.class,
                office.receive(folder.resolve("absent.zip"), PERSON)).sender());
    }

    @Test
    void aNameThatWasNotSignedIsNotToldAndOneOfAnUntrustedKeyIsToldAsAClaim() throws IOException {
        String bundle = HostilePacks.bundle(BagForge.PHOTO);
        Map<String, byte[]> renamed = bag("tablet", bundle).files();
        renamed.put("data/bundle.json", BagForge.text(bundle.replace("tablet 7", "tablet 8")));
        assertEquals("trusted-nameless", sender(ZipForge.of(renamed).build()).code());
        Map<String, byte[]> foreign = bag("stranger", bundle).files();
        foreign.put("data/photos/a.png", Samples.png(2, 3));
        Sender stranger = sender(ZipForge.of(foreign).build());
        assertEquals("untrusted", stranger.code());
        assertEquals(Optional.of("tablet 7"), stranger.name());
        Map<String, byte[]> unfit = bag("stranger", bundle.replace("tablet 7", "t\\u0000")).files();
        unfit.put("data/photos/a.png", Samples.png(2, 3));
        assertEquals("untrusted-nameless", sender(ZipForge.of(unfit).build()).code());
    }

    private static BagForge bag(String key, String bundle) {
        BagForge bag = new BagForge(DeviceKey.of(folder.resolve(key)));
        bag.payload.put("data/bundle.json", BagForge.text(bundle));
        return bag;
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
