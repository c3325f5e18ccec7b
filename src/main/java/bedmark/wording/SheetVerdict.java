package bedmark.wording;

import bedmark.document.Branch;
import bedmark.engine.Assessment;
import bedmark.engine.MethodSpread;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Remedy;
import bedmark.engine.verdict.Rule;
import bedmark.engine.working.Step;
import bedmark.engine.working.Working;
import bedmark.form.FieldForm;
import bedmark.quantity.QuantityFormat;
import bedmark.survey.Survey;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Collectors;

/** What a calculation sheet says of the numbers: how far the methods lie apart, every rule, what would help. */
final class SheetVerdict {
    /** Less of the rated power than this is none of another zone's. */
    private static final double OTHERS = 1e-9;
    private static final double WORTH_NAMING = 0.01;

    private final Wording wording;
    private final SheetNumbers numbers;
    private final Telling telling;

    SheetVerdict(Wording wording, FieldForm form, SheetNumbers numbers) {
        this.wording = wording;
        this.numbers = numbers;
        telling = new Telling(wording, form);
    }

    /** How far the methods for the material drag lie apart, and why. */
    Optional<SheetPart> methods(Assessment assessment) {
        return assessment.spread().map(spread -> {
            String reasons = spread.reasons().stream().map(reason -> wording.text("working.reason",
                    wording.text("working.cause." + reason.cause().code()), numbers.number(reason.ratio())))
                    .collect(Collectors.joining(", "));
            String apart = wording.text("working.apart", name(spread.highest()), name(spread.lowest()),
                    numbers.number(spread.ratio()), reasons);
            return new SheetPart.Row("", wording.text("working.methods"), apart + counted(spread));
        });
    }

    private String name(DragMethod method) {
        return wording.text("working.method." + method.code());
    }

    private String counted(MethodSpread spread) {
        return spread.standardUncertainty() == 0 ? "" : wording.text("working.apart-counted",
                numbers.both(spread.standardUncertainty(), 0, "N"));
    }

    /** Every rule at today's feed and, where it changes with it, at design feed. */
    List<SheetPart> findings(Survey survey, Assessment assessment, Working working) {
        List<SheetPart> parts = new ArrayList<>();
        List<String> clear = new ArrayList<>();
        for (Finding finding : assessment.findings()) {
            String then = of(assessment.findingsAtDesign(), finding.rule()).map(this::atDesign)
                    .filter(text -> !text.equals(atDesign(finding))).map(text -> ", " + text).orElse("");
            String text = formula(finding, survey, working) + observed(finding) + then;
            if (isClear(finding, then)) {
                clear.add(named(finding) + " " + text);
            } else {
                parts.add(row(finding, text));
            }
        }
        for (Finding finding : assessment.findingsAtDesign()) {
            if (of(assessment.findings(), finding.rule()).isEmpty()) {
                parts.add(row(finding, wording.text("working.at-design", observed(finding))));
            }
        }
        assessment.refused().forEach(refused -> parts.add(new SheetPart.Row(wording.text("working.level.refused"),
                wording.text("rule." + refused.rule().code()), wording.text("working.not-judged"))));
        if (!clear.isEmpty()) {
            clear.set(0, wording.text("working.clear", clear.get(0)));
            parts.add(new SheetPart.Flow(clear));
        }
        assessment.levelAtDesignFeed().ifPresent(level -> parts.add(new SheetPart.Item(
                wording.text("working.level-at-design", telling.level(level)))));
        telling.tell(assessment).repeat().map(SheetPart.Item::new).ifPresent(parts::add);
        return parts;
    }

    private static Optional<Finding> of(List<Finding> findings, Rule rule) {
        return findings.stream().filter(finding -> finding.rule() == rule).findFirst();
    }

    /** Whether a rule that only warns holds beyond doubt at both feeds, so that a word is enough. */
    private static boolean isClear(Finding finding, String atDesign) {
        return finding.level() == Level.WITHIN && finding.overloaded().isEmpty() && atDesign.isEmpty()
                && finding.probabilityNear().orElse(0) < WORTH_NAMING;
    }

