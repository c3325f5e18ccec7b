package bedmark.office;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import bedmark.index.office.OfficeTables;
import bedmark.index.office.PackedZone;
import bedmark.index.office.RefusalRow;
import bedmark.index.office.Standing;
import bedmark.index.office.Verdict;
import bedmark.index.office.ZoneNames;
import bedmark.index.office.ZoneRow;
import bedmark.survey.InspectionStatus;
import bedmark.survey.merge.Copy;
import bedmark.survey.merge.ZoneId;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.UUID;
import org.flywaydb.core.Flyway;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Tables of an earlier version are read by this one, with every zone as it stood. */
class OfficeMigrationTest {
    private static final String NAMES = "insert into zone (zone, plant, transfer, plant_name, area, conveyor, "
            + "conveyor_tag, tag, asset, material, registered, clashes, clock_wrong, judged";

    private static final String SURVEYS = "insert into survey (digest, id, revision, zone, round, status, begun, "
            + "finished, made, register, conveyor, drive, pack, content) select digest, '" + new UUID(3, 4) + "', 1, "
            + "'/north/TP-1', '', 'INSPECTED', at, at, at, 'r', 'C1', 'd', '9f', '' from (values ";

    @TempDir
    private Path folder;

    @Test
    void aFoldersTables() throws SQLException {
        String url = "jdbc:h2:file:" + folder.resolve("office");
        laidOut(url, "blob");
        try (OfficeTables tables = OfficeTables.of(folder)) {
            check(tables);
        }
    }

    @Test
    @Tag("outside-tool")
    void aServersTables() throws Exception {
        assumeTrue(PostgresServer.possible(), "needs Linux on amd64 with tar, xz and, as root, setpriv");
        try (PostgresServer server = PostgresServer.start()) {
            laidOut(server.url(), "bytea");
            try (OfficeTables tables = OfficeTables.of(server.url())) {
                check(tables);
            }
        }
    }

    /** The tables of version 2: a zone judged, one that only the last visit tells of, one that nobody came to. */
    private static void laidOut(String url, String bytes) throws SQLException {
        Flyway.configure().dataSource(url, null, null).locations("classpath:bedmark/index/office")
                .placeholders(Map.of("bytes", bytes)).target("2").load().migrate();
        try (Connection connection = DriverManager.getConnection(url);
                Statement statement = connection.createStatement()) {
            statement.executeUpdate(NAMES + ", visit, visit_status, visited, latest, moment, level, incomplete, "
                    + "drive_share, skirt_power, saving_wh, saving_cost, remedy, energy_wh, energy_kind, findings) "
                    + "values ('/north/TP-1', 'north', 'TP-1', 'North', 'Crusher', 'C1', 'CV-1', 'TP 1', 'A-1', "
                    + "'Limestone', true, 1, true, true, 'ab12', 'INSPECTED', 1750000000000, 'ab12', 1750000000000, "
                    + "4, false, 0.21, 4100.5, 9e6, 1200, 'widen-boards', 3e7, 'shaft', "
                    + "'bed-over-design near 1.15 0.05')");
            statement.executeUpdate(NAMES + ", visit, visit_status, visited, drive_share) values ('/north/TP-2', "
                    + "'north', 'TP-2', 'North', '', 'C1', 'CV-1', 'TP 2', '', '', true, 0, false, true, 'cd34', "
                    + "'NOT_ACCESSIBLE', 1750000000001, 0.5)");
            statement.executeUpdate(NAMES + ") values ('/a~1b/TP-1', 'a/b', 'TP-1', 'A', '', '', '', 'TP-1', '', '', "
                    + "false, 0, false, false)");
            // Sent at noon: one told of an hour before it, one of the day after the next.
            statement.executeUpdate("insert into deed (seq, made_at, person, device, code, payload) values (7, "
                    + "'2025-06-15T12:00+02:00', 'Ida Marsh', '" + new UUID(1, 2) + "', 'pack-received', '')");
            statement.executeUpdate("insert into pack (sha256, seq) values ('9f', 7)");
            statement.executeUpdate(SURVEYS + "('ab12', 1749978000000), ('ef56', 1750161600000)) as told (digest, at)");
        }
    }

