package bedmark.sample;

import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import java.math.BigDecimal;
import java.math.RoundingMode;

/** Quantities of the demo plant as a person would write them: decimals, and inches in halves to eighths. */
final class SampleQuantity {
    private SampleQuantity() {
    }

    /** Reads {@code 1200 mm} or {@code 9 1/2 [in_i]}: a number, a space, a UCUM code. */
    static Quantity parse(String text) {
        int gap = text.lastIndexOf(' ');
        Unit unit = Unit.ofCode(text.substring(gap + 1)).orElseThrow(() -> new IllegalStateException(text));
        return of(text.substring(0, gap), unit);
    }

    /** A number as it is written, in a unit. */
    static Quantity of(String written, Unit unit) {
        if (!written.contains("/")) {
            return Quantity.of(written, unit);
        }
        int gap = written.indexOf(' ');
        BigDecimal whole = gap < 0 ? BigDecimal.ZERO : new BigDecimal(written.substring(0, gap));
        String[] fraction = written.substring(gap + 1).split("/");
        BigDecimal value = whole.add(new BigDecimal(fraction[0]).divide(new BigDecimal(fraction[1])));
        return Quantity.of(value, unit).enteredAs(written);
    }

    /** An SI number as a decimal of a unit, to so many places. */
    static Quantity decimal(double si, Unit unit, int places) {
        return Quantity.of(new BigDecimal(unit.fromSi(si)).setScale(places, RoundingMode.HALF_UP), unit);
    }

    /** An SI number to the nearest multiple of a step of a unit, such as 5 mm or 0.5 cm. */
    static Quantity stepped(double si, Unit unit, String step) {
        BigDecimal size = new BigDecimal(step);
        BigDecimal steps = new BigDecimal(unit.fromSi(si)).divide(size, 0, RoundingMode.HALF_UP);
        return Quantity.of(steps.multiply(size), unit);
    }

    /** An SI length to the nearest fraction of an inch with that denominator, written as people write it. */
    static Quantity inches(double si, int denominator) {
        long parts = Math.round(Unit.INCH.fromSi(si) * denominator);
        long whole = parts / denominator;
        long rest = parts % denominator;
        if (rest == 0) {
            return Quantity.of(Long.toString(whole), Unit.INCH);
        }
        long divisor = Long.lowestOneBit(rest);
        String fraction = rest / divisor + "/" + denominator / divisor;
        return of(whole == 0 ? fraction : whole + " " + fraction, Unit.INCH);
    }
}