    private SheetPart row(Finding finding, String text) {
        return new SheetPart.Row(level(finding.level()), named(finding), text);
    }

    private String named(Finding finding) {
        return wording.text("rule." + finding.code()) + " [" + finding.source() + "]";
    }

    private String level(Level level) {
        return wording.text("working.level." + level.code());
    }

    /** What is observed, in signs; of a count how it was counted. */
    private String formula(Finding finding, Survey survey, Working working) {
        Optional<Step> step = working.stepOf(finding.code());
        if (step.isEmpty()) {
            return "";
        }
        if (finding.rule() == Rule.SEAL_DEFECT) {
            List<Branch> segments = survey.readings().branches("seals");
            return wording.text("working.seal-defects", segments.size()) + " = ";
        }
        double others = finding.observed() - step.get().value();
        boolean ofConveyor = finding.rule() == Rule.SKIRTS_OVER_BUDGET && others > OTHERS;
        return numbers.formula(step.get().formula())
                + (ofConveyor ? " + " + wording.text("working.other-zones", wording.percent(others)) : "") + " = ";
    }

    private String observed(Finding finding) {
        return telling.observed(finding, finding.observed())
                + limit("working.near", finding, finding.near(), finding.probabilityNear())
                + limit("working.overloaded", finding, finding.overloaded(), finding.probabilityOverloaded());
    }

    private String atDesign(Finding then) {
        String level = then.level() == Level.WITHIN ? "" : " " + level(then.level());
        return wording.text("working.at-design", telling.observed(then, then.observed()) + level
                + probability(then.probabilityOverloaded().isPresent() ? then.probabilityOverloaded()
                        : then.probabilityNear()));
    }

    private String limit(String key, Finding finding, OptionalDouble limit, OptionalDouble probability) {
        return limit.isEmpty() ? "" : ", " + wording.text(key, telling.limit(finding, limit.getAsDouble()),
                probability(probability));
    }

    /** Of lying beyond a limit; one that rounds to nothing is left out. */
    private String probability(OptionalDouble probability) {
        return probability.orElse(0) < WORTH_NAMING ? "" : " (" + wording.percent(probability.getAsDouble()) + ")";
    }

    /** What would lower the skirt power, as it is ranked; what is refused with the rule that it would break. */
    List<SheetPart> remedies(Assessment assessment) {
        return assessment.remedies().stream().map(remedy -> (SheetPart) new SheetPart.Item(remedy(assessment, remedy)))
                .toList();
    }

    private String remedy(Assessment assessment, Remedy remedy) {
        if (remedy.refusedBecause().isPresent()) {
            return telling.remedy(remedy) + " " + wording.text("working.remedy-refused",
                    wording.text("rule." + remedy.refusedBecause().get().code()));
        }
        String force = "F = " + numbers.both(remedy.skirtDrag(), 0, "N");
        String power = remedy.drivePower().isPresent()
                ? "Pd = " + numbers.both(remedy.drivePower().getAsDouble(), 0, "W")
                : "P = " + numbers.both(remedy.skirtPower(), 0, "W");
        return telling.remedy(remedy) + " " + whole(force) + "; " + whole(power) + money(assessment, remedy) + ".";
    }

    /** Not to be broken between lines. */
    private static String whole(String equation) {
        return equation.replace(' ', QuantityFormat.BEFORE_UNIT);
    }

    private String money(Assessment assessment, Remedy remedy) {
        String cost = remedy.savedCost().isEmpty() ? "" : "; " + wording.text("working.saved-cost",
                numbers.number(remedy.savedCost().getAsDouble()), assessment.currency().orElse(""));
        return cost + (remedy.savedCo2().isEmpty() ? "" : "; " + wording.text("working.saved-co2",
                numbers.number(remedy.savedCo2().getAsDouble())));
    }
}
