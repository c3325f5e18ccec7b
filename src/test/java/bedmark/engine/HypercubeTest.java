package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.uncertainty.Distribution;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.NormalDistribution;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.uncertainty.Tape;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Rule;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;

class HypercubeTest {
    private static final int TRIALS = 1_000;

    @Test
    void everyStratumOfAReadingIsTakenOnce() {
        for (int trials : new int[] {1, 7, TRIALS}) {
            Tape tape = new Tape(8);
            Uncertain depth = tape.take(new Reading("/readings/x", 100, 2));
            double[] drawn = new Hypercube(trials).zone(tape).of(depth);
            double[] sorted = drawn.clone();
            Arrays.sort(sorted);
            double[] strata = NormalDistribution.strata(trials);
            for (int i = 0; i < trials; i++) {
                assertEquals(100 + 2 * strata[i], sorted[i], 1e-9);
            }
            assertFalse(trials == TRIALS && Arrays.equals(sorted, drawn), "in an order of its own");
        }
    }

    @Test
    void theSameIsDrawnEveryTime() {
        double[][] twice = new double[2][];
        for (int i = 0; i < 2; i++) {
            Tape tape = new Tape(8);
            Uncertain sum = tape.take(new Reading("/readings/x", 3, 0.1)).plus(
                    tape.take(new Reading("/readings/y", 5, 0.2)));
            twice[i] = new Hypercube(TRIALS).zone(tape).of(sum);
        }
        assertArrayEquals(twice[0], twice[1]);
        assertEquals(Math.hypot(0.1, 0.2), Distribution.of(twice[0]).standardDeviation(), 0.02);
    }

    /** A depth is cut at nothing, an efficiency at one; what stays is spread evenly over what was left. */
    @Test
    void nothingImpossibleIsDrawn() {
        Tape tape = new Tape(8);
        Hypercube.Zone readings = new Hypercube(TRIALS).zone(tape);
        double[] depth = readings.of(tape.take(new Reading(ZoneFacts.DEPTHS + "/0/depth", 0.01, 0.02)));
        assertTrue(Arrays.stream(depth).min().orElseThrow() >= -1e-4, "no depth below nothing");
        assertEquals(0.02018, Distribution.of(depth).mean(), 0.0001, "mean of the cut normal distribution");
        double[] share = readings.of(tape.take(new Reading(Datum.DRIVE_EFFICIENCY.pointer(), 0.98, 0.03)));
        assertTrue(Arrays.stream(share).max().orElseThrow() <= 1 + 1e-4, "no efficiency over one");
        assertTrue(Distribution.of(share).mean() < 0.98);
    }

    /** What is left of a cut distribution is cut into equal strata again, each drawn in its middle. */
    @Test
    void strataOfACutReadingAreEquallyLikely() {
        Tape tape = new Tape(8);
        Reading depth = new Reading(ZoneFacts.DEPTHS + "/0/depth", 0.01, 0.02);
        double[] drawn = new Hypercube(TRIALS).zone(tape).of(tape.take(depth));
        Arrays.sort(drawn);
        double below = NormalDistribution.under(0, depth.estimate());
        for (int i = 0; i < TRIALS; i++) {
            double under = NormalDistribution.over(0, new Estimate(drawn[i] - 0.01, 0.02));
            assertEquals(below + (1 - below) * (i + 0.5) / TRIALS, under, 2e-4);
        }
    }

    @Test
    void zonesShareWhatStandsInTheRegisterAndNothingElse() {
        Tape one = new Tape(8);
        Tape two = new Tape(8);
        Reading common = new Reading("/conveyor/driveEfficiency", 0.9, 0.02);
        Reading own = new Reading("/readings/zoneLength", 6, 0.1);
        Hypercube cube = new Hypercube(TRIALS);
        Hypercube.Zone first = cube.zone(one);
        Hypercube.Zone second = cube.zone(two);
        assertArrayEquals(first.of(one.take(common)), second.of(two.take(common)));
        assertFalse(Arrays.equals(first.of(one.take(own)), second.of(two.take(own))));
        assertArrayEquals(first.of(one.take(own)), first.of(one.take(own)));
    }

    @Test
    void anEvenNumberHasNoMeanAndADeviationOfOne() {
        double[] even = new Hypercube(TRIALS).even();
        assertEquals(0, Arrays.stream(even).average().orElseThrow(), 1e-12);
        assertEquals(1, Distribution.of(even).standardDeviation(), 0.001);
        assertTrue(Arrays.stream(even).allMatch(drawn -> Math.abs(drawn) < Math.sqrt(3)));
        assertFalse(even[0] < even[1] && even[1] < even[2] && even[2] < even[3] && even[3] < even[4], "not in order");
    }

