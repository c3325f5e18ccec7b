package bedmark.engine.uncertainty;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;

class ReadingTest {
    private static final double MOST = 1e9;

    @Test
    void uncertaintiesReachFromNothingToTheMost() {
        assertEquals(0, new Reading("/x", 1, 0).standardUncertainty());
        assertEquals(MOST, new Reading("/x", 1, MOST).standardUncertainty());
        refused("/x", Math.nextUp(MOST), () -> new Reading("/x", 1, Math.nextUp(MOST)));
        refused("/x", -Double.MIN_VALUE, () -> new Reading("/x", 1, -Double.MIN_VALUE));
        assertEquals(0, Instruments.standard().with(Instrument.TAPE, 0).spread(Instrument.TAPE));
        assertEquals(MOST, Instruments.standard().with(Instrument.TAPE, MOST).spread(Instrument.TAPE));
        refused("/plant/instruments/tape", Math.nextUp(MOST),
                () -> Instruments.standard().with(Instrument.TAPE, Math.nextUp(MOST)));
        refused("/plant/instruments/tape", Double.NaN, () -> new Instruments(Map.of(Instrument.TAPE, Double.NaN)));
    }

    @Test
    void aReadingIsAnEstimateOfItsValue() {
        assertEquals(new Estimate(2, 0.1), new Reading("/x", 2, 0.1).estimate());
        assertEquals(new Reading("/x", 2, 0), Reading.exact("/x", 2));
    }

    /** A share of the value is taken of its size, so that a falling slope is no less uncertain than a rising one. */
    @Test
    void aRelativeSpreadIsAShareOfTheSizeOfTheValue() {
        Instruments standard = Instruments.standard();
        assertEquals(0.02 * 300, standard.reading("/x", -300, Instrument.BELT_SCALE).standardUncertainty(), 1e-12);
        assertEquals(0.02 * 300, standard.reading("/x", 300, Instrument.BELT_SCALE).standardUncertainty(), 1e-12);
        assertEquals(0.005, standard.reading("/x", -300, Instrument.TAPE).standardUncertainty());
    }

    /** What was refused is told by its code, its place and its numbers, for sentences in any language. */
    @Test
    void aRefusalNamesCodePlaceAndNumbers() {
        ImpossibleReading refusal = new ImpossibleReading("reading-out-of-range", "/readings/beltSpeed", "2.0", "0.0");
        assertEquals("reading-out-of-range", refusal.code());
        assertEquals("/readings/beltSpeed", refusal.readingName());
        assertEquals(List.of("2.0", "0.0"), refusal.arguments());
        assertEquals("reading-out-of-range at /readings/beltSpeed [2.0, 0.0]", refusal.getMessage());
    }

    private static void refused(String name, double value, Executable attempt) {
        ImpossibleReading refusal = assertThrows(ImpossibleReading.class, attempt);
        assertEquals("uncertainty-impossible", refusal.code());
        assertEquals(name, refusal.readingName());
        assertEquals(List.of(Double.toString(value)), refusal.arguments());
    }
}
