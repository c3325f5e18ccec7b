package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.bed.DepthPoint;
import bedmark.engine.flow.LengthConventions;
import bedmark.engine.uncertainty.Estimate;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Where something begins to be taken for granted; that each assumption is told at all is MissingReadingsTest's. */
class AssumptionsTest {
    private static final LoadingZone ZONE = Zones.healthy();

    private static boolean isSaid(String code, LoadingZone zone) {
        return Engine.assess(zone, Settings.standard()).assumptions().stream().anyMatch(one -> one.code().equals(code));
    }

    private static boolean isCoarse(double depth, double uncertainty) {
        return Assumptions.isCoarse(List.of(new DepthPoint(1, new Estimate(0.4, 0.01)),
                new DepthPoint(3, new Estimate(depth, uncertainty))));
    }

    /** A tenth of the depth is still fine enough, and a bed that touches nothing has nothing to square. */
    @Test
    void aDepthIsCoarseBeyondATenthOfItself() {
        assertFalse(isCoarse(0.5, 0.05));
        assertTrue(isCoarse(0.5, Math.nextUp(0.05)));
        assertFalse(isCoarse(0, 0.04));
        assertFalse(Assumptions.isCoarse(List.of()));
    }

    @Test
    void aBedAtTheBoardLineIsNotBelowIt() {
        LoadingZone bare = ZONE.withStations(List.of());
        assertFalse(isSaid("bed-below-boards", bare.withStation(3, 0.4, DepthMethod.FROM_BOARD_TOP, 0)));
        assertTrue(isSaid("bed-below-boards", bare.withStation(3, 0.401, DepthMethod.FROM_BOARD_TOP, 0)));
    }

    @Test
    void whatTheSettlingLengthDoesNotUseIsNotAssumed() {
        LoadingZone unknown = ZONE.without(Datum.IMPACT_LENGTH);
        assertTrue(isSaid("impact-length-zero", unknown));
        Settings byLeast = Settings.standard().with(Conventions.standard().with(
                new LengthConventions(false, true, true)));
        assertEquals(0, Engine.assess(unknown, byLeast).assumptions().stream()
                .filter(one -> one.code().equals("impact-length-zero")).count());
    }
}
