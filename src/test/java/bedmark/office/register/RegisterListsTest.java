package bedmark.office.register;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.office.Offices;
import java.io.IOException;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The plant itself, its instruments, and rows that are taken away. */
class RegisterListsTest {
    private static final Branch HEAD = head();

    private static Branch head() {
        Branch bundle = Offices.sample("round-2026-03").document();
        return Branch.EMPTY.with("plant", bundle.get("plant").orElseThrow())
                .with("rounds", bundle.get("rounds").orElseThrow());
    }

    private static Draft draft(String list, String... lines) throws IOException {
        return RegisterImport.draft(HEAD, List.of(Tables.csv(String.join("\n", lines)
                .getBytes(StandardCharsets.UTF_8), list + ".csv")), Map.of());
    }

    private static Branch plant(Draft draft) {
        assertEquals(List.of(), draft.defects());
        return draft.head().branch("plant").orElseThrow();
    }

    private static Draft changed(Branch head, String list, List<String> row, Map<String, String> cells) {
        return RegisterImport.changed(head, new RegisterChange(list, Optional.of(row), cells));
    }

    private static Draft removed(Branch head, String list, String... row) {
        return RegisterImport.changed(head, RegisterChange.removal(list, List.of(row)));
    }

    private static List<String> codes(Draft draft) {
        return draft.defects().stream().map(Defect::code).toList();
    }

    @Test
    void thePlantsNamePricesAndCertaintyAreChangedAndNothingElseOfIt() throws IOException {
        Branch before = HEAD.branch("plant").orElseThrow();
        Branch plant = plant(draft("plant", "id,name,method,energyPrice,currency,co2Factor,overloadedFrom",
                "ostermere,Ostermere North,rankine,0.17,EUR,0.31,0.95"));
        assertEquals("Ostermere North", plant.text("name").orElseThrow());
        assertEquals("rankine", plant.text("method").orElseThrow());
        assertEquals(new BigDecimal("0.17"), plant.branch("tariff").orElseThrow().number("energy").orElseThrow());
        assertEquals("EUR", plant.branch("tariff").orElseThrow().text("currency").orElseThrow());
        assertEquals(new BigDecimal("0.31"), plant.number("co2Factor").orElseThrow());
        assertEquals(Optional.of(new BigDecimal("0.95")), plant.branch("limits").flatMap(limits ->
                limits.branch("certainty")).flatMap(row -> row.number("overloaded")));
        for (String list : List.of("areas", "materials", "conveyors", "transfers", "sealRates")) {
            assertEquals(before.get(list), plant.get(list), list);
        }
    }

    @Test
    void whatATariffHoldsBesideStaysAndAnEmptiedPriceIsGone() {
        Branch tariff = Branch.EMPTY.with("energy", Node.number(new BigDecimal("0.2"))).with("contract", "night");
        Branch head = HEAD.with("plant", HEAD.branch("plant").orElseThrow().with("tariff", tariff));
        Branch plant = plant(changed(head, "plant", List.of("ostermere"), Map.of("energyPrice", "")));
        assertEquals(Branch.EMPTY.with("contract", "night"), plant.branch("tariff").orElseThrow());
    }

    @Test
    void anotherPlantsTableIsRefused() throws IOException {
        assertEquals(List.of("row-other-plant"), codes(draft("plant", "id,name", "westmere,Westmere")));
    }

    @ParameterizedTest
    @CsvSource({"0.05,,row-certainty-crossed", "0.8,0.9,row-certainty-crossed", "1.2,,cell-above", "0,,cell-not-above"})
    void aCertaintyThatCantHoldIsRefused(String overloaded, String undecided, String code) throws IOException {
        assertEquals(List.of(code), codes(draft("plant", "id,overloadedFrom,undecidedFrom", "ostermere," + overloaded
                + "," + (undecided == null ? "" : undecided))));
    }

    @Test
    void anInstrumentsUncertaintyIsTakenAsWhatItIsOf() throws IOException {
        Branch plant = plant(draft("instruments", "kind,standardUncertainty,relative", "tape,2 mm,", "repose,2 deg,",
                "belt-scale,,0.01"));
        assertEquals(0.002, instrument(plant, "tape").quantity("standardUncertainty").orElseThrow().si());
        assertEquals("deg", instrument(plant, "repose").quantity("standardUncertainty").orElseThrow().unit().code());
        assertEquals(new BigDecimal("0.01"), instrument(plant, "belt-scale").number("relative").orElseThrow());
    }

    private static Branch instrument(Branch plant, String kind) {
        return plant.branches("instruments").stream().filter(row -> row.text("kind").equals(Optional.of(kind)))
                .findFirst().orElseThrow();
    }

    @ParameterizedTest
    @CsvSource({"'tape,,0.01',row-uncertainty-length", "'tape,2 deg,',row-uncertainty-length",
        "'repose,2 mm,',row-uncertainty-angle", "'belt-scale,2 mm,',row-uncertainty-share",
        "'belt-scale,2 mm,0.01',row-uncertainty-share", "'exact,,0',cell-word-unknown",
        "'tape,2 t/h,',cell-unit-other"})
    void anInstrumentsUncertaintyOfAnotherKindIsRefused(String row, String code) throws IOException {
        assertEquals(List.of(code), codes(draft("instruments", "kind,standardUncertainty,relative", row)));
    }

