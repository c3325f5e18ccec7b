package bedmark.engine.bed;

import bedmark.engine.working.Formula;
import java.util.ArrayList;
import java.util.List;
import java.util.function.BiFunction;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

/**
 * The integrals of a {@link Profile} as they are printed, written out for its stations by the rules of
 * {@link Segment}: {@code x1, h1} are position and level of the first station, and so on.
 */
public final class ProfileFormula {
    /** Depth by the freeboard. */
    public static final Formula OF_FREEBOARD = Formula.of("depth-of-freeboard", "h", "H − f", "D");

    private ProfileFormula() {
    }

    /** ∫h² dx. */
    public static Formula square(Profile bed) {
        return new Formula("integral-of-square", "J2",
                sum(bed, ProfileFormula::squareAt, ProfileFormula::meanSquare),
                "Σ Δx · (h² + h · h′ + h′²)/3", "D");
    }

    /** ∫h dx. */
    public static Formula depth(Profile bed) {
        return new Formula("integral-of-depth", "J1", sum(bed, ProfileFormula::depthAt, ProfileFormula::meanDepth),
                "Σ Δx · (h + h′)/2", "D");
    }

    /** Mean level, which counts a bed that lies below the boards. */
    public static Formula level(Profile bed) {
        return new Formula("mean-level", "hn", "(" + sum(bed, (here, station) -> here,
                (run, ends) -> run + " · (" + ends.from() + " + " + ends.to() + ")/2") + ")/L",
                "(Σ Δx · (h + h′)/2)/L", "D");
    }

    /** The greatest depth. */
    public static Formula deepest(Profile bed) {
        return Formula.of("deepest-depth", "hmax", "max(" + signs(bed) + (touches(bed) ? ")" : ", 0)"), "D");
    }

    /** Level where the last quarter of the zone begins. */
    public static Formula atLastQuarter(Profile bed) {
        int next = 0;
        double start = bed.length().value() * 0.75;
        while (next < bed.stations() && bed.position(next).value() < start) {
            next++;
        }
        String expression = next == 0 ? "h1" : next == bed.stations() ? "h" + next
                : "h%1$d + (0.75 · L − x%1$d)/(x%2$d − x%1$d) · (h%2$d − h%1$d)".formatted(next, next + 1);
        return Formula.of("level-at-last-quarter", "hq", expression, "D");
    }

    /** Greatest less least depth over the last quarter of the zone. */
    public static Formula changeOverLastQuarter(Profile bed) {
        double start = bed.length().times(0.75).value();
        String depths = IntStream.range(0, bed.stations()).filter(i -> bed.position(i).value() > start)
                .mapToObj(i -> touches(bed) ? ", h" + (i + 1) : ", max(h" + (i + 1) + ", 0)")
                .collect(Collectors.joining());
        String all = (touches(bed) ? "hq" : "max(hq, 0)") + depths;
        return Formula.of("change-over-last-quarter", "Δh", depths.isEmpty() ? all + " − " + all
                : "max(" + all + ") − min(" + all + ")", "D");
    }

    /** Whether the bed reaches the boards at every station. */
    public static boolean touches(Profile bed) {
        return IntStream.range(0, bed.stations()).allMatch(station -> touches(bed, station));
    }

    private static String signs(Profile bed) {
        return IntStream.range(0, bed.stations()).mapToObj(i -> "h" + (i + 1)).collect(Collectors.joining(", "));
    }

    /** The levels at the ends of a stretch: their signs, and whether the bed reaches the boards there. */
    private record Ends(String from, boolean fromTouches, String to, boolean toTouches) {
        String high() {
            return fromTouches ? from : to;
        }

        String low() {
            return fromTouches ? to : from;
        }
    }

    private static String sum(Profile bed, BiFunction<String, Boolean, String> constant,
            BiFunction<String, Ends, String> between) {
        List<String> terms = new ArrayList<>();
        int last = bed.stations() - 1;
        if (bed.position(0).value() > 0) {
            add(terms, "x1", constant.apply("h1", touches(bed, 0)));
        }
        for (int i = 1; i <= last; i++) {
            String run = "(x" + (i + 1) + " − x" + i + ")";
            terms.add(between.apply(run, new Ends("h" + i, touches(bed, i - 1), "h" + (i + 1), touches(bed, i))));
        }
        if (bed.length().value() != bed.position(last).value()) {
            add(terms, "(L − x" + (last + 1) + ")", constant.apply("h" + (last + 1), touches(bed, last)));
        }
        String sum = terms.stream().filter(term -> !term.isEmpty()).collect(Collectors.joining(" + "));
        return sum.isEmpty() ? "0" : sum;
    }

    private static void add(List<String> terms, String run, String mean) {
        if (!mean.isEmpty()) {
            terms.add(run + " · " + mean);
        }
    }

    private static boolean touches(Profile bed, int station) {
        return bed.level(station).value() >= 0;
    }

    private static String squareAt(String sign, boolean touches) {
        return touches ? sign + "²" : "";
    }

    private static String depthAt(String sign, boolean touches) {
        return touches ? sign : "";
    }

    private static String meanSquare(String run, Ends ends) {
        if (ends.fromTouches() && ends.toTouches()) {
            return run + " · (" + ends.from() + "² + " + ends.from() + " · " + ends.to() + " + " + ends.to() + "²)/3";
        }
        return ends.fromTouches() || ends.toTouches()
                ? run + " · " + ends.high() + "³/(3 · (" + ends.high() + " − " + ends.low() + "))" : "";
    }

    private static String meanDepth(String run, Ends ends) {
        if (ends.fromTouches() && ends.toTouches()) {
            return run + " · (" + ends.from() + " + " + ends.to() + ")/2";
        }
        return ends.fromTouches() || ends.toTouches()
                ? run + " · " + ends.high() + "²/(2 · (" + ends.high() + " − " + ends.low() + "))" : "";
    }
}
