package bedmark.office.trend;

import bedmark.engine.Assessment;
import bedmark.engine.Result;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Rule;
import bedmark.quantity.Quantity;
import bedmark.survey.Survey;
import java.util.Optional;
import java.util.OptionalDouble;

/** What is followed over time. */
public enum Measure {
    /** Root mean square depth at the board (m). */
    DEPTH("depth"),
    /** Drag of material and seals (N). */
    DRAG("drag"),
    /** Power of the skirts at the belt (W). */
    POWER("power"),
    /** Length of seal that is not sound, as a share of all of it. */
    SEALS("seals");

    private final String code;

    Measure(String code) {
        this.code = code;
    }

    public String code() {
        return code;
    }

    /** Where values of this measure would be limited, in its own unit. */
    record Limits(OptionalDouble near, OptionalDouble overloaded) {
        static final Limits NONE = new Limits(OptionalDouble.empty(), OptionalDouble.empty());
    }

    /** The value with its standard uncertainty, where the survey tells it. */
    Optional<Estimate> of(Survey survey, Assessment assessment) {
        return switch (this) {
            case DEPTH -> assessment.get(Result.MEAN_SQUARE_DEPTH).map(square -> {
                double root = Math.sqrt(Math.max(0, square.value()));
                return new Estimate(root, root > 0 ? square.standardUncertainty() / (2 * root) : 0);
            });
            case DRAG -> assessment.get(Result.SKIRT_DRAG);
            case POWER -> assessment.get(Result.SKIRT_POWER);
            case SEALS -> unsound(survey);
        };
    }

    private static Optional<Estimate> unsound(Survey survey) {
        double all = 0;
        double bad = 0;
        for (var seal : survey.readings().branches("seals")) {
            double length = seal.quantity("length").map(Quantity::si).orElse(0.0);
            boolean none = seal.text("type").filter("none"::equals).isPresent();
            all += none ? 0 : length;
            bad += none || seal.text("condition").filter("sound"::equals).isPresent() ? 0 : length;
        }
        return all > 0 ? Optional.of(new Estimate(bad / all, 0)) : Optional.empty();
    }

    /** The limits that the assessment was judged by. */
    Limits limits(Assessment assessment) {
        return switch (this) {
            case DEPTH -> scaled(assessment, Rule.BED_OVER_DESIGN,
                    assessment.get(Result.REFERENCE_DEPTH).map(Estimate::value));
            case POWER -> assessment.findings().stream().filter(one -> one.rule() == Rule.SKIRTS_OVER_BUDGET)
                    .filter(one -> alone(one, assessment)).findFirst().map(one -> scaled(assessment,
                            Rule.SKIRTS_OVER_BUDGET, assessment.get(Result.SKIRT_POWER).map(power ->
                                    power.value() / one.observed()))).orElse(Limits.NONE);
            case SEALS, DRAG -> Limits.NONE;
        };
    }

    /** Where a conveyor has other zones, no power of this one alone says when its budget is used up. */
    private static boolean alone(Finding finding, Assessment assessment) {
        return finding.observed() > 0 && assessment.get(Result.DRIVE_SHARE).filter(share ->
                Math.abs(share.value() - finding.observed()) < 1e-9 * share.value()).isPresent();
    }

    private static Limits scaled(Assessment assessment, Rule rule, Optional<Double> unit) {
        Optional<Finding> finding = assessment.findings().stream().filter(one -> one.rule() == rule).findFirst();
        return finding.isEmpty() || unit.isEmpty() ? Limits.NONE
                : new Limits(scaled(finding.get().near(), unit.get()), scaled(finding.get().overloaded(), unit.get()));
    }

    private static OptionalDouble scaled(OptionalDouble limit, double unit) {
        return limit.isPresent() ? OptionalDouble.of(limit.getAsDouble() * unit) : OptionalDouble.empty();
    }
}
