package bedmark.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.Assessment;
import bedmark.engine.Result;
import bedmark.engine.drag.DragMethod;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Map;
import java.util.Random;
import org.junit.jupiter.api.Test;

/**
 * The same zone, written once in customary and once in SI units, is the same zone: over random surveys with their
 * registers, from the documents on. The factors are those of NIST SP 811, written here anew.
 */
class UnitInvarianceTest {
    private static final int ZONES = Integer.getInteger("bedmark.zones", 10_000);
    private static final double EXACT = 1e-12;
    /** Customary unit, SI unit, and how many of the second make one of the first. */
    private static final Map<String, String[]> FACTORS = Map.of(
            "[ft_i]", new String[] {"m", "0.3048", "1"}, "[in_i]", new String[] {"mm", "25.4", "1"},
            "[ft_i]/min", new String[] {"m/s", "0.00508", "1"}, "[ston_av]/h", new String[] {"t/h", "0.90718474", "1"},
            "[lb_av]/[cft_i]", new String[] {"kg/m3", "0.45359237", "0.028316846592"},
            "[HP]", new String[] {"kW", "0.74569987158227022", "1"});

    private Random random;
    private boolean metric;

    @Test
    void customaryAndSiUnitsOfTheSameZoneAgree() {
        int judged = 0;
        for (int seed = 0; seed < ZONES; seed++) {
            Assessment us = assess(seed, false);
            Assessment si = assess(seed, true);
            assertEquals(us.results().keySet(), si.results().keySet());
            for (Result result : us.results().keySet()) {
                close(result.key() + " " + seed, us.get(result).orElseThrow().value(),
                        si.get(result).orElseThrow().value());
                close("u of " + result.key() + " " + seed, us.get(result).orElseThrow().standardUncertainty(),
                        si.get(result).orElseThrow().standardUncertainty());
            }
            for (DragMethod method : us.methods().keySet()) {
                close(method.code(), us.methods().get(method).value(), si.methods().get(method).value());
            }
            assertEquals(us.findings().size(), si.findings().size());
            for (int i = 0; i < us.findings().size(); i++) {
                assertEquals(us.findings().get(i).rule(), si.findings().get(i).rule());
                close(us.findings().get(i).code(), us.findings().get(i).observed(), si.findings().get(i).observed());
                judged++;
            }
        }
        assertTrue(judged > 8 * ZONES, judged + " findings");
    }

    private Assessment assess(int seed, boolean inSi) {
        random = new Random(seed);
        metric = inSi;
        Register register = new Register(Plants.read("{'materials':[{'id':'m','skirtFrictionFactor':"
                + decimal(0.01, 0.28) + ",'bulkDensity':" + quantity(20, 180, "[lb_av]/[cft_i]")
                + ",'angleOfRepose':{'value':" + decimal(25, 45) + ",'unit':'deg'},'surchargeAngle':{'value':"
                + decimal(5, 30) + ",'unit':'deg'}}],'conveyors':[{'id':'c','beltWidth':" + quantity(40, 60, "[in_i]")
                + ",'troughAngle':{'value':" + decimal(20, 45) + ",'unit':'deg'},'centreRollLength':"
                + quantity(14, 20, "[in_i]") + ",'incline':{'value':" + decimal(0, 12) + ",'unit':'deg'},'ratedPower':"
                + quantity(20, 200, "[HP]") + ",'driveEfficiency':" + decimal(0.8, 0.97) + ",'motorEfficiency':"
                + decimal(0.85, 0.96) + ",'loadedHoursPerYear':" + decimal(500, 8000) + ",'designSpeed':"
                + quantity(200, 700, "[ft_i]/min") + "}],'transfers':[{'id':'t','conveyor':'c','material':'m',"
                + "'skirtSpacing':" + quantity(22, 28, "[in_i]") + ",'skirtHeight':" + quantity(8, 20, "[in_i]")
                + ",'designThroughput':" + quantity(400, 2000, "[ston_av]/h") + ",'feedVelocity':"
                + quantity(0, 190, "[ft_i]/min") + ",'impactLength':" + quantity(2, 6, "[ft_i]") + ",'lumpSize':"
                + quantity(1, 6, "[in_i]") + "}]}"));
        String side = quantity(12, 25, "[ft_i]");
        return new Assessor(register).assess(Plants.survey("t", "'loadingZoneLength':" + side + ",'beltSpeed':"
                + quantity(200, 700, "[ft_i]/min") + ",'depthMethod':'at-board','bedDepths':[{'position':"
                + quantity(1, 4, "[ft_i]") + ",'depth':" + quantity(1, 12, "[in_i]") + "},{'position':"
                + quantity(5, 11, "[ft_i]") + ",'depth':" + quantity(1, 12, "[in_i]") + "}],'seals':[{'side':'left',"
                + "'type':'vertical','condition':'sound','length':" + side + "},{'side':'right','type':'oblique',"
                + "'condition':'worn','length':" + side + "}],'throughput':" + quantity(200, 2000, "[ston_av]/h")
                + ",'runningPower':" + quantity(5, 150, "[HP]")), java.util.List.of());
    }

    private BigDecimal decimal(double low, double high) {
        return new BigDecimal(low + (high - low) * random.nextDouble()).setScale(4, RoundingMode.HALF_EVEN);
    }

    private String quantity(double low, double high, String unit) {
        BigDecimal number = decimal(low, high);
        String[] si = FACTORS.get(unit);
        return metric ? "{'value':" + number.multiply(new BigDecimal(si[1]))
                .divide(new BigDecimal(si[2]), MathContext.DECIMAL128).toPlainString() + ",'unit':'" + si[0] + "'}"
                : "{'value':" + number + ",'unit':'" + unit + "'}";
    }

    /** To 1e-12 of the number, or of 1 where it is a difference of numbers as great as that. */
    private static void close(String what, double expected, double actual) {
        assertEquals(expected, actual, EXACT * Math.max(1, Math.abs(expected)), what);
    }
}
