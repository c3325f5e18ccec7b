package bedmark.engine;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Function;

/**
 * The engineering page once more, in decimals of 60 digits, written from the page alone: it shares no class and no
 * constant with the engine. Its standard uncertainties come from differences of the whole computation.
 */
final class DecimalReference {
    private static final MathContext MC = new MathContext(60);
    private static final BigDecimal TWO = dec("2");
    private static final BigDecimal THREE = dec("3");
    private static final BigDecimal GRAVITY = dec("9.80665");
    private static final BigDecimal POUND_FORCE = dec("4.4482216152605");
    private static final BigDecimal FOOT = dec("0.3048");
    private static final BigDecimal INCH = dec("0.0254");
    private static final BigDecimal STEP = dec("1e-20");

    /** A station or seal segment with the keys of its numbers. */
    record Row(String first, String second, String kind) {
    }

    private final Map<String, BigDecimal> numbers;
    private final List<Row> stations;
    private final List<Row> seals;
    private final Map<BigDecimal, BigDecimal> sines = new HashMap<>();
    private final Map<BigDecimal, BigDecimal> cosines = new HashMap<>();

    /**
     * @param numbers  every number in SI by its JSON Pointer, besides {@code rate}, {@code mu1}, {@code mu2}
     * @param stations position, depth and method
     * @param seals    length, and whether it touches
     */
    DecimalReference(Map<String, BigDecimal> numbers, List<Row> stations, List<Row> seals) {
        this.numbers = numbers;
        this.stations = stations;
        this.seals = seals;
    }

    Map<String, BigDecimal> results() {
        Map<String, BigDecimal> out = new HashMap<>();
        BigDecimal length = number("/readings/loadingZoneLength");
        BigDecimal spacing = number("/readings/skirtSpacing");
        BigDecimal speed = number("/readings/beltSpeed");
        BigDecimal density = number("/material/bulkDensity");
        BigDecimal carried = carried(spacing);
        List<BigDecimal> levels = new ArrayList<>();
        List<BigDecimal> places = new ArrayList<>();
        for (Row station : stations) {
            places.add(number(station.first()));
            levels.add(level(spacing, carried, number(station.second()), station.kind()));
        }
        BigDecimal square = square(length, places, levels);
        BigDecimal area = add(carried, mul(spacing, div(mean(length, places, levels), length)));
        BigDecimal implied = mul(density, mul(speed, area));
        BigDecimal flow = numbers.getOrDefault("/readings/throughput", implied);
        out.put("meanSquareDepthM2", div(square, length));
        out.put("bedAreaM2", area);
        out.put("impliedThroughputKgPerS", implied);
        out.put("tabulated", mul(number("/material/skirtFrictionFactor"),
                mul(square, div(POUND_FORCE, mul(FOOT, mul(INCH, INCH))))));
        out.put("site", mul(number("/plant/siteFactor"), mul(square, div(POUND_FORCE, mul(FOOT, mul(INCH, INCH))))));
        BigDecimal sine = sin(number("/material/angleOfRepose"));
        out.put("rankine", mul(number("/material/wallFriction"), mul(div(sub(BigDecimal.ONE, sine),
                add(BigDecimal.ONE, sine)), mul(density, mul(GRAVITY, square)))));
        out.put("iso-5048", special(flow, density, speed, spacing, length));
        BigDecimal seal = BigDecimal.ZERO;
        for (Row row : seals) {
            seal = row.kind().equals("touches") ? add(seal, mul(number("rate"), number(row.first()))) : seal;
        }
        out.put("sealDragN", seal);
        BigDecimal skirt = add(out.get("tabulated"), seal);
        out.put("skirtDragN", skirt);
        out.put("skirtPowerW", mul(skirt, speed));
        out.put("drivePowerW", div(mul(skirt, speed), number("/conveyor/driveEfficiency")));
        out.put("energyWhPerYear", mul(div(out.get("drivePowerW"), number("/conveyor/motorEfficiency")),
                number("/conveyor/loadedHoursPerYear")));
        out.put("loadingForceN", mul(flow, sub(speed, number("/transfer/feedVelocity"))));
        out.put("fill", div(flow, mul(density, mul(speed, openBelt()))));
        BigDecimal registered = number("/transfer/skirtSpacing");
        BigDecimal designArea = div(number("/transfer/designThroughput"),
                mul(density, number("/conveyor/designSpeed")));
        out.put("designDepthM", div(sub(designArea, carried(registered)), registered).max(BigDecimal.ZERO));
        return out;
    }

