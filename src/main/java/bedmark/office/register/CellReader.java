package bedmark.office.register;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.quantity.Dimension;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import java.math.BigDecimal;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Reads one cell as what its column holds. */
final class CellReader {
    private static final int LONGEST = 500;
    private static final int LARGEST_EXPONENT = 12;
    private static final BigDecimal LARGEST = BigDecimal.TEN.pow(LARGEST_EXPONENT);
    private static final BigDecimal SMALLEST = BigDecimal.ONE.movePointLeft(LARGEST_EXPONENT);
    /** A comma before three digits: a decimal sign here and a group of thousands there. */
    private static final Pattern UNCLEAR = Pattern.compile("([+-]?[1-9][0-9]{0,2}),([0-9]{3})");
    private static final Pattern NUMBER = Pattern.compile("([+-]?[0-9]+(?:[.,][0-9]+)?(?:[eE][+-]?[0-9]{1,3})?)"
            + "\\s*(.*)", Pattern.DOTALL);
    private static final Set<String> YES = Set.of("true", "yes", "1", "x", "sí", "si", "wahr", "ja");
    private static final Set<String> NO = Set.of("false", "no", "0", "falso", "falsch", "nein");
    /** How people write units that UCUM writes otherwise. */
    private static final Map<String, String> SPELLINGS = Map.ofEntries(Map.entry("°", "deg"),
            Map.entry("ft", "[ft_i]"), Map.entry("in", "[in_i]"), Map.entry("\"", "[in_i]"), Map.entry("'", "[ft_i]"),
            Map.entry("ft/min", "[ft_i]/min"), Map.entry("fpm", "[ft_i]/min"), Map.entry("hp", "[HP]"),
            Map.entry("HP", "[HP]"), Map.entry("kg/m³", "kg/m3"), Map.entry("lb/ft3", "[lb_av]/[cft_i]"),
            Map.entry("lb/ft³", "[lb_av]/[cft_i]"), Map.entry("tph", "t/h"));

    private CellReader() {
    }

    /** A cell that can't be what its column holds: the code of why, and what the sentence names. */
    static final class Unfit extends Exception {
        private final String code;
        private final transient List<String> details;

        Unfit(String code, String... details) {
            super(code);
            this.code = code;
            this.details = List.of(details);
        }

        String code() {
            return code;
        }

        List<String> details() {
            return details;
        }
    }

    /** The unit that a head or a cell names. */
    static Optional<Unit> unit(String text) {
        String stripped = text.strip();
        return Unit.ofCode(SPELLINGS.getOrDefault(stripped, stripped));
    }

    /**
     * Reads a cell that is not blank.
     *
     * @param unit the unit that the column's head names
     */
    static Node read(Table.Cell cell, Kind kind, Optional<Unit> unit) throws Unfit {
        String text = cell.text();
        if (text.length() > LONGEST) {
            throw new Unfit("cell-too-long", Integer.toString(LONGEST));
        }
        if (text.codePoints().anyMatch(c -> Character.isISOControl(c) || Character.getType(c) == Character.FORMAT)) {
            throw new Unfit("cell-control-character");
        }
        if (kind instanceof Kind.Number number) {
            return Node.number(number(text, number));
        } else if (kind instanceof Kind.Measured measured) {
            return Branch.write(quantity(text, measured, unit));
        } else if (kind instanceof Kind.YesNo) {
            return Node.flag(yesNo(text));
        } else if (kind instanceof Kind.Word word) {
            if (!word.words().contains(text)) {
                throw new Unfit("cell-word-unknown", text, String.join(", ", word.words()));
            }
        } else if (text.startsWith("=") && !cell.guarded()) {
            throw new Unfit("cell-formula", text);
        }
        return Node.text(text);
    }

    private static boolean yesNo(String text) throws Unfit {
        String word = text.toLowerCase(Locale.ROOT);
        if (!YES.contains(word) && !NO.contains(word)) {
            throw new Unfit("cell-no-flag", text);
        }
        return YES.contains(word);
    }

    private static BigDecimal number(String text, Kind.Number kind) throws Unfit {
        Matcher matcher = matched(text);
        if (!matcher.group(2).isBlank()) {
            throw new Unfit("cell-number-with-unit", text);
        }
        BigDecimal number = decimal(matcher.group(1));
        if (number.compareTo(kind.least()) < 0 || kind.above() && number.compareTo(kind.least()) == 0) {
            throw new Unfit(kind.above() ? "cell-not-above" : "cell-below", text, kind.least().toPlainString());
        }
        if (kind.most().isPresent() && number.compareTo(kind.most().get()) > 0) {
            throw new Unfit("cell-above", text, kind.most().get().toPlainString());
        }
        return number;
    }

    private static Quantity quantity(String text, Kind.Measured kind, Optional<Unit> head) throws Unfit {
        Matcher matcher = matched(text);
        String own = matcher.group(2).strip();
        Optional<Unit> unit = own.isEmpty() ? head : unit(own);
        if (unit.isEmpty()) {
            throw own.isEmpty() ? new Unfit("cell-unit-absent", text) : new Unfit("cell-unit-unknown", own);
        }
        Dimension found = unit.get().dimension();
        if (found != kind.dimension() && !kind.other().equals(Optional.of(found))) {
            throw new Unfit("cell-unit-other", unit.get().code(), kind.dimension().code());
        }
        BigDecimal number = decimal(matcher.group(1));
        if (kind.sign() == Kind.Sign.POSITIVE && number.signum() <= 0) {
            throw new Unfit("cell-not-above", text, "0");
        }
        if (kind.sign() == Kind.Sign.NOT_NEGATIVE && number.signum() < 0) {
            throw new Unfit("cell-below", text, "0");
        }
        if (found == Dimension.ANGLE && Math.abs(unit.get().toSi(number)) >= Math.PI / 2) {
            throw new Unfit("cell-angle-too-steep", text);
        }
        return Quantity.of(number, unit.get());
    }

    private static Matcher matched(String text) throws Unfit {
        Matcher matcher = NUMBER.matcher(text);
        if (!matcher.matches()) {
            throw new Unfit("cell-no-number", text);
        }
        if (matcher.group(2).matches("[.,0-9eE+-].*")) {
            throw new Unfit("cell-no-number", text);
        }
        return matcher;
    }

    private static BigDecimal decimal(String text) throws Unfit {
        Matcher unclear = UNCLEAR.matcher(text);
        if (unclear.matches()) {
            throw new Unfit("cell-number-unclear", text, unclear.group(1) + unclear.group(2),
                    unclear.group(1) + "." + unclear.group(2));
        }
        BigDecimal number = new BigDecimal(text.replace(',', '.'));
        boolean tiny = number.signum() != 0 && number.abs().compareTo(SMALLEST) < 0;
        if (tiny || number.abs().compareTo(LARGEST) > 0) {
            throw new Unfit("cell-number-too-large", text);
        }
        return number.scale() < 0 ? number.setScale(0) : number;
    }
}
