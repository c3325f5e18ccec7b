package bedmark.screen.theme;

import java.util.Objects;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Turns millimetres of the glass into logical pixels, so that a target is as large as a finger on every screen.
 *
 * @param dpi  logical pixels to the inch, positive
 * @param hand whose targets are laid out
 * @param text how large type is set
 */
public record Density(double dpi, Hand hand, TextSize text) {

    /** A 10.1-inch screen of 1280 × 800. */
    public static final double DEFAULT_DPI = 149;

    private static final double MM_PER_INCH = 25.4;
    private static final double GAP_MM = 0.85;
    private static final Pattern LENGTH = Pattern.compile("\\b(\\d+(?:\\.\\d+)?)mm\\b");
    private static final Pattern TYPE = Pattern.compile("(-fx-font-size:\\s*)(\\d+(?:\\.\\d+)?)mm\\b");
    private static final Pattern TARGET = Pattern.compile(
            "\\b(target-height|secondary-height|foot-height|entry-tall|entry-flat)\\b");

    public Density {
        if (!(dpi > 0)) {
            throw new IllegalArgumentException("a screen has a density");
        }
        Objects.requireNonNull(hand);
        Objects.requireNonNull(text);
    }

    /** Type of the standard size. */
    public Density(double dpi, Hand hand) {
        this(dpi, hand, TextSize.STANDARD);
    }

    public Density withText(TextSize size) {
        return new Density(dpi, hand, size);
    }

    /** The density of the default screen for a bare hand. */
    public static Density standard() {
        return new Density(DEFAULT_DPI, Hand.BARE);
    }

    /**
     * The density of a screen whose pixels the window system gathers into larger logical ones.
     *
     * @param physicalDpi pixels of the glass to the inch
     * @param outputScale pixels of the glass to a logical pixel
     */
    public static Density of(double physicalDpi, double outputScale, Hand hand) {
        return new Density(physicalDpi / outputScale, hand);
    }

    /** A length on the glass in whole logical pixels, never less than asked for. */
    public double mm(double millimetres) {
        return Math.ceil(millimetres * perMm() - 1e-6);
    }

    /** Logical pixels to the millimetre. */
    public double perMm() {
        return dpi / MM_PER_INCH;
    }

    /** Least height of a target, in logical pixels. */
    public double target() {
        return mm(hand.target());
    }

    /** Least height of a secondary target, in logical pixels. */
    public double secondary() {
        return mm(hand.secondary());
    }

    /** So many rows of targets with their gaps, and a pixel for rounding. */
    private double rows(int count) {
        return count * target() + (count - 1) * Math.ceil(GAP_MM * perMm()) + 1;
    }

    /**
     * A style sheet written out in pixels of this density: targets never less than asked for, all other millimetres
     * rounded, so that type and gaps stay as close as whole pixels allow.
     */
    String transcribe(String sheet) {
        String targets = TARGET.matcher(sheet).replaceAll(match -> Matcher.quoteReplacement(
                pixels(switch (match.group(1)) {
                    case "target-height" -> target();
                    case "secondary-height" -> secondary();
                    case "entry-tall" -> rows(4);
                    case "entry-flat" -> rows(3);
                    default -> mm(Hand.BARE.target());
                })));
        String typed = TYPE.matcher(targets).replaceAll(match -> Matcher.quoteReplacement(match.group(1)
                + pixels(Math.rint(Double.parseDouble(match.group(2)) * text.scale() * perMm()))));
        return LENGTH.matcher(typed).replaceAll(match ->
                Matcher.quoteReplacement(pixels(Math.rint(Double.parseDouble(match.group(1)) * perMm()))));
    }

    private static String pixels(double pixels) {
        return (long) pixels + "px";
    }
}
