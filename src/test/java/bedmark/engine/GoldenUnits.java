package bedmark.engine;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Map;

/** Numbers with units as golden files write them, such as {@code 9.50 [in_i]}; factors of NIST SP 811, appendix B.8. */
final class GoldenUnits {
    private static final Map<String, String> FACTORS = Map.ofEntries(
            Map.entry("1", "1"), Map.entry("m", "1"), Map.entry("mm", "0.001"), Map.entry("[ft_i]", "0.3048"),
            Map.entry("[in_i]", "0.0254"), Map.entry("m/s", "1"), Map.entry("[ft_i]/min", "0.00508"),
            Map.entry("kg/s", "1"), Map.entry("t/h", "1000/3600"), Map.entry("[ston_av]/h", "907.18474/3600"),
            Map.entry("kg/m3", "1"), Map.entry("[lb_av]/[cft_i]", "0.45359237/0.028316846592"),
            Map.entry("W", "1"), Map.entry("kW", "1000"), Map.entry("[HP]", "745.69987158227022"),
            Map.entry("rad", "1"), Map.entry("deg", "3.14159265358979323846264338327950288/180"),
            Map.entry("%", "0.01"), Map.entry("N", "1"), Map.entry("[lbf_av]", "4.4482216152605"),
            Map.entry("N/m", "1"), Map.entry("[lbf_av]/[ft_i]", "4.4482216152605/0.3048"), Map.entry("m2", "1"),
            Map.entry("[sft_i]", "0.09290304"), Map.entry("m3/s", "1"), Map.entry("[cft_i]/h", "0.028316846592/3600"),
            Map.entry("m3", "1"), Map.entry("kg/m", "1"), Map.entry("h", "1"), Map.entry("s", "1"),
            Map.entry("1/min", "1/60"), Map.entry("Wh", "1"), Map.entry("kWh", "1000"));

    private GoldenUnits() {
    }

    /** The number in SI, correctly rounded once. */
    static double si(String text) {
        String[] parts = text.split(" ");
        if (parts.length != 2 || !FACTORS.containsKey(parts[1])) {
            throw new IllegalArgumentException("no number with a known unit: " + text);
        }
        String[] factor = FACTORS.get(parts[1]).split("/");
        BigDecimal number = new BigDecimal(parts[0]).multiply(new BigDecimal(factor[0]));
        return factor.length == 1 ? number.doubleValue()
                : number.divide(new BigDecimal(factor[1]), MathContext.DECIMAL128).doubleValue();
    }
}
