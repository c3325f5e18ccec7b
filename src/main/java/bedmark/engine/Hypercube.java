package bedmark.engine;

import bedmark.engine.uncertainty.NormalDistribution;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.uncertainty.Sensitivity;
import bedmark.engine.uncertainty.Tape;
import bedmark.engine.uncertainty.Uncertain;
import java.util.Arrays;
import java.util.HashMap;
import java.util.Map;
import java.util.Random;

/**
 * The readings of some zones, drawn together by a Latin hypercube (JCGM 101:2008 leaves the way of drawing open): of as
 * many equally likely strata of each reading as there are trials every one is taken once, in an order of its own. With
 * {@link Random}, whose numbers are laid down by its specification, the same zones give the same numbers everywhere.
 *
 * <p>Each reading is drawn from the normal distribution about its value, cut to what it may be. What the zones of a
 * conveyor take from the same row of the register is drawn once for all of them.
 */
final class Hypercube {
    /** Any number would do; it is the same everywhere, so that a verdict is. */
    private static final long SEED = 20_260_101;
    private static final double[] STANDARD = NormalDistribution.strata(Conventions.standard().trials());

    private final int trials;
    private final double[] scores;
    private final Random random = new Random(SEED);
    private final Map<Reading, double[]> common = new HashMap<>();

    /** @param trials at least one */
    Hypercube(int trials) {
        this.trials = trials;
        scores = trials == STANDARD.length ? STANDARD : NormalDistribution.strata(trials);
    }

    int trials() {
        return trials;
    }

    /** A number of its own in every trial: evenly over a range about 0 whose standard deviation is 1. */
    double[] even() {
        double[] drawn = new double[trials];
        for (int i = 0; i < trials; i++) {
            drawn[i] = Math.sqrt(3) * (2 * (i + 0.5) / trials - 1);
        }
        shuffle(drawn);
        return drawn;
    }

    /** The readings of one more zone. */
    Zone zone(Tape tape) {
        return new Zone(tape);
    }

    /** The readings of one zone. */
    final class Zone {
        private final Tape tape;
        private final Map<Reading, double[]> own = new HashMap<>();

        private Zone(Tape tape) {
            this.tape = tape;
        }

        /** A number in every trial, as its derivatives by its readings have it. */
        double[] of(Uncertain number) {
            double[] drawn = new double[trials];
            Arrays.fill(drawn, number.value());
            for (Sensitivity sensitivity : tape.sensitivities(number)) {
                Reading reading = sensitivity.reading();
                double[] deviations = (Sum.isOwn(reading) ? own : common)
                        .computeIfAbsent(reading, Hypercube.this::deviations);
                for (int i = 0; i < trials; i++) {
                    drawn[i] += sensitivity.derivative() * deviations[i];
                }
            }
            return drawn;
        }
    }

    /** By how much the reading lies off its value in every trial. */
    private double[] deviations(Reading reading) {
        double u = reading.standardUncertainty();
        Domain domain = Draw.domain(reading);
        double below = NormalDistribution.under(domain.lowest(), reading.estimate());
        double within = 1 - below - NormalDistribution.over(domain.highest(), reading.estimate());
        double[] drawn = new double[trials];
        for (int i = 0; i < trials; i++) {
            drawn[i] = u * score((below + within * (i + 0.5) / trials) * trials - 0.5);
        }
        shuffle(drawn);
        return drawn;
    }

    /** The score at a place among the strata, between two of them in proportion. */
    private double score(double place) {
        double held = Math.max(0, Math.min(trials - 1.0, place));
        int under = (int) held;
        int over = Math.min(under + 1, trials - 1);
        return scores[under] + (held - under) * (scores[over] - scores[under]);
    }

    private void shuffle(double[] drawn) {
        for (int i = trials - 1; i > 0; i--) {
            int other = random.nextInt(i + 1);
            double kept = drawn[i];
            drawn[i] = drawn[other];
            drawn[other] = kept;
        }
    }
}
