package bedmark.office.register;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.office.Offices;
import java.io.IOException;
import java.io.OutputStream;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.UUID;
import java.util.stream.Stream;
import org.dhatim.fastexcel.Workbook;
import org.dhatim.fastexcel.Worksheet;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.junit.jupiter.api.io.TempDir;

/** Registers from tables: forty kinds of bad rows, each named, and none of them leaves anything behind. */
class RegisterImportTest {
    private static final Branch HEAD = head();

    private static Branch head() {
        Branch bundle = Offices.sample("round-2026-03").document();
        return Branch.EMPTY.with("plant", bundle.get("plant").orElseThrow()).with("forms", bundle.get("forms")
                .orElseThrow()).with("rounds", bundle.get("rounds").orElseThrow());
    }

    private static Table table(String list, String... lines) throws IOException {
        return Tables.csv(String.join("\n", lines).getBytes(StandardCharsets.UTF_8), list + ".csv");
    }

    private static Draft draft(Table... tables) {
        return RegisterImport.draft(HEAD, List.of(tables), Map.of());
    }

    /**
     * @param where  of the defect
     * @param list   the table's name
     * @param lines  head and rows; the first row is good, so that a half import would show
     */
    private record Bad(String code, String where, String list, String... lines) {
    }

    private static final String ZONE = "id,conveyor,skirtSpacing [mm],material,area,tag";
    private static final String GOOD_ZONE = "TP-90,C1,800,limestone,quarry,TP-90";
    private static final String BELT = "id,beltWidth [mm],troughAngle [deg],centreRollLength [mm],driveEfficiency,"
            + "loadedHoursPerYear,ratedPower [kW],skirtPowerBudget,assetId";
    private static final String GOOD_BELT = "C90,1200,35,450,0.9,5000,55,10 %,A-90";
    private static final String STONE = "id,skirtFrictionFactor,bulkDensity [kg/m3],angleOfRepose,speedClass,freeFlowing,"
            + "name";
    private static final String GOOD_STONE = "M90,0.1,1500,38 deg,coal-soft-ore-fine-stone,no,Marl";

