package bedmark.engine;

import bedmark.engine.uncertainty.Uncertain;
import java.util.EnumMap;
import java.util.Map;

/** The numbers of an assessment, each by its name. */
final class Results {
    private Results() {
    }

    /** Every number, known or not. */
    static Map<Result, Deduced<Uncertain>> of(FeedFacts today) {
        ZoneFacts zone = today.zone();
        Map<Result, Deduced<Uncertain>> all = new EnumMap<>(Result.class);
        all.put(Result.BELT_SPEED, zone.beltSpeed());
        all.put(Result.MEAN_SQUARE_DEPTH, today.meanSquare());
        all.put(Result.MEAN_DEPTH, today.meanDepth());
        all.put(Result.DEEPEST_DEPTH, today.deepest());
        all.put(Result.SQUARE_OF_MEAN_SHARE, today.squareOfMeanShare());
        all.put(Result.MATERIAL_DRAG, today.materialDrag());
        all.put(Result.SEAL_DRAG, zone.sealDrag());
        all.put(Result.SKIRT_DRAG, today.skirtDrag());
        all.put(Result.LOADING_FORCE, today.loadingForce());
        all.put(Result.SKIRT_POWER, today.skirtPower());
        all.put(Result.DRIVE_POWER, today.drivePower());
        all.put(Result.DRIVE_SHARE, today.driveShare());
        all.put(Result.RUNNING_SHARE, runningShare(today));
        all.put(Result.BED_AREA, today.area());
        all.put(Result.IMPLIED_THROUGHPUT, today.impliedFlow());
        all.put(Result.FILL, today.fill());
        all.put(Result.BED_SPEED_RATIO, today.bedSpeedRatio());
        all.put(Result.DESIGN_DEPTH, zone.designDepth());
        all.put(Result.REFERENCE_DEPTH, zone.referenceDepth());
        all.put(Result.ACCELERATION_LENGTH, zone.accelerationLength());
        all.put(Result.ENERGY, today.energy());
        all.put(Result.COST, today.electricity(zone.settings().prices().energy()));
        all.put(Result.CO2, today.electricity(zone.settings().prices().co2()));
        return all;
    }

    /** Share of the shaft power that was running; nothing where none was read. */
    private static Deduced<Uncertain> runningShare(FeedFacts today) {
        ZoneFacts zone = today.zone();
        if (zone.zone().get(Datum.RUNNING_POWER).filter(power -> power.value() > 0).isEmpty()) {
            return Deduced.nothing();
        }
        return Deduced.from(today.drivePower(), Observations.runningShaftPower(zone), Uncertain::over);
    }
}
