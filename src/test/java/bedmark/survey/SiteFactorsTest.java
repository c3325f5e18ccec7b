package bedmark.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Refused;
import bedmark.engine.Assessment;
import bedmark.engine.Assumption;
import bedmark.engine.Result;
import bedmark.engine.drag.DragMethod;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class SiteFactorsTest {
    private static final String DAY = "'fittedAt':'2026-02-03T10:00:00+01:00'";
    private static final String ENTERED = "{'factor':0.1,'standardUncertainty':0.01," + DAY + "}";

    @Test
    void aFactorThatTheSiteEnteredStandsBesideTheOthersAndDecidesWhereItWasChosen() {
        Assessment beside = assess(",'siteFactors':[" + ENTERED + "]");
        assertEquals(Optional.of(DragMethod.TABULATED), beside.method());
        double drag = 22_620.594_79 * 0.1 * 0.15 * 0.15 * 6;
        assertEquals(drag, beside.methods().get(DragMethod.SITE).value(), 1e-5);
        assertTrue(beside.assumptions().contains(Assumption.of("site-factor-entered", "2026-02-03")));
        Assessment chosen = assess(",'method':'site','siteFactors':[" + ENTERED + "]");
        assertEquals(Optional.of(DragMethod.SITE), chosen.method());
        assertEquals(drag, chosen.get(Result.MATERIAL_DRAG).orElseThrow().value(), 1e-5);
    }

    @Test
    void aChosenFactorThatIsNotThereIsMissing() {
        Assessment assessment = assess(",'method':'site'");
        assertEquals(Optional.empty(), assessment.method());
        assertEquals(List.of("/plant/siteFactor"), assessment.missingRequired());
        assertFalse(assess("").missing().contains("/plant/siteFactor"));
    }

    @Test
    void aRowWithPairsIsFittedFromThem() {
        Assessment assessment = assess(",'method':'site','siteFactors':[{'material':'stone','conveyor':'c1'," + DAY
                + ",'factor':99,'pairs':[" + depths(0.30, 0.15) + "," + depths(0.28, 0.12) + ","
                + seals(0.2) + "]}]");
        double drag = assessment.methods().get(DragMethod.SITE).value();
        assertEquals(22_620.594_79 * 0.09 * 0.15 * 0.15 * 6, drag, 1e-3 * drag);
        assertEquals(12 * 50, assessment.get(Result.SEAL_DRAG).orElseThrow().value(), 1);
        assertTrue(assessment.assumptions().contains(Assumption.of("site-factor-fitted", "2026-02-03", "3")));
        assertTrue(assessment.assumptions().stream().anyMatch(one -> one.code().equals("seal-rate-fitted")));
    }

    @Test
    void theFittedRateOfTheSealsCountsOnlyWhereTheSitesMethodDecides() {
        String row = "{'factor':0.1,'standardUncertainty':0.01,'sealRate':{'value':80,'unit':'N/m'}," + DAY + "}";
        assertEquals(960, assess(",'method':'site','siteFactors':[" + row + "]").get(Result.SEAL_DRAG).orElseThrow()
                .value(), 1e-9);
        assertEquals(12 * 43.78, assess(",'siteFactors':[" + row + "]").get(Result.SEAL_DRAG).orElseThrow().value(),
                0.1);
    }

    @Test
    void pairsThatCarryNothingAreToldAndNothingIsComputedFromThem() {
        Assessment assessment = assess(",'method':'site','siteFactors':[{'conveyor':'c1'," + DAY + ",'pairs':["
                + depths(0.30, 0.15) + "]}]");
        assertTrue(assessment.assumptions().contains(Assumption.of("site-factor-unfit", "site-pairs-too-few")));
        assertFalse(assessment.methods().containsKey(DragMethod.SITE));
        assertEquals(List.of("/plant/siteFactor"), assessment.missingRequired());
    }

    @Test
    void theMostParticularRowHolds() {
        String all = "'siteFactors':[" + row("", 0.1) + "," + row("'conveyor':'c1',", 0.2) + ","
                + row("'material':'coal',", 0.3) + "," + row("'material':'coal','conveyor':'c1',", 0.4) + ","
                + row("'material':'coal','conveyor':'c1',", 0.5) + "]";
        Register register = Plants.register("," + all);
        assertEquals(0.2, factor(register, "t1", ""));
        assertEquals(0.1, factor(register, "t3", ""));
        assertEquals(0.4, factor(register, "t1", "'materialRunning':'coal'"));
        assertEquals(0.3, factor(register, "t3", "'materialRunning':'coal'"));
    }

    @Test
    void aRowThatLacksWhatItNeedsIsRefusedWithItsPlace() {
        refused("key-absent", "/siteFactors/0", "{'factor':0.1,'standardUncertainty':0.01}");
        refused("key-absent", "/siteFactors/0", "{'factor':0.1," + DAY + "}");
        refused("key-absent", "/siteFactors/0", "{'standardUncertainty':0.01," + DAY + "}");
        refused("key-absent", "/siteFactors/0/pairs/0", "{" + DAY + ",'pairs':[" + depths(0.3, 0.1) + "]}");
        refused("conveyor-unknown", "/siteFactors/0/pairs/0/conveyor", "{'conveyor':'c9'," + DAY + ",'pairs':["
                + depths(0.3, 0.1) + "]}");
        refused("key-absent", "/siteFactors/0/pairs/0", "{'conveyor':'c1'," + DAY + ",'pairs':[{}]}");
        refused("unit-of-wrong-kind", "/siteFactors/0/pairs/0/first/runningPower/unit", "{'conveyor':'c1'," + DAY
                + ",'pairs':[" + depths(0.3, 0.1).replace("'unit':'kW'", "'unit':'m'") + "]}");
        refused("reading-zero", "/siteFactors/0/pairs/0/beltSpeed", "{'conveyor':'c1'," + DAY
                + ",'pairs':[" + depths(0.3, 0.1).replace("'beltSpeed':{'value':2.5", "'beltSpeed':{'value':0") + "]}");
    }

    private static void refused(String code, String where, String row) {
        Refused refused = assertThrows(Refused.class,
                () -> new Assessor(Plants.register(",'siteFactors':[" + row + "]")));
        assertEquals(code, refused.defect().code());
        assertEquals(where, refused.defect().where());
    }

    private static double factor(Register register, String transfer, String readings) {
        return new Assessor(register).siteFactors().of(Plants.survey(transfer, readings), register).orElseThrow()
                .factor().orElseThrow().value();
    }

    private static Assessment assess(String plant) {
        return new Assessor(Plants.register(plant)).assess(Plants.survey("t1", ""), List.of());
    }

    private static String row(String holds, double factor) {
        return "{" + holds + "'factor':" + factor + ",'standardUncertainty':0.01," + DAY + "}";
    }

    private static String depths(double first, double second) {
        return pair(state(first, 16, true), state(second, 16, true));
    }

    private static String seals(double depth) {
        return pair(state(depth, 16, true), state(depth, 0, false));
    }

    private static String pair(String first, String second) {
        return "{'loadingZoneLength':{'value':8,'unit':'m'},'beltSpeed':{'value':2.5,'unit':'m/s'},'first':" + first
                + ",'second':" + second + "}";
    }

    private static String state(double depth, double seals, boolean deep) {
        double power = (12_000 + 0.09 * 22_620.594_79 * 8 * depth * depth + 50 * seals) * 2.5 / 0.9 / 0.92 / 1000;
        return String.format(Locale.ROOT, "{'runningPower':{'value':%.6f,'unit':'kW','standardUncertainty':0.02},"
                + "'sealLength':{'value':%s,'unit':'m'}%s}", power, seals,
                deep ? ",'bedDepth':{'value':" + depth + ",'unit':'m'}" : "");
    }
}