    /** Standard uncertainties of all results, from the standard uncertainties of the numbers. */
    Map<String, Double> uncertainties(Map<String, Double> ofNumbers) {
        Map<String, BigDecimal> variances = new HashMap<>();
        ofNumbers.forEach((name, uncertainty) -> {
            Map<String, BigDecimal> over = moved(name, STEP);
            moved(name, STEP.negate()).forEach((result, under) -> {
                BigDecimal part = mul(div(sub(over.get(result), under), mul(TWO, STEP)), new BigDecimal(uncertainty));
                variances.merge(result, mul(part, part), DecimalReference::add);
            });
        });
        Map<String, Double> uncertainties = new HashMap<>();
        variances.forEach((result, variance) -> uncertainties.put(result, variance.sqrt(MC).doubleValue()));
        return uncertainties;
    }

    private Map<String, BigDecimal> moved(String name, BigDecimal step) {
        Map<String, BigDecimal> changed = new HashMap<>(numbers);
        changed.merge(name, step, DecimalReference::add);
        return new DecimalReference(changed, stations, seals).results();
    }

    private BigDecimal number(String name) {
        return numbers.get(name);
    }

    private BigDecimal run(BigDecimal spacing) {
        return div(sub(spacing, centreRoll()), mul(TWO, cos(trough()))).max(BigDecimal.ZERO);
    }

    private BigDecimal centreRoll() {
        return number("/conveyor/centreRollLength");
    }

    private BigDecimal trough() {
        return number("/conveyor/troughAngle");
    }

    private BigDecimal slope() {
        BigDecimal angle = number("/material/surchargeAngle");
        return div(sin(angle), cos(angle));
    }

    private BigDecimal troughArea(BigDecimal run) {
        return mul(add(centreRoll(), mul(run, cos(trough()))), mul(run, sin(trough())));
    }

    private BigDecimal crownArea(BigDecimal width) {
        return div(mul(mul(width, width), slope()), dec("6"));
    }

    private BigDecimal carried(BigDecimal spacing) {
        return add(troughArea(run(spacing)), crownArea(spacing));
    }

    /** Depth at the board; negative by the area that is lacking, where the surface lies below the board line. */
    private BigDecimal level(BigDecimal spacing, BigDecimal carried, BigDecimal raw, String method) {
        BigDecimal drop = mul(run(spacing), sin(trough()));
        BigDecimal rise = div(mul(spacing, slope()), dec("4"));
        BigDecimal depth = switch (method) {
            case "from-board-top" -> sub(number("/readings/skirtHeight"), raw);
            case "at-centre" -> sub(sub(raw, drop), rise);
            default -> raw;
        };
        if (depth.signum() >= 0) {
            return depth;
        }
        BigDecimal narrow = centreRoll().min(spacing);
        BigDecimal edge = method.equals("at-centre")
                ? div(sub(raw, div(mul(centreRoll(), slope()), dec("4"))),
                        add(sin(trough()), div(mul(cos(trough()), slope()), TWO)))
                : add(run(spacing), div(depth, sin(trough())));
        BigDecimal area;
        if (edge.signum() >= 0) {
            area = add(troughArea(edge), crownArea(add(centreRoll(), mul(TWO, mul(edge, cos(trough()))))));
        } else {
            BigDecimal centre = method.equals("at-centre") ? raw
                    : add(div(mul(narrow, slope()), dec("4")), add(depth, drop));
            area = centre.signum() <= 0 ? BigDecimal.ZERO : crownArea(div(mul(dec("4"), centre), slope()));
        }
        return div(sub(area, carried), spacing);
    }

