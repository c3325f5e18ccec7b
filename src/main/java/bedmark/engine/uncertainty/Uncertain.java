package bedmark.engine.uncertainty;

/**
 * A number that knows how it came out of readings: the one type on which every formula is written, so that its
 * uncertainty follows from the formula itself and cannot drift from it. Derivatives are exact, and correlation through
 * a shared reading is kept, such as the board's height below every depth that was taken from its top edge.
 *
 * <p>Each operation leaves its partial derivatives on the {@link Tape} of its operands; the gradient is read from
 * there when it is asked for. A number without readings behind it leaves nothing and costs nothing.
 */
public sealed class Uncertain permits Uncertain.Noted {
    /** Nothing. */
    public static final Uncertain ZERO = exact(0);
    /** One. */
    public static final Uncertain ONE = exact(1);

    private final double value;

    private Uncertain(double value) {
        this.value = value;
    }

    /** A number with readings behind it. */
    static final class Noted extends Uncertain {
        private final Tape tape;
        private final int place;

        Noted(double value, Tape tape, int place) {
            super(value);
            this.tape = tape;
            this.place = place;
        }

        @Override
        Tape tape() {
            return tape;
        }

        @Override
        int place() {
            return place;
        }
    }

    /** The tape on which it was noted. */
    Tape tape() {
        return Tape.NONE;
    }

    /** Its place on the tape; {@link Tape#NOWHERE} for an exact number. */
    int place() {
        return Tape.NOWHERE;
    }

    /** A number without uncertainty. */
    public static Uncertain exact(double value) {
        return new Uncertain(value);
    }

    /**
     * A formula of many numbers whose derivatives are written beside it.
     *
     * @param slopes derivatives of the value by each of the numbers
     */
    public static Uncertain composed(double value, Uncertain[] numbers, double[] slopes) {
        return Tape.note(value, numbers, slopes);
    }

    public double value() {
        return value;
    }

    /** Whether no uncertain reading is behind it. */
    public boolean isCertain() {
        return tape() == Tape.NONE;
    }

    /** The same value without uncertainty. */
    public Uncertain certain() {
        return isCertain() ? this : exact(value);
    }

    public Uncertain plus(Uncertain other) {
        return Tape.note(value + other.value, this, 1, other, 1);
    }

    public Uncertain minus(Uncertain other) {
        return Tape.note(value - other.value, this, 1, other, -1);
    }

    public Uncertain times(Uncertain other) {
        return Tape.note(value * other.value, this, other.value, other, value);
    }

    /** The quotient; the divisor is not 0. */
    public Uncertain over(Uncertain other) {
        double quotient = value / other.value;
        return Tape.note(quotient, this, 1 / other.value, other, -quotient / other.value);
    }

    public Uncertain plus(double number) {
        return Tape.note(value + number, this, 1);
    }

    public Uncertain minus(double number) {
        return plus(-number);
    }

    public Uncertain times(double factor) {
        return Tape.note(value * factor, this, factor);
    }

    /** The quotient; the divisor is not 0. */
    public Uncertain over(double divisor) {
        return Tape.note(value / divisor, this, 1 / divisor);
    }

    public Uncertain square() {
        return Tape.note(value * value, this, 2 * value);
    }

    /** The square root of what is not negative; at 0 its derivative is taken as 0, since there is none. */
    public Uncertain squareRoot() {
        double root = Math.sqrt(value);
        return Tape.note(root, this, root == 0 ? 0 : 0.5 / root);
    }

    public Uncertain sine() {
        return Tape.note(Math.sin(value), this, Math.cos(value));
    }

    public Uncertain cosine() {
        return Tape.note(Math.cos(value), this, -Math.sin(value));
    }

    public Uncertain tangent() {
        double tangent = Math.tan(value);
        return Tape.note(tangent, this, 1 + tangent * tangent);
    }

    /** The greater of the two, with its own derivatives; this one where they are equal. */
    public Uncertain max(Uncertain other) {
        return value >= other.value ? this : other;
    }

    /** The lesser of the two, with its own derivatives; this one where they are equal. */
    public Uncertain min(Uncertain other) {
        return value <= other.value ? this : other;
    }
}
