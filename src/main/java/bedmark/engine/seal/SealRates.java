package bedmark.engine.seal;

import bedmark.engine.uncertainty.ImpossibleReading;
import java.util.HashMap;
import java.util.Map;

/**
 * Drag per length of seal: a rate, and a multiplier for each type and condition. The rate of 3 lbf/ft a side is
 * published [S1]. No published figure tells one type or condition from another: every multiplier but the standard ones
 * (1; 0 for what touches nothing) is the site's own assumption [A].
 *
 * @param rate        drag of a sound, touching seal (N/m)
 * @param multipliers those that the site set
 */
public record SealRates(double rate, Map<Kind, Double> multipliers) {

    /** The published convention, 3 lbf per foot of seal (N/m) [S1]. */
    public static final double CONVENTION = 3 * 4.448_221_615_260_5 / 0.3048;

    /** A type in a condition. */
    public record Kind(SealType type, SealCondition condition) {
    }

    /** @throws ImpossibleReading {@code seal-rate-impossible} where a number is negative, not finite or beyond 1e6 */
    public SealRates {
        check("/plant/sealRates", rate);
        multipliers.forEach((kind, factor) -> check(
                "/plant/sealRates/" + kind.type().code() + "/" + kind.condition().code(), factor));
        multipliers = Map.copyOf(multipliers);
    }

    /** The convention for everything that touches. */
    public static SealRates standard() {
        return new SealRates(CONVENTION, Map.of());
    }

    /** The same table with one more multiplier of the site. */
    public SealRates with(SealType type, SealCondition condition, double multiplier) {
        Map<Kind, Double> all = new HashMap<>(multipliers);
        all.put(new Kind(type, condition), multiplier);
        return new SealRates(rate, all);
    }

    /** The multiplier that counts for a type in a condition. */
    public double multiplier(SealType type, SealCondition condition) {
        return multipliers.getOrDefault(new Kind(type, condition), standardMultiplier(type, condition));
    }

    /** Whether the site moved this multiplier away from the standard one. */
    public boolean isSiteAssumption(SealType type, SealCondition condition) {
        return multiplier(type, condition) != standardMultiplier(type, condition);
    }

    private static double standardMultiplier(SealType type, SealCondition condition) {
        return type.touches() && condition != SealCondition.MISSING ? 1 : 0;
    }

    private static void check(String name, double number) {
        if (!(number >= 0 && number <= 1e6)) {
            throw new ImpossibleReading("seal-rate-impossible", name, Double.toString(number));
        }
    }
}
