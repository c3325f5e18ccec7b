package bedmark.quantity;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/**
 * The units that Bedmark reads and writes, each by its code of UCUM, the Unified Code for Units of Measure.
 * Factors are the exact ones of NIST SP 811 (appendix B.8), kept as a fraction so that no rounding happens
 * before the one into a double.
 */
public enum Unit {
    METRE("m", Dimension.LENGTH, "1", "1"),
    CENTIMETRE("cm", Dimension.LENGTH, "0.01", "1"),
    MILLIMETRE("mm", Dimension.LENGTH, "0.001", "1"),
    FOOT("[ft_i]", Dimension.LENGTH, "0.3048", "1"),
    INCH("[in_i]", Dimension.LENGTH, "0.0254", "1"),
    METRE_PER_SECOND("m/s", Dimension.SPEED, "1", "1"),
    FOOT_PER_MINUTE("[ft_i]/min", Dimension.SPEED, "0.3048", "60"),
    TONNE_PER_HOUR("t/h", Dimension.MASS_FLOW, "1000", "3600"),
    SHORT_TON_PER_HOUR("[ston_av]/h", Dimension.MASS_FLOW, "907.18474", "3600"),
    KILOGRAM_PER_SECOND("kg/s", Dimension.MASS_FLOW, "1", "1"),
    KILOGRAM_PER_CUBIC_METRE("kg/m3", Dimension.DENSITY, "1", "1"),
    POUND_PER_CUBIC_FOOT("[lb_av]/[cft_i]", Dimension.DENSITY, "0.45359237", "0.028316846592"),
    KILOWATT("kW", Dimension.POWER, "1000", "1"),
    WATT("W", Dimension.POWER, "1", "1"),
    /** 550 ft·lbf/s. */
    HORSEPOWER("[HP]", Dimension.POWER, "745.69987158227022", "1"),
    DEGREE("deg", Dimension.ANGLE, "3.141592653589793238462643383279503", "180"),
    RADIAN("rad", Dimension.ANGLE, "1", "1"),
    MINUTE("min", Dimension.TIME, "60", "1"),
    SECOND("s", Dimension.TIME, "1", "1"),
    HOUR("h", Dimension.TIME, "3600", "1"),
    PERCENT("%", Dimension.RATIO, "0.01", "1"),
    NEWTON("N", Dimension.FORCE, "1", "1"),
    POUND_FORCE("[lbf_av]", Dimension.FORCE, "4.4482216152605", "1"),
    NEWTON_PER_METRE("N/m", Dimension.LINE_FORCE, "1", "1"),
    POUND_FORCE_PER_FOOT("[lbf_av]/[ft_i]", Dimension.LINE_FORCE, "4.4482216152605", "0.3048"),
    PER_MINUTE("1/min", Dimension.FREQUENCY, "1", "60");

    private static final Map<String, Unit> BY_CODE =
            Stream.of(values()).collect(Collectors.toUnmodifiableMap(Unit::code, Function.identity()));

    private final String code;
    private final Dimension dimension;
    private final BigDecimal numerator;
    private final BigDecimal denominator;
    /** The factor to SI where it is a decimal: to multiply is a small part of the work that a division is. */
    private final Optional<BigDecimal> factor;

    Unit(String code, Dimension dimension, String numerator, String denominator) {
        this.code = code;
        this.dimension = dimension;
        this.numerator = new BigDecimal(numerator);
        this.denominator = new BigDecimal(denominator);
        this.factor = decimal(this.numerator, this.denominator);
    }

    private static Optional<BigDecimal> decimal(BigDecimal numerator, BigDecimal denominator) {
        try {
            return Optional.of(numerator.divide(denominator));
        } catch (ArithmeticException e) {
            return Optional.empty();
        }
    }

    /** The unit with that UCUM code, or nothing where Bedmark does not use it. */
    public static Optional<Unit> ofCode(String code) {
        return Optional.ofNullable(BY_CODE.get(code));
    }

    /** The case-sensitive UCUM code. */
    public String code() {
        return code;
    }

    /**
     * The code as a key of resource bundles: without its brackets, {@code -per-} for the slash and {@code percent}
     * for its sign, as in {@code ft_i-per-min}.
     */
    public String key() {
        return code.replaceAll("[\\[\\]]", "").replace("/", "-per-").replace("%", "percent");
    }

    public Dimension dimension() {
        return dimension;
    }

    /** The units of a dimension. */
    public static List<Unit> of(Dimension dimension) {
        return Stream.of(values()).filter(unit -> unit.dimension == dimension).toList();
    }

    /** A number of this unit in the SI unit of its dimension, correctly rounded once. */
    public double toSi(BigDecimal number) {
        return (factor.isPresent() ? number.multiply(factor.get(), MathContext.DECIMAL128) : divided(number))
                .doubleValue();
    }

    private BigDecimal divided(BigDecimal number) {
        return number.multiply(numerator).divide(denominator, MathContext.DECIMAL128);
    }

    /** An SI number in this unit (for display: to the precision of a double). */
    public double fromSi(double si) {
        return si * denominator.doubleValue() / numerator.doubleValue();
    }

    /**
     * A number of another unit of the same dimension in this one, to 34 digits.
     *
     * @throws IllegalArgumentException where the dimensions differ
     */
    public BigDecimal convert(BigDecimal number, Unit from) {
        if (from.dimension != dimension) {
            throw new IllegalArgumentException(from.code + " does not convert to " + code);
        }
        return number.multiply(from.numerator).multiply(denominator)
                .divide(from.denominator.multiply(numerator), MathContext.DECIMAL128);
    }
}
