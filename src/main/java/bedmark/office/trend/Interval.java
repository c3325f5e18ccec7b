package bedmark.office.trend;

import java.util.Optional;
import java.util.OptionalDouble;

/**
 * How often a zone should be looked at, from the P–F idea: a point of potential failure, where the near limit is
 * reached and a survey can tell, and one of functional failure, where the bed is overloaded. Surveys at half the time
 * between the two find the first before the second.
 *
 * <p>Source: common practice of reliability-centred maintenance [C]; the half is that practice's rule of thumb.
 *
 * @param days   between two surveys
 * @param reason why
 * @param pfDays  the time from near to overloaded at the fast end of the slope's interval (d), where that was reckoned
 */
public record Interval(int days, Reason reason, OptionalDouble pfDays) {
    /** At most: what nobody looks at for longer is stale. */
    public static final int MOST = 182;
    /** At least: more often than every week is a watch and no survey. */
    public static final int LEAST = 7;

    /** Why that often. */
    public enum Reason {
        /** Too few surveys: as often as the site goes anyway. */
        TOO_FEW("too-few"),
        /** No trend: as often as the site goes anyway. */
        NO_TREND("no-trend"),
        /** Half the time from near to overloaded. */
        HALF_OF_PF("half-of-pf"),
        /** Half the time that is left, since the near limit is behind already. */
        HALF_OF_REST("half-of-rest");

        private final String code;

        Reason(String code) {
            this.code = code;
        }

        public String code() {
            return code;
        }
    }

    static Interval of(Series depth) {
        if (depth.outlook() instanceof Outlook.TooFew) {
            return new Interval(MOST, Reason.TOO_FEW, OptionalDouble.empty());
        }
        if (!(depth.outlook() instanceof Outlook.Trend trend) || trend.line().slope() <= 0
                || depth.near().isEmpty() || depth.overloaded().isEmpty()) {
            return new Interval(MOST, Reason.NO_TREND, OptionalDouble.empty());
        }
        double fast = trend.line().upper();
        double pf = (depth.overloaded().getAsDouble() - depth.near().getAsDouble()) / fast;
        Optional<Observation> last = depth.observations().stream().filter(one -> !one.replaced())
                .reduce((one, other) -> other);
        double rest = last.map(one -> (depth.overloaded().getAsDouble() - one.value()) / fast).orElse(pf);
        return rest < pf ? new Interval(clamped(rest / 2), Reason.HALF_OF_REST, OptionalDouble.of(pf))
                : new Interval(clamped(pf / 2), Reason.HALF_OF_PF, OptionalDouble.of(pf));
    }

    private static int clamped(double days) {
        return (int) Math.max(LEAST, Math.min(MOST, Math.floor(days)));
    }
}
