package bedmark.bench;

import java.util.Locale;
import java.util.UUID;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

/** A demo bundle of many loading zones, each on a conveyor of its own, no two alike. */
final class BenchPlant {
    private BenchPlant() {
    }

    static String bundle(int zones) {
        return ("{'format':'bedmark.bundle','version':1,'id':'" + new UUID(2, zones) + "',"
                + "'createdAt':'2026-03-02T15:00:00Z','plant':{'id':'p','name':'Demo','materials':[{'id':'m',"
                + "'skirtFrictionFactor':0.0754,'bulkDensity':{'value':1000,'unit':'kg/m3'},"
                + "'angleOfRepose':{'value':38,'unit':'deg'},'surchargeAngle':{'value':20,'unit':'deg'},"
                + "'wallFriction':0.5,'speedClass':'coal-soft-ore-fine-stone'}],'conveyors':["
                + each(zones, BenchPlant::conveyor) + "],'transfers':[" + each(zones, BenchPlant::transfer)
                + "]},'surveys':[" + each(zones, BenchPlant::survey) + "]}").replace('\'', '"');
    }

    private static String each(int zones, java.util.function.IntFunction<String> text) {
        return IntStream.range(0, zones).mapToObj(text).collect(Collectors.joining(","));
    }

    private static String conveyor(int turn) {
        return "{'id':'c" + turn + "','beltWidth':" + quantity(1200, "mm") + ",'troughAngle':" + quantity(35, "deg")
                + ",'centreRollLength':" + quantity(450, "mm") + ",'incline':" + quantity(3, "deg")
                + ",'designSpeed':" + quantity(2, "m/s") + ",'ratedPower':" + quantity(55, "kW")
                + ",'driveEfficiency':0.9,'motorEfficiency':0.92,'loadedHoursPerYear':5000}";
    }

    private static String transfer(int turn) {
        return "{'id':'t" + turn + "','conveyor':'c" + turn + "','material':'m','designThroughput':"
                + quantity(1200, "t/h") + ",'designBedDepth':" + quantity(160, "mm") + ",'feedVelocity':"
                + quantity(0.5, "m/s") + ",'skirtSpacing':" + quantity(700, "mm") + ",'skirtHeight':"
                + quantity(400, "mm") + ",'impactLength':" + quantity(1.5, "m") + ",'lumpSize':"
                + quantity(100, "mm") + "}";
    }

    private static String survey(int turn) {
        String stations = IntStream.range(0, 4).mapToObj(i -> "{'position':" + quantity(0.75 + 1.5 * i, "m")
                + ",'depth':" + quantity(100 + (turn * 7 + i * 13) % 250, "mm") + "}").collect(Collectors.joining(","));
        return "{'id':'" + new UUID(1, turn) + "','transfer':'t" + turn + "','startedAt':'2026-03-02T08:00:00Z',"
                + "'completedAt':'2026-03-02T08:10:00Z','readings':{'loadingZoneLength':"
                + quantity(6, "m") + ",'beltSpeed':" + quantity(2, "m/s") + ",'depthMethod':'at-board','bedDepths':["
                + stations + "],'seals':[{'side':'left','type':'vertical','condition':'sound','length':"
                + quantity(6, "m") + "},{'side':'right','type':'oblique','condition':'worn','length':"
                + quantity(6, "m") + "}],'throughput':" + quantity(900 + turn % 300, "t/h") + ",'runningPower':"
                + quantity(30, "kW") + "}}";
    }

    private static String quantity(double value, String unit) {
        return String.format(Locale.ROOT, "{'value':%s,'unit':'%s'}", value, unit);
    }
}
