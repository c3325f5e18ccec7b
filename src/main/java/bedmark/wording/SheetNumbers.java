package bedmark.wording;

import bedmark.engine.working.Formula;
import bedmark.engine.working.Step;
import bedmark.engine.working.Symbol;
import bedmark.quantity.QuantityFormat;
import bedmark.quantity.UnitSystem;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.HashMap;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** The numbers and formulas of a calculation sheet as one person reads them: four significant digits. */
final class SheetNumbers {
    private static final MathContext DIGITS = new MathContext(4, RoundingMode.HALF_EVEN);
    private static final MathContext BESIDE = new MathContext(3, RoundingMode.HALF_EVEN);
    private static final MathContext SPREAD = new MathContext(2, RoundingMode.HALF_UP);
    private static final Pattern CLOSE = Pattern.compile(" ([·−]) ");
    private static final Pattern DECIMAL = Pattern.compile("(\\d+)\\.(\\d+)");

    private final Wording wording;
    private final QuantityFormat format;

    SheetNumbers(Wording wording) {
        this.wording = wording;
        format = wording.format();
    }

    /** A number alone; what has more whole digits keeps them all. */
    String number(double number) {
        return rounded(number, DIGITS);
    }

    private String rounded(double number, MathContext digits) {
        if (number == 0) {
            return "0";
        }
        BigDecimal exact = new BigDecimal(number);
        BigDecimal rounded = exact.round(digits);
        boolean cut = rounded.scale() < 0 && digits == DIGITS;
        BigDecimal plain = (cut ? exact.setScale(0, RoundingMode.HALF_EVEN) : rounded).stripTrailingZeros();
        return format.exact(plain.scale() < 0 ? plain.setScale(0) : plain);
    }

    /** A value in both unit systems with its expanded uncertainty (k = 2) in the person's own. */
    String both(double value, double standardUncertainty, String code) {
        SheetUnit unit = SheetUnit.of(code, value);
        boolean us = wording.units() == UnitSystem.US;
        Optional<SheetUnit.Shown> other = unit.other();
        String si = shown(value, us && other.isPresent() ? 0 : standardUncertainty, unit.si(), DIGITS);
        return other.map(customary -> si + " (" + shown(value, us ? standardUncertainty : 0, customary,
                us ? DIGITS : BESIDE) + ")").orElse(si);
    }

    /** A value in SI alone. */
    String si(double value, String code) {
        return shown(value, 0, SheetUnit.of(code, value).si(), DIGITS);
    }

    private String shown(double value, double standardUncertainty, SheetUnit.Shown unit, MathContext digits) {
        String symbol = unit.symbol(wording);
        String space = symbol.isEmpty() || symbol.equals("°") ? "" : String.valueOf(QuantityFormat.BEFORE_UNIT);
        String number = rounded(value / unit.inSi(), digits) + space + symbol;
        return standardUncertainty == 0 ? number
                : number + " ± " + rounded(2 * standardUncertainty / unit.inSi(), SPREAD);
    }

    /** The formula in signs. */
    String formula(Formula formula) {
        return local(formula.general().isEmpty() ? formula.expression() : formula.general());
    }

    /** The formula with the numbers put in, in SI; angles in degrees. */
    String substituted(Step step) {
        Map<String, String> numbers = new HashMap<>();
        for (Symbol symbol : step.symbols()) {
            boolean angle = symbol.unit().equals("rad");
            String number = number(angle ? Math.toDegrees(symbol.value()) : symbol.value()) + (angle ? "°" : "");
            numbers.put(symbol.sign(), symbol.value() < 0 ? "(" + number + ")" : number);
        }
        return new Formula("", "", local(step.formula().expression()), "", "").substituted(numbers);
    }

    /** Products and differences written close, decimal numbers and lists within a formula in the person's own writing. */
    private String local(String spaced) {
        String expression = CLOSE.matcher(spaced).replaceAll("$1");
        if (format.decimalSign() == '.') {
            return expression;
        }
        return DECIMAL.matcher(expression.replace(",", ";")).replaceAll(match ->
                Matcher.quoteReplacement(match.group(1) + format.decimalSign() + match.group(2)));
    }
}
