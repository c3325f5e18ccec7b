package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.flow.AccelerationLength;
import bedmark.engine.flow.MaximumBeltSpeed;
import bedmark.engine.flow.OpenBelt;
import bedmark.engine.flow.SpeedClass;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealRates;
import bedmark.engine.seal.SealType;
import bedmark.engine.uncertainty.ImpossibleReading;
import bedmark.engine.uncertainty.Uncertain;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

/** What holds exactly at the edge of a range, where a slip of the pen would show last. */
class EdgesTest {
    private static final double MOST = 1e6;

    @Test
    void speedTableWithoutAClassIsRefused() {
        List<MaximumBeltSpeed.Row> rows = new ArrayList<>(MaximumBeltSpeed.standard().rows());
        rows.removeIf(row -> row.material() == SpeedClass.HEAVY_HARD_SHARP_COARSE);
        ImpossibleReading refused = assertThrows(ImpossibleReading.class, () -> new MaximumBeltSpeed(rows));
        assertEquals("speed-table-incomplete", refused.code());
        assertSame(MaximumBeltSpeed.standard(), MaximumBeltSpeed.standard());
    }

    /** Belts are named by their nominal width; 2 % below it still is that belt, 2 % above it not yet a wider one. */
    @Test
    void nominalWidthHoldsFromTwoPercentBelow() {
        List<MaximumBeltSpeed.Row> rows = new ArrayList<>();
        for (SpeedClass material : SpeedClass.values()) {
            rows.add(new MaximumBeltSpeed.Row(material, 0.5, false, 1));
            rows.add(new MaximumBeltSpeed.Row(material, 1, false, 2));
            rows.add(new MaximumBeltSpeed.Row(material, 2, true, 3));
        }
        MaximumBeltSpeed table = new MaximumBeltSpeed(rows);
        SpeedClass any = SpeedClass.GRAIN_FREE_FLOWING;
        assertEquals(1, table.forBelt(any, Math.nextDown(0.98)));
        assertEquals(2, table.forBelt(any, 0.98));
        assertEquals(2, table.forBelt(any, 2 * 1.02));
        assertEquals(3, table.forBelt(any, Math.nextUp(2 * 1.02)));
    }

    @Test
    void sealRatesReachFromNothingToTheMost() {
        assertEquals(0, new SealRates(0, Map.of()).rate());
        assertEquals(MOST, new SealRates(MOST, Map.of()).rate());
        assertThrows(ImpossibleReading.class, () -> new SealRates(Math.nextUp(MOST), Map.of()));
        assertThrows(ImpossibleReading.class, () -> SealRates.standard().with(SealType.VERTICAL, SealCondition.WORN,
                Math.nextUp(MOST)));
    }

    @Test
    void beltThatHoldsNothingHasNoAccelerationLength() {
        assertTrue(AccelerationLength.of(Uncertain.exact(2), Uncertain.ZERO, Uncertain.ZERO, Uncertain.ZERO).isEmpty());
    }

    @Test
    void beltAsNarrowAsItsEdgesCarriesNothing() {
        assertTrue(OpenBelt.usableWidth(Uncertain.exact(0.05)).isEmpty());
        assertEquals(1.75, OpenBelt.usableWidth(Uncertain.exact(2)).orElseThrow().value(), 1e-12);
        assertEquals(2.15, OpenBelt.usableWidth(Uncertain.exact(2.4)).orElseThrow().value(), 1e-12);
    }
}