    private static List<Bad> bad() {
        return List.of(
                zone("cell-absent", "id", ",C1,800,limestone,quarry,X"),
                zone("cell-absent", "conveyor", "TP-91,,800,limestone,quarry,X"),
                zone("row-twice", "", "TP-90,C1,800,limestone,quarry,TP-90"),
                zone("cell-control-character", "id", "TP\u200B91,C1,800,limestone,quarry,X"),
                zone("cell-control-character", "tag", "TP-91,C1,800,limestone,quarry,X\u0007"),
                zone("cell-too-long", "tag", "TP-91,C1,800,limestone,quarry," + "x".repeat(501)),
                zone("cell-formula", "tag", "TP-91,C1,800,limestone,quarry,=1+1"),
                zone("cell-no-number", "skirtSpacing [mm]", "TP-91,C1,wide,limestone,quarry,X"),
                zone("cell-no-number", "skirtSpacing [mm]", "TP-91,C1,NaN,limestone,quarry,X"),
                zone("cell-no-number", "skirtSpacing [mm]", "TP-91,C1,Infinity,limestone,quarry,X"),
                zone("cell-no-number", "skirtSpacing [mm]", "TP-91,C1,1.2.3,limestone,quarry,X"),
                zone("cell-no-number", "skirtSpacing [mm]", "TP-91,C1,1 200,limestone,quarry,X"),
                zone("cell-number-too-large", "skirtSpacing [mm]", "TP-91,C1,1e999,limestone,quarry,X"),
                zone("cell-number-too-large", "skirtSpacing [mm]", "TP-91,C1,1e-999,limestone,quarry,X"),
                zone("cell-not-above", "skirtSpacing [mm]", "TP-91,C1,0,limestone,quarry,X"),
                zone("cell-not-above", "skirtSpacing [mm]", "TP-91,C1,-800,limestone,quarry,X"),
                zone("cell-unit-unknown", "skirtSpacing [mm]", "TP-91,C1,4 furlong,limestone,quarry,X"),
                zone("cell-unit-other", "skirtSpacing [mm]", "TP-91,C1,4 t/h,limestone,quarry,X"),
                zone("cell-reference-unknown", "conveyor", "TP-91,C99,800,limestone,quarry,X"),
                zone("cell-reference-unknown", "material", "TP-91,C1,800,cheese,quarry,X"),
                zone("cell-reference-unknown", "area", "TP-91,C1,800,limestone,moon,X"),
                zone("row-boards-over-belt", "", "TP-91,C1,1400,limestone,quarry,X"),
                zone("row-name-twice", "", "TP-91,C1,800,limestone,quarry,TP-90"),
                zone("row-too-long", "", "TP-91,C1,800,limestone,quarry,X,and,more"),
                belt("cell-below", "troughAngle [deg]", "C91,1200,-5,450,0.9,5000,55,10 %,A-91"),
                belt("cell-angle-too-steep", "troughAngle [deg]", "C91,1200,95,450,0.9,5000,55,10 %,A-91"),
                belt("row-roll-over-belt", "", "C91,1200,35,1300,0.9,5000,55,10 %,A-91"),
                belt("cell-not-above", "driveEfficiency", "C91,1200,35,450,0,5000,55,10 %,A-91"),
                belt("cell-above", "driveEfficiency", "C91,1200,35,450,1.2,5000,55,10 %,A-91"),
                belt("cell-number-with-unit", "driveEfficiency", "C91,1200,35,450,93 %,5000,55,10 %,A-91"),
                belt("cell-above", "loadedHoursPerYear", "C91,1200,35,450,0.9,9000,55,10 %,A-91"),
                belt("cell-below", "loadedHoursPerYear", "C91,1200,35,450,0.9,-1,55,10 %,A-91"),
                belt("cell-unit-absent", "skirtPowerBudget", "C91,1200,35,450,0.9,5000,55,10,A-91"),
                belt("cell-unit-other", "skirtPowerBudget", "C91,1200,35,450,0.9,5000,55,10 m/s,A-91"),
                belt("row-name-twice", "", "C91,1200,35,450,0.9,5000,55,10 %,A-90"),
                stone("cell-below", "skirtFrictionFactor", "M91,-0.1,1500,38 deg,,,"),
                stone("cell-not-above", "bulkDensity [kg/m3]", "M91,0.1,0,38 deg,,,"),
                stone("cell-unit-absent", "angleOfRepose", "M91,0.1,1500,38,,,"),
                stone("cell-word-unknown", "speedClass", "M91,0.1,1500,38 deg,quick,,"),
                stone("cell-no-flag", "freeFlowing", "M91,0.1,1500,38 deg,,maybe,"),
                new Bad("cell-word-unknown", "limits.csv:3 rule", "limits", "rule,near,overloaded",
                        "bed-over-board,0.8,1", "bed-over-moon,0.8,1"),
                new Bad("row-limits-crossed", "limits.csv:3", "limits", "rule,near,overloaded",
                        "bed-over-board,0.8,1", "bed-over-design,1.5,1.2"),
                new Bad("cell-word-unknown", "sealRates.csv:3 type", "sealRates", "type,condition,multiplier",
                        "vertical,worn,1.2", "woolly,worn,1.2"),
                new Bad("cell-word-unknown", "sealRates.csv:3 condition", "sealRates", "type,condition,multiplier",
                        "vertical,worn,1.2", "vertical,sad,1.2"),
                new Bad("cell-below", "sealRates.csv:3 multiplier", "sealRates", "type,condition,multiplier",
                        "vertical,worn,1.2", "vertical,torn,-1"),
                new Bad("cell-reference-unknown", "rounds.csv:3 transfer", "rounds", "id,transfer", "r90,TP-01",
                        "r90,TP-99"),
                new Bad("row-point-twice", "rounds.csv:3", "rounds", "id,transfer", "r90,TP-01", "r90,TP-01"),
                new Bad("table-column-absent", "transfers.csv", "transfers", "id,tag", "TP-90,TP-90"),
                new Bad("table-column-twice", "transfers.csv conveyor", "transfers", "id,conveyor,conveyor",
                        "TP-90,C1,C1"),
                new Bad("table-unknown", "pumps.csv", "pumps", "id", "P1"),
                new Bad("table-empty", "transfers.csv", "transfers", ""),
                new Bad("cell-unit-unknown", "transfers.csv skirtSpacing [span]", "transfers",
                        "id,conveyor,skirtSpacing [span]", "TP-90,C1,"));
    }

    private static Bad zone(String code, String column, String row) {
        return new Bad(code, ("transfers.csv:3 " + column).strip(), "transfers", ZONE, GOOD_ZONE, row);
    }

    private static Bad belt(String code, String column, String row) {
        return new Bad(code, ("conveyors.csv:3 " + column).strip(), "conveyors", BELT, GOOD_BELT, row);
    }

    private static Bad stone(String code, String column, String row) {
        return new Bad(code, ("materials.csv:3 " + column).strip(), "materials", STONE, GOOD_STONE, row);
    }

    @TestFactory
    Stream<DynamicTest> everyBadRowIsNamed() {
        assertTrue(bad().size() >= 40);
        return bad().stream().map(bad -> DynamicTest.dynamicTest(bad.code() + " " + bad.where(), () -> {
            Draft draft = draft(table(bad.list(), bad.lines()));
            assertEquals(List.of(bad.code() + " " + bad.where()), draft.defects().stream()
                    .map(defect -> defect.code() + " " + defect.where()).toList());
        }));
    }

