package bedmark.engine.uncertainty;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * The record of one computation: for each operation the places of its two operands and the partial derivatives by
 * them. Run backwards from a result it gives the result's derivative by every reading at once (reverse accumulation
 * of the chain rule, exact to rounding), and with it the first-order standard uncertainty of JCGM 100:2008, 5.1 [S10]:
 *
 * <pre>u² = Σ (∂f/∂xi)² u(xi)²</pre>
 *
 * <p>The readings themselves are taken as independent. A tape belongs to one computation in one thread; it is not part
 * of what the computation returns.
 */
public final class Tape {
    /** The place of a number that is on no tape. */
    static final int NOWHERE = -1;
    private static final String TWO_COMPUTATIONS = "numbers of two computations do not mix";
    /** What stands for the first reading that was taken; those after it count down from there. */
    private static final int FIRST = -2;
    /** The tape of exact numbers: nothing is ever noted on it. */
    static final Tape NONE = new Tape(0);

    /** Places of the operands, two for each operation; for a reading the first is {@code FIRST - its turn}. */
    private int[] operands;
    private double[] partials;
    private int length;
    private Reading[] readings = new Reading[48];
    private int taken;
    /** Derivatives by what is still to be passed on; all 0 between two runs. */
    private double[] adjoints = {};
    /** One bit for each place that is still to be passed on. */
    private long[] pending = {};
    /** Readings behind the number of the last run by their turn, and its derivatives by them. */
    private int[] behind = {};
    private double[] derivatives = {};
    private int found;

    /** @param expected about how many operations there will be; more are possible */
    public Tape(int expected) {
        operands = new int[2 * expected];
        partials = new double[2 * expected];
    }

    /**
     * A reading as a number of this computation. The same reading is taken once and then shared; a second one would be
     * another, independent reading.
     */
    public Uncertain take(Reading reading) {
        if (reading.standardUncertainty() == 0) {
            return Uncertain.exact(reading.value());
        }
        if (taken == readings.length) {
            readings = Arrays.copyOf(readings, 2 * taken);
        }
        readings[taken] = reading;
        return new Uncertain.Noted(reading.value(), this, append(FIRST - taken++, 0, NOWHERE, 0));
    }

    /** The result of an operation with two operands. */
    static Uncertain note(double value, Uncertain a, double byA, Uncertain b, double byB) {
        Tape tape = a.tape() == NONE ? b.tape() : a.tape();
        if (tape == NONE) {
            return Uncertain.exact(value);
        }
        if (b.tape() != tape && b.tape() != NONE) {
            throw new IllegalArgumentException(TWO_COMPUTATIONS);
        }
        return new Uncertain.Noted(value, tape, tape.append(a.place(), byA, b.place(), byB));
    }

    /** The result of an operation with one operand. */
    static Uncertain note(double value, Uncertain a, double byA) {
        return a.tape() == NONE ? Uncertain.exact(value)
                : new Uncertain.Noted(value, a.tape(), a.tape().append(a.place(), byA, NOWHERE, 0));
    }

    /** The result of an operation with many operands: a sum of what each brings, noted one after another. */
    static Uncertain note(double value, Uncertain[] numbers, double[] slopes) {
        Tape tape = NONE;
        int place = NOWHERE;
        for (int i = 0; i < numbers.length; i++) {
            if (numbers[i].tape() != NONE) {
                if (tape != NONE && numbers[i].tape() != tape) {
                    throw new IllegalArgumentException(TWO_COMPUTATIONS);
                }
                tape = numbers[i].tape();
                place = tape.append(place, 1, numbers[i].place(), slopes[i]);
            }
        }
        return tape == NONE ? Uncertain.exact(value) : new Uncertain.Noted(value, tape, place);
    }

    private int append(int a, double byA, int b, double byB) {
        int at = 2 * length;
        if (at == operands.length) {
            int capacity = Math.max(64, 2 * operands.length);
            operands = Arrays.copyOf(operands, capacity);
            partials = Arrays.copyOf(partials, capacity);
        }
        operands[at] = a;
        operands[at + 1] = b;
        partials[at] = byA;
        partials[at + 1] = byB;
        return length++;
    }

    /** The number with its standard uncertainty. */
    public Estimate estimate(Uncertain number) {
        runBack(number);
        return new Estimate(number.value(), Math.sqrt(variance()));
    }

    /**
     * The number with its standard uncertainty and with the reading that brings the most variance into it.
     *
     * @param beginning of the names of the readings that may lead
     */
    public Traced traced(Uncertain number, String beginning) {
        runBack(number);
        double most = 0;
        Optional<String> leading = Optional.empty();
        for (int i = found - 1; i >= 0; i--) {
            double part = variance(i);
            if (part > most && readings[behind[i]].name().startsWith(beginning)) {
                most = part;
                leading = Optional.of(readings[behind[i]].name());
            }
        }
        return new Traced(new Estimate(number.value(), Math.sqrt(variance())), leading);
    }

    /** The derivatives of the number by the readings that it depends on, in the order in which they were taken. */
    public List<Sensitivity> sensitivities(Uncertain number) {
        runBack(number);
        List<Sensitivity> sensitivities = new ArrayList<>(found);
        for (int i = found - 1; i >= 0; i--) {
            sensitivities.add(new Sensitivity(readings[behind[i]], derivatives[i]));
        }
        return sensitivities;
    }

    /** The share of each reading in the variance of the number, the greatest first; none for an exact number. */
    public List<Share> shares(Uncertain number) {
        runBack(number);
        double variance = variance();
        List<Share> shares = new ArrayList<>(found);
        for (int i = found - 1; i >= 0 && variance > 0; i--) {
            shares.add(new Share(readings[behind[i]].name(), variance(i) / variance));
        }
        shares.sort(Comparator.comparingDouble(Share::share).reversed());
        return shares;
    }

    private double variance() {
        double variance = 0;
        for (int i = found - 1; i >= 0; i--) {
            variance += variance(i);
        }
        return variance;
    }

    private double variance(int turn) {
        double part = derivatives[turn] * readings[behind[turn]].standardUncertainty();
        return part * part;
    }

    private void runBack(Uncertain number) {
        found = 0;
        if (number.tape() == NONE) {
            return;
        }
        if (number.tape() != this) {
            throw new IllegalArgumentException("a number of another computation");
        }
        if (adjoints.length < length) {
            adjoints = new double[operands.length / 2];
            pending = new long[adjoints.length / Long.SIZE + 1];
        }
        if (behind.length < taken) {
            behind = new int[readings.length];
            derivatives = new double[readings.length];
        }
        pass(number.place(), 1);
        for (int word = number.place() / Long.SIZE; word >= 0; word--) {
            while (pending[word] != 0) {
                int bit = Long.SIZE - 1 - Long.numberOfLeadingZeros(pending[word]);
                pending[word] &= ~(1L << bit);
                visit(word * Long.SIZE + bit);
            }
        }
    }

    private void visit(int place) {
        double adjoint = adjoints[place];
        adjoints[place] = 0;
        int first = operands[2 * place];
        if (first <= FIRST) {
            if (adjoint != 0) {
                behind[found] = FIRST - first;
                derivatives[found++] = adjoint;
            }
            return;
        }
        pass(first, adjoint * partials[2 * place]);
        pass(operands[2 * place + 1], adjoint * partials[2 * place + 1]);
    }

    private void pass(int operand, double adjoint) {
        if (operand != NOWHERE) {
            adjoints[operand] += adjoint;
            pending[operand / Long.SIZE] |= 1L << operand;
        }
    }
}
