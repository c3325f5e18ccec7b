package bedmark.quantity;

import bedmark.quantity.TypedNumber.Reason;
import java.math.BigDecimal;
import java.text.DecimalFormatSymbols;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Reads what people type: decimals with a point or the locale's decimal comma, and fractions such as {@code 9 1/2},
 * {@code 9-1/2"}, {@code 9½} and {@code 1/4}, exactly. What could mean two things is refused and never reinterpreted.
 */
public final class NumberEntry {
    private static final int LONGEST = 24;
    private static final Map<Character, String> VULGAR = Map.ofEntries(
            Map.entry('½', "1/2"), Map.entry('¼', "1/4"), Map.entry('¾', "3/4"), Map.entry('⅛', "1/8"),
            Map.entry('⅜', "3/8"), Map.entry('⅝', "5/8"), Map.entry('⅞', "7/8"), Map.entry('⅓', "1/3"),
            Map.entry('⅔', "2/3"), Map.entry('⅕', "1/5"), Map.entry('⅖', "2/5"), Map.entry('⅗', "3/5"),
            Map.entry('⅘', "4/5"), Map.entry('⅙', "1/6"), Map.entry('⅚', "5/6"));
    private static final Pattern DECIMAL = Pattern.compile("-?(?:\\d+\\.?\\d*|\\.\\d+)");
    private static final Pattern FRACTION = Pattern.compile("(-?)(?:(\\d+)[ -])?(\\d+)/(\\d+)");
    private static final Pattern UNFINISHED = Pattern.compile("-?\\.?|-?\\d+[ -](?:\\d+/?)?|-?\\d+/");
    private static final Pattern SPACES = Pattern.compile(" +");
    private static final Pattern SLASH = Pattern.compile(" ?/ ?");
    private static final Pattern EXPONENT = Pattern.compile("-?[\\d.,]+[eE][-+]?\\d*");

    private final boolean comma;

    /** @param locale whose decimal sign is read beside the point */
    public NumberEntry(Locale locale) {
        comma = DecimalFormatSymbols.getInstance(locale).getDecimalSeparator() == ',';
    }

    /** Reads a plain number. */
    public TypedNumber read(String typed) {
        return read(typed, Optional.empty());
    }

    /** Reads the number of a quantity; an inch mark may follow it where the unit is the inch. */
    public TypedNumber read(String typed, Unit unit) {
        return read(typed, Optional.of(unit));
    }

    private TypedNumber read(String typed, Optional<Unit> unit) {
        String kept = typed.strip();
        if (kept.length() > LONGEST) {
            return new TypedNumber.Rejected(Reason.TOO_LONG);
        }
        String plain = plain(kept);
        if (plain.endsWith("\"")) {
            if (unit.filter(Unit.INCH::equals).isEmpty()) {
                return new TypedNumber.Rejected(Reason.INCH_MARK);
            }
            plain = plain.substring(0, plain.length() - 1).strip();
        }
        return number(plain, kept);
    }

    private TypedNumber number(String plain, String kept) {
        String pointed = comma ? plain.replace(',', '.') : plain;
        Matcher fraction = FRACTION.matcher(pointed);
        if (fraction.matches()) {
            return fraction(fraction, kept);
        }
        if (DECIMAL.matcher(pointed).matches()) {
            return new TypedNumber.Accepted(new BigDecimal(pointed), Optional.empty());
        }
        return new TypedNumber.Rejected(reason(pointed));
    }

    private static TypedNumber fraction(Matcher fraction, String kept) {
        BigDecimal whole = new BigDecimal(Optional.ofNullable(fraction.group(2)).orElse("0"));
        BigDecimal numerator = new BigDecimal(fraction.group(3));
        BigDecimal denominator = new BigDecimal(fraction.group(4));
        boolean improper = fraction.group(2) != null && numerator.compareTo(denominator) >= 0;
        if (denominator.signum() == 0 || improper) {
            return new TypedNumber.Rejected(Reason.FRACTION);
        }
        try {
            BigDecimal value = whole.add(numerator.divide(denominator));
            return new TypedNumber.Accepted(fraction.group(1).isEmpty() ? value : value.negate(), Optional.of(kept));
        } catch (ArithmeticException e) {
            return new TypedNumber.Rejected(Reason.ENDLESS_FRACTION);
        }
    }

    private static Reason reason(String pointed) {
        if (pointed.isEmpty()) {
            return Reason.EMPTY;
        } else if (UNFINISHED.matcher(pointed).matches()) {
            return Reason.UNFINISHED;
        } else if (EXPONENT.matcher(pointed).matches()) {
            return Reason.EXPONENT;
        } else if (!pointed.matches("[-0-9., /]*")) {
            return Reason.FOREIGN_SIGN;
        } else if (pointed.indexOf('/') >= 0) {
            return Reason.FRACTION;
        } else if (pointed.chars().filter(sign -> sign == '.' || sign == ',').count() > 1) {
            return Reason.SECOND_DECIMAL_SIGN;
        } else if (pointed.indexOf(',') >= 0) {
            return Reason.COMMA;
        }
        return pointed.indexOf(' ') >= 0 ? Reason.SPACE : Reason.FOREIGN_SIGN;
    }

    /** The same typing with the signs of a plain keyboard, and one space where there were several. */
    private static String plain(String typed) {
        StringBuilder plain = new StringBuilder();
        for (char sign : typed.toCharArray()) {
            if (VULGAR.containsKey(sign)) {
                boolean afterDigit = plain.length() > 0 && Character.isDigit(plain.charAt(plain.length() - 1));
                plain.append(afterDigit ? " " : "").append(VULGAR.get(sign));
            } else {
                plain.append(switch (sign) {
                    case '−', '–' -> '-';
                    case '⁄' -> '/';
                    case '″', '”' -> '"';
                    case '\u00A0', '\u202F', '\u2009' -> ' ';
                    default -> sign;
                });
            }
        }
        return SLASH.matcher(SPACES.matcher(plain).replaceAll(" ")).replaceAll("/").replace(" \"", "\"");
    }
}
