package bedmark.wording;

import bedmark.engine.Assessment;
import bedmark.engine.Result;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.verdict.Component;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Remedy;
import bedmark.engine.verdict.Repeat;
import bedmark.engine.verdict.Rule;
import bedmark.form.FieldForm;
import bedmark.quantity.Dimension;
import bedmark.quantity.QuantityFormat;
import bedmark.quantity.Unit;
import bedmark.survey.Readings;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/** Turns an assessment into the sentence, the numbers and the one action that a person needs. */
public final class Telling {
    /** Ratios that people say as "so many times"; the others are said in percent. */
    private static final Set<Rule> TIMES = Set.of(Rule.BED_OVER_DESIGN, Rule.BOARD_TOO_LOW_FOR_LUMPS);
    private static final Set<Rule> ABOUT_POWER = Set.of(Rule.DRIVE_NEAR_RATING, Rule.SKIRTS_OVER_BUDGET);
    private static final Set<Rule> ABOUT_DEPTH =
            Set.of(Rule.BED_OVER_DESIGN, Rule.BED_OVER_BOARD, Rule.BED_BEHIND_BELT);
    /** Their clauses speak of the bed, so that a second one can go on about it. */
    private static final Set<Rule> ABOUT_BED = Set.of(Rule.BED_OVER_DESIGN, Rule.BED_OVER_BOARD);
    private static final Set<String> LOWER_THE_BED = Set.of("free-bed", "lower-feed", "widen-boards");
    /** The depth speaks first where several rules say the same level. */
    private static final List<Rule> FIRST = List.of(Rule.BED_OVER_DESIGN, Rule.BED_OVER_BOARD,
            Rule.FLOW_OVER_CAPACITY, Rule.DRIVE_NEAR_RATING, Rule.SKIRTS_OVER_BUDGET);

    private final Wording wording;
    private final FieldForm form;

    public Telling(Wording wording, FieldForm form) {
        this.wording = wording;
        this.form = form;
    }

    /** Tells an assessment. */
    public Told tell(Assessment assessment) {
        Optional<Finding> leading = leading(assessment);
        Optional<String> atDesign = assessment.level() == Level.INCOMPLETE ? Optional.empty()
                : Optional.of(atDesign(assessment));
        return new Told(sentence(assessment, leading), leading.flatMap(finding -> sure(assessment, finding)),
                leading.filter(finding -> assessment.level() != Level.INCOMPLETE).flatMap(this::against), atDesign, figures(assessment), action(assessment, leading),
                assessment.repeat().map(this::repeat));
    }

    /** What the leading rule observed against the limit of its level; nothing where it has no limit. */
    private Optional<String> against(Finding finding) {
        boolean warns = finding.level() == Level.NEAR;
        OptionalDouble limit = warns || finding.overloaded().isEmpty() ? finding.near() : finding.overloaded();
        return limit.isEmpty() ? Optional.empty() : Optional.of(wording.text("verdict.against",
                observed(finding, finding.observed()), limit(finding, limit.getAsDouble())));
    }

    /** The reading to take again, and within how much (k = 2) it would settle the verdict. */
    private String repeat(Repeat repeat) {
        String reading = wording.reading(repeat.reading(), form);
        Optional<Dimension> dimension = Readings.dimension(repeat.reading());
        if (repeat.standardUncertainty().isEmpty() || dimension.isEmpty()) {
            return wording.text("verdict.repeat", reading);
        }
        Unit unit = dimension.get() == Dimension.LENGTH ? wording.smallLength()
                : wording.unit(dimension.get());
        return wording.text("verdict.repeat-within", reading,
                wording.computed(2 * repeat.standardUncertainty().getAsDouble(), unit));
    }

    /** The finding that makes the verdict: of the worst level, the one nearest to or farthest over its limit. */
    public static Optional<Finding> leading(Assessment assessment) {
        return assessment.findings().stream().min(Comparator
                .comparing(Finding::level, Comparator.reverseOrder())
                .thenComparing(finding -> FIRST.contains(finding.rule()) ? FIRST.indexOf(finding.rule())
                        : FIRST.size()));
    }

