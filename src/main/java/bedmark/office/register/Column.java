package bedmark.office.register;

import bedmark.engine.flow.SpeedClass;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealType;
import bedmark.engine.uncertainty.Instrument;
import bedmark.engine.verdict.Rule;
import bedmark.office.register.Kind.Measured;
import bedmark.office.register.Kind.Sign;
import bedmark.quantity.Dimension;
import java.math.BigDecimal;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * A column of one of a register's lists.
 *
 * @param key      in the register's document
 * @param required whether each row must have it
 */
record Column(String key, Kind kind, boolean required) {
    static final String PLANT = "plant";
    static final String INSTRUMENTS = "instruments";
    static final String ROUNDS = "rounds";
    static final String LIMITS = "limits";
    static final String SEAL_RATES = "sealRates";

    /** The columns of each list, in the order in which lists are taken in: what is referred to comes first. */
    static final Map<String, List<Column>> LISTS = lists();

    private static Map<String, List<Column>> lists() {
        Map<String, List<Column>> lists = new LinkedHashMap<>();
        lists.put(PLANT, PlantSheet.COLUMNS);
        lists.put("areas", List.of(id(), text("name")));
        lists.put("materials", List.of(id(), text("name"), number("skirtFrictionFactor", false, null),
                measured("bulkDensity", Dimension.DENSITY, Sign.POSITIVE),
                measured("angleOfRepose", Dimension.ANGLE, Sign.NOT_NEGATIVE),
                measured("surchargeAngle", Dimension.ANGLE, Sign.NOT_NEGATIVE), number("wallFriction", false, null),
                word("speedClass", Stream.of(SpeedClass.values()).map(SpeedClass::code).toList()),
                yesNo("freeFlowing")));
        lists.put("conveyors", List.of(id(), text("tag"), text("assetId"), text("name"),
                measured("beltWidth", Dimension.LENGTH, Sign.POSITIVE),
                measured("troughAngle", Dimension.ANGLE, Sign.NOT_NEGATIVE),
                measured("centreRollLength", Dimension.LENGTH, Sign.POSITIVE),
                measured("incline", Dimension.ANGLE, Sign.ANY), measured("designSpeed", Dimension.SPEED, Sign.POSITIVE),
                measured("ratedPower", Dimension.POWER, Sign.POSITIVE), number("driveEfficiency", true, "1"),
                number("motorEfficiency", true, "1"), number("loadedHoursPerYear", false, "8784"),
                measured("beltLength", Dimension.LENGTH, Sign.POSITIVE),
                new Column("skirtPowerBudget", new Measured(Dimension.POWER, Sign.POSITIVE,
                        Optional.of(Dimension.RATIO)), false),
                yesNo("fullySkirted")));
        lists.put("transfers", List.of(id(), text("tag"), text("assetId"),
                new Column("area", new Kind.Reference("areas"), false),
                new Column("conveyor", new Kind.Reference("conveyors"), true), text("from"),
                new Column("material", new Kind.Reference("materials"), false),
                measured("designThroughput", Dimension.MASS_FLOW, Sign.POSITIVE),
                measured("designBedDepth", Dimension.LENGTH, Sign.POSITIVE),
                measured("feedVelocity", Dimension.SPEED, Sign.ANY),
                measured("skirtSpacing", Dimension.LENGTH, Sign.POSITIVE),
                measured("skirtHeight", Dimension.LENGTH, Sign.POSITIVE),
                measured("designZoneLength", Dimension.LENGTH, Sign.POSITIVE),
                measured("impactLength", Dimension.LENGTH, Sign.NOT_NEGATIVE),
                measured("lumpSize", Dimension.LENGTH, Sign.POSITIVE), yesNo("highAirFlow"), yesNo("beltFeeder")));
        lists.put(ROUNDS, List.of(new Column("id", new Kind.Plain(), true), text("name"),
                new Column("transfer", new Kind.Reference("transfers"), true)));
        lists.put(LIMITS, List.of(new Column("rule", new Kind.Word(Stream.of(Rule.values()).map(Rule::code).toList()),
                true), number("near", false, null), number("overloaded", false, null), yesNo("enabled")));
        lists.put(SEAL_RATES, List.of(
                new Column("type", new Kind.Word(Stream.of(SealType.values()).map(SealType::code).toList()), true),
                new Column("condition", new Kind.Word(Stream.of(SealCondition.values()).map(SealCondition::code)
                        .toList()), true),
                new Column("multiplier", new Kind.Number(BigDecimal.ZERO, false, Optional.empty()), true)));
        lists.put(INSTRUMENTS, List.of(
                new Column("kind", new Kind.Word(Stream.of(Instrument.values()).filter(one -> one != Instrument.EXACT)
                        .map(Instrument::code).toList()), true),
                new Column("standardUncertainty", new Measured(Dimension.LENGTH, Sign.NOT_NEGATIVE,
                        Optional.of(Dimension.ANGLE)), false), number("relative", false, null)));
        return lists;
    }

    /** The keys by which a list's rows are told apart. */
    static List<String> identity(String list) {
        return switch (list) {
            case ROUNDS -> List.of("id", "transfer");
            case LIMITS -> List.of("rule");
            case INSTRUMENTS -> List.of("kind");
            case SEAL_RATES -> List.of("type", "condition");
            default -> List.of("id");
        };
    }

    static Column id() {
        return new Column("id", new Kind.Id(), true);
    }

    static Column text(String key) {
        return new Column(key, new Kind.Plain(), false);
    }

    static Column number(String key, boolean above, String most) {
        return new Column(key, new Kind.Number(BigDecimal.ZERO, above, Optional.ofNullable(most).map(BigDecimal::new)),
                false);
    }

    private static Column measured(String key, Dimension dimension, Sign sign) {
        return new Column(key, new Measured(dimension, sign, Optional.empty()), false);
    }

    private static Column yesNo(String key) {
        return new Column(key, new Kind.YesNo(), false);
    }

    static Column word(String key, List<String> words) {
        return new Column(key, new Kind.Word(words), false);
    }
}
