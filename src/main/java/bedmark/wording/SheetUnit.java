package bedmark.wording;

import bedmark.quantity.Unit;
import java.math.BigDecimal;
import java.util.Map;
import java.util.Optional;

/**
 * How a unit of the working is shown on the calculation sheet: in SI, and in the customary unit where there is another
 * one. The factors of areas and volumes are powers of the exact foot.
 *
 * @param si    symbol of the SI unit; empty for a plain number
 * @param other what stands in the brackets
 */
record SheetUnit(Shown si, Optional<Shown> other) {
    private static final double FOOT = 0.3048;
    private static final Map<String, SheetUnit> ALL = Map.ofEntries(
            Map.entry("1", plain("")),
            Map.entry("m", of("m", Unit.FOOT)),
            Map.entry("m2", new SheetUnit(new Shown("m²", 1), Optional.of(new Shown("ft²", FOOT * FOOT)))),
            Map.entry("m3", new SheetUnit(new Shown("m³", 1), Optional.of(new Shown("ft³", FOOT * FOOT * FOOT)))),
            Map.entry("m3/s", new SheetUnit(new Shown("m³/s", 1), Optional.of(new Shown("ft³/s", FOOT * FOOT * FOOT)))),
            Map.entry("m/s", of("m/s", Unit.FOOT_PER_MINUTE)),
            Map.entry("m/s2", new SheetUnit(new Shown("m/s²", 1), Optional.of(new Shown("ft/s²", FOOT)))),
            Map.entry("kg/s", of("kg/s", Unit.SHORT_TON_PER_HOUR)),
            Map.entry("kg/m3", of("kg/m³", Unit.POUND_PER_CUBIC_FOOT)),
            Map.entry("N", of("N", Unit.POUND_FORCE)),
            Map.entry("N/m", of("N/m", Unit.POUND_FORCE_PER_FOOT)),
            Map.entry("W", of("W", Unit.HORSEPOWER)),
            Map.entry("W.h", plain("Wh")),
            Map.entry("rad", new SheetUnit(new Shown("°", Unit.DEGREE.toSi(BigDecimal.ONE)), Optional.empty())),
            Map.entry("s", plain("s")),
            Map.entry("1/s", of("1/s", Unit.PER_MINUTE)),
            Map.entry("h", plain("h")),
            Map.entry("[lbf_av]/([ft_i].[in_i]2)", plain("lbf/(ft·in²)")));

    /** A symbol, and how much of the SI unit it is; {@code unit} names it in the person's words where it has some. */
    record Shown(String symbol, double inSi, Optional<Unit> unit) {
        Shown(String symbol, double inSi) {
            this(symbol, inSi, Optional.empty());
        }

        String symbol(Wording wording) {
            return unit.map(wording::symbol).orElse(symbol);
        }
    }

    private static SheetUnit plain(String symbol) {
        return new SheetUnit(new Shown(symbol, 1), Optional.empty());
    }

    private static SheetUnit of(String symbol, Unit other) {
        return new SheetUnit(new Shown(symbol, 1),
                Optional.of(new Shown(other.code(), other.toSi(BigDecimal.ONE), Optional.of(other))));
    }

    /** The unit of that UCUM code; a length under a metre has inches beside it. */
    static SheetUnit of(String code, double value) {
        SheetUnit unit = ALL.get(code);
        if (unit == null) {
            throw new IllegalArgumentException("no way of showing " + code);
        }
        return code.equals("m") && Math.abs(value) < 1 ? of("m", Unit.INCH) : unit;
    }
}