    private String sentence(Assessment assessment, Optional<Finding> leading) {
        Level level = assessment.level();
        if (level == Level.INCOMPLETE) {
            List<String> waiting = assessment.missingRequired().stream().map(name -> wording.asked(name, form))
                    .distinct().toList();
            return waiting.isEmpty() ? wording.text("verdict.incomplete")
                    : wording.text("verdict.incomplete-for", waiting.get(0),
                            wording.format().computed(waiting.size() - 1.0, 0), waiting.size() - 1);
        }
        if (leading.isEmpty()) {
            return wording.text("verdict.level-alone", level(level));
        }
        Optional<Finding> lagging = assessment.findings().stream()
                .filter(finding -> finding.rule() == Rule.BED_BEHIND_BELT && finding.level() != Level.WITHIN
                        && leading.get().rule() != Rule.BED_BEHIND_BELT).findFirst();
        return lagging.map(second -> wording.text(ABOUT_BED.contains(leading.get().rule())
                                ? "verdict.sentence-bed" : "verdict.sentence-two", level(level), clause(leading.get()),
                        ABOUT_BED.contains(leading.get().rule()) ? wording.text("rule.bed-behind-belt.too",
                                observed(second, second.observed())) : clause(second)))
                .orElseGet(() -> wording.text("verdict.sentence", level(level), clause(leading.get())));
    }

    /** A level as the head of a sentence. */
    public String level(Level level) {
        return wording.text("verdict.level." + level.code());
    }

    /** What a rule observed, as a clause. */
    public String clause(Finding finding) {
        return wording.text("rule." + finding.code() + ".clause", observed(finding, finding.observed()));
    }

    /** A number of a finding in the way in which its rule is spoken of. */
    public String observed(Finding finding, double number) {
        return observed(finding.rule(), number);
    }

    private String observed(Rule rule, double number) {
        if (rule == Rule.SEAL_DEFECT) {
            return wording.format().computed(number, 0);
        }
        if (rule == Rule.BELT_TOO_FAST) {
            return wording.computed(number, wording.unit(Dimension.SPEED));
        }
        return TIMES.contains(rule) ? wording.format().computed(number, 1) : wording.percent(number);
    }

    /** A limit of a finding in the way in which its rule is spoken of. */
    public String limit(Finding finding, double limit) {
        return TIMES.contains(finding.rule()) ? wording.format().exact(BigDecimal.valueOf(limit))
                : observed(finding, limit);
    }

    /** A limit as it is set: that of the belt's speed is a share of the speed in its table. */
    public String setLimit(Rule rule, double limit) {
        return TIMES.contains(rule) ? wording.format().exact(BigDecimal.valueOf(limit))
                : rule == Rule.BELT_TOO_FAST ? wording.percent(limit) : observed(rule, limit);
    }

    /** Nothing where the verdict rests on what is counted or seen, and not on a reading with an uncertainty. */
    private Optional<String> sure(Assessment assessment, Finding leading) {
        return switch (assessment.level()) {
            case OVERLOADED -> probability(leading, leading.probabilityOverloaded(), "verdict.sure");
            case UNDECIDED -> probability(leading, leading.probabilityOverloaded(), "verdict.perhaps-over");
            case NEAR -> probability(leading, leading.probabilityNear(), "verdict.sure");
            case WITHIN -> assessment.findings().stream()
                    .filter(finding -> isMeasured(finding) && finding.probabilityNear().isPresent())
                    .max(Comparator.comparingDouble(finding -> finding.probabilityNear().getAsDouble()))
                    .map(finding -> wording.text("verdict.sure",
                            wording.probability(1 - finding.probabilityNear().getAsDouble())));
            case INCOMPLETE -> Optional.empty();
        };
    }

    private static boolean isMeasured(Finding finding) {
        return finding.standardUncertainty() > 0;
    }

    private Optional<String> probability(Finding finding, OptionalDouble probability, String key) {
        return isMeasured(finding) && probability.isPresent()
                ? Optional.of(wording.text(key, wording.probability(probability.getAsDouble()))) : Optional.empty();
    }

    private String atDesign(Assessment assessment) {
        return assessment.levelAtDesignFeed()
                .map(level -> wording.text("verdict.at-design-feed", level(level)))
                .orElseGet(() -> wording.text("verdict.todays-feed"));
    }

