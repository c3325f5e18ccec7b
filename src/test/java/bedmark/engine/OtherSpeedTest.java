package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class OtherSpeedTest {
    private static final LoadingZone ZONE = Zones.healthy().withStations(List.of())
            .withStation(1, 0.1, DepthMethod.AT_BOARD, 0.005).withStation(5, 0.2, DepthMethod.AT_BOARD, 0.005);

    private static OtherSpeed at(LoadingZone zone, double speed) {
        return OtherSpeed.of(zone, Settings.standard(), speed).orElseThrow();
    }

    /** The depth of half or twice the area between boards 0.7 m apart, over the carried area A0 of trough and crown. */
    private static double depth(double depth, double factor) {
        double wing = (0.7 - 0.45) / 2 / Math.cos(Math.toRadians(35));
        double carried = (0.45 + 0.125) * wing * Math.sin(Math.toRadians(35))
                + 0.49 * Math.tan(Math.toRadians(20)) / 6;
        return ((carried + 0.7 * depth) * factor - carried) / 0.7;
    }

    @Test
    void halfTheSpeedDoublesTheAreaAtEveryStation() {
        OtherSpeed slower = at(ZONE, 1);
        assertEquals(1, slower.speed());
        assertEquals(2, slower.speedNow());
        assertEquals(List.of(1.0, 5.0), slower.depths().stream().map(OtherSpeed.At::position).toList());
        assertEquals(depth(0.1, 2), slower.depths().get(0).depth(), 1e-12);
        assertEquals(depth(0.2, 2), slower.depths().get(1).depth(), 1e-12);
        assertEquals(depth(0.15, 2), slower.meanDepth(), 1e-12, "straight between the stations");
        assertEquals(0.15, slower.meanDepthNow(), 1e-15);
    }

    /** A depth does not fall below nothing, where the bed comes to lie under the boards. */
    @Test
    void aFastBeltDrawsTheBedDownUnderTheBoards() {
        OtherSpeed faster = at(ZONE, 6);
        assertTrue(depth(0.2, 1 / 3.0) < 0);
        assertEquals(List.of(0.0, 0.0), faster.depths().stream().map(OtherSpeed.At::depth).toList());
        assertEquals(0, faster.meanDepth());
        OtherSpeed same = at(ZONE, 2);
        assertEquals(0.15, same.meanDepth(), 1e-12);
        assertEquals(0.2, same.depths().get(1).depth(), 1e-12);
    }

    @Test
    void withoutSpeedBedOrSectionThereIsNothingToTell() {
        for (double speed : new double[] {0, -1, Double.NaN}) {
            assertEquals(Optional.empty(), OtherSpeed.of(ZONE, Settings.standard(), speed));
        }
        for (LoadingZone zone : List.of(ZONE.without(Datum.BELT_SPEED), ZONE.withStations(List.of()),
                ZONE.without(Datum.SURCHARGE_ANGLE), LoadingZone.UNKNOWN)) {
            assertEquals(Optional.empty(), OtherSpeed.of(zone, Settings.standard(), 1));
        }
        assertEquals(0, at(ZONE.with(Datum.BELT_SPEED, 0, 0), 1).meanDepth(), "a belt that stands carries no flow");
    }
}
