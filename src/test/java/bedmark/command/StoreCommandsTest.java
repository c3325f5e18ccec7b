package bedmark.command;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.dispatch.Dispatch;
import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.index.Store;
import bedmark.index.StoreOptions;
import bedmark.index.SurveyLine;
import bedmark.index.SurveyQuery;
import bedmark.journal.Progress;
import bedmark.json.BundleReader;
import bedmark.office.OfficeStore;
import bedmark.office.Offices;
import bedmark.pack.DeviceKey;
import bedmark.pack.PackLimits;
import bedmark.pack.PackReader;
import bedmark.pack.ReadPack;
import bedmark.pack.Receipt;
import bedmark.pack.ReceiptWriter;
import bedmark.pack.WrittenPack;
import bedmark.survey.Act;
import bedmark.survey.Adoption;
import bedmark.survey.Bundle;
import bedmark.survey.QueueState;
import bedmark.survey.Survey;
import bedmark.vault.Passphrase;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.UUID;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The care of a store from the terminal: backup, restore, encryption, the office's receipt. */
class StoreCommandsTest {
    private static final Clock CLOCK = Clock.fixed(Instant.parse("2026-03-12T09:00:00Z"), ZoneOffset.UTC);

    @TempDir
    Path temp;
    private Path home;
    private Path stick;
    private Path secret;

    @BeforeEach
    void prepare() throws IOException {
        home = temp.resolve("store");
        stick = Files.createDirectory(temp.resolve("stick"));
        secret = Files.writeString(temp.resolve("secret.txt"), "skirt and board\n");
    }

    private static StoreOptions options() {
        return StoreOptions.of("tablet").withClock(CLOCK);
    }

    /** A round under way, its completed surveys in the queue. */
    private List<UUID> queued() throws IOException {
        Bundle bundle = BundleReader.read(Files.readAllBytes(Path.of("sample-surveys/round-under-way.json")));
        try (Store store = Store.open(home, options())) {
            store.append("A. Vale", Adoption.register(List.of(bundle)));
            for (Act act : Adoption.surveys(bundle, true)) {
                store.append("A. Vale", act instanceof Act.SurveyOpened opened
                        ? new Act.SurveyOpened(opened.survey(), opened.document().without("photos")) : act);
            }
            List<UUID> completed = store.surveys(SurveyQuery.ALL.in(QueueState.COMPLETED)).stream()
                    .map(SurveyLine::id).toList();
            store.append("A. Vale", new Act.SurveysQueued(completed));
            return completed;
        }
    }

    private WrittenPack export(List<UUID> surveys) {
        try (Store store = Store.open(home, options())) {
            return new Dispatch(store).export(surveys, stick, "An estimate.", "A. Vale", Progress.NONE);
        }
    }

    private Terminal.Result fine(String... arguments) {
        Terminal.Result result = Terminal.run(arguments);
        assertEquals(0, result.code(), result.err());
        return result;
    }

    @Test
    void aBackupIsMadeAndRestoredByTwoCommands() throws IOException {
        queued();
        Terminal.Result made = fine("store", "backup", home.toString(), "--to", stick.toString());
        assertTrue(made.out().contains("bedmark-backup-"), made.out());
        Path other = temp.resolve("other");
        fine("store", "restore", stick.toString(), "--to", other.toString());
        fine("store", "check", other.toString());
        Terminal.Result again = fine("store", "restore", stick.toString(), "--to", other.toString());
        assertTrue(again.out().startsWith("Nothing new"), again.out());
        assertTrue(fine("store", "check", home.toString()).out().contains("Last backup 2026-10-01 09:42:07"));
        assertEquals(3, Terminal.run("store", "restore", temp.resolve("none").toString(), "--to",
                other.toString()).code());
        assertEquals(2, Terminal.run("store", "backup", home.toString()).code());
    }

