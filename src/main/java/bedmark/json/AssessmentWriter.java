package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.engine.Assessment;
import bedmark.engine.Assumption;
import bedmark.engine.ConveyorAssessment;
import bedmark.engine.MethodSpread;
import bedmark.engine.Result;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.Share;
import bedmark.engine.verdict.AllowedDepth;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Remedy;
import bedmark.engine.verdict.Repeat;
import bedmark.survey.Assessor.Assessed;
import bedmark.survey.Assessor.AssessedConveyor;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.function.Function;

/** Assessments as documents: SI, plain numbers, the unit in the key; what could not be computed is absent. */
public final class AssessmentWriter {

    /** The format of a list of assessments. */
    public static final String FORMAT = "bedmark.assessment";
    private static final int VERSION = 1;

    private AssessmentWriter() {
    }

    /**
     * The assessments of a bundle's surveys, in its order, and of the conveyors that they belong to.
     *
     * @param notice the caution in one sentence
     */
    public static Branch list(List<Assessed> assessed, List<AssessedConveyor> conveyors, String notice) {
        return Branch.EMPTY.with("format", FORMAT).with("version", Node.number(VERSION)).with("notice", notice)
                .with("surveys", series(assessed, one -> Branch.EMPTY
                        .with("id", one.survey().id().toString())
                        .with("revision", Node.number(one.survey().revision()))
                        .with("transfer", one.survey().transfer())
                        .with("assessment", write(one.assessment()))))
                .with("conveyors", series(conveyors, AssessmentWriter::conveyor));
    }

    /** One conveyor: its zones summed against its drive. */
    public static Branch conveyor(AssessedConveyor conveyor) {
        ConveyorAssessment whole = conveyor.assessment();
        Branch branch = Branch.EMPTY.with("conveyor", conveyor.conveyor());
        if (!conveyor.round().isEmpty()) {
            branch = branch.with("round", conveyor.round());
        }
        branch = branch.with("level", whole.level().code())
                .with("surveys", texts(conveyor.surveys().stream().map(survey -> survey.id().toString()).toList()))
                .with("zonesLacking", Node.number(whole.lacking()));
        Branch uncertainty = Branch.EMPTY;
        for (Map.Entry<Result, Estimate> sum : whole.sums().entrySet()) {
            branch = branch.with(sum.getKey().key(), number(sum.getValue().value()));
            uncertainty = uncertainty.with(sum.getKey().key(), number(sum.getValue().standardUncertainty()));
        }
        branch = branch.with("uncertainty", uncertainty);
        if (whole.leadingZone().isPresent()) {
            branch = branch.with("leadingZone",
                    conveyor.surveys().get(whole.leadingZone().getAsInt()).transfer());
        }
        if (whole.leading().isPresent()) {
            branch = branch.with("leading", whole.leading().get().code());
        }
        return branch.with("findings", series(whole.driveFindings(), AssessmentWriter::finding));
    }

    /** One assessment. */
    public static Branch write(Assessment assessment) {
        Branch branch = Branch.EMPTY.with("level", assessment.level().code());
        if (assessment.levelAtDesignFeed().isPresent()) {
            branch = branch.with("levelAtDesignFeed", assessment.levelAtDesignFeed().get().code());
        }
        if (assessment.method().isPresent()) {
            branch = branch.with("method", assessment.method().get().code());
        }
        Branch uncertainty = Branch.EMPTY;
        for (Map.Entry<Result, Estimate> result : assessment.results().entrySet()) {
            branch = branch.with(result.getKey().key(), number(result.getValue().value()));
            uncertainty = uncertainty.with(result.getKey().key(), number(result.getValue().standardUncertainty()));
        }
        if (assessment.energyKind().isPresent()) {
            branch = branch.with("energyIs", assessment.energyKind().get().code());
        }
        if (assessment.currency().isPresent() && assessment.get(Result.COST).isPresent()) {
            branch = branch.with("currency", assessment.currency().get());
        }
        if (assessment.leading().isPresent()) {
            branch = branch.with("leading", assessment.leading().get().code());
        }
        branch = branch
                .with("methods", series(assessment.methods().entrySet(), method -> Branch.EMPTY
                        .with("method", method.getKey().code())
                        .with("materialDragN", number(method.getValue().value()))
                        .with("standardUncertaintyN", number(method.getValue().standardUncertainty()))))
                .with("uncertainty", uncertainty);
        if (assessment.spread().isPresent()) {
            branch = branch.with("methodSpread", spread(assessment.spread().get()))
                    .with("uncertaintyWithSpread", counted(assessment));
        }
        branch = branch
                .with("powerShares", series(assessment.powerShares(), AssessmentWriter::share))
                .with("bedProfile", series(assessment.profile(), point -> Branch.EMPTY
                        .with("positionM", number(point.position()))
                        .with("depthM", number(point.depth().value()))
                        .with("standardUncertaintyM", number(point.depth().standardUncertainty()))))
                .with("findings", series(assessment.findings(), AssessmentWriter::finding));
        if (!assessment.findingsAtDesign().isEmpty()) {
            branch = branch.with("findingsAtDesignFeed",
                    series(assessment.findingsAtDesign(), AssessmentWriter::finding));
        }
        if (!assessment.refused().isEmpty()) {
            branch = branch.with("refused", series(assessment.refused(), refused -> Branch.EMPTY
                    .with("code", refused.rule().code()).with("because", refused.because())));
        }
        branch = branch.with("allowedDepths", series(assessment.allowedDepths(), AssessmentWriter::allowed))
                .with("remedies", series(assessment.remedies(), AssessmentWriter::remedy))
                .with("assumptions", series(assessment.assumptions(), AssessmentWriter::assumption))
                .with("missing", texts(assessment.missing()));
        return assessment.repeat().isPresent() ? repeat(branch, assessment.repeat().get()) : branch;
    }

