package bedmark.office.trend;

import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * One measure of one zone over time.
 *
 * @param observations all of them, in time order; replaced ones among them
 * @param begun        when the present regime began: observations before it are not part of its story
 * @param near         the near limit of the latest survey, in the measure's unit
 * @param overloaded   its overloaded limit
 */
public record Series(Measure measure, List<Observation> observations, Instant begun, OptionalDouble near,
                     OptionalDouble overloaded, Outlook outlook) {
    /** Fewer surveys of one regime say nothing at {@value #CONFIDENCE} confidence. */
    public static final int NEEDED = 5;
    static final double CONFIDENCE = 0.95;
    /** Beyond this a date says no more than that it is far away (days). */
    private static final double HORIZON = 3652.5;
    private static final double MILLIS = 86_400_000.0;

    public Series {
        observations = List.copyOf(observations);
    }

    static Series of(Measure measure, List<Observation> observations, Instant begun, OptionalDouble near,
                     OptionalDouble overloaded) {
        List<TimedValue> counted = new ArrayList<>();
        for (Observation one : observations) {
            if (!one.replaced() && !one.at().isBefore(begun)) {
                counted.add(new TimedValue(one.at().toEpochMilli() / MILLIS, one.value()));
            }
        }
        return new Series(measure, observations, begun, near, overloaded, outlook(counted, near, overloaded));
    }

    private static Outlook outlook(List<TimedValue> counted, OptionalDouble near, OptionalDouble overloaded) {
        long times = counted.stream().mapToDouble(TimedValue::time).distinct().count();
        if (times < NEEDED) {
            return new Outlook.TooFew(counted.size(), NEEDED);
        }
        MannKendall test = MannKendall.of(counted);
        TheilSen line;
        try {
            line = TheilSen.of(counted, CONFIDENCE);
        } catch (IllegalArgumentException e) {
            return new Outlook.TooFew(counted.size(), NEEDED);
        }
        if (test.probability() > 1 - CONFIDENCE || line.slope() == 0) {
            return new Outlook.Level(line, test);
        }
        return new Outlook.Trend(line, test, reached(counted, line, near), reached(counted, line, overloaded));
    }

    private static Optional<Outlook.Reached> reached(List<TimedValue> counted, TheilSen line, OptionalDouble limit) {
        double last = counted.get(counted.size() - 1).time();
        // Only ever upwards: no measure here is limited from below.
        if (limit.isEmpty() || line.slope() <= 0) {
            return Optional.empty();
        }
        double expected = crossing(counted, line.slope(), limit.getAsDouble(), last);
        double earliest = Math.min(expected, crossing(counted, line.upper(), limit.getAsDouble(), last));
        double latest = Math.max(expected, crossing(counted, line.lower(), limit.getAsDouble(), last));
        return Optional.of(new Outlook.Reached(when(expected, last), when(earliest, last), when(latest, last)));
    }

    /** When a line through the middle of the observations meets the limit: not before the last one. */
    private static double crossing(List<TimedValue> counted, double slope, double limit, double last) {
        return slope <= 0 ? Double.POSITIVE_INFINITY
                : Math.max(last, (limit - TheilSen.intercept(counted, slope)) / slope);
    }

    private static Outlook.When when(double time, double last) {
        if (time == Double.POSITIVE_INFINITY) {
            return new Outlook.Never();
        }
        return time - last > HORIZON ? new Outlook.Beyond() : new Outlook.On(day(time));
    }

    private static LocalDate day(double days) {
        return Instant.ofEpochMilli(Math.round(days * MILLIS)).atZone(ZoneOffset.UTC).toLocalDate();
    }
}