    @Test
    void aStoreIsEncryptedAndItsPassphraseChanged() throws IOException {
        queued();
        Terminal.Result done = fine("store", "encrypt", home.toString(), "--passphrase-file", secret.toString());
        assertTrue(done.out().contains("can not be recovered by anybody"), done.out());
        Terminal.Result closed = Terminal.run("store", "check", home.toString());
        assertEquals(3, closed.code());
        assertTrue(closed.err().contains("give its passphrase"), closed.err());
        fine("store", "check", home.toString(), "--passphrase-file", secret.toString());
        fine("store", "rebuild", home.toString(), "--passphrase-file", secret.toString());
        Path fresh = Files.writeString(temp.resolve("fresh.txt"), "board and skirt");
        fine("store", "encrypt", home.toString(), "--change", "--old-passphrase-file", secret.toString(),
                "--passphrase-file", fresh.toString());
        assertTrue(Terminal.run("store", "check", home.toString(), "--passphrase-file", secret.toString()).err()
                .contains("not the right one"));
        fine("store", "backup", home.toString(), "--to", stick.toString(), "--passphrase-file", fresh.toString());
        Path other = temp.resolve("other");
        fine("store", "restore", stick.toString(), "--to", other.toString(), "--passphrase-file", fresh.toString());
        assertTrue(fine("store", "check", other.toString(), "--passphrase-file", fresh.toString()).out()
                .contains("is encrypted"));
        Terminal.Result none = fine("store", "encrypt", temp.resolve("hoem").toString(), "--passphrase-file",
                secret.toString());
        assertTrue(none.out().contains("hoem: a new, empty store was made there"), none.out());
        Path shorter = Files.writeString(temp.resolve("short.txt"), "short");
        assertEquals(3, Terminal.run("store", "encrypt", temp.resolve("new").toString(), "--passphrase-file",
                shorter.toString()).code());
        assertFalse(Files.exists(temp.resolve("new")));
    }

    @Test
    void theOfficesReceiptClosesTheLoop() throws IOException {
        List<UUID> surveys = queued();
        WrittenPack pack = export(surveys);
        ReadPack read = PackReader.open(pack.file(), PackLimits.STANDARD);
        DeviceKey office = DeviceKey.of(temp.resolve("office"));
        List<Survey> all = read.bundle().surveys();
        List<Receipt.Item> items = all.stream().map(Receipt.Item::of).toList();
        Receipt.Item other = new Receipt.Item(items.get(0).survey(), items.get(0).revision(), "00".repeat(32));
        List<Receipt.Item> some = new ArrayList<>(items);
        some.set(0, other);
        Receipt receipt = Receipt.of(UUID.randomUUID(), OffsetDateTime.now(CLOCK),
                new Receipt.Office(UUID.randomUUID(), "Plant office"),
                read.bundle().document().uuid("id").orElseThrow(), pack.sha256(), some);
        Path file = ReceiptWriter.write(receipt, office, stick.resolve(ReceiptWriter.fileName(receipt)));

        Terminal.Result unknown = Terminal.run("store", "receipt", home.toString(), stick.toString());
        assertEquals(3, unknown.code());
        assertTrue(unknown.err().contains(office.fingerprint().toString()), unknown.err());
        assertEquals(2, Terminal.run("store", "receipt", home.toString(), file.toString(), "--trust", "abc").code());
        Terminal.Result noted = Terminal.run("store", "receipt", home.toString(), file.toString(), "--trust",
                office.fingerprint().toString());
        assertEquals(1, noted.code(), noted.err());
        assertTrue(noted.err().contains("not as on this tablet"), noted.err());
        try (Store store = Store.open(home, options())) {
            assertEquals(QueueState.EXPORTED, store.survey(surveys.get(0)).orElseThrow().state());
            assertEquals(surveys.size() - 1L, store.counts().get(QueueState.RECEIVED));
        }
        Receipt whole = Receipt.of(UUID.randomUUID(), OffsetDateTime.now(CLOCK), receipt.office(), receipt.pack(),
                pack.sha256(), items);
        Path second = ReceiptWriter.write(whole, office, temp.resolve("whole.receipt.json"));
        fine("store", "receipt", home.toString(), second.toString());
        fine("store", "receipt", home.toString(), second.toString());
        Receipt renamed = Receipt.of(whole.id(), whole.receivedAt(), new Receipt.Office(whole.office().id(),
                "Works office"), whole.pack(), whole.packSha256(), items);
        Path third = ReceiptWriter.write(renamed, office, temp.resolve("renamed.receipt.json"));
        Terminal.Result told = Terminal.run("store", "receipt", home.toString(), third.toString());
        assertEquals(0, told.code(), "an office that goes by another name is the same office: " + told.err());
        assertEquals("Works office: nothing new, " + items.size() + " known before", told.out().strip());
        try (Store store = Store.open(home, options())) {
            assertEquals((long) surveys.size(), store.counts().get(QueueState.RECEIVED));
            assertEquals(2, store.chronicle().receipts().size(), "a receipt that tells nothing new is not noted again");
        }
        Path foreign = ReceiptWriter.write(Receipt.of(UUID.randomUUID(), OffsetDateTime.now(CLOCK), receipt.office(),
                receipt.pack(), "11".repeat(32), items), office, temp.resolve("foreign.receipt.json"));
        Terminal.Result refused = Terminal.run("store", "receipt", home.toString(), foreign.toString());
        assertEquals(3, refused.code());
        assertTrue(refused.err().contains("did not leave this tablet"), refused.err());
    }

