package bedmark.engine.verdict;

import java.util.OptionalDouble;

/**
 * The limits of one rule.
 *
 * @param near       where the rule starts to warn; nothing where it does not
 * @param overloaded where the zone is overloaded; nothing where the rule only warns
 * @param on         whether the site uses the rule
 * @param source     mark of the source: S1…S12, R, C, A, or {@code site}
 * @param assumption whether the limits are an assumption, of the page or of the site
 */
public record Limit(OptionalDouble near, OptionalDouble overloaded, boolean on, String source, boolean assumption) {

    /** Limits that a site set. */
    public static Limit ofSite(OptionalDouble near, OptionalDouble overloaded) {
        return new Limit(near, overloaded, true, "site", true);
    }

    /** The same limits, not used. */
    public Limit off() {
        return new Limit(near, overloaded, false, source, assumption);
    }
}