    /** Exact readings draw the number itself, whatever the method, and however shallow the bed. */
    @Test
    void withoutUncertaintyEveryTrialIsTheAssessment() {
        for (DragMethod method : DragMethod.values()) {
            for (double depth : new double[] {0, 0.2}) {
                LoadingZone zone = Zones.exact(Zones.healthy().with(Datum.SITE_FACTOR, 0.1, 0))
                        .withStations(List.of()).withStation(1, depth, DepthMethod.AT_BOARD, 0)
                        .withStation(4, depth / 2, DepthMethod.AT_BOARD, 0);
                Settings settings = Zones.exactSettings().with(method);
                ZoneFacts facts = new ZoneFacts(Sources.uncertain(zone, settings));
                FeedFacts feed = FeedFacts.today(facts);
                DrawnBed bed = new DrawnBed(feed, new Hypercube(3).zone(facts.sources().tape()));
                same(feed.driveShare().get().value(), bed.driveShare());
                same(feed.deepest().get().value() / 0.4, bed.observed(Rule.BED_OVER_BOARD));
                same(Math.sqrt(feed.meanSquare().get().value()) / 0.16, bed.observed(Rule.BED_OVER_DESIGN));
            }
        }
    }

    private static void same(double expected, double[] drawn) {
        for (double one : drawn) {
            assertEquals(expected, one, 1e-12 * Math.max(1, expected));
        }
    }

    /** Two zones that agree but for the disagreement of the methods: it moves both the same way. */
    @Test
    void theSumOfTwoZonesIsDrawnWithItsSpread() {
        Settings settings = Zones.exactSettings().with(Zones.exactSettings().conventions().withSpread(true));
        LoadingZone zone = Zones.exact(Zones.healthy()).withStations(List.of())
                .withStation(3, 0.2, DepthMethod.AT_BOARD, 0.05);
        List<Appraisal> appraisals = List.of(new Appraisal(zone, settings), new Appraisal(zone, settings));
        DrawnLoad drawn = DrawnLoad.of(appraisals, new Hypercube(20_000));
        FeedFacts feed = appraisals.get(0).today();
        double factor = feed.materialDrag().get().value() / 0.04 * feed.driveShare().get().value()
                / feed.skirtDrag().get().value();
        double ofSquare = Math.sqrt(4 * 0.04 * 0.0025 + 2 * 0.0025 * 0.0025) * factor;
        double spread = 2 * feed.spreadOfShare();
        Distribution today = Distribution.of(drawn.today());
        assertEquals(2 * (feed.driveShare().get().value() + 0.0025 * factor), today.mean(), 0.01 * today.mean());
        assertEquals(Math.hypot(Math.sqrt(2) * ofSquare, spread), today.standardDeviation(),
                0.02 * today.standardDeviation());
        assertTrue(Distribution.of(drawn.atDesign()).mean() > 0);
    }

    @Test
    void aZoneWithoutAShareAddsNothing() {
        LoadingZone unrated = Zones.healthy().without(Datum.RATED_POWER);
        DrawnLoad drawn = DrawnLoad.of(List.of(new Appraisal(unrated, Settings.standard())), new Hypercube(5));
        assertArrayEquals(new double[5], drawn.today());
    }

    /** The verdict of a contested pair is drawn at both feeds, that of a clear one at neither. */
    @Test
    void contestedDepthsAreDrawn() {
        LoadingZone pair = Zones.healthy().withStations(List.of()).with(Datum.DESIGN_THROUGHPUT, 275, 0)
                .withStation(1, 0.397, DepthMethod.AT_BOARD, 0.005).withStation(5, 0.397, DepthMethod.AT_BOARD, 0.005);
        LoadingZone clear = pair.withStations(List.of()).withStation(1, 0.397, DepthMethod.AT_BOARD, 0.005)
                .withStation(5, 0.35, DepthMethod.AT_BOARD, 0.005);
        assertTrue(board(Engine.assess(pair, Settings.standard()).findings()).drawn());
        assertTrue(board(Engine.assess(pair, Settings.standard()).findingsAtDesign()).drawn());
        assertFalse(board(Engine.assess(clear, Settings.standard()).findings()).drawn());
        double one = board(Engine.assess(clear, Settings.standard()).findings()).probabilityOverloaded().orElseThrow();
        double both = board(Engine.assess(pair, Settings.standard()).findings()).probabilityOverloaded().orElseThrow();
        assertTrue(both > 1.4 * one, both + " over " + one);
    }

    private static Finding board(List<Finding> findings) {
        return findings.stream().filter(finding -> finding.rule() == Rule.BED_OVER_BOARD).findFirst().orElseThrow();
    }
}
