package bedmark.quantity;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.math.BigDecimal;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

class UnitTest {

    /** Factors of NIST SP 811, appendix B.8 and B.9; the horsepower is 550 ft·lbf/s. */
    @ParameterizedTest
    @CsvSource({
        "[in_i], 0.0254", "[ft_i], 0.3048", "mm, 0.001", "cm, 0.01", "[ft_i]/min, 0.00508",
        "[lbf_av], 4.4482216152605", "[HP], 745.69987158227022", "t/h, 0.27777777777777778",
        "[ston_av]/h, 0.25199576111111111", "[lb_av]/[cft_i], 16.018463373960138",
        "[lbf_av]/[ft_i], 14.593902937206364", "deg, 0.017453292519943296", "%, 0.01", "1/min, 0.016666666666666667"
    })
    void factorsAreThoseOfNistSp811(String code, String factor) {
        assertEquals(Double.parseDouble(factor), Unit.ofCode(code).orElseThrow().toSi(BigDecimal.ONE));
    }

    @ParameterizedTest
    @EnumSource(Unit.class)
    void thereAndBackIsTheSameNumber(Unit unit) {
        Random random = new Random(20260301);
        for (int i = 0; i < 200; i++) {
            BigDecimal number = BigDecimal.valueOf(random.nextInt(1_000_000) + 1, random.nextInt(6));
            double back = unit.fromSi(unit.toSi(number));
            assertEquals(number.doubleValue(), back, Math.abs(number.doubleValue()) * 1e-15 * 4);
        }
    }

    @Test
    void conversionBetweenUnitsIsExactWhereItCanBe() {
        assertEquals(0, new BigDecimal("241.3").compareTo(
                Unit.MILLIMETRE.convert(new BigDecimal("9.5"), Unit.INCH)));
    }

    @Test
    void dimensionsDoNotMix() {
        assertThrows(IllegalArgumentException.class, () -> Unit.METRE.convert(BigDecimal.ONE, Unit.SECOND));
    }
}
