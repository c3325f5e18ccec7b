package bedmark.bench;

import bedmark.engine.Engine;
import bedmark.engine.LoadingZone;
import bedmark.engine.Settings;
import java.util.Collections;
import java.util.List;
import java.util.function.IntFunction;

/** How the cost of an assessment grows: the exponent of the number of stations, and of zones; 1 is linear. */
final class GrowthSuite implements Suite {
    private static final int ROUNDS = 60;

    @Override
    public String name() {
        return "growth";
    }

    @Override
    public List<Row> run() {
        Settings settings = Settings.standard();
        return List.of(
                new Row("growth with stations, 128 to 512: exponent", exponent(128, 512, count -> {
                    LoadingZone zone = BenchZones.of(count);
                    return () -> Engine.assess(zone, settings).profile().size();
                }), "", 1.1, true),
                new Row("growth with zones of one conveyor, 8 to 32: exponent", exponent(8, 32, count -> {
                    List<LoadingZone> zones = Collections.nCopies(count, BenchZones.of(4));
                    return () -> Engine.assessConveyor(zones, 0, settings).zones().size();
                }), "", 1.1, true));
    }

    private static double exponent(int few, int many, IntFunction<Timing.Work> work) {
        double ratio = Timing.best(ROUNDS, work.apply(many), 40) / Timing.best(ROUNDS, work.apply(few), 40);
        return Math.log(ratio) / Math.log((double) many / few);
    }
}
