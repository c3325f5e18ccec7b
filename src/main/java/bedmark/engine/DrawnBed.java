package bedmark.engine;

import bedmark.engine.bed.Profile;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.verdict.Rule;

/**
 * The bed of one zone at one feed in every trial of a {@link Hypercube}. Levels, lengths and factors follow their
 * readings by derivatives, being straight in them or nearly so; what is not is computed for each trial by the formulas
 * themselves: the integral of the square, the greatest of several depths, the root, the quotients, and the product of a
 * factor and a square.
 */
final class DrawnBed {
    private final FeedFacts feed;
    private final Hypercube.Zone readings;
    private final int trials;
    private final double[] length;
    private final double[][] positions;
    private final double[][] levels;

    /** @param feed with a profile */
    DrawnBed(FeedFacts feed, Hypercube.Zone readings) {
        this.feed = feed;
        this.readings = readings;
        Profile bed = feed.profile().get();
        length = readings.of(bed.length());
        trials = length.length;
        positions = new double[trials][bed.stations()];
        levels = new double[trials][bed.stations()];
        for (int station = 0; station < bed.stations(); station++) {
            double[] position = readings.of(bed.position(station));
            double[] level = readings.of(bed.level(station));
            for (int i = 0; i < trials; i++) {
                double before = station == 0 ? 0 : positions[i][station - 1];
                positions[i][station] = Math.min(Math.max(position[i], before), length[i]);
                levels[i][station] = level[i];
            }
        }
    }

    /** What one of the rules on the depth observes, its parts being known. */
    double[] observed(Rule rule) {
        double[] whole = readings.of((rule == Rule.BED_OVER_BOARD ? feed.zone().height() : feed.zone().referenceDepth())
                .get());
        double[] observed = new double[trials];
        for (int i = 0; i < trials; i++) {
            observed[i] = (rule == Rule.BED_OVER_BOARD ? deepest(levels[i])
                    : Math.sqrt(integralOfSquare(i) / length[i])) / whole[i];
        }
        return observed;
    }

    /** The zone's skirt power over the drive's rating, which is known. */
    double[] driveShare() {
        Uncertain share = feed.driveShare().get();
        Uncertain square = feed.integralOfSquare().get();
        boolean follows = feed.method() != DragMethod.ISO_5048 && square.value() > 0;
        if (!follows || feed.skirtDrag().get().value() == 0) {
            return readings.of(share);
        }
        Uncertain perForce = share.over(feed.skirtDrag().get());
        double[] perSquare = readings.of(feed.materialDrag().get().over(square).times(perForce));
        double[] ofSeals = readings.of(feed.zone().sealDrag().get().times(perForce));
        double[] observed = new double[trials];
        for (int i = 0; i < trials; i++) {
            observed[i] = perSquare[i] * integralOfSquare(i) + ofSeals[i];
        }
        return observed;
    }

    private double integralOfSquare(int trial) {
        return Profile.integralOfSquare(length[trial], positions[trial], levels[trial]);
    }

    private static double deepest(double[] levels) {
        double most = 0;
        for (double level : levels) {
            most = Math.max(most, level);
        }
        return most;
    }
}
