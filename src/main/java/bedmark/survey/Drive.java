package bedmark.survey;

import bedmark.engine.LoadingZone;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/** The surveys that load one drive on one round, in the register's order of their transfer points. */
final class Drive {
    private final String round;
    private final String conveyor;
    private final List<String> transfers;
    private final Map<String, Survey> surveys = new HashMap<>();
    private final Map<String, LoadingZone> zones = new HashMap<>();

    /** @param transfers the ids of all of the conveyor's transfer points */
    Drive(String round, String conveyor, List<String> transfers) {
        this.round = round;
        this.conveyor = conveyor;
        this.transfers = transfers;
    }

    /** Takes the survey of a transfer point in the place of any other of it. */
    void put(Survey survey, LoadingZone zone) {
        surveys.put(survey.transfer(), survey);
        zones.put(survey.transfer(), zone);
    }

    String round() {
        return round;
    }

    String conveyor() {
        return conveyor;
    }

    /** Whether this very survey is the one that counts of its transfer point. */
    boolean holds(Survey survey) {
        return survey == surveys.get(survey.transfer());
    }

    /** The ids of the surveyed transfer points. */
    List<String> transfers() {
        return transfers.stream().filter(surveys::containsKey).toList();
    }

    List<Survey> surveys() {
        return transfers().stream().map(surveys::get).toList();
    }

    List<LoadingZone> zones() {
        return transfers().stream().map(zones::get).toList();
    }

    /** How many more loading zones the conveyor has. */
    int unsurveyed() {
        return transfers.size() - zones.size();
    }
}