    /** The same rows out of a workbook: what looks like a number is one there, everything else a text. */
    @TestFactory
    Stream<DynamicTest> everyBadRowOfAWorkbookIsNamed(@TempDir Path folder) {
        // A workbook is XML, which can't hold a bell.
        List<Bad> held = bad().stream().filter(bad -> !String.join("", bad.lines()).contains("\u0007")).toList();
        assertTrue(held.size() >= 40);
        return held.stream().map(bad -> DynamicTest.dynamicTest(bad.code() + " " + bad.where(), () -> {
            String name = UUID.randomUUID() + ".xlsx";
            Path file = folder.resolve(name);
            try (OutputStream out = Files.newOutputStream(file); Workbook workbook = new Workbook(out, "bedmark",
                    "1.0")) {
                Worksheet sheet = workbook.newWorksheet(bad.list());
                for (int row = 0; row < bad.lines().length; row++) {
                    String[] cells = bad.lines()[row].split(",", -1);
                    for (int column = 0; column < cells.length; column++) {
                        put(sheet, row, column, cells[column]);
                    }
                }
            }
            Draft draft = RegisterImport.draft(HEAD, Tables.read(file), Map.of());
            String where = bad.where().replace(bad.list() + ".csv", name + " / " + bad.list());
            assertEquals(List.of(bad.code() + " " + where), draft.defects().stream()
                    .map(defect -> defect.code() + " " + defect.where()).toList());
        }));
    }

    private static void put(Worksheet sheet, int row, int column, String cell) {
        if (cell.matches("-?[0-9]+([.][0-9]+)?")) {
            sheet.value(row, column, new BigDecimal(cell));
        } else if (!cell.isEmpty()) {
            sheet.value(row, column, cell);
        }
    }

    @Test
    void allBadRowsAreNamedAtOnceInTheirOrder() throws IOException {
        List<String> lines = new ArrayList<>(List.of(ZONE));
        List<Bad> zones = bad().stream().filter(bad -> bad.list().equals("transfers") && bad.lines().length == 3
                && bad.lines()[0].equals(ZONE) && !bad.code().equals("row-twice") && !bad.code().equals("row-name-twice"))
                .toList();
        zones.forEach(bad -> lines.add(bad.lines()[2]));
        Draft draft = draft(table("transfers", lines.toArray(String[]::new)));
        assertEquals(zones.stream().map(Bad::code).toList(), draft.defects().stream().map(Defect::code).toList());
    }

    @Test
    void filesThatAreNoTablesAreRefused() {
        assertEquals("table-not-utf8", assertThrows(Refused.class, () ->
                Tables.csv(new byte[] {'i', 'd', '\n', (byte) 0xFF}, "areas.csv")).defect().code());
        assertEquals("table-quotes-wrong", assertThrows(Refused.class, () ->
                table("areas", "id,name", "a,\"never closed", "b,c")).defect().code());
    }

    @Test
    void goodRowsAreAddedAndChangeWhatIsThere() throws IOException {
        Draft draft = draft(table("transfers", ZONE, GOOD_ZONE, "TP-01,C1,36 in,,,"),
                table("conveyors", BELT.replace(',', ';'), GOOD_BELT.replace(',', ';').replace("0.9", "0,9")));
        assertEquals(List.of(), draft.defects());
        assertEquals(2, draft.added());
        assertEquals(1, draft.changed());
        Branch plant = draft.head().branch("plant").orElseThrow();
        Branch changed = plant.branches("transfers").get(0);
        assertEquals("36", changed.quantity("skirtSpacing").orElseThrow().value().toPlainString());
        assertEquals("[in_i]", changed.quantity("skirtSpacing").orElseThrow().unit().code());
        assertEquals("limestone", changed.text("material").orElseThrow(), "an empty cell changes nothing");
        Branch belt = plant.branches("conveyors").stream().filter(one -> one.text("id").get().equals("C90"))
                .findFirst().orElseThrow();
        assertEquals("0.9", belt.number("driveEfficiency").orElseThrow().toPlainString());
    }

    @Test
    void aColumnMayBeNamedOtherwise() throws IOException {
        Draft draft = RegisterImport.draft(HEAD, List.of(table("transfers", "Point,Belt,Width,Colour", "TP-90,C1,80,red")),
                Map.of("Point", "id", "Belt", "conveyor", "Width", "skirtSpacing [cm]"));
        assertEquals(List.of(), draft.defects());
        assertEquals(List.of("id", "conveyor", "skirtSpacing", ""), draft.mapping().stream()
                .map(Draft.Mapped::key).toList());
        assertEquals("cm", draft.mapping().get(2).unit());
    }

    @Test
    void whatIsWrittenAsTablesIsTakenBackAsItWas() throws IOException {
        List<Table> tables = new ArrayList<>();
        for (Map.Entry<String, String> file : RegisterTables.of(HEAD).entrySet()) {
            tables.add(Tables.csv(file.getValue().getBytes(StandardCharsets.UTF_8), file.getKey()));
        }
        Draft draft = RegisterImport.draft(HEAD, tables, Map.of());
        assertEquals(List.of(), draft.defects());
        assertEquals(0, draft.changed());
        assertEquals(HEAD.branch("plant"), draft.head().branch("plant"));
    }
}
