package bedmark.picture;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import org.junit.jupiter.api.Test;

class SnapTest {

    @Test
    void metricDepthsSnapToFiveMillimetres() {
        assertEquals(new Snap.Stepped(52, 0.005), Snap.METRIC.depth(0.2612));
        assertEquals(0.26, Snap.METRIC.depth(0.2612).metres(), 1e-15);
    }

    @Test
    void inchDepthsSnapToQuarters() {
        assertEquals(38, Snap.INCH.depth(9.45 * 0.0254).steps());
        assertEquals(9.5 * 0.0254, Snap.INCH.depth(9.45 * 0.0254).metres(), 1e-15);
    }

    @Test
    void depthIsNeverBelowTheBelt() {
        assertEquals(0, Snap.METRIC.depth(-0.3).steps());
    }

    @Test
    void positionsSnapToSteps() {
        assertEquals(4.0, Snap.METRIC.position(3.98, 6.4).metres(), 1e-12);
        assertEquals(20 * 0.0254, Snap.INCH.position(0.5, 3).metres(), 1e-12);
    }

    @Test
    void positionsStayInTheZone() {
        Random random = new Random(3);
        for (int i = 0; i < 500; i++) {
            double length = 0.3 + 10 * random.nextDouble();
            double position = length * random.nextDouble();
            for (Snap snap : Snap.values()) {
                double snapped = snap.position(position, length).metres();
                assertTrue(snapped >= 0 && snapped <= length + 1e-9, () -> snapped + " of " + length);
            }
        }
    }

    @Test
    void endOfAZoneOfWholeStepsCanBeReached() {
        assertEquals(128, Snap.METRIC.position(6.4, 6.4).steps());
    }
}
