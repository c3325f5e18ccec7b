package bedmark.engine.verdict;

import bedmark.engine.uncertainty.ImpossibleReading;

/**
 * How sure a verdict must be, as probabilities.
 *
 * @param overloaded from this probability of exceeding its overloaded limit a rule is overloaded
 * @param undecided  from this probability up to {@code overloaded} it is undecided
 * @param near       from this probability of exceeding its near limit it is near
 */
public record Certainty(double overloaded, double undecided, double near) {

    /** @throws ImpossibleReading {@code certainty-impossible} where one is 0, over 1, or undecided over overloaded */
    public Certainty {
        if (!(undecided > 0 && undecided <= overloaded && overloaded <= 1 && near > 0 && near <= 1)) {
            throw new ImpossibleReading("certainty-impossible", "/plant/limits/certainty",
                    Double.toString(overloaded), Double.toString(undecided), Double.toString(near));
        }
    }

    /** 90 %, 10 %, 50 %. */
    public static Certainty standard() {
        return new Certainty(0.9, 0.1, 0.5);
    }
}
