package bedmark.engine;

import bedmark.engine.uncertainty.ImpossibleReading;
import java.util.ArrayList;
import java.util.Collections;
import bedmark.engine.working.Working;
import java.util.List;
import java.util.Optional;

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
        return assessConveyor(List.of(zone), 0, settings).get(0);
    }

    /**
     * Assesses the loading zones of one conveyor, whose skirts load one drive together.
     *
     * @param zones      those of which a survey can be used, each with the same conveyor
     * @param unsurveyed how many more loading zones the conveyor has
     * @return the assessments in the order of the zones
     * @throws ImpossibleReading where a reading cannot be; {@link #check} tells before
     */
    public static List<Assessment> assessConveyor(List<LoadingZone> zones, int unsurveyed, Settings settings) {
        zones.forEach(Engine::check);
        List<Appraisal> appraisals = new ArrayList<>(zones.size());
        List<FeedFacts> feedsToday = new ArrayList<>(zones.size());
        List<FeedFacts> feedsAtDesign = new ArrayList<>(zones.size());
        for (LoadingZone zone : zones) {
            Appraisal appraisal = new Appraisal(zone, settings);
            appraisals.add(appraisal);
            feedsToday.add(appraisal.today());
            feedsAtDesign.add(appraisal.atDesign());
        }
        Optional<ConveyorLoad> today = ConveyorLoad.of(feedsToday, unsurveyed);
        Optional<ConveyorLoad> atDesign = ConveyorLoad.of(feedsAtDesign, unsurveyed);
        List<Assessment> assessments = new ArrayList<>(zones.size());
        for (Appraisal appraisal : appraisals) {
            assessments.add(appraisal.judge(today, atDesign));
        }
        return Collections.unmodifiableList(assessments);
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
