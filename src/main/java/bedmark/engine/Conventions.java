package bedmark.engine;

import bedmark.engine.flow.LengthConventions;
import bedmark.engine.uncertainty.ImpossibleReading;
import bedmark.engine.uncertainty.Reading;

/**
 * How a site computes where practice knows more than one way.
 *
 * @param beltGrip  μ1 of ISO 5048, material on belt while it is accelerated: 0.5–0.7 [R]
 * @param boardGrip μ2 of ISO 5048, material on boards: 0.5–0.7 [R, range S7]
 * @param lengths   the conventions for the length of a zone
 * @param incline   whether the slope of the belt counts in the acceleration length; the standard's own form is level
 * @param spread    whether the disagreement of the methods counts in verdicts on power
 * @param trials    of the Monte Carlo method where a verdict rests on depths too uncertain for the first order, or on
 *                  the deepest of several that are nearly as deep; 0 for never
 */
public record Conventions(Reading beltGrip, Reading boardGrip, LengthConventions lengths, boolean incline,
        boolean spread, int trials) {
    /** Most trials that a site may ask for. */
    public static final int MOST_TRIALS = 100_000;

    /** Half the published range of 0.5–0.7, taken as equally likely all over (JCGM 100, 4.3.7) [D]. */
    private static final double GRIP_SPREAD = 0.1 / Math.sqrt(3);
    private static final Conventions STANDARD = new Conventions(
            new Reading("/plant/limits/beltGrip", 0.6, GRIP_SPREAD),
            new Reading("/plant/limits/boardGrip", 0.6, GRIP_SPREAD), LengthConventions.ALL, true, true, 1_000);

    /** @throws ImpossibleReading where a factor is not above 0 and up to 1, or the trials are not 0…100 000 */
    public Conventions {
        Domain.EFFICIENCY.check(beltGrip);
        Domain.EFFICIENCY.check(boardGrip);
        if (trials < 0 || trials > MOST_TRIALS) {
            throw new ImpossibleReading("trials-impossible", "/plant/limits/monteCarloTrials",
                    Integer.toString(trials), Integer.toString(MOST_TRIALS));
        }
    }

    /** The defaults of the engineering page. */
    public static Conventions standard() {
        return STANDARD;
    }

    /** The same with exact factors of ISO 5048. */
    public Conventions withGrip(double onBelt, double onBoards) {
        return withGrip(Reading.exact(beltGrip.name(), onBelt), Reading.exact(boardGrip.name(), onBoards));
    }

    /** The same with other factors of ISO 5048 and their uncertainties. */
    public Conventions withGrip(Reading onBelt, Reading onBoards) {
        return new Conventions(onBelt, onBoards, lengths, incline, spread, trials);
    }

    public Conventions with(LengthConventions other) {
        return new Conventions(beltGrip, boardGrip, other, incline, spread, trials);
    }

    public Conventions withIncline(boolean counts) {
        return new Conventions(beltGrip, boardGrip, lengths, counts, spread, trials);
    }

    public Conventions withSpread(boolean counts) {
        return new Conventions(beltGrip, boardGrip, lengths, incline, counts, trials);
    }

    public Conventions withTrials(int number) {
        return new Conventions(beltGrip, boardGrip, lengths, incline, spread, number);
    }
}
