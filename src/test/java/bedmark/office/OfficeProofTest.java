package bedmark.office;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Defect;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Whatever changes in an office's folder by itself is found. */
class OfficeProofTest {
    @TempDir
    private Path folder;

    private Path office;
    private String told = "";

    @BeforeEach
    void receive() {
        office = folder.resolve("office");
        Path pack = Offices.pack(Offices.sample("round-2026-03"), folder.resolve("tablet"), folder.resolve("a.zip"));
        try (OfficeStore store = Offices.trusting(office, folder.resolve("tablet"))) {
            store.receive(pack, "Ida Marsh");
            told = Offices.told(store);
        }
    }

    private List<Defect> proved() {
        return OfficeProof.of(office, OfficeOptions.of(Offices.NOW)).defects();
    }

    private void change(String sql) throws SQLException {
        try (Connection connection = DriverManager.getConnection("jdbc:h2:file:" + office.resolve("index/office"), "",
                ""); Statement statement = connection.createStatement()) {
            assertTrue(statement.executeUpdate(sql) > 0, sql);
        }
    }

    @Test
    void aSoundOfficeIsSoundAndIsLeftAsItWas() throws IOException {
        byte[] journal = journal();
        assertEquals(List.of(), proved());
        assertArrayEquals(journal, journal());
        assertFalse(Files.exists(office.resolve("proof")));
        try (OfficeStore store = OfficeStore.open(office, OfficeOptions.of(Offices.NOW))) {
            assertEquals(told, Offices.told(store));
        }
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "zone | update zone set drive_share = drive_share * 1.0000001 where drive_share is not null",
        "zone | update zone set level = 0 where level > 0",
        "zone | delete from zone where zone in (select zone from zone limit 1)",
        "zone_block | update zone_block set zones = X'00'",
        "zone_block | delete from zone_block where block in (select block from zone_block limit 1)",
        "survey | update survey set made = made + 1",
        "survey | update survey set content = X'00' where digest in (select digest from survey limit 1)",
        "deed | update deed set person = 'somebody else'",
        "register | update register set plant = 'another'",
        "plant | update plant set own = not own",
        "pack | update pack set seq = seq + 1"})
    void aChangedRowIsNamedAndRebuildingMendsIt(String table, String sql) throws SQLException {
        change(sql);
        List<Defect> defects = proved();
        assertFalse(defects.isEmpty(), "it was not found");
        assertTrue(defects.stream().allMatch(one -> one.code().equals("office-row-differs")
                && one.where().equals(table)), defects::toString);
        OfficeStore.rebuild(office, OfficeOptions.of(Offices.NOW)).close();
        assertEquals(List.of(), proved());
    }

    @Test
    void aContentThatIsNotItsDigestsIsNeverJudgedButMadeAnew() throws SQLException {
        change("update survey set content = X'7b7d'");
        change("update zone set judged = false");
        try (OfficeStore store = OfficeStore.open(office, OfficeOptions.of(Offices.NOW))) {
            assertEquals(told, Offices.told(store));
            assertEquals(List.of("office-tables-broken"), store.found().stream().map(Defect::code).toList());
        }
        assertEquals(List.of(), proved());
    }

    /** All of it in one. */
    private byte[] journal() throws IOException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try (var files = Files.list(office.resolve("journal"))) {
            for (Path file : files.sorted().toList()) {
                bytes.writeBytes(Files.readAllBytes(file));
            }
        }
        return bytes.toByteArray();
    }

    @Test
    void aFlippedBitOfTheJournalIsNamed() throws IOException {
        Path segment;
        try (var files = Files.list(office.resolve("journal"))) {
            segment = files.sorted().findFirst().orElseThrow();
        }
        byte[] bytes = Files.readAllBytes(segment);
        bytes[200] ^= 1;
        Files.write(segment, bytes);
        assertFalse(proved().isEmpty());
    }

    @Test
    void aPackThatIsLostOrDamagedIsNamed() throws IOException {
        Path pack;
        try (var packs = Files.list(office.resolve("packs"))) {
            pack = packs.findFirst().orElseThrow();
        }
        byte[] sound = Files.readAllBytes(pack);
        byte[] flipped = sound.clone();
        flipped[flipped.length / 2] ^= 1;
        Files.write(pack, flipped);
        assertTrue(proved().stream().anyMatch(one -> one.code().equals("office-pack-damaged")));
        assertArrayEquals(flipped, Files.readAllBytes(pack));
        Files.delete(pack);
        assertTrue(proved().stream().anyMatch(one -> one.code().equals("office-pack-lost")));
        Files.write(pack, sound);
        assertEquals(List.of(), proved());
    }
}
