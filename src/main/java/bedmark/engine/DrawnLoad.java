package bedmark.engine;

import java.util.List;

/**
 * What the skirts of all zones of a conveyor ask of its drive in every trial of a {@link Hypercube}, as shares of the
 * rated power. A method that errs does so in all zones alike: the disagreement of the methods, where it counts, is
 * drawn evenly over their range.
 */
record DrawnLoad(double[] today, double[] atDesign) {

    /** The sum over the zones whose share is known. */
    static DrawnLoad of(List<Appraisal> zones, Hypercube cube) {
        double[] today = new double[cube.trials()];
        double[] atDesign = new double[cube.trials()];
        double[] apart = cube.even();
        for (Appraisal zone : zones) {
            Hypercube.Zone readings = cube.zone(zone.today().zone().sources().tape());
            add(zone.today(), readings, apart, today);
            add(zone.atDesign(), readings, apart, atDesign);
        }
        return new DrawnLoad(today, atDesign);
    }

    private static void add(FeedFacts feed, Hypercube.Zone readings, double[] apart, double[] sum) {
        if (feed.driveShare().isKnown()) {
            double[] share = new DrawnBed(feed, readings).driveShare();
            double spread = feed.spreadOfShare();
            for (int i = 0; i < sum.length; i++) {
                sum[i] += share[i] + apart[i] * spread;
            }
        }
    }
}
