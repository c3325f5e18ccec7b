package bedmark.quantity;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.util.Locale;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class QuantityFormatTest {
    private static final QuantityFormat ENGLISH = new QuantityFormat(Locale.UK);
    private static final QuantityFormat SPANISH = new QuantityFormat(Locale.forLanguageTag("es"));

    @ParameterizedTest
    @CsvSource({"9.50, 9.50, '9,50'", "1234, 1234, 1234", "12345.60, 12_345.60, '12_345,60'",
        "-1234567, −1_234_567, −1_234_567", "0.250, 0.250, '0,250'", "1E+5, 100_000, 100_000"})
    void enteredNumbersKeepEveryDigit(String number, String english, String spanish) {
        assertEquals(english.replace('_', '\u202F'), ENGLISH.exact(new BigDecimal(number)));
        assertEquals(spanish.replace('_', '\u202F'), SPANISH.exact(new BigDecimal(number)));
    }

    @ParameterizedTest
    @CsvSource({"0.1524, MILLIMETRE, 152", "0.00952, MILLIMETRE, 9.5", "0.2413, INCH, 9.50", "0.24, INCH, 9.45",
        "2.032, METRE_PER_SECOND, 2.03", "2.032, FOOT_PER_MINUTE, 400", "1917.6, KILOWATT, 1.92",
        "1917.6, HORSEPOWER, 2.57", "943.7, POUND_FORCE, 212", "333.333, TONNE_PER_HOUR, 1200",
        "0.2836, PERCENT, 28.4", "0.9996, PERCENT, 100", "12345.6, NEWTON, 12_346", "0, KILOWATT, 0",
        "-0.0000001, KILOWATT, 0.000", "-120.4, NEWTON, −120"})
    void computedNumbersGetWhatTheirUnitDeserves(double si, Unit unit, String shown) {
        assertEquals(shown.replace('_', '\u202F'), ENGLISH.computed(si, unit));
    }

    @Test
    void fractionsAreShownAsTheyWereTyped() {
        Quantity depth = Quantity.of("9.5", Unit.INCH).enteredAs("9 1/2");
        assertEquals("9 1/2", ENGLISH.entered(depth));
        assertEquals("9 1/2", ENGLISH.in(Unit.INCH, depth));
        assertEquals("241", ENGLISH.in(Unit.MILLIMETRE, depth));
    }

    @Test
    void unitFollowsItsNumber() {
        assertEquals("9.5\u00A0in", QuantityFormat.with("9.5", Unit.INCH, "in"));
        assertEquals("35°", QuantityFormat.with("35", Unit.DEGREE, "°"));
    }

    @Test
    void keysOfUnitsAreDifferentAndSafe() {
        var keys = Stream.of(Unit.values()).map(Unit::key).collect(Collectors.toSet());
        assertEquals(Unit.values().length, keys.size());
        assertTrue(keys.stream().allMatch(key -> key.matches("[A-Za-z0-9_-]+")), keys.toString());
        assertEquals("ft_i-per-min", Unit.FOOT_PER_MINUTE.key());
    }

    @Test
    void eachSystemShowsEveryDimensionInAUnitOfIt() {
        for (UnitSystem system : UnitSystem.values()) {
            for (Dimension dimension : Dimension.values()) {
                assertEquals(dimension, system.unit(dimension).dimension());
                assertEquals(dimension, Dimension.ofCode(dimension.code()).orElseThrow());
            }
            assertEquals(system, UnitSystem.ofCode(system.code()).orElseThrow());
        }
    }
}
