package bedmark.office.register;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.office.OfficeStore;
import bedmark.office.Offices;
import bedmark.quantity.Unit;
import java.io.IOException;
import java.io.OutputStream;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
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
                stone("cell-number-unclear", "bulkDensity [kg/m3]", "M91,0.1,\"1,600\",38 deg,,,"),
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
                zone("row-too-short", "", "TP-91,C1,800"),
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
                new Bad("row-limits-crossed", "limits.csv:3", "limits", "rule,near,overloaded",
                        "bed-over-board,0.8,1", "bed-behind-belt,0.8,0.9"),
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
        // Nor does it keep how many empty cells end a row.
        List<Bad> held = bad().stream().filter(bad -> !String.join("", bad.lines()).contains("\u0007")
                && !bad.code().equals("row-too-short")).toList();
        assertTrue(held.size() >= 40);
        return held.stream().map(bad -> DynamicTest.dynamicTest(bad.code() + " " + bad.where(), () -> {
            String name = UUID.randomUUID() + ".xlsx";
            Path file = folder.resolve(name);
            try (OutputStream out = Files.newOutputStream(file); Workbook workbook = new Workbook(out, "bedmark",
                    "1.0")) {
                Worksheet sheet = workbook.newWorksheet(bad.list());
                for (int row = 0; row < bad.lines().length; row++) {
                    String[] cells = cells(bad.lines()[row]);
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

    /** The cells of a line as {@link Tables} reads them. */
    private static String[] cells(String line) throws IOException {
        List<Table.Row> rows = table("one", line).rows();
        return rows.isEmpty() ? new String[0] : rows.get(0).cells().stream().map(Table.Cell::text)
                .toArray(String[]::new);
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
    void aTableAndItsColumnsAreWhatAPersonSaysTheyAre() throws IOException {
        List<Table> tables = List.of(table("points", "Nr,Belt,Gap", "TP-90,C1,30"), table("areas", "Nr,name", "east,East"),
                table("notes", "whatever", "else"));
        Meanings meanings = Meanings.AS_NAMED.holding("points.csv", "transfers").holding("notes.csv", "")
                .with(new Meanings.Head("points.csv", "Nr"), "id", Optional.empty())
                .with(new Meanings.Head("points.csv", "Belt"), "conveyor", Optional.empty())
                .with(new Meanings.Head("points.csv", "Gap"), "skirtSpacing", Unit.ofCode("[in_i]"))
                .with(new Meanings.Head("areas.csv", "Nr"), "id", Optional.empty())
                .with(new Meanings.Head("areas.csv", "name"), "", Optional.empty());
        Draft draft = RegisterImport.draft(HEAD, tables, meanings);
        assertEquals(List.of(), draft.defects());
        Branch plant = draft.head().branch("plant").orElseThrow();
        List<Branch> zones = plant.branches("transfers");
        assertEquals("[in_i]", zones.get(zones.size() - 1).quantity("skirtSpacing").orElseThrow().unit().code());
        List<Branch> areas = plant.branches("areas");
        assertEquals(Branch.EMPTY.with("id", "east"), areas.get(areas.size() - 1), "its name is not taken in");
    }

    private static Draft takenBack(Branch head) throws IOException {
        List<Table> tables = new ArrayList<>();
        for (Map.Entry<String, String> file : RegisterTables.of(head).entrySet()) {
            tables.add(Tables.csv(file.getValue().getBytes(StandardCharsets.UTF_8), file.getKey()));
        }
        return RegisterImport.draft(head, tables, Map.of());
    }

    @Test
    void whatIsWrittenAsTablesIsTakenBackAsItWas() throws IOException {
        Draft draft = takenBack(HEAD);
        assertEquals(List.of(), draft.defects());
        assertEquals(0, draft.added());
        assertEquals(0, draft.changed());
        assertEquals(HEAD, draft.head());
    }

    private static Branch with(Branch head, String list, Branch row) {
        Branch plant = head.branch("plant").orElseThrow();
        List<Node> rows = new ArrayList<>(plant.series(list));
        rows.add(row);
        return head.with("plant", plant.with(list, new Node.Series(rows)));
    }

    @Test
    void namesThatLookLikeFormulasComeBackAsTheyWere() throws IOException {
        Branch head = HEAD;
        List<String> names = List.of("'Alt' coal", "'-A", "\uFF1DA", "=1+1", "-5 deg", "a;=1+1", "@home", "''");
        for (String name : names) {
            head = with(head, "areas", Branch.EMPTY.with("id", "-N" + names.indexOf(name)).with("name", name));
        }
        head = with(head, "transfers", Branch.EMPTY.with("id", "TP-90").with("conveyor", "C1").with("area", "-N1"));
        Draft draft = takenBack(head);
        assertEquals(List.of(), draft.defects());
        assertEquals(head, draft.head());
    }

    @Test
    void pointsOfARoundKeepWhatElseIsKnownOfThem() throws IOException {
        Branch round = HEAD.branches("rounds").get(0);
        Branch point = round.branches("points").get(0).with("status", "not-accessible").with("reason", "flooded");
        List<Node> points = new ArrayList<>(round.series("points"));
        points.set(0, point);
        Branch head = HEAD.with("rounds", new Node.Series(List.of(round.with("points", new Node.Series(points)))));
        assertEquals(head, takenBack(head).head());
        Draft fewer = RegisterImport.draft(head, List.of(table("rounds", "id,transfer",
                round.text("id").orElseThrow() + "," + point.text("transfer").orElseThrow())), Map.of());
        assertEquals(List.of(point), fewer.head().branches("rounds").get(0).branches("points"));
        assertEquals(1, fewer.changed());
    }

    @Test
    void aRowAfterAQuotedLineBreakIsNamedByItsFirstLine() throws IOException {
        assertEquals(List.of(1, 2, 4), table("areas", "id,name", "a,\"two\nlines\"", "b,one").rows().stream()
                .map(Table.Row::number).toList());
    }

    @Test
    void limitsOfARuleThatLooksDownwardsLieTheOtherWayRound() throws IOException {
        assertEquals(List.of(), draft(table("limits", "rule,near,overloaded", "bed-behind-belt,0.9,0.8")).defects());
    }

    @Test
    void tagsMayBeSwappedInOneTable() throws IOException {
        List<Branch> zones = HEAD.branch("plant").orElseThrow().branches("transfers");
        Branch one = zones.get(0);
        Branch other = zones.get(1);
        Draft draft = draft(table("transfers", "id,conveyor,tag",
                one.text("id").get() + "," + one.text("conveyor").get() + "," + other.text("tag").get(),
                other.text("id").get() + "," + other.text("conveyor").get() + "," + one.text("tag").get()));
        assertEquals(List.of(), draft.defects());
        assertEquals(other.text("tag"), draft.head().branch("plant").get().branches("transfers").get(0).text("tag"));
    }

    @Test
    void aBeltMadeNarrowerThanTheBoardsOverItIsNamed() throws IOException {
        Draft draft = draft(table("conveyors", "id,beltWidth [mm],centreRollLength [mm]", "C1,300,100"));
        assertEquals("row-boards-over-belt conveyors.csv:2 beltWidth", draft.defects().get(0).code() + " "
                + draft.defects().get(0).where());
    }

    @Test
    void aNumberOfAWorkbookIsTakenByTheDigitsThatAWorkbookHolds(@TempDir Path folder) throws IOException {
        Path file = folder.resolve("register.xlsx");
        try (OutputStream out = Files.newOutputStream(file); Workbook workbook = new Workbook(out, "bedmark", "1.0")) {
            Worksheet sheet = workbook.newWorksheet("transfers");
            List<String> heads = List.of("id", "conveyor", "skirtSpacing [mm]");
            heads.forEach(head -> sheet.value(0, heads.indexOf(head), head));
            sheet.value(1, 0, "TP-01");
            sheet.value(1, 1, "C1");
            sheet.value(1, 2, new BigDecimal("914.4000000000001"));
        }
        Draft draft = RegisterImport.draft(HEAD, Tables.read(file), Map.of());
        assertEquals(List.of(), draft.defects());
        assertEquals("914.4", draft.head().branch("plant").get().branches("transfers").get(0)
                .quantity("skirtSpacing").orElseThrow().value().toPlainString());
    }

    private static Draft changed(String list, int row, String key, String text) {
        return RegisterImport.changed(HEAD, new RegisterChange(list,
                Optional.of(RegisterGrid.of(HEAD, list).identity(row)), Map.of(key, text)));
    }

    @Test
    void aRoundThatIsNamedOtherwiseKeepsItsPoints() {
        RegisterGrid grid = RegisterGrid.of(HEAD, "rounds");
        Branch round = HEAD.branches("rounds").get(0);
        for (Draft draft : List.of(changed("rounds", 0, "name", "Spring round"), RegisterImport.draft(HEAD,
                List.of(grid.edit(0, Map.of("name", "Spring round"))), Map.of()))) {
            assertEquals(List.of(), draft.defects());
            assertEquals(round.with("name", "Spring round"), draft.head().branches("rounds").get(0));
        }
    }

    @Test
    void aPointOfARoundIsReplacedAtItsPlace() {
        RegisterGrid grid = RegisterGrid.of(HEAD, "rounds");
        assertEquals(List.of("row-point-twice"), codes(changed("rounds", 2, "transfer", grid.rows().get(5).get(2))));
        Branch head = with(HEAD, "transfers", Branch.EMPTY.with("id", "TP-90").with("conveyor", "C1"));
        Draft draft = RegisterImport.changed(head, new RegisterChange("rounds", Optional.of(grid.identity(2)),
                Map.of("transfer", "TP-90")));
        assertEquals(List.of(), draft.defects());
        List<Node> points = new ArrayList<>(HEAD.branches("rounds").get(0).series("points"));
        points.set(2, Branch.EMPTY.with("transfer", "TP-90"));
        assertEquals(points, draft.head().branches("rounds").get(0).series("points"));
    }

    private static List<String> codes(Draft draft) {
        return draft.defects().stream().map(Defect::code).toList();
    }

    @Test
    void aRateOfAnotherConditionReplacesTheOneThatWasThere() {
        Branch rate = Branch.EMPTY.with("type", "vertical").with("multiplier", Node.number(2)).with("note", "kept");
        Branch head = with(with(HEAD, "sealRates", rate.with("condition", "worn")), "sealRates",
                rate.with("condition", "torn"));
        List<List<String>> rows = RegisterGrid.of(head, "sealRates").rows();
        Optional<List<String>> worn = Optional.of(List.of("vertical", "worn"));
        Draft draft = RegisterImport.changed(head, new RegisterChange("sealRates", worn, Map.of("condition",
                "hardened")));
        assertEquals(List.of(), draft.defects());
        List<Branch> rates = draft.head().branch("plant").get().branches("sealRates");
        assertEquals(rows.size(), rates.size());
        assertEquals(rate.with("condition", "hardened"), rates.get(rates.size() - 2));
        assertEquals(List.of("row-twice"), codes(RegisterImport.changed(head, new RegisterChange("sealRates", worn,
                Map.of("condition", "torn")))));
    }

    @Test
    void anOptionalCellIsEmptiedOnTheScreenAndARequiredOneIsNot() {
        Branch zone = HEAD.branch("plant").get().branches("transfers").get(0);
        Draft draft = changed("transfers", 0, "material", " ");
        assertEquals(List.of(), draft.defects());
        assertEquals(zone.without("material"), draft.head().branch("plant").get().branches("transfers").get(0));
        assertEquals(List.of("cell-absent"), codes(changed("transfers", 0, "conveyor", "")));
    }

    @Test
    void aNewRowIsAddedAtTheEndAndMayNotBeOneThatIsThere() {
        Draft draft = RegisterImport.changed(HEAD, new RegisterChange("transfers", Optional.empty(),
                Map.of("id", "TP-90", "conveyor", "C1")));
        List<Branch> zones = draft.head().branch("plant").get().branches("transfers");
        assertEquals(Branch.EMPTY.with("id", "TP-90").with("conveyor", "C1"), zones.get(zones.size() - 1));
        assertEquals(List.of("row-twice"), codes(RegisterImport.changed(HEAD, new RegisterChange("transfers",
                Optional.empty(), Map.of("id", "TP-01", "conveyor", "C1")))));
        Branch round = HEAD.branches("rounds").get(0);
        Branch longer = with(HEAD, "transfers", Branch.EMPTY.with("id", "TP-90").with("conveyor", "C1"));
        assertEquals(round.series("points").size() + 1, RegisterImport.changed(longer, new RegisterChange("rounds",
                Optional.empty(), Map.of("id", round.text("id").get(), "transfer", "TP-90"))).head()
                .branches("rounds").get(0).series("points").size());
    }

    @Test
    void aRowThatIsGoneIsNotChanged() {
        assertEquals("register-changed-since", assertThrows(Refused.class, () -> RegisterImport.changed(HEAD,
                new RegisterChange("transfers", Optional.of(List.of("TP-99")), Map.of("tag", "X")))).defect().code());
    }

    @Test
    void ofTwoDraftsFromTheSameRegisterOnlyOneIsTaken(@TempDir Path folder) throws IOException {
        Offices.pack(Offices.sample("round-2026-03"), folder.resolve("tablet"), folder.resolve("pack.zip"));
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), folder.resolve("tablet"))) {
            store.receive(folder.resolve("pack.zip"), "Ida Marsh");
            RegisterDesk desk = new RegisterDesk(store);
            Branch head = desk.head(Optional.empty(), List.of());
            Draft one = RegisterImport.draft(head, List.of(table("materials", "id,name", "ONE,One")), Map.of());
            Draft two = RegisterImport.draft(head, List.of(table("materials", "id,name", "TWO,Two")), Map.of());
            desk.take(one, "import", "Ida Marsh");
            assertEquals("register-changed-since", assertThrows(Refused.class, () ->
                    desk.take(two, "import", "Ida Marsh")).defect().code());
            assertEquals(Optional.of(one.head()), store.head("ostermere"));
            desk.take(RegisterImport.draft(one.head(), List.of(table("materials", "id,name", "TWO,Two")), Map.of()),
                    "import", "Ida Marsh");
        }
    }
}