    @Test
    void theSameSurveysAreTheSamePackWheneverTheyLeave() throws IOException {
        List<UUID> surveys = queued();
        WrittenPack first = export(surveys);
        byte[] bytes = Files.readAllBytes(first.file());
        Files.delete(first.file());
        try (Store store = Store.open(home, StoreOptions.of("tablet").withClock(Clock.systemUTC()))) {
            Branch register = store.register().orElseThrow();
            store.append("B. Other", new Act.RegisterTaken(register.with("changed", "since")));
            UUID fresh = UUID.randomUUID();
            Survey open = store.history(store.surveys(SurveyQuery.ALL.in(QueueState.OPEN)).get(0).id()).orElseThrow()
                    .survey();
            store.append("B. Other", new Act.SurveyCompleted(open.id(), "B. Other"));
            store.append("B. Other", new Act.RevisionOpened(fresh, surveys.get(0), "wrong belt",
                    store.history(surveys.get(0)).orElseThrow().survey().document().with("id", fresh.toString())
                            .with("revision", Node.number(2)).with("supersedes",
                                    surveys.get(0).toString()).without("completedAt").without("signedOffBy")));
        }
        WrittenPack again = export(surveys);
        assertEquals(first.sha256(), again.sha256());
        assertArrayEquals(bytes, Files.readAllBytes(again.file()));
        fine("store", "encrypt", home.toString(), "--passphrase-file", secret.toString());
        try (Store store = Store.open(home, options().withPassphrase(Optional.of(
                Passphrase.of("skirt and board"))))) {
            WrittenPack sealed = new Dispatch(store).export(surveys, stick, "An estimate.", "A. Vale", Progress.NONE);
            assertEquals(first.sha256(), sealed.sha256(), "encryption changes nothing of what leaves");
        }
    }

    private static Map<Path, byte[]> held(Path folder) throws IOException {
        Map<Path, byte[]> held = new TreeMap<>();
        try (Stream<Path> files = Files.walk(folder)) {
            for (Path file : files.filter(Files::isRegularFile).toList()) {
                held.put(file, Files.readAllBytes(file));
            }
        }
        return held;
    }

    @Test
    void whatIsDoneToATabletsStoreIsNotDoneToAnOffice() throws IOException {
        Path office = temp.resolve("office");
        try (OfficeStore store = Offices.trusting(office, home)) {
            store.receive(List.of(Offices.pack(Offices.sample("round-2026-03"), home, temp.resolve("a.zip"))), "I",
                    Progress.NONE);
        }
        Map<Path, byte[]> before = held(office);
        String[][] commands = {{"check", "office check"}, {"rebuild", "office rebuild"}, {"backup", "copy", "--to",
            stick.toString()}, {"encrypt", "encrypted disk", "--passphrase-file", secret.toString()},
            {"receipt", "tablet", temp.toString()}};
        for (String[] command : commands) {
            List<String> line = new ArrayList<>(List.of("store", command[0], office.toString()));
            line.addAll(List.of(command).subList(2, command.length));
            Terminal.Result refused = Terminal.run(line.toArray(String[]::new));
            assertEquals(3, refused.code(), command[0]);
            assertEquals(1, refused.err().lines().count(), refused.err());
            assertTrue(refused.err().contains(command[1]), refused.err());
        }
        assertEquals(3, Terminal.run("store", "restore", stick.toString(), "--to", office.toString()).code());
        assertEquals(3, Terminal.run("support", office.toString(), "--out", temp.resolve("s.txt").toString()).code());
        Map<Path, byte[]> after = held(office);
        assertEquals(before.keySet(), after.keySet());
        before.forEach((file, bytes) -> assertArrayEquals(bytes, after.get(file), file.toString()));
        assertEquals(0, Terminal.run("office", "check", office.toString()).code());
    }
}
