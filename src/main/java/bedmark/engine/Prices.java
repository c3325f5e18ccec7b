package bedmark.engine;

import bedmark.engine.uncertainty.ImpossibleReading;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What electricity costs.
 *
 * @param energy   of the site's currency, for each kWh
 * @param currency as the site writes it
 * @param co2      kg for each kWh
 */
public record Prices(OptionalDouble energy, Optional<String> currency, OptionalDouble co2) {
    private static final Prices UNKNOWN =
            new Prices(OptionalDouble.empty(), Optional.empty(), OptionalDouble.empty());

    /** @throws ImpossibleReading {@code reading-out-of-range} where one is negative, not finite or beyond 1e6 */
    public Prices {
        check("/plant/tariff/energy", energy);
        check("/plant/co2Factor", co2);
    }

    /** None known. */
    public static Prices unknown() {
        return UNKNOWN;
    }

    private static void check(String name, OptionalDouble price) {
        if (price.isPresent() && !(price.getAsDouble() >= 0 && price.getAsDouble() <= 1e6)) {
            throw new ImpossibleReading("reading-out-of-range", name, Double.toString(price.getAsDouble()), "0", "1.0E6");
        }
    }
}
