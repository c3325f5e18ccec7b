package bedmark.form;

import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.quantity.Dimension;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import bedmark.words.Words;
import java.math.BigDecimal;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/** Small forms and surveys for tests. */
final class Forms {
    static final Texts TEXTS = Texts.of("English", "español");

    private Forms() {
    }

    static Measure length(String plausibleTo, String possibleTo) {
        return new Measure(Dimension.LENGTH, Unit.METRE, Unit.FOOT,
                Map.of(Unit.METRE, new BigDecimal("0.1"), Unit.FOOT, new BigDecimal("0.5")),
                Range.of(Quantity.of("0.01", Unit.METRE), Quantity.of(plausibleTo, Unit.METRE)),
                new Range<>(Optional.of(Quantity.of("0", Unit.METRE)), true,
                        Optional.of(Quantity.of(possibleTo, Unit.METRE))));
    }

    static Measure free(Dimension dimension, Unit unit) {
        return new Measure(dimension, unit, unit, Map.of(unit, BigDecimal.ONE), Range.open(), Range.open());
    }

    static QuantityField zoneLength() {
        return new QuantityField(Head.of("loadingZoneLength", Group.READINGS, TEXTS).require(), length("40", "500"));
    }

    static SpeedField speed() {
        Measure speed = new Measure(Dimension.SPEED, Unit.METRE_PER_SECOND, Unit.FOOT_PER_MINUTE,
                Map.of(Unit.METRE_PER_SECOND, BigDecimal.ONE, Unit.FOOT_PER_MINUTE, BigDecimal.TEN),
                Range.of(Quantity.of("0.1", Unit.METRE_PER_SECOND), Quantity.of("8", Unit.METRE_PER_SECOND)),
                Range.open());
        SpeedField.Part part = new SpeedField.Part(TEXTS, length("20000", "100000"));
        return new SpeedField(Head.of("beltSpeed", Group.READINGS, TEXTS).require(),
                new SpeedField.Direct(TEXTS, Optional.empty(), speed),
                new SpeedField.Timed(TEXTS, Optional.empty(), part, TEXTS,
                        new Count(Range.open(), new Range<>(Optional.of(BigDecimal.ZERO), true, Optional.empty()),
                                BigDecimal.ONE),
                        new SpeedField.Part(TEXTS, free(Dimension.TIME, Unit.SECOND))),
                new SpeedField.Pulley(TEXTS, Optional.empty(), part,
                        new SpeedField.Part(TEXTS, free(Dimension.FREQUENCY, Unit.PER_MINUTE))));
    }

    static StationsField stations() {
        return new StationsField(Head.of("bedDepths", Group.READINGS, TEXTS).require(), choices(StationsField.METHODS),
                free(Dimension.LENGTH, Unit.METRE), length("0.9", "5"));
    }

    static SealsField seals() {
        return new SealsField(Head.of("seals", Group.READINGS, TEXTS).require(), choices(SealsField.SIDES),
                choices(SealsField.TYPES), choices(SealsField.CONDITIONS), length("40", "500"));
    }

    static ChoiceField choice(String key, String... codes) {
        return new ChoiceField(Head.of(key, Group.OBSERVATIONS, TEXTS), choices(List.of(codes)));
    }

    private static List<Choice> choices(List<String> codes) {
        return codes.stream().map(code -> new Choice(code, TEXTS)).toList();
    }

    static FieldForm form(Field... fields) {
        return new FieldForm("test", 1, TEXTS, List.of(new Section("all", TEXTS, Optional.empty(), List.of(fields))));
    }

    static Branch survey(String key, Node answer) {
        return Branch.EMPTY.with(Group.READINGS.where(key), answer);
    }

    static Branch quantity(String value, Unit unit) {
        return Branch.write(Quantity.of(value, unit));
    }

    static Branch station(String position, String depth) {
        return Branch.EMPTY.with("position", quantity(position, Unit.METRE))
                .with("depth", quantity(depth, Unit.METRE));
    }

    static Branch segment(String side, String length) {
        return Branch.EMPTY.with("side", side).with("type", "vertical").with("condition", "sound")
                .with("length", quantity(length, Unit.METRE));
    }

    /** The codes, each of which must have its words in both languages. */
    static List<String> codes(List<Judgement> judgements) {
        for (Locale language : Words.LANGUAGES) {
            judgements.forEach(judgement -> assertTrue(new Words(language).has("judgement." + judgement.code()),
                    judgement.code()));
        }
        return judgements.stream().map(Judgement::code).toList();
    }
}
