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
    /** The tape of exact numbers: nothing is ever noted on it. */
    static final Tape NONE = new Tape(0);

    private int[] operands;
    private double[] partials;
    private double[] adjoints = {};
    private int length;
    private final List<Reading> readings = new ArrayList<>();
    private int[] readingPlaces = new int[32];

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
        if (readings.size() == readingPlaces.length) {
            readingPlaces = Arrays.copyOf(readingPlaces, 2 * readingPlaces.length);
        }
        readingPlaces[readings.size()] = length;
        readings.add(reading);
        return new Uncertain(reading.value(), this, append(NOWHERE, 0, NOWHERE, 0));
    }

    /** The result of an operation with two operands. */
    static Uncertain note(double value, Uncertain a, double byA, Uncertain b, double byB) {
        Tape tape = a.tape == NONE ? b.tape : a.tape;
        if (tape == NONE) {
            return Uncertain.exact(value);
        }
        if (b.tape != tape && b.tape != NONE) {
            throw new IllegalArgumentException("numbers of two computations do not mix");
        }
        return new Uncertain(value, tape, tape.append(a.place, byA, b.place, byB));
    }

    /** The result of an operation with one operand. */
    static Uncertain note(double value, Uncertain a, double byA) {
        return a.tape == NONE ? Uncertain.exact(value)
                : new Uncertain(value, a.tape, a.tape.append(a.place, byA, NOWHERE, 0));
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
        if (number.tape == NONE) {
            return new Estimate(number.value(), 0);
        }
        runBack(number);
        double variance = 0;
        for (int i = 0; i < readings.size(); i++) {
            variance += variance(i, number.place);
        }
        return new Estimate(number.value(), Math.sqrt(variance));
    }

    /** The derivatives of the number by the readings that it depends on. */
    public List<Sensitivity> sensitivities(Uncertain number) {
        List<Sensitivity> found = new ArrayList<>();
        if (number.tape != NONE) {
            runBack(number);
            for (int i = 0; i < readings.size() && readingPlaces[i] <= number.place; i++) {
                if (adjoints[readingPlaces[i]] != 0) {
                    found.add(new Sensitivity(readings.get(i), adjoints[readingPlaces[i]]));
                }
            }
        }
        return found;
    }

    /** The share of each reading in the variance of the number, the greatest first; none for an exact number. */
    public List<Share> shares(Uncertain number) {
        List<Sensitivity> sensitivities = sensitivities(number);
        double variance = sensitivities.stream().mapToDouble(Sensitivity::variance).sum();
        return variance == 0 ? List.of() : sensitivities.stream()
                .map(sensitivity -> new Share(sensitivity.reading().name(), sensitivity.variance() / variance))
                .sorted(Comparator.comparingDouble(Share::share).reversed())
                .toList();
    }

    /** The reading, among those whose names begin so, that brings the most variance into the number. */
    public Optional<String> leading(Uncertain number, String beginning) {
        if (number.tape == NONE) {
            return Optional.empty();
        }
        runBack(number);
        double most = 0;
        Optional<String> leading = Optional.empty();
        for (int i = 0; i < readings.size(); i++) {
            double variance = variance(i, number.place);
            if (variance > most && readings.get(i).name().startsWith(beginning)) {
                most = variance;
                leading = Optional.of(readings.get(i).name());
            }
        }
        return leading;
    }

    private double variance(int reading, int resultPlace) {
        if (readingPlaces[reading] > resultPlace) {
            return 0;
        }
        double part = adjoints[readingPlaces[reading]] * readings.get(reading).standardUncertainty();
        return part * part;
    }

    private void runBack(Uncertain number) {
        if (number.tape != this) {
            throw new IllegalArgumentException("a number of another computation");
        }
        if (adjoints.length < length) {
            adjoints = new double[operands.length / 2];
        }
        Arrays.fill(adjoints, 0, number.place, 0);
        adjoints[number.place] = 1;
        for (int place = number.place; place >= 0; place--) {
            double adjoint = adjoints[place];
            if (adjoint != 0) {
                pass(2 * place, adjoint);
                pass(2 * place + 1, adjoint);
            }
        }
    }

    private void pass(int at, double adjoint) {
        int operand = operands[at];
        if (operand >= 0) {
            adjoints[operand] += adjoint * partials[at];
        }
    }
}