    private static BigDecimal square(BigDecimal length, List<BigDecimal> places, List<BigDecimal> levels) {
        return integral(length, places, levels, pair -> {
            BigDecimal a = pair.get(0);
            BigDecimal b = pair.get(1);
            if (a.signum() >= 0 && b.signum() >= 0) {
                return div(add(add(mul(a, a), mul(a, b)), mul(b, b)), THREE);
            }
            BigDecimal top = a.max(b).max(BigDecimal.ZERO);
            return top.signum() == 0 ? top : div(mul(top, mul(top, top)), mul(THREE, sub(top, a.min(b))));
        });
    }

    private static BigDecimal mean(BigDecimal length, List<BigDecimal> places, List<BigDecimal> levels) {
        return integral(length, places, levels, pair -> div(add(pair.get(0), pair.get(1)), TWO));
    }

    private static BigDecimal integral(BigDecimal length, List<BigDecimal> places, List<BigDecimal> levels,
            Function<List<BigDecimal>, BigDecimal> mean) {
        int last = places.size() - 1;
        BigDecimal sum = mul(places.get(0), mean.apply(List.of(levels.get(0), levels.get(0))));
        for (int i = 0; i < last; i++) {
            sum = add(sum, mul(sub(places.get(i + 1), places.get(i)),
                    mean.apply(List.of(levels.get(i), levels.get(i + 1)))));
        }
        return add(sum, mul(sub(length, places.get(last)), mean.apply(List.of(levels.get(last), levels.get(last)))));
    }

    private BigDecimal special(BigDecimal flow, BigDecimal density, BigDecimal speed, BigDecimal spacing,
            BigDecimal length) {
        BigDecimal feed = number("/transfer/feedVelocity");
        BigDecimal incline = number("/conveyor/incline");
        BigDecimal acceleration = div(sub(mul(speed, speed), mul(feed, feed)), mul(mul(TWO, GRAVITY),
                sub(mul(number("mu1"), cos(incline)), sin(incline))));
        BigDecimal within = acceleration.max(BigDecimal.ZERO).min(length);
        BigDecimal volume = div(flow, density);
        BigDecimal common = div(mul(number("mu2"), mul(mul(volume, volume), mul(density, GRAVITY))),
                mul(spacing, spacing));
        BigDecimal mean = div(add(speed, feed), TWO);
        return mul(common, add(div(within, mul(mean, mean)), div(sub(length, within), mul(speed, speed))));
    }

    private BigDecimal openBelt() {
        BigDecimal belt = number("/conveyor/beltWidth");
        BigDecimal usable = belt.compareTo(TWO) <= 0 ? sub(mul(dec("0.9"), belt), dec("0.05"))
                : sub(belt, dec("0.25"));
        BigDecimal wings = sub(usable, centreRoll());
        BigDecimal top = add(centreRoll(), mul(wings, cos(trough())));
        BigDecimal wing = div(wings, TWO);
        return add(crownArea(top), mul(add(centreRoll(), mul(wing, cos(trough()))), mul(wing, sin(trough()))));
    }

    private BigDecimal sin(BigDecimal x) {
        return sines.computeIfAbsent(x, angle -> series(angle, angle, 1));
    }

    private BigDecimal cos(BigDecimal x) {
        return cosines.computeIfAbsent(x, angle -> series(angle, BigDecimal.ONE, 0));
    }

    /** The power series of sine or cosine, by its first term and the power of that. */
    private static BigDecimal series(BigDecimal x, BigDecimal first, int power) {
        BigDecimal square = mul(x, x);
        BigDecimal term = first;
        BigDecimal sum = first;
        for (long n = power + 1; n < 80; n += 2) {
            term = div(mul(term, square), BigDecimal.valueOf(n * (n + 1))).negate();
            sum = add(sum, term);
        }
        return sum;
    }

    private static BigDecimal dec(String text) {
        return new BigDecimal(text);
    }

    private static BigDecimal add(BigDecimal a, BigDecimal b) {
        return a.add(b, MC);
    }

    private static BigDecimal sub(BigDecimal a, BigDecimal b) {
        return a.subtract(b, MC);
    }

    private static BigDecimal mul(BigDecimal a, BigDecimal b) {
        return a.multiply(b, MC);
    }

    private static BigDecimal div(BigDecimal a, BigDecimal b) {
        return a.divide(b, MC);
    }
}
