package bedmark.engine;

import bedmark.engine.uncertainty.NormalDistribution;
import bedmark.engine.uncertainty.Sensitivity;
import bedmark.engine.verdict.Certainty;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Repeat;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Which reading of the walk would decide an undecided rule if it were taken again, and how good it must be [D]. The rule
 * is decided once its observed number lies z standard uncertainties from the limit, with z from the site's certainty;
 * of {@code u² = c² u(x)² + u'²} one reading can change its own part alone:
 *
 * <pre>u(x) ≤ √((|y − limit|/z)² − u'²)/|c|</pre>
 *
 * <p>Of those that can decide it, the one that must improve least is asked for; where none can, the one that brings most.
 */
final class Repetition {
    private static final String OF_THIS_WALK = "/readings/";

    private final Finding finding;
    private final double room;

    /** @param finding undecided, with a limit of overload */
    Repetition(Finding finding, Certainty certainty) {
        this.finding = finding;
        double limit = finding.overloaded().orElseThrow();
        boolean over = finding.probabilityOverloaded().orElseThrow() >= 0.5;
        double away = NormalDistribution.quantile(over ? certainty.overloaded() : 1 - certainty.undecided());
        room = Math.pow((finding.observed() - limit) / away, 2);
    }

    /** @param sensitivities of what the rule observes */
    Optional<Repeat> of(List<Sensitivity> sensitivities) {
        Optional<Repeat> best = Optional.empty();
        double least = 0;
        double most = 0;
        for (Sensitivity sensitivity : sensitivities) {
            if (sensitivity.reading().name().startsWith(OF_THIS_WALK)) {
                double others = Math.pow(finding.standardUncertainty(), 2) - sensitivity.variance();
                double needed = Math.sqrt(Math.max(0, room - Math.max(0, others)))
                        / Math.abs(sensitivity.derivative());
                double share = needed / sensitivity.reading().standardUncertainty();
                if (share > least || least == 0 && sensitivity.variance() > most) {
                    best = Optional.of(new Repeat(sensitivity.reading().name(), finding.rule(),
                            needed > 0 ? OptionalDouble.of(needed) : OptionalDouble.empty()));
                    least = share;
                    most = sensitivity.variance();
                }
            }
        }
        return best;
    }
}
