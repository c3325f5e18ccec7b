package bedmark.engine;

import bedmark.engine.uncertainty.ImpossibleReading;
import bedmark.engine.working.Working;
import java.util.List;

/** The way into the engine: pure functions. */
public final class Engine {
    private Engine() {
    }

    /**
     * Assesses the only loading zone of a conveyor.
     *
     * @throws ImpossibleReading where a reading cannot be
     */
    public static Assessment assess(LoadingZone zone, Settings settings) {
        return assessConveyor(List.of(zone), 0, settings).zones().get(0);
    }

    /**
     * Assesses the loading zones of one conveyor, whose skirts load one drive together.
     *
     * @param zones      those of which a survey can be used, each with the same conveyor
     * @param unsurveyed how many more loading zones the conveyor has
     * @return the conveyor as a whole, with the assessments of its zones in their order
     * @throws ImpossibleReading where a reading cannot be; {@link #check} tells before
     */
    public static ConveyorAssessment assessConveyor(List<LoadingZone> zones, int unsurveyed, Settings settings) {
        zones.forEach(Engine::check);
        return new ConveyorAppraisal(List.copyOf(zones), unsurveyed, settings).assess();
    }

    /**
     * Draws the readings of the loading zones of one conveyor many times (JCGM 101:2008).
     *
     * @param zones  each with the same conveyor
     * @param seed   the same seed gives the same numbers on every device
     * @param trials how often, 1…100 000
     * @return one for each zone, in their order
     * @throws ImpossibleReading where a reading cannot be, or {@code trials-impossible}
     */
    public static List<MonteCarlo> monteCarlo(List<LoadingZone> zones, Settings settings, long seed, int trials) {
        if (trials < 1 || trials > Conventions.MOST_TRIALS) {
            throw new ImpossibleReading("trials-impossible", "/plant/limits/monteCarloTrials",
                    Integer.toString(trials), Integer.toString(Conventions.MOST_TRIALS));
        }
        zones.forEach(Engine::check);
        return new Trials(zones, settings, trials).run(seed);
    }

    /**
     * Shows how the numbers of a zone come about, as {@link #assess} computes them.
     *
     * @throws ImpossibleReading where a reading cannot be
     */
    public static Working explain(LoadingZone zone, Settings settings) {
        check(zone);
        return new Explanation(zone, settings).working();
    }

    /**
     * Refuses a zone that cannot be.
     *
     * @throws ImpossibleReading with the first reason
     */
    public static void check(LoadingZone zone) {
        new Checks(zone).run();
    }
}
