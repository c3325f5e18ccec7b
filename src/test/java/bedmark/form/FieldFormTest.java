package bedmark.form;

import static bedmark.form.Forms.quantity;
import static bedmark.form.Forms.segment;
import static bedmark.form.Forms.station;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.quantity.Unit;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class FieldFormTest {
    private static final FieldForm ZONE =
            Forms.form(Forms.zoneLength(), Forms.speed(), Forms.stations(), Forms.seals());

    private static List<String> gaps(FieldForm form, Branch survey) {
        return form.gaps(survey).stream().map(Field::key).toList();
    }

    private static Branch readings(String key, Node answer) {
        return Forms.survey(key, answer);
    }

    @Test
    void gapsStandInFormOrder() {
        assertEquals(List.of("loadingZoneLength", "beltSpeed", "bedDepths", "seals"), gaps(ZONE, Branch.EMPTY));
        assertEquals(List.of("beltSpeed", "bedDepths", "seals"),
                gaps(ZONE, readings("loadingZoneLength", quantity("6", Unit.METRE))));
    }

    @Test
    void zoneThatWasNotInspectedHasNoGaps() {
        assertEquals(List.of(), gaps(ZONE, Branch.EMPTY.with("inspectionStatus", "not-accessible")));
        assertEquals(4, gaps(ZONE, Branch.EMPTY.with("inspectionStatus", "inspected")).size());
    }

    @Test
    void anyOfTheThreeWaysAnswersTheSpeedOnceItIsWhole() {
        FieldForm form = Forms.form(Forms.speed());
        Branch timing = Branch.EMPTY.with("beltLength", quantity("100", Unit.METRE))
                .with("revolutions", Node.number(2));
        assertEquals(List.of("beltSpeed"), gaps(form, readings("beltTiming", timing)));
        assertEquals(List.of(), gaps(form, readings("beltTiming",
                timing.with("elapsed", quantity("99", Unit.SECOND)))));
        assertEquals(List.of(), gaps(form, readings("beltTiming", timing.without("beltLength")
                .with("elapsed", quantity("99", Unit.SECOND)))), "the conveyor's belt length holds");
        assertEquals(List.of(), gaps(form, readings("beltSpeed", quantity("2", Unit.METRE_PER_SECOND))));
        assertEquals(List.of("beltSpeed"), gaps(form, readings("pulleySpeed",
                Branch.EMPTY.with("diameter", quantity("1", Unit.METRE)))));
    }

    @Test
    void tablesAreAnsweredByWholeRows() {
        FieldForm stations = Forms.form(Forms.stations());
        assertEquals(List.of("bedDepths"), gaps(stations, readings("bedDepths",
                Node.Series.of(Branch.EMPTY.with("position", quantity("1", Unit.METRE))))));
        assertEquals(List.of(), gaps(stations, readings("bedDepths", Node.Series.of(station("1", "0.1")))));
        FieldForm seals = Forms.form(Forms.seals());
        assertEquals(List.of("seals"), gaps(seals, readings("seals", Node.Series.of(segment("left", "6")))));
        assertEquals(List.of(), gaps(seals, readings("seals",
                Node.Series.of(segment("left", "6"), segment("right", "6")))));
    }

    @Test
    void emptyAnswerIsNone() {
        Field text = new TextField(Head.of("permit", Group.SURVEY, Forms.TEXTS).require(), 9, false,
                Optional.empty());
        FieldForm form = Forms.form(text);
        assertEquals(List.of("permit"), gaps(form, Branch.EMPTY.with("permit", "  ")));
        assertEquals(List.of("permit"), gaps(form, Branch.EMPTY.with("permit", new Node.Blank())));
        assertEquals(List.of(), gaps(form, Branch.EMPTY.with("permit", "P-17")));
    }

    @Test
    void conditionsDecideWhatIsShownAndRequired() {
        Condition bad = new Condition.IsOneOf("guards", List.of(Node.text("critical"), Node.text("failed")));
        ChoiceField guards = Forms.choice("guards", "normal", "degraded", "critical", "failed");
        Field fault = new TextField(Head.of("guardsFault", Group.OBSERVATIONS, Forms.TEXTS).requireIf(bad)
                .showIf(new Condition.Not(new Condition.Is("guards", Node.text("normal")))), 99, false,
                Optional.empty());
        FieldForm form = Forms.form(guards, fault);
        Branch normal = Branch.EMPTY.with(guards.where(), Node.text("normal"));
        Branch degraded = Branch.EMPTY.with(guards.where(), Node.text("degraded"));
        Branch failed = Branch.EMPTY.with(guards.where(), Node.text("failed"));
        assertFalse(form.shows(fault, normal));
        assertTrue(form.shows(fault, degraded));
        assertEquals(List.of(), gaps(form, degraded));
        assertEquals(List.of("guardsFault"), gaps(form, failed));
        assertEquals(List.of(), gaps(form, failed.with(fault.where(), Node.text("open"))));
    }

    @Test
    void hiddenFieldIsNeverRequired() {
        Field hidden = new FlagField(Head.of("flag", Group.OBSERVATIONS, Forms.TEXTS).require()
                .showIf(new Condition.Present("other", true)));
        assertEquals(List.of(), gaps(Forms.form(Forms.choice("other", "a"), hidden), Branch.EMPTY));
    }

    @Test
    void fieldThatHoldsSomethingImpossibleIsShown() {
        QuantityField field = new QuantityField(Head.of("gap", Group.OBSERVATIONS, Forms.TEXTS)
                .showIf(new Condition.Present("other", true)), Forms.length("1", "2"));
        FieldForm form = Forms.form(Forms.choice("other", "a"), field);
        Branch impossible = Branch.EMPTY.with(field.where(), quantity("-1", Unit.METRE));
        assertFalse(form.shows(field, Branch.EMPTY));
        assertTrue(form.shows(field, impossible));
        assertEquals(List.of("not-above-possible"),
                form.refusals(impossible).stream().map(Judgement::code).toList());
    }

    @Test
    void conditionsCombine() {
        Map<String, Node> answers = Map.of("a", Node.text("x"), "n", Node.number(2));
        Condition is = new Condition.Is("a", Node.text("x"));
        Condition two = new Condition.Is("n", new Node.Decimal(new java.math.BigDecimal("2.0")));
        Condition absent = new Condition.Present("b", false);
        Condition no = new Condition.Is("b", Node.text("x"));
        assertTrue(holds(is, answers) && holds(two, answers) && holds(absent, answers));
        assertFalse(holds(no, answers));
        assertTrue(holds(new Condition.All(List.of(is, two, absent)), answers));
        assertFalse(holds(new Condition.All(List.of(is, no)), answers));
        assertTrue(holds(new Condition.Any(List.of(no, is)), answers));
        assertFalse(holds(new Condition.Any(List.of(no)), answers));
        assertTrue(holds(new Condition.Not(no), answers));
        assertEquals(java.util.Set.of("a", "b"), new Condition.Any(List.of(is, new Condition.Not(no))).fields());
    }

    private static boolean holds(Condition condition, Map<String, Node> answers) {
        return condition.holds(key -> Optional.ofNullable(answers.get(key)));
    }

    @Test
    void everyPlaceLeadsToItsField() {
        assertEquals("beltSpeed", ZONE.fieldAt(Pointer.parse("/readings/beltTiming/elapsed")).orElseThrow().key());
        assertEquals("bedDepths", ZONE.fieldAt(Pointer.parse("/readings/bedDepths/0/depth")).orElseThrow().key());
        assertEquals("bedDepths", ZONE.fieldAt(StationsField.METHOD).orElseThrow().key());
        assertTrue(ZONE.fieldAt(Pointer.parse("/readings/moisture")).isEmpty());
    }

    @Test
    void twoFieldsWithOneKeyAreNoForm() {
        assertThrows(IllegalArgumentException.class, () -> Forms.form(Forms.zoneLength(), Forms.zoneLength()));
    }

    @Test
    void englishStandsInForAMissingLanguage() {
        assertEquals("Dust", new Texts(Map.of("en", "Dust")).in("es"));
        assertEquals("Polvo", Texts.of("Dust", "Polvo").in("es"));
        assertThrows(IllegalArgumentException.class, () -> new Texts(Map.of("es", "Polvo")));
    }
}
