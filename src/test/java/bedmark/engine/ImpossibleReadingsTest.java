package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertDoesNotThrow;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealRates;
import bedmark.engine.seal.SealType;
import bedmark.engine.seal.Side;
import bedmark.engine.uncertainty.ImpossibleReading;
import bedmark.engine.uncertainty.Instrument;
import bedmark.engine.uncertainty.Instruments;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.verdict.Certainty;
import bedmark.engine.verdict.Limit;
import bedmark.engine.verdict.Limits;
import bedmark.engine.verdict.Rule;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;

class ImpossibleReadingsTest {
    private static final LoadingZone ZONE = Zones.healthy();

    @Test
    void numbersThatAreNoneAreRefused() {
        for (double none : new double[] {Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY}) {
            refused("reading-not-finite", "/x", () -> new Reading("/x", none, 0));
            refused("reading-not-finite", "/x", () -> Instruments.standard().reading("/x", none, Instrument.TAPE));
            refused("uncertainty-impossible", "/x", () -> new Reading("/x", 1, none));
        }
        refused("uncertainty-impossible", "/x", () -> new Reading("/x", 1, -0.1));
        refused("uncertainty-impossible", "/x", () -> new Reading("/x", 1, 2e9));
    }

    @Test
    void negativeAndZeroLengthsAreRefused() {
        refused("reading-negative", "/readings/loadingZoneLength", () -> check(ZONE.with(Datum.ZONE_LENGTH, -1, 0)));
        refused("reading-zero", "/readings/loadingZoneLength", () -> check(ZONE.with(Datum.ZONE_LENGTH, 0, 0)));
        refused("reading-out-of-range", "/readings/loadingZoneLength",
                () -> check(ZONE.with(Datum.ZONE_LENGTH, 1e-10, 0)));
        refused("reading-out-of-range", "/readings/throughput", () -> check(ZONE.with(Datum.THROUGHPUT, 1e-10, 0)));
        refused("reading-out-of-range", "/readings/throughput", () -> check(ZONE.with(Datum.THROUGHPUT, 1e10, 0)));
        refused("reading-negative", "/readings/throughput", () -> check(ZONE.with(Datum.THROUGHPUT, -1, 0)));
        assertDoesNotThrow(() -> check(ZONE.with(Datum.THROUGHPUT, 0, 0).with(Datum.FEED_VELOCITY, -1, 0)
                .with(Datum.INCLINE, -0.2, 0)));
    }

    @Test
    void sharesAndAnglesStayWithinTheirRange() {
        refused("reading-out-of-range", "/conveyor/driveEfficiency",
                () -> check(ZONE.with(Datum.DRIVE_EFFICIENCY, 1.01, 0)));
        refused("reading-out-of-range", "/conveyor/troughAngle", () -> check(ZONE.with(Datum.TROUGH_ANGLE, 1.57, 0)));
        refused("reading-out-of-range", "/conveyor/loadedHoursPerYear",
                () -> check(ZONE.with(Datum.LOADED_HOURS, 9000, 0)));
        refused("reading-out-of-range", "/plant/limits/beltGrip", () -> Settings.standard().withGrip(2, 0.6));
    }

    @Test
    void aBoardBeyondTheWingRollsIsRefused() {
        double reach = 0.45 + 0.75 * Math.cos(Math.toRadians(35));
        refused("board-beyond-wing-rolls", "/readings/skirtSpacing",
                () -> check(ZONE.with(Datum.READ_SPACING, reach + 1e-6, 0)));
        refused("board-beyond-wing-rolls", "/transfer/skirtSpacing",
                () -> check(ZONE.with(Datum.REGISTER_SPACING, reach + 1e-6, 0)));
        assertDoesNotThrow(() -> check(ZONE.with(Datum.READ_SPACING, reach, 0)));
        LoadingZone flat = ZONE.with(Datum.TROUGH_ANGLE, 0, 0).without(Datum.CENTRE_ROLL);
        assertDoesNotThrow(() -> check(flat.with(Datum.READ_SPACING, 1.2, 0)));
        double rounded = 1.2 * (1 + 1e-9);
        assertDoesNotThrow(() -> check(flat.with(Datum.READ_SPACING, rounded, 0)), "as units round");
        refused("board-beyond-wing-rolls", "/readings/skirtSpacing",
                () -> check(flat.with(Datum.READ_SPACING, Math.nextUp(rounded), 0)));
        refused("board-beyond-wing-rolls", "/readings/skirtSpacing",
                () -> check(flat.with(Datum.READ_SPACING, 1.21, 0)));
    }

    @Test
    void aCentreRollAsWideAsTheBeltIsRefusedUnlessTheBeltIsFlat() {
        refused("centre-roll-beyond-belt", "/conveyor/centreRollLength",
                () -> check(ZONE.with(Datum.CENTRE_ROLL, 1.2, 0)));
        assertDoesNotThrow(() -> check(ZONE.with(Datum.CENTRE_ROLL, 1.4, 0).with(Datum.TROUGH_ANGLE, 0, 0)));
    }

