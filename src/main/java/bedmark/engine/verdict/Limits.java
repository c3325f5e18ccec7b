package bedmark.engine.verdict;

import bedmark.engine.uncertainty.ImpossibleReading;
import java.util.EnumMap;
import java.util.Map;
import java.util.OptionalDouble;

/**
 * The limits of a site.
 *
 * @param changed those that differ from the defaults of {@link Rule}
 */
public record Limits(Map<Rule, Limit> changed) {

    /** @throws ImpossibleReading {@code limit-impossible} where a limit is negative or not finite */
    public Limits {
        changed.forEach((rule, limit) -> {
            check(rule, "near", limit.near());
            check(rule, "overloaded", limit.overloaded());
        });
        changed = Map.copyOf(changed);
    }

    /** The defaults of the engineering page. */
    public static Limits standard() {
        return new Limits(Map.of());
    }

    /** The same limits with another one for a rule. */
    public Limits with(Rule rule, Limit limit) {
        Map<Rule, Limit> all = new EnumMap<>(Rule.class);
        all.putAll(changed);
        all.put(rule, limit);
        return new Limits(all);
    }

    /** The same limits with a rule that the site does not use. */
    public Limits without(Rule rule) {
        return with(rule, of(rule).off());
    }

    /** The limits that count for a rule. */
    public Limit of(Rule rule) {
        return changed.getOrDefault(rule, rule.limit());
    }

    private static void check(Rule rule, String key, OptionalDouble limit) {
        if (limit.isPresent() && !(limit.getAsDouble() >= 0 && limit.getAsDouble() <= 1e9)) {
            throw new ImpossibleReading("limit-impossible", "/plant/limits/" + rule.code() + "/" + key,
                    Double.toString(limit.getAsDouble()));
        }
    }
}
