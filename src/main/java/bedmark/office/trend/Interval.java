package bedmark.office.trend;

import bedmark.engine.verdict.Level;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * How often a zone should be looked at, from the P–F idea: a point of potential failure, where the near limit is
 * reached and a survey can tell, and one of functional failure, where the bed is overloaded. Surveys at half the time
 * between the two find the first before the second. Where a limit of overload is passed there is nothing left to halve.
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
    /** At most where the zone is near a limit: half of what sites go by, since potential failure is behind already. */
    public static final int NEAR = MOST / 2;

    /** Why that often. */
    public enum Reason {
        /** Too few surveys: as often as the site goes anyway. */
        TOO_FEW("too-few"),
        /** No trend: as often as the site goes anyway. */
        NO_TREND("no-trend"),
        /** Half the time from near to overloaded. */
        HALF_OF_PF("half-of-pf"),
        /** Half the time that is left, since the near limit is behind already. */
        HALF_OF_REST("half-of-rest"),
        /** A near limit is passed, or overload can't be ruled out, and no trend asks for more. */
        NEAR_A_LIMIT("near-a-limit"),
        /** A limit of overload is passed already. */
        OVERLOADED("overloaded");

        private final String code;

        Reason(String code) {
            this.code = code;
        }

        public String code() {
            return code;
        }
    }

    /**
     * The interval of a zone.
     *
     * @param depth  nothing where no survey tells it
     * @param latest how the zone stands by the latest survey that counts; nothing where none does
     */
    static Interval of(Optional<Series> depth, Optional<Level> latest) {
        Interval trend = depth.map(Interval::of).orElse(new Interval(MOST, Reason.TOO_FEW, OptionalDouble.empty()));
        if (latest.filter(Level.OVERLOADED::equals).isPresent() || depth.filter(Interval::passed).isPresent()) {
            return new Interval(LEAST, Reason.OVERLOADED, trend.pfDays());
        }
        boolean near = latest.filter(level -> level == Level.NEAR || level == Level.UNDECIDED).isPresent();
        return near && trend.days() > NEAR ? new Interval(NEAR, Reason.NEAR_A_LIMIT, trend.pfDays()) : trend;
    }

    private static boolean passed(Series depth) {
        return depth.overloaded().isPresent() && last(depth).filter(one ->
                one.value() >= depth.overloaded().getAsDouble()).isPresent();
    }

    private static Optional<Observation> last(Series depth) {
        return depth.observations().stream().filter(one -> !one.replaced()).reduce((one, other) -> other);
    }

    private static Interval of(Series depth) {
        if (depth.outlook() instanceof Outlook.TooFew) {
            return new Interval(MOST, Reason.TOO_FEW, OptionalDouble.empty());
        }
        if (!(depth.outlook() instanceof Outlook.Trend trend) || trend.line().slope() <= 0
                || depth.near().isEmpty() || depth.overloaded().isEmpty()) {
            return new Interval(MOST, Reason.NO_TREND, OptionalDouble.empty());
        }
        double fast = trend.line().upper();
        double pf = (depth.overloaded().getAsDouble() - depth.near().getAsDouble()) / fast;
        double rest = last(depth).map(one -> (depth.overloaded().getAsDouble() - one.value()) / fast).orElse(pf);
        return rest < pf ? new Interval(clamped(rest / 2), Reason.HALF_OF_REST, OptionalDouble.of(pf))
                : new Interval(clamped(pf / 2), Reason.HALF_OF_PF, OptionalDouble.of(pf));
    }

    private static int clamped(double days) {
        return (int) Math.max(LEAST, Math.min(MOST, Math.floor(days)));
    }
}