    @Test
    void stationsStandInsideTheZoneEachInItsPlace() {
        refused("station-twice", "/readings/bedDepths/2/position",
                () -> check(ZONE.withStation(5, 0.2, DepthMethod.AT_BOARD, 0)));
        refused("station-outside-zone", "/readings/bedDepths/2/position",
                () -> check(ZONE.withStation(6.1, 0.2, DepthMethod.AT_BOARD, 0)));
        refused("reading-negative", "/readings/bedDepths/2/position",
                () -> check(ZONE.withStation(-0.1, 0.2, DepthMethod.AT_BOARD, 0)));
        refused("reading-negative", "/readings/bedDepths/2/depth",
                () -> check(ZONE.withStation(2, -0.2, DepthMethod.AT_BOARD, 0)));
        double rounded = 6 * (1 + 1e-9);
        assertDoesNotThrow(() -> check(ZONE.withStation(rounded, 0.2, DepthMethod.AT_BOARD, 0)), "as units round");
        refused("station-outside-zone", "/readings/bedDepths/2/position",
                () -> check(ZONE.withStation(Math.nextUp(rounded), 0.2, DepthMethod.AT_BOARD, 0)));
        assertDoesNotThrow(() -> check(ZONE.withStation(6, 0.2, DepthMethod.AT_BOARD, 0)
                .withStation(0, 0.2, DepthMethod.AT_BOARD, 0)));
    }

    @Test
    void sealsOfASideAddUpToTheLengthWithinOnePercent() {
        ImpossibleReading refusal = refused("seal-lengths-disagree", "/readings/seals",
                () -> check(seals(5.9)));
        assertEquals(List.of("left", "5.9", "6.0"), refusal.arguments());
        refused("seal-lengths-disagree", "/readings/seals", () -> check(seals(6.1)));
        ImpossibleReading right = refused("seal-lengths-disagree", "/readings/seals", () -> check(seals(6)
                .withSeal(Side.RIGHT, SealType.NONE, SealCondition.SOUND, 2, 0)
                .withSeal(Side.RIGHT, SealType.NONE, SealCondition.SOUND, 3, 0)));
        assertEquals(List.of("right", "5.0", "6.0"), right.arguments());
        assertDoesNotThrow(() -> check(seals(6.06)));
        assertDoesNotThrow(() -> check(seals(5.94)));
        assertDoesNotThrow(() -> check(seals(3).without(Datum.ZONE_LENGTH)), "nothing to compare with yet");
        refused("reading-zero", "/readings/seals/0/length", () -> check(seals(0)));
    }

    @Test
    void settingsThatCannotBeAreRefused() {
        refused("uncertainty-impossible", "/plant/instruments/tape",
                () -> Instruments.standard().with(Instrument.TAPE, -1));
        refused("seal-rate-impossible", "/plant/sealRates", () -> new SealRates(-1, Map.of()));
        refused("seal-rate-impossible", "/plant/sealRates/vertical/worn",
                () -> SealRates.standard().with(SealType.VERTICAL, SealCondition.WORN, Double.NaN));
        refused("limit-impossible", "/plant/limits/bed-over-board/overloaded", () -> Limits.standard().with(
                Rule.BED_OVER_BOARD, Limit.ofSite(OptionalDouble.of(1), OptionalDouble.of(Double.NaN))));
        refused("certainty-impossible", "/plant/limits/certainty", () -> new Certainty(0.1, 0.9, 0.5));
        refused("certainty-impossible", "/plant/limits/certainty", () -> new Certainty(0.9, 0, 0.5));
        refused("certainty-impossible", "/plant/limits/certainty", () -> new Certainty(1.1, 0.1, 0.5));
        refused("certainty-impossible", "/plant/limits/certainty", () -> new Certainty(0.9, 0.1, 0));
        refused("certainty-impossible", "/plant/limits/certainty", () -> new Certainty(0.9, 0.1, 1.1));
    }

    @Test
    void anAssessmentRefusesWhatTheCheckRefuses() {
        refused("reading-zero", "/readings/loadingZoneLength",
                () -> Engine.assess(ZONE.with(Datum.ZONE_LENGTH, 0, 0), Settings.standard()));
    }

    private static LoadingZone seals(double leftLength) {
        return ZONE.withSeals(List.of()).withSeal(Side.LEFT, SealType.NONE, SealCondition.SOUND, leftLength, 0);
    }

    private static void check(LoadingZone zone) {
        Engine.check(zone);
    }

    private static ImpossibleReading refused(String code, String name, Executable attempt) {
        ImpossibleReading refusal = assertThrows(ImpossibleReading.class, attempt);
        assertEquals(code, refusal.code());
        assertEquals(name, refusal.readingName());
        return refusal;
    }
}
