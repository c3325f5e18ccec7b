package bedmark.engine.working;

import java.util.List;
import java.util.Optional;

/**
 * How the numbers of one zone came about.
 *
 * @param inputs readings, registered numbers, the site's factors and constants that some step uses
 * @param steps  in the order in which an engineer would write them; every sign of a step is an input or the outcome of
 *               an earlier step
 */
public record Working(List<Input> inputs, List<Step> steps) {
    public Working {
        inputs = List.copyOf(inputs);
        steps = List.copyOf(steps);
    }

    /**
     * A number that nothing was computed for.
     *
     * @param standardUncertainty in the unit of the symbol, not negative
     */
    public record Input(Symbol symbol, double standardUncertainty) {
    }

    /** The step that gave a result, where it could be computed. */
    public Optional<Step> stepOf(String result) {
        return steps.stream().filter(step -> step.result().equals(result)).findFirst();
    }
}
