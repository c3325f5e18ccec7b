package bedmark.quantity;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.text.DecimalFormatSymbols;
import java.util.Locale;

/**
 * Writes numbers for people: the locale's decimal sign, no-break spaces between thousands from five digits on,
 * a real minus. Numbers that a person entered keep every digit; computed ones get three significant digits, no fewer
 * than their whole part, and no finer than their unit deserves.
 */
public final class QuantityFormat {
    /** Between thousands. */
    public static final char THOUSANDS = '\u00A0';
    /** Between a number and its unit. */
    public static final char BEFORE_UNIT = '\u00A0';

    private static final char MINUS = '\u2212';
    private static final int SIGNIFICANT = 3;
    private static final int GROUPED_FROM = 5;

    private final char decimalSign;

    public QuantityFormat(Locale locale) {
        decimalSign = DecimalFormatSymbols.getInstance(locale).getDecimalSeparator();
    }

    /** The decimal sign that the locale writes. */
    public char decimalSign() {
        return decimalSign;
    }

    /** A number with every digit that it has. */
    public String exact(BigDecimal number) {
        String digits = number.abs().toPlainString();
        int point = digits.indexOf('.');
        String whole = point < 0 ? digits : digits.substring(0, point);
        String rest = point < 0 ? "" : decimalSign + digits.substring(point + 1);
        return (number.signum() < 0 ? String.valueOf(MINUS) : "") + grouped(whole) + rest;
    }

    /** A reading as the person entered it: the fraction where one was typed. */
    public String entered(Quantity quantity) {
        return quantity.entered().orElseGet(() -> exact(quantity.value()));
    }

    /** A reading in another unit of its dimension, rounded as a computed number; as entered in its own unit. */
    public String in(Unit unit, Quantity quantity) {
        return unit == quantity.unit() ? entered(quantity)
                : rounded(unit.convert(quantity.value(), quantity.unit()), decimals(unit));
    }

    /**
     * A computed number in a unit.
     *
     * @param si in the SI unit of the unit's dimension, finite
     */
    public String computed(double si, Unit unit) {
        return rounded(new BigDecimal(unit.fromSi(si)), decimals(unit));
    }

    /** A computed plain number with three significant digits and at most so many decimals. */
    public String computed(double number, int mostDecimals) {
        return rounded(new BigDecimal(number), mostDecimals);
    }

    /** A number and its unit's symbol; signs that cling to the number follow without a space. */
    public static String with(String number, Unit unit, String symbol) {
        return unit == Unit.DEGREE ? number + symbol : number + BEFORE_UNIT + symbol;
    }

    private String rounded(BigDecimal number, int mostDecimals) {
        if (number.signum() == 0) {
            return "0";
        }
        BigDecimal significant = number.round(new MathContext(SIGNIFICANT, RoundingMode.HALF_EVEN));
        int whole = significant.precision() - significant.scale();
        int decimals = Math.max(0, Math.min(mostDecimals, SIGNIFICANT - Math.max(whole, 0)));
        return exact(number.setScale(decimals, RoundingMode.HALF_EVEN));
    }

    private static String grouped(String whole) {
        if (whole.length() < GROUPED_FROM) {
            return whole;
        }
        StringBuilder grouped = new StringBuilder(whole);
        for (int at = whole.length() - 3; at > 0; at -= 3) {
            grouped.insert(at, THOUSANDS);
        }
        return grouped.toString();
    }

    /** The finest decimals that a reading in the unit is worth. */
    private static int decimals(Unit unit) {
        return switch (unit) {
            case METRE, KILOWATT, RADIAN -> 3;
            case FOOT, INCH, METRE_PER_SECOND, KILOGRAM_PER_SECOND, HORSEPOWER, POUND_FORCE_PER_FOOT -> 2;
            case CENTIMETRE, MILLIMETRE, TONNE_PER_HOUR, SHORT_TON_PER_HOUR, POUND_PER_CUBIC_FOOT, DEGREE, SECOND,
                    MINUTE, HOUR, PERCENT, NEWTON, POUND_FORCE, NEWTON_PER_METRE, PER_MINUTE -> 1;
            case FOOT_PER_MINUTE, KILOGRAM_PER_CUBIC_METRE, WATT -> 0;
        };
    }
}
