package bedmark.office;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import bedmark.index.office.OfficeTables;
import bedmark.index.office.RefusalRow;
import bedmark.index.office.RefusalTable;
import bedmark.journal.Fault;
import bedmark.journal.Progress;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.SQLException;
import java.sql.Statement;
import java.time.Clock;
import java.time.Duration;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What was refused at night is there in the morning. */
class RefusalsTest {
    private static final Clock NIGHT = Clock.offset(Offices.NOW, Duration.ofHours(-10));

    @TempDir
    private Path folder;
    private Path pack;
    private Path broken;

    @BeforeEach
    void packs() throws IOException {
        pack = Offices.pack(Offices.sample("round-under-way"), folder.resolve("tablet"), folder.resolve("a.zip"));
        broken = Files.write(folder.resolve("broken.zip"), new byte[] {1, 2, 3});
    }

    private OfficeStore office(Clock clock) {
        return OfficeStore.open(folder.resolve("office"), OfficeOptions.of(clock));
    }

    private static List<Refusal> refusals(OfficeStore store, Clock clock) {
        return new Refusals(store, clock).open();
    }

    private static Received.Turned refused(OfficeStore store, Path file) {
        Received.Turned turned = assertInstanceOf(Received.Turned.class, store.receive(file, "Ida Marsh"));
        assertTrue(turned.kept());
        return turned;
    }

    private static OffsetDateTime at(Clock clock) {
        return OffsetDateTime.now(clock);
    }

    @Test
    void aRefusedPackIsRememberedOnceWithItsReasonUntilItIsIn() {
        Received.Turned unknown;
        Received.Turned damaged;
        try (OfficeStore store = office(NIGHT)) {
            unknown = refused(store, pack);
            damaged = refused(store, broken);
            assertEquals(Optional.of("Tablet 3"), unknown.sender().orElseThrow().name());
            assertEquals(Optional.of(Sender.UNPROVED), damaged.sender());
            assertEquals(3, damaged.content().orElseThrow().bytes());
        }
        try (OfficeStore store = office(Offices.NOW)) {
            refused(store, pack);
            assertEquals(List.of(new Refusal(unknown, at(NIGHT), at(Offices.NOW)),
                    new Refusal(damaged, at(NIGHT), at(NIGHT))), refusals(store, Offices.NOW));
            store.trust(Offices.fingerprint(folder.resolve("tablet")), "", "Ida Marsh");
            assertTrue(refusals(store, Offices.NOW).get(0).turned().sender().orElseThrow().trusted());
            assertInstanceOf(Received.Taken.class, store.receive(pack, "Ida Marsh"));
            assertEquals(List.of(new Refusal(damaged, at(NIGHT), at(NIGHT))), refusals(store, Offices.NOW));
        }
    }

    @Test
    void noRecordAndNoExportOfAnOfficeTellsOfThem() throws IOException {
        try (OfficeStore store = office(NIGHT); OfficeStore other = Offices.trusting(folder.resolve("other"),
                folder.resolve("tablet"))) {
            refused(store, broken);
            refused(store, pack);
            store.trust(Offices.fingerprint(folder.resolve("tablet")), "", "Ida Marsh");
            store.receive(pack, "Ida Marsh");
            other.receive(pack, "Ida Marsh");
            new OfficeExport(store).write(folder.resolve("export"), Progress.NONE);
            new OfficeExport(other).write(folder.resolve("export-other"), Progress.NONE);
            assertEquals(Offices.files(folder.resolve("export-other")), Offices.files(folder.resolve("export")));
            assertEquals(other.ask(OfficeTables::rowDigests).keySet(), store.ask(OfficeTables::rowDigests).keySet());
        }
    }

    @Test
    void tablesThatAreMadeAnewTellOfThemStill() {
        try (OfficeStore store = office(NIGHT)) {
            refused(store, broken);
            refused(store, pack);
            store.trust(Offices.fingerprint(folder.resolve("tablet")), "", "Ida Marsh");
            store.receive(pack, "Ida Marsh");
        }
        assertEquals(List.of(), OfficeProof.of(folder.resolve("office"), OfficeOptions.of(NIGHT)).defects());
        try (OfficeStore store = OfficeStore.rebuild(folder.resolve("office"), OfficeOptions.of(NIGHT))) {
            assertEquals(List.of(broken), refusals(store, NIGHT).stream().map(one -> one.turned().file()).toList());
        }
    }

    @Test
    void aFileThatCanNotBeReadIsRememberedByItsNameAndOneThatIsNotThereIsNot() throws IOException {
        Path unread = Files.createDirectory(folder.resolve("b.zip"));
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), folder.resolve("tablet"))) {
            store.receive(folder.resolve("absent.zip"), "Ida Marsh");
            assertEquals(Optional.empty(), refused(store, unread).sender());
            assertEquals(List.of(unread), refusals(store, Offices.NOW).stream().map(one -> one.turned().file())
                    .toList());
            Files.delete(unread);
            Files.copy(pack, unread);
            assertInstanceOf(Received.Taken.class, store.receive(unread, "Ida Marsh"));
            assertEquals(List.of(), refusals(store, Offices.NOW));
        }
    }

    @Test
    void aFileThatFailsWhileItIsReadIsRefusedWithTheSystemsOwnReason() {
        // A file of the system that can be opened and not read, as a stick is that was pulled out.
        Path failing = Path.of("/proc/self/mem");
        assumeTrue(Files.isReadable(failing));
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), folder.resolve("tablet"))) {
            Received.Turned turned = refused(store, failing);
            assertEquals("pack-unreadable", turned.why().code());
            IOException failure = assertThrows(IOException.class, () -> Files.readAllBytes(failing));
            assertEquals(List.of(Fault.reason(failure)), turned.why().details());
        }
    }

    @Test
    void whatCanNotBeNotedIsRefusedAllTheSameAndSaysSo() throws SQLException {
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), folder.resolve("tablet"))) {
            try (Connection tables = DriverManager.getConnection("jdbc:h2:file:"
                    + folder.resolve("office/index/office"));
                    Statement statement = tables.createStatement()) {
                statement.execute("drop table refusal");
            }
            Received.Turned turned = assertInstanceOf(Received.Turned.class, store.receive(broken, "Ida Marsh"));
            assertEquals("pack-not-zip", turned.why().code());
            assertFalse(turned.kept());
            assertInstanceOf(Received.Taken.class, store.receive(pack, "Ida Marsh"));
        }
    }

    @Test
    void theNewestThousandAreKeptForNinetyDays() {
        try (OfficeTables tables = OfficeTables.of(folder.resolve("tables"))) {
            tables.whole(() -> {
                for (int i = 0; i < RefusalTable.MOST + 3; i++) {
                    tables.refusals().note(new RefusalRow("pack" + i, "/in/" + i, Optional.empty(),
                            OptionalLong.empty(), Optional.empty(), Optional.empty(), "{}", i, i));
                }
                tables.refusals().thin(1);
                return true;
            });
            List<RefusalRow> kept = tables.refusals().all();
            assertEquals(RefusalTable.MOST, kept.size());
            assertEquals(List.of(1002L, 3L), List.of(kept.get(0).last(), kept.get(999).last()));
        }
        try (OfficeStore store = office(NIGHT)) {
            refused(store, broken);
            Clock later = Clock.offset(NIGHT, Refusals.KEPT.plusMillis(1));
            assertEquals(List.of(), refusals(store, later));
        }
    }
}