    @Test
    void aRowThatNothingNamesIsRemovedAndOneThatIsNamedStays() throws IOException {
        Branch longer = draft("materials", "id,name", "slag,Slag").head();
        assertEquals(HEAD, removed(longer, "materials", "slag").head());
        assertEquals(List.of("row-still-used"), codes(removed(HEAD, "materials", "limestone")));
        assertEquals(List.of("row-still-used"), codes(removed(HEAD, "conveyors", "C1")));
        assertEquals(List.of("row-still-used"), codes(removed(HEAD, "areas", "quarry")));
        assertEquals(List.of("row-still-used"), codes(removed(HEAD, "transfers", "TP-01")), "a round names it");
        assertEquals(List.of("row-plant-stays"), codes(removed(HEAD, "plant", "ostermere")));
    }

    @Test
    void aRowThatOnlyAFittedFactorNamesStays() throws IOException {
        Branch longer = draft("materials", "id,name", "slag,Slag").head();
        Branch plant = longer.branch("plant").orElseThrow();
        Branch conveyor = plant.branches("conveyors").get(0).with("id", "C99").without("tag").without("assetId");
        List<Node> conveyors = new ArrayList<>(plant.series("conveyors"));
        conveyors.add(conveyor);
        Node factors = new Node.Series(List.of(factor("material", "slag"), factor("conveyor", "C99")));
        Branch named = longer.with("plant", plant.with("conveyors", new Node.Series(conveyors))
                .with("siteFactors", factors));
        Branch pairs = named.with("plant", named.branch("plant").orElseThrow().with("siteFactors", new Node.Series(
                List.of(factor("material", "slag").with("pairs", new Node.Series(List.of(
                        Branch.EMPTY.with("conveyor", "C99"))))))));
        assertEquals(List.of("row-still-used"), codes(removed(pairs, "conveyors", "C99")), "a pair was read there");
        for (String[] row : new String[][] {{"materials", "slag"}, {"conveyors", "C99"}}) {
            Draft refused = removed(named, row[0], row[1]);
            assertEquals(List.of("row-still-used"), codes(refused), row[1]);
            assertEquals(List.of("siteFactors"), refused.defects().get(0).details());
            Branch without = named.with("plant", named.branch("plant").orElseThrow().without("siteFactors"));
            assertEquals(List.of(), codes(removed(without, row[0], row[1])), "nothing else names it");
        }
    }

    private static Branch factor(String key, String id) {
        return Branch.EMPTY.with(key, id).with("factor", Node.number(2)).with("standardUncertainty", Node.number(1))
                .with("fittedAt", "2026-03-01T08:30:00+01:00");
    }

    @Test
    void aPointIsTakenOffItsRoundAndTheZoneCanThenGo() {
        Branch round = HEAD.branches("rounds").get(0);
        Draft draft = removed(HEAD, "rounds", round.text("id").orElseThrow(), "TP-01");
        assertEquals(List.of(), draft.defects());
        List<Branch> points = draft.head().branches("rounds").get(0).branches("points");
        assertEquals(round.branches("points").size() - 1, points.size());
        assertEquals(List.of(), points.stream().filter(point -> point.text("transfer").equals(Optional.of("TP-01")))
                .toList());
        Branch without = draft.head();
        for (Branch other : without.branches("rounds")) {
            if (other.branches("points").stream().anyMatch(point -> point.text("transfer")
                    .equals(Optional.of("TP-01")))) {
                without = removed(without, "rounds", other.text("id").orElseThrow(), "TP-01").head();
            }
        }
        assertEquals(HEAD.branch("plant").orElseThrow().branches("transfers").size() - 1,
                plant(removed(without, "transfers", "TP-01")).branches("transfers").size());
    }

    @Test
    void aRoundLosesItsLastPointAndIsGone() {
        Branch round = Branch.EMPTY.with("id", "short").with("points", new Node.Series(List.of(
                Branch.EMPTY.with("transfer", "TP-01"))));
        Branch head = HEAD.with("rounds", new Node.Series(List.of(round)));
        assertEquals(List.of(), removed(head, "rounds", "short", "TP-01").head().branches("rounds"));
    }

    @Test
    void aLimitThatIsRemovedIsTheStandardAgain() {
        Branch limits = Branch.EMPTY.with("belt-too-fast", Branch.EMPTY.with("enabled", Node.flag(false))).with("beltGrip",
                Node.number(new BigDecimal("0.6")));
        Branch head = HEAD.with("plant", HEAD.branch("plant").orElseThrow().with("limits", limits));
        assertEquals(limits.without("belt-too-fast"), plant(removed(head, "limits", "belt-too-fast"))
                .branch("limits").orElseThrow());
    }

    @Test
    void aRowThatIsGoneCantBeRemovedAgain() {
        assertEquals("register-changed-since", assertThrows(Refused.class, () -> removed(HEAD, "materials", "gold"))
                .defect().code());
    }
}