    private List<Told.Figure> figures(Assessment assessment) {
        List<Told.Figure> figures = new ArrayList<>();
        figure(assessment, Result.SKIRT_DRAG, "figure.drag", wording.unit(Dimension.FORCE)).ifPresent(figures::add);
        boolean atMotor = assessment.get(Result.DRIVE_POWER).isPresent();
        figure(assessment, atMotor ? Result.DRIVE_POWER : Result.SKIRT_POWER,
                atMotor ? "figure.power-motor" : "figure.power-belt", wording.unit(Dimension.POWER))
                .ifPresent(figures::add);
        figure(assessment, Result.DRIVE_SHARE, "figure.share", Unit.PERCENT).ifPresent(figures::add);
        assessment.leading().ifPresent(component -> figures.add(leads(assessment, component)));
        return figures;
    }

    private Optional<Told.Figure> figure(Assessment assessment, Result result, String label, Unit unit) {
        return assessment.get(result).map(estimate -> {
            String number = wording.format().computed(estimate.value(), unit);
            return new Told.Figure(wording.text(label), number, "± " + QuantityFormat.with(
                    spread(2 * estimate.standardUncertainty(), unit, number), unit, wording.symbol(unit)));
        });
    }

    /** A spread with as many decimals as the number that it belongs to. */
    private String spread(double si, Unit unit, String number) {
        int sign = number.indexOf(wording.format().decimalSign());
        return wording.format().exact(new BigDecimal(unit.fromSi(si))
                .setScale(sign < 0 ? 0 : number.length() - sign - 1, RoundingMode.HALF_UP));
    }

    private Told.Figure leads(Assessment assessment, Component component) {
        Map<Component, Result> forces = Map.of(Component.BED, Result.MATERIAL_DRAG, Component.SEAL, Result.SEAL_DRAG,
                Component.LOADING, Result.LOADING_FORCE);
        double all = forces.values().stream().flatMap(result -> assessment.get(result).stream())
                .mapToDouble(Estimate::value).filter(force -> force > 0).sum();
        String share = all > 0 ? assessment.get(forces.get(component))
                .map(force -> wording.percent(force.value() / all)).orElse("") : "";
        return new Told.Figure(wording.text("figure.leads"), wording.text("figure.leads." + component.code()), share);
    }

    /** What helps against the finding that leads; nothing where all is within its limits. */
    private Optional<String> action(Assessment assessment, Optional<Finding> leading) {
        return leading.filter(finding -> finding.level() != Level.WITHIN && assessment.level() != Level.INCOMPLETE)
                .map(finding -> best(assessment, finding).map(this::remedy)
                        .orElseGet(() -> wording.text("action." + finding.action())));
    }

    /** The remedy that saves most of those that help against a finding. */
    private static Optional<Remedy> best(Assessment assessment, Finding finding) {
        return assessment.remedies().stream()
                .filter(remedy -> remedy.ranked() && remedy.refusedBecause().isEmpty()
                        && remedy.savedWh().orElse(0) > 0)
                .filter(remedy -> ABOUT_POWER.contains(finding.rule())
                        || ABOUT_DEPTH.contains(finding.rule()) && LOWER_THE_BED.contains(remedy.code()))
                .findFirst();
    }

    /** A remedy in one sentence: what is changed, the depth that comes of it, what it saves in a year. */
    public String remedy(Remedy remedy) {
        Unit small = wording.smallLength();
        String change = remedy.change().isPresent() ? wording.percent(remedy.change().getAsDouble()) : "";
        Optional<Unit> unit = Unit.ofCode(remedy.unit());
        if (unit.isPresent() && remedy.change().isPresent()) {
            change = wording.computed(unit.get().toSi(BigDecimal.valueOf(remedy.change().getAsDouble())),
                    wording.unit(unit.get().dimension()));
        }
        String saved = remedy.savedWh().isPresent()
                ? wording.text("action.saves", wording.text("action.megawatt-hours",
                        wording.format().computed(remedy.savedWh().getAsDouble() / 1e6, 2))) : "";
        return wording.text("remedy." + remedy.code(), change, wording.computed(remedy.meanDepth(), small), saved);
    }
}
