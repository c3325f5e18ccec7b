package bedmark.survey;

import bedmark.engine.Datum;
import bedmark.engine.uncertainty.ImpossibleReading;
import bedmark.quantity.Dimension;
import bedmark.quantity.Unit;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Optional;

/** The engine's numbers about an impossible reading for people: angles in degrees, no more digits than are read. */
final class ImpossibleNumber {
    private static final MathContext DIGITS = new MathContext(5);
    private static final int LONGEST = 12;

    private ImpossibleNumber() {
    }

    /** The details of the refusal; what is out of its range goes with its unit. */
    static String[] details(ImpossibleReading impossible) {
        Optional<Unit> unit = Datum.ofPointer(impossible.readingName()).flatMap(ZoneMapping::dimension)
                .map(ImpossibleNumber::unit);
        String symbol = impossible.code().equals("reading-out-of-range")
                ? unit.map(known -> " " + known.code()).orElse("") : "";
        return impossible.arguments().stream().map(argument -> shown(argument, unit) + symbol).toArray(String[]::new);
    }

    /** The unit of SI, where people use it. */
    private static Unit unit(Dimension dimension) {
        return dimension == Dimension.ANGLE ? Unit.DEGREE
                : Unit.of(dimension).stream().filter(unit -> unit.toSi(BigDecimal.ONE) == 1).findFirst()
                        .orElse(Unit.of(dimension).get(0));
    }

    private static String shown(String argument, Optional<Unit> unit) {
        try {
            double si = Double.parseDouble(argument);
            BigDecimal number = new BigDecimal(unit.map(known -> known.fromSi(si)).orElse(si)).round(DIGITS)
                    .stripTrailingZeros();
            return number.toPlainString().length() > LONGEST ? number.toString() : number.toPlainString();
        } catch (NumberFormatException e) {
            return argument;
        }
    }
}
