package bedmark.quantity;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.math.BigDecimal;
import java.math.BigInteger;
import java.math.MathContext;
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

    /** Multiplied or divided, a number comes to the same bits as by the fraction that the factor is. */
    @ParameterizedTest
    @CsvSource({
        "cm, 1, 100", "mm, 1, 1000", "[in_i], 254, 10000", "[ft_i]/min, 3048, 600000", "kW, 1000, 1",
        "t/h, 1000, 3600", "[lbf_av]/[ft_i], 44482216152605, 3048000000000", "1/min, 1, 60"
    })
    void aNumberIsRoundedAsItsFractionIs(String code, long numerator, long denominator) {
        Unit unit = Unit.ofCode(code).orElseThrow();
        Random random = new Random(20261202);
        for (int i = 0; i < 2000; i++) {
            BigDecimal number = new BigDecimal(new BigInteger(random.nextInt(110) + 1, random), random.nextInt(12));
            BigDecimal fraction = number.multiply(BigDecimal.valueOf(numerator))
                    .divide(BigDecimal.valueOf(denominator), MathContext.DECIMAL128);
            assertEquals(Double.parseDouble(fraction.toString()), unit.toSi(number), 0.0);
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
