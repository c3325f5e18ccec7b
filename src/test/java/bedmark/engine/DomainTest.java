package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertDoesNotThrow;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.uncertainty.ImpossibleReading;
import bedmark.engine.uncertainty.Reading;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

class DomainTest {
    private static final OptionalDouble NONE = OptionalDouble.empty();

    @Test
    void bothEndsOfARangeBelongToIt() {
        for (Domain domain : Domain.values()) {
            for (double end : new double[] {domain.lowest(), domain.highest()}) {
                assertTrue(domain.holds(end), domain::toString);
                assertDoesNotThrow(() -> domain.check(Reading.exact("/x", end)));
            }
            assertFalse(domain.holds(Math.nextDown(domain.lowest())), domain::toString);
            assertFalse(domain.holds(Math.nextUp(domain.highest())), domain::toString);
            assertFalse(domain.holds(Double.NaN), domain::toString);
            assertEquals(List.of("reading-out-of-range", Double.toString(Math.nextUp(domain.highest())),
                    Double.toString(domain.lowest()), Double.toString(domain.highest())),
                    refusal(domain, Math.nextUp(domain.highest())));
        }
    }

    /** What is divided by is nothing or at least 1e-9; nothing itself is fit only where it is not divided by. */
    @Test
    void betweenNothingAndTheLeastThereIsNoReading() {
        assertTrue(Domain.NOT_NEGATIVE.holds(0));
        assertTrue(Domain.NOT_NEGATIVE.holds(1e-9));
        assertFalse(Domain.NOT_NEGATIVE.holds(Math.nextDown(1e-9)));
        assertFalse(Domain.HOURS.holds(Double.MIN_VALUE));
        assertTrue(Domain.SLOPE.holds(Double.MIN_VALUE), "a slope is never divided by");
        assertEquals(List.of("reading-zero"), refusal(Domain.POSITIVE, 0));
        assertEquals(List.of("reading-zero"), refusal(Domain.EFFICIENCY, 0));
        assertEquals(List.of("reading-out-of-range", "1.0E-10", "1.0E-9", "1.0E9"), refusal(Domain.POSITIVE, 1e-10));
    }

    @Test
    void aNegativeReadingIsCalledSoWhereNoneCanBe() {
        assertEquals(List.of("reading-negative", "-1.0"), refusal(Domain.NOT_NEGATIVE, -1));
        assertEquals(List.of("reading-negative", "-1.0"), refusal(Domain.POSITIVE, -1));
        assertEquals("reading-out-of-range", refusal(Domain.SLOPE, -2).get(0));
        assertEquals("reading-out-of-range", refusal(Domain.ANY, -2e9).get(0));
    }

    private static List<String> refusal(Domain domain, double value) {
        ImpossibleReading refusal = assertThrows(ImpossibleReading.class,
                () -> domain.check(Reading.exact("/x", value)));
        assertEquals("/x", refusal.readingName());
        return Stream.concat(Stream.of(refusal.code()),
                refusal.arguments().stream()).toList();
    }

    @Test
    void pricesReachFromNothingToAMillion() {
        for (double price : new double[] {0, 1e6}) {
            OptionalDouble possible = OptionalDouble.of(price);
            assertEquals(possible, new Prices(possible, Optional.empty(), possible).co2());
        }
        for (double price : new double[] {-Double.MIN_VALUE, Math.nextUp(1e6), Double.NaN}) {
            OptionalDouble impossible = OptionalDouble.of(price);
            assertEquals("/plant/tariff/energy", assertThrows(ImpossibleReading.class,
                    () -> new Prices(impossible, Optional.empty(), NONE)).readingName());
            assertEquals("/plant/co2Factor", assertThrows(ImpossibleReading.class,
                    () -> new Prices(NONE, Optional.empty(), impossible)).readingName());
        }
    }

    @Test
    void trialsReachFromNoneToTheMost() {
        assertEquals(0, Conventions.standard().withTrials(0).trials());
        assertEquals(100_000, Conventions.standard().withTrials(Conventions.MOST_TRIALS).trials());
        for (int trials : new int[] {-1, 100_001}) {
            ImpossibleReading refusal = assertThrows(ImpossibleReading.class,
                    () -> Conventions.standard().withTrials(trials));
            assertEquals(List.of(Integer.toString(trials), "100000"), refusal.arguments());
        }
    }
}
