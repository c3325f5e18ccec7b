package bedmark.engine.uncertainty;

import java.util.EnumMap;
import java.util.Map;

/**
 * The standard uncertainties that a site gives to its instruments and sources.
 *
 * @param changed the spreads that differ from the defaults of {@link Instrument}, each in the instrument's own way
 *                (SI, or a share of the value)
 */
public record Instruments(Map<Instrument, Double> changed) {

    /** @throws ImpossibleReading {@code uncertainty-impossible} */
    public Instruments {
        changed.forEach((instrument, spread) -> {
            if (!(spread >= 0 && spread <= 1e9)) {
                throw new ImpossibleReading("uncertainty-impossible", "/plant/instruments/" + instrument.code(),
                        Double.toString(spread));
            }
        });
        changed = Map.copyOf(changed);
    }

    /** The defaults of the engineering page. */
    public static Instruments standard() {
        return new Instruments(Map.of());
    }

    /** The same instruments with another spread for one. */
    public Instruments with(Instrument instrument, double spread) {
        Map<Instrument, Double> all = new EnumMap<>(Instrument.class);
        all.putAll(changed);
        all.put(instrument, spread);
        return new Instruments(all);
    }

    /** The spread of one instrument: in SI, or as a share of the value. */
    public double spread(Instrument instrument) {
        return changed.getOrDefault(instrument, instrument.spread());
    }

    /** The standard uncertainty of a value that was taken with an instrument, in the unit of the value. */
    public double standardUncertainty(Instrument instrument, double value) {
        return instrument.relative() ? spread(instrument) * Math.abs(value) : spread(instrument);
    }

    /** A reading with the instrument's own uncertainty. */
    public Reading reading(String name, double value, Instrument instrument) {
        return new Reading(name, value, Double.isFinite(value) ? standardUncertainty(instrument, value) : 0);
    }
}
