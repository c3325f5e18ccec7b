package bedmark.survey;

import bedmark.document.Branch;
import bedmark.json.JsonReader;
import java.nio.charset.StandardCharsets;
import java.util.UUID;

/** Registers and surveys for tests, written as documents with single quotes. */
public final class Plants {
    /** What every plant of these tests holds: two materials, two conveyors, three loading zones. */
    public static final String ROWS = "'materials':[{'id':'stone','skirtFrictionFactor':0.128,'bulkDensity':{'value':1400,"
            + "'unit':'kg/m3'},'angleOfRepose':{'value':38,'unit':'deg'},'surchargeAngle':{'value':20,'unit':'deg'}},"
            + "{'id':'coal','bulkDensity':{'value':800,'unit':'kg/m3'},'angleOfRepose':{'value':38,'unit':'deg'},"
            + "'surchargeAngle':{'value':20,'unit':'deg'}}],"
            + "'conveyors':[" + conveyor("c1") + "," + conveyor("c2") + "],"
            + "'transfers':[" + transfer("t1", "c1") + "," + transfer("t2", "c1") + "," + transfer("t3", "c2") + "]";

    private Plants() {
    }

    private static String conveyor(String id) {
        return "{'id':'" + id + "','beltWidth':{'value':1200,'unit':'mm'},'troughAngle':{'value':35,'unit':'deg'},"
                + "'centreRollLength':{'value':450,'unit':'mm'},'incline':{'value':0,'unit':'deg'},"
                + "'ratedPower':{'value':55,'unit':'kW'},'driveEfficiency':0.9,'motorEfficiency':0.92,"
                + "'loadedHoursPerYear':5000,'designSpeed':{'value':2,'unit':'m/s'}}";
    }

    private static String transfer(String id, String conveyor) {
        return "{'id':'" + id + "','conveyor':'" + conveyor + "','material':'stone','skirtSpacing':{'value':700,"
                + "'unit':'mm'},'skirtHeight':{'value':400,'unit':'mm'},'designThroughput':{'value':1000,"
                + "'unit':'t/h'},'feedVelocity':{'value':0.5,'unit':'m/s'},'impactLength':{'value':1,'unit':'m'}}";
    }

    public static Branch read(String text) {
        return JsonReader.read(text.replace('\'', '"').getBytes(StandardCharsets.UTF_8)).root();
    }

    /** A register with more keys of the plant, each with a comma before it. */
    public static Register register(String more) {
        return new Register(read("{" + ROWS + more + "}"));
    }

    /** A complete survey; more readings replace those of the same key. */
    public static Survey survey(String transfer, String moreReadings) {
        Branch readings = read("{'loadingZoneLength':{'value':6,'unit':'m'},'beltSpeed':{'value':2,'unit':'m/s'},"
                + "'depthMethod':'at-board','bedDepths':[{'position':{'value':3,'unit':'m'},"
                + "'depth':{'value':150,'unit':'mm'}}],'seals':[{'side':'left','type':'vertical','condition':'sound',"
                + "'length':{'value':6,'unit':'m'}},{'side':'right','type':'vertical','condition':'sound',"
                + "'length':{'value':6,'unit':'m'}}]}");
        for (var entry : read("{" + moreReadings + "}").members().entrySet()) {
            readings = readings.with(entry.getKey(), entry.getValue());
        }
        return new Survey(read("{'id':'" + UUID.nameUUIDFromBytes((transfer + moreReadings)
                .getBytes(StandardCharsets.UTF_8)) + "','transfer':'" + transfer + "','round':'r'}")
                .with("readings", readings));
    }
}