    private static void check(OfficeTables tables) {
        ZoneId first = new ZoneId("north", "TP-1");
        ZoneId second = new ZoneId("north", "TP-2");
        ZoneId third = new ZoneId("a/b", "TP-1");
        ZoneRow judged = new ZoneRow(new ZoneNames(first, "North", "Crusher", "C1", "CV-1", "TP 1", "A-1",
                "Limestone", true), new Standing(first, Optional.of("ab12"), Optional.of(InspectionStatus.INSPECTED),
                OptionalLong.of(1_750_000_000_000L), Optional.of("ab12"), OptionalLong.of(1_750_000_000_000L), 1, true),
                Optional.of(new Verdict(4, false, OptionalDouble.of(0.21), OptionalDouble.of(4100.5),
                        OptionalDouble.of(9e6), OptionalDouble.of(1200), OptionalDouble.empty(),
                        Optional.of("widen-boards"), OptionalDouble.of(3e7), OptionalDouble.empty(),
                        OptionalDouble.empty(), Optional.of("shaft"), Optional.empty(),
                        "bed-over-design near 1.15 0.05")));
        ZoneRow barred = new ZoneRow(new ZoneNames(second, "North", "", "C1", "CV-1", "TP 2", "", "", true),
                new Standing(second, Optional.of("cd34"), Optional.of(InspectionStatus.NOT_ACCESSIBLE),
                        OptionalLong.of(1_750_000_000_001L), Optional.empty(), OptionalLong.empty(), 0, false),
                Optional.empty());
        ZoneRow fresh = new ZoneRow(new ZoneNames(third, "A", "", "", "", "TP-1", "", "", false),
                new Standing(third, Optional.empty(), Optional.empty(), OptionalLong.empty(), Optional.empty(),
                        OptionalLong.empty(), 0, false), Optional.empty());
        assertEquals(List.of(fresh, judged, barred), tables.zones().stream().map(PackedZone::row)
                .sorted(Comparator.comparing(ZoneRow::zone)).toList());
        assertEquals(Optional.of(barred), tables.zone(second).map(PackedZone::row));
        assertEquals(List.of(judged), tables.worst(4, 10).stream().map(PackedZone::row).toList());
        assertEquals(List.of(third, first), tables.waiting(10), "what was judged is judged once more");
        tables.whole(() -> {
            tables.judge(Map.of(first, judged.verdict(), second, judged.verdict(), third, Optional.empty()));
            return true;
        });
        assertEquals(judged.verdict(), tables.zone(second).orElseThrow().row().verdict());
        assertEquals(List.of(second, first), tables.worst(4, 10).stream().map(PackedZone::zone).sorted(
                Comparator.comparing(ZoneId::transfer).reversed()).toList());
        assertEquals(0, tables.countWaiting());
        Map<String, Copy> copies = tables.copiesOf(List.of("ab12", "ef56"));
        assertEquals(OptionalLong.empty(), copies.get("ab12").came());
        assertEquals(OptionalLong.of(1_749_981_600_000L), copies.get("ef56").came(), "dated ahead of when it came");
        assertEquals(List.of(first), tables.datedAhead(List.of(first, second, third)));
        assertEquals(List.of(), tables.refusals().all());
        RefusalRow refused = new RefusalRow("ab12", "/in/a.zip", Optional.of("ab12"), OptionalLong.of(3),
                Optional.empty(), Optional.empty(), "{}", 1, 1);
        tables.whole(() -> {
            tables.refusals().note(refused);
            tables.refusals().note(refused);
            tables.refusals().thin(0);
            return true;
        });
        assertEquals(List.of(refused), tables.refusals().all());
        tables.whole(() -> {
            tables.refusals().settle(List.of("ab12"));
            return true;
        });
        assertEquals(List.of(), tables.refusals().all());
    }
}
