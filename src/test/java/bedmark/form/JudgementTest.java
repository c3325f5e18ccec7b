package bedmark.form;

import static bedmark.form.Forms.codes;
import static bedmark.form.Forms.quantity;
import static bedmark.form.Forms.segment;
import static bedmark.form.Forms.station;
import static bedmark.form.Forms.survey;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.quantity.Unit;
import java.math.BigDecimal;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class JudgementTest {
    private static final Field LENGTH = Forms.zoneLength();
    private static final Field SPEED = Forms.speed();
    private static final Field STATIONS = Forms.stations();
    private static final Field SEALS = Forms.seals();

    private static List<String> judge(Field field, Branch survey) {
        return codes(field.judge(survey, Branch.EMPTY));
    }

    @ParameterizedTest
    @CsvSource({"6, METRE, ''", "40, METRE, ''", "130, FOOT, ''", "132, FOOT, over-plausible",
        "0.005, METRE, under-plausible", "0, METRE, not-above-possible", "-1, METRE, not-above-possible",
        "501, METRE, over-possible", "500, METRE, over-plausible", "6, SECOND, unit-of-wrong-dimension"})
    void rangesHoldInEveryUnit(String value, Unit unit, String code) {
        assertEquals(code.isEmpty() ? List.of() : List.of(code),
                judge(LENGTH, survey("loadingZoneLength", quantity(value, unit))));
    }

    @ParameterizedTest
    @ValueSource(strings = {"1.5", "2.5", "60"})
    void judgementLooksAtNothingButThePlacesThatItIsSaidTo(String zone) {
        Branch survey = survey("loadingZoneLength", quantity(zone, Unit.METRE))
                .with(Pointer.parse("/readings/bedDepths"), new Node.Series(List.of(station("2.5", "0.3"))))
                .with(Pointer.parse("/readings/seals"), new Node.Series(List.of(segment("left", "2.5"))))
                .with(Pointer.parse("/readings/depthMethod"), Node.text("by-guess"))
                .with(Pointer.parse("/readings/beltSpeed"), quantity("20", Unit.METRE_PER_SECOND))
                .with(Pointer.parse("/readings/pulleySpeed"), Branch.EMPTY.with("diameter", quantity("0.5", Unit.METRE)));
        for (Field field : List.of(LENGTH, SPEED, STATIONS, SEALS)) {
            Branch looked = Branch.EMPTY;
            for (Pointer place : field.judgedBy()) {
                looked = survey.at(place).isPresent() ? looked.with(place, survey.at(place).get()) : looked;
            }
            assertEquals(field.judge(survey, Branch.EMPTY), field.judge(looked, Branch.EMPTY), field.key());
        }
    }

    @Test
    void impossibleIsRefusedAndImplausibleIsDoubted() {
        assertInstanceOf(Judgement.Refusal.class, LENGTH.judge(
                survey("loadingZoneLength", quantity("0", Unit.METRE)), Branch.EMPTY).get(0));
        Judgement doubt = LENGTH.judge(survey("loadingZoneLength", quantity("60", Unit.METRE)), Branch.EMPTY).get(0);
        assertInstanceOf(Judgement.Doubt.class, doubt);
        assertEquals(Pointer.parse("/readings/loadingZoneLength"), doubt.where());
        assertEquals(List.of(quantity("60", Unit.METRE), quantity("40", Unit.METRE)), doubt.details());
    }

    @Test
    void whatIsNoQuantityIsOfTheWrongKind() {
        assertEquals(List.of("answer-of-wrong-kind"), judge(LENGTH, survey("loadingZoneLength", Node.text("6 m"))));
        assertEquals(List.of("answer-of-wrong-kind"), judge(LENGTH, survey("loadingZoneLength",
                Branch.EMPTY.with("value", "6").with("unit", "m"))));
        assertEquals(List.of(), judge(LENGTH, survey("loadingZoneLength", new Node.Blank())));
    }

    @ParameterizedTest
    @CsvSource({"2, METRE, 20, METRE, ten-times-off-last", "20, METRE, 2, METRE, ten-times-off-last",
        "1.8, METRE, 20, METRE, ten-times-off-last", "6.1, METRE, 20, FOOT, ''", "4, METRE, 1, METRE, ''",
        "20, FOOT, 0.61, METRE, ten-times-off-last", "2, METRE, 0, METRE, ''"})
    void slippedDecimalSignIsQuestioned(String now, Unit unit, String then, Unit before, String code) {
        assertEquals(code.isEmpty() ? List.of() : List.of(code),
                codes(LENGTH.judge(survey("loadingZoneLength", quantity(now, unit)),
                        survey("loadingZoneLength", quantity(then, before)))));
    }

    @Test
    void plainNumbersAreJudgedAlike() {
        Field field = new NumberField(Head.of("count", Group.OBSERVATIONS, Forms.TEXTS),
                new Count(Range.of(BigDecimal.ONE, BigDecimal.TEN), Range.of(BigDecimal.ZERO,
                        BigDecimal.valueOf(100)), BigDecimal.ONE));
        for (String[] row : new String[][] {{"5", ""}, {"0", "under-plausible"}, {"11", "over-plausible"},
            {"-1", "under-possible"}, {"101", "over-possible"}}) {
            assertEquals(row[1].isEmpty() ? List.of() : List.of(row[1]), judge(field,
                    Branch.EMPTY.with(field.where(), Node.number(new BigDecimal(row[0])))));
        }
        assertEquals(List.of("answer-of-wrong-kind"), judge(field, Branch.EMPTY.with(field.where(), Node.text("5"))));
        assertEquals(List.of("ten-times-off-last"), codes(field.judge(
                Branch.EMPTY.with(field.where(), Node.number(10)), Branch.EMPTY.with(field.where(), Node.number(1)))));
    }

    @Test
    void textsChoicesAndFlagsKnowTheirKind() {
        Field text = new TextField(Head.of("notes", Group.SURVEY, Forms.TEXTS), 3, false, Optional.empty());
        assertEquals(List.of(), judge(text, Branch.EMPTY.with("notes", "abc")));
        assertEquals(List.of("text-too-long"), judge(text, Branch.EMPTY.with("notes", "abcd")));
        assertEquals(List.of("answer-of-wrong-kind"), judge(text, Branch.EMPTY.with("notes", Node.number(1))));
        Field choice = Forms.choice("dust", "none", "dense");
        assertEquals(List.of(), judge(choice, Branch.EMPTY.with(choice.where(), Node.text("dense"))));
        assertEquals(List.of("choice-unknown"), judge(choice, Branch.EMPTY.with(choice.where(), Node.text("x"))));
        Field flag = new FlagField(Head.of("sags", Group.OBSERVATIONS, Forms.TEXTS));
        assertEquals(List.of(), judge(flag, Branch.EMPTY.with(flag.where(), Node.flag(false))));
        assertEquals(List.of("answer-of-wrong-kind"), judge(flag, Branch.EMPTY.with(flag.where(), Node.text("no"))));
    }

    @Test
    void timedSpeedIsJudgedByWhatItComesTo() {
        Branch timing = Branch.EMPTY.with("beltLength", quantity("100", Unit.METRE))
                .with("revolutions", Node.number(2)).with("elapsed", quantity("100", Unit.SECOND));
        assertEquals(List.of(), judge(SPEED, survey("beltTiming", timing)));
        assertEquals(List.of("over-plausible"), judge(SPEED, survey("beltTiming",
                timing.with("elapsed", quantity("10", Unit.SECOND)))));
        assertEquals(List.of("not-above-possible"), judge(SPEED, survey("beltTiming",
                timing.with("revolutions", Node.number(0)))));
        assertEquals(List.of(), judge(SPEED, survey("beltTiming",
                timing.with("elapsed", quantity("0", Unit.SECOND)))));
        assertEquals(List.of("ten-times-off-last"), codes(SPEED.judge(survey("beltTiming", timing),
                survey("beltSpeed", quantity("0.2", Unit.METRE_PER_SECOND)))));
    }

    @Test
    void pulleySpeedIsJudgedByWhatItComesTo() {
        Branch pulley = Branch.EMPTY.with("diameter", quantity("1", Unit.METRE))
                .with("rotation", quantity("60", Unit.PER_MINUTE));
        assertEquals(List.of(), judge(SPEED, survey("pulleySpeed", pulley)));
        assertEquals(List.of("over-plausible"), judge(SPEED, survey("pulleySpeed",
                pulley.with("rotation", quantity("600", Unit.PER_MINUTE)))));
    }

    @Test
    void twoWaysAtOnceAreDoubted() {
        Branch both = survey("beltSpeed", quantity("2", Unit.METRE_PER_SECOND)).with(
                Pointer.parse("/readings/pulleySpeed"), Branch.EMPTY.with("diameter", quantity("1", Unit.METRE)));
        assertEquals(List.of("speed-read-in-several-ways"), judge(SPEED, both));
    }

    @Test
    void stationsLieOnceWithinTheZone() {
        Branch survey = survey("bedDepths", Node.Series.of(station("1", "0.1"), station("2", "0.1"),
                Branch.EMPTY.with("position", quantity("200", Unit.CENTIMETRE)), station("6.01", "0.1"),
                station("6", "0.1"))).with(Pointer.parse("/readings/loadingZoneLength"), quantity("6", Unit.METRE));
        List<Judgement> judgements = STATIONS.judge(survey, Branch.EMPTY);
        assertEquals(List.of("station-twice", "station-outside-zone"), codes(judgements));
        assertEquals(List.of("/readings/bedDepths/2/position", "/readings/bedDepths/3/position"),
                judgements.stream().map(judgement -> judgement.where().toString()).toList());
    }

    @Test
    void depthIsComparedWithTheBedOfTheLastSurveyAtTheSamePlace() {
        Branch now = survey("bedDepths", Node.Series.of(station("1", "0.2"), station("3", "0.2")));
        Branch last = survey("bedDepths", Node.Series.of(station("2", "0.15"), station("3", "0.02")));
        List<Judgement> judgements = STATIONS.judge(now, last);
        assertEquals(List.of("ten-times-off-last"), codes(judgements));
        assertEquals("/readings/bedDepths/1/depth", judgements.get(0).where().toString());
    }

    @Test
    void depthMethodIsOneOfTheFour() {
        Branch odd = survey("bedDepths", Node.Series.of(station("1", "0.1").with("depthMethod", "by-eye")))
                .with(StationsField.METHOD, Node.text("guess"));
        assertEquals(List.of("choice-unknown", "choice-unknown"), judge(STATIONS, odd));
    }

    @Test
    void sealsOfASideAddUpToTheZone() {
        Branch zone = survey("loadingZoneLength", quantity("6", Unit.METRE));
        Pointer where = SEALS.where();
        assertEquals(List.of(), judge(SEALS, zone.with(where, Node.Series.of(segment("left", "6"),
                segment("right", "2"), segment("right", "3.95")))));
        assertEquals(List.of("seals-right-beside-zone-length"), judge(SEALS, zone.with(where,
                Node.Series.of(segment("left", "6"), segment("right", "5.9")))));
        assertEquals(List.of("choice-unknown", "choice-unknown", "not-above-possible"), judge(SEALS,
                zone.with(where, Node.Series.of(segment("top", "0").with("type", "brush")))));
    }
}