    private static Branch spread(MethodSpread spread) {
        return Branch.EMPTY.with("lowest", spread.lowest().code()).with("highest", spread.highest().code())
                .with("ratio", number(spread.ratio()))
                .with("reasons", series(spread.reasons(), reason -> Branch.EMPTY
                        .with("code", reason.cause().code()).with("ratio", number(reason.ratio()))))
                .with("standardUncertaintyN", number(spread.standardUncertainty()));
    }

    /** Standard uncertainties of what the drag methods disagree about, the disagreement among what makes them up. */
    private static Branch counted(Assessment assessment) {
        Branch counted = Branch.EMPTY;
        for (Result result : assessment.results().keySet()) {
            if (result == Result.MATERIAL_DRAG || result.followsDrag()) {
                counted = counted.with(result.key(),
                        number(assessment.counted(result).orElseThrow().standardUncertainty()));
            }
        }
        return counted;
    }

    private static Branch repeat(Branch branch, Repeat repeat) {
        return optional(branch.with("repeat", repeat.reading()).with("repeatFor", repeat.rule().code()),
                "repeatStandardUncertainty", repeat.standardUncertainty());
    }

    private static Branch share(Share share) {
        return Branch.EMPTY.with("reading", share.reading()).with("share", number(share.share()));
    }

    private static Branch finding(Finding finding) {
        Branch branch = Branch.EMPTY.with("code", finding.code()).with("level", finding.level().code())
                .with("observed", number(finding.observed())).with("unit", finding.unit())
                .with("standardUncertainty", number(finding.standardUncertainty()));
        branch = optional(branch, "near", finding.near());
        branch = optional(branch, "overloaded", finding.overloaded());
        branch = optional(branch, "probabilityNear", finding.probabilityNear());
        branch = optional(branch, "probabilityOverloaded", finding.probabilityOverloaded());
        if (finding.drawn()) {
            branch = branch.with("by", "monte-carlo");
        }
        return branch.with("action", finding.action()).with("source", finding.source())
                .with("assumption", Node.flag(finding.assumption()));
    }

    private static Branch allowed(AllowedDepth allowed) {
        Branch branch = Branch.EMPTY.with("code", allowed.rule().code());
        return optional(optional(branch, "nearM", allowed.near()), "overloadedM", allowed.overloaded());
    }

    private static Branch remedy(Remedy remedy) {
        Branch branch = optional(Branch.EMPTY.with("code", remedy.code()), "change", remedy.change())
                .with("unit", remedy.unit())
                .with("meanDepthM", number(remedy.meanDepth()))
                .with("skirtDragN", number(remedy.skirtDrag()))
                .with("skirtPowerW", number(remedy.skirtPower()));
        branch = optional(optional(branch, "drivePowerW", remedy.drivePower()), "driveShare", remedy.driveShare());
        branch = optional(optional(optional(branch, "savedWhPerYear", remedy.savedWh()),
                "savedCostPerYear", remedy.savedCost()), "savedCo2KgPerYear", remedy.savedCo2())
                .with("ranked", Node.flag(remedy.ranked()));
        return remedy.refusedBecause().isPresent()
                ? branch.with("refusedBecause", remedy.refusedBecause().get().code()) : branch;
    }

    private static Branch assumption(Assumption assumption) {
        Branch branch = Branch.EMPTY.with("code", assumption.code());
        return assumption.arguments().isEmpty() ? branch
                : branch.with("arguments", texts(assumption.arguments()));
    }

    private static Branch optional(Branch branch, String key, OptionalDouble number) {
        return number.isPresent() ? branch.with(key, number(number.getAsDouble())) : branch;
    }

    /** The shortest decimal that gives the same double back. */
    private static Node number(double value) {
        return Node.number(new BigDecimal(Double.toString(value)));
    }

    private static Node texts(Iterable<String> texts) {
        List<Node> items = new ArrayList<>();
        texts.forEach(text -> items.add(Node.text(text)));
        return new Node.Series(items);
    }

    private static <T> Node series(Iterable<T> things, Function<T, Branch> write) {
        List<Node> items = new ArrayList<>();
        things.forEach(thing -> items.add(write.apply(thing)));
        return new Node.Series(items);
    }
}
