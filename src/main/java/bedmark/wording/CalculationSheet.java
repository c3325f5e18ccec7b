package bedmark.wording;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.engine.Assessment;
import bedmark.engine.Assumption;
import bedmark.engine.Result;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Rule;
import bedmark.engine.working.Step;
import bedmark.engine.working.Symbol;
import bedmark.engine.working.Working;
import bedmark.form.FieldForm;
import bedmark.quantity.QuantityFormat;
import bedmark.survey.Survey;
import java.util.ArrayList;
import java.util.Collection;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.stream.Stream;

/**
 * The working of one zone as a calculation sheet of lines, about a page: what was read and registered, every formula
 * with its name, source, numbers and result, the findings with their limits, and what was assumed.
 */
public final class CalculationSheet {
    /** Columns of a line. */
    public static final int WIDTH = 100;

    private static final int NAMES = 25;
    private static final int RULES = 46;
    private static final int LEVELS = 11;
    private static final String NO_NUMBERS = "integral-of-depth";
    /** Assumptions that begin with the reading that they are about. */
    private static final Set<String> OF_ROWS = Set.of("first-order-coarse", "bed-below-boards", "wear-line-is-history");

    private final Wording wording;
    private final FieldForm form;
    private final SheetNumbers numbers;
    private final Telling telling;

    public CalculationSheet(Wording wording, FieldForm form) {
        this.wording = wording;
        this.form = form;
        numbers = new SheetNumbers(wording);
        telling = new Telling(wording, form);
    }

    /** A sentence in lines of the sheet's width. */
    public static List<String> wrapped(String sentence) {
        SheetLines lines = new SheetLines(WIDTH);
        lines.sentence(sentence);
        return lines.all();
    }

    /** The lines of the sheet below its head. */
    public List<String> lines(Survey survey, Assessment assessment, Working working) {
        SheetLines lines = new SheetLines(WIDTH);
        lines.heading(wording.text("working.readings"));
        readings(working, survey, lines);
        lines.heading(wording.text("working.registered"));
        lines.flow(working.inputs().stream()
                .filter(input -> input.symbol().reading().isPresent() && !isReading(input.symbol()))
                .map(this::given).toList());
        lines.heading(wording.text("working.steps"));
        steps(working, assessment, lines);
        lines.heading(wording.text("working.findings"));
        findings(assessment, working, lines);
        if (!assessment.assumptions().isEmpty()) {
            lines.sentence(wording.text("working.assumptions", String.join(" ", assumptions(assessment))));
        }
        if (!assessment.missing().isEmpty()) {
            lines.sentence(wording.text("working.missing", String.join(", ",
                    assessment.missing().stream().map(place -> wording.reading(place, form)).toList())));
        }
        return lines.all();
    }

    /** What was assumed; of several rows alike it is said once. */
    private Collection<String> assumptions(Assessment assessment) {
        Map<String, String> sentences = new LinkedHashMap<>();
        for (Assumption assumption : assessment.assumptions()) {
            String sentence = wording.assumption(assumption, form);
            if (OF_ROWS.contains(assumption.code())) {
                String row = wording.reading(assumption.arguments().get(0), form);
                sentences.merge(assumption.code(), sentence, (before, now) -> before.replaceFirst(": ",
                        Matcher.quoteReplacement("; " + row + ": ")));
            } else {
                sentences.put(assumption.code() + assumption.arguments(), sentence);
            }
        }
        return sentences.values();
    }

    private static boolean isReading(Symbol symbol) {
        return symbol.reading().filter(place -> place.startsWith("/readings/")).isPresent();
    }

    private void readings(Working working, Survey survey, SheetLines lines) {
        List<String> single = new ArrayList<>();
        List<String> rows = new ArrayList<>();
        for (Working.Input input : working.inputs()) {
            if (!isReading(input.symbol())) {
                continue;
            }
            Pointer place = Pointer.parse(input.symbol().reading().orElseThrow());
            boolean inRow = place.tokens().stream().anyMatch(token -> token.matches("[0-9]+"));
            (inRow ? rows : single).add(inRow ? value(input) + mark(survey, place)
                    : value(input) + mark(survey, place) + " " + label(place));
        }
        single.addAll(rows);
        single.addAll(sealRows(survey));
        lines.flow(single);
    }

    private List<String> sealRows(Survey survey) {
        List<String> seals = new ArrayList<>();
        List<Branch> rows = survey.readings().branches("seals");
        for (int i = 0; i < rows.size(); i++) {
            Branch row = rows.get(i);
            seals.add((i + 1) + ": " + String.join(", ", Stream.of("side", "type", "condition")
                    .flatMap(key -> row.text(key).stream()).map(this::word).toList()));
        }
        return seals.isEmpty() ? seals : List.of(wording.text("working.seals", String.join("; ", seals)));
    }

    private String word(String code) {
        String key = "assumption.word." + code;
        return wording.words().has(key) ? wording.text(key) : wording.text("working.side." + code);
    }

    private String label(Pointer place) {
        return wording.reading(place.toString(), form);
    }

    /** The label without what the heading says of all of them. */
    private String bare(Pointer place) {
        return label(place).replaceFirst(" \\([^)]*\\)$", "");
    }

    private String value(Working.Input input) {
        return (input.symbol().sign() + " = " + numbers.both(input.symbol().value(), input.standardUncertainty(),
                input.symbol().unit())).replace(' ', QuantityFormat.BEFORE_UNIT);
    }

    /** How sure the person was. */
    private String mark(Survey survey, Pointer place) {
        Optional<Node> node = survey.document().at(place);
        return node.filter(Branch.class::isInstance).flatMap(found -> ((Branch) found).text("quality"))
                .map(quality -> " " + wording.text("screen.quality." + quality)).orElse("");
    }

    private String given(Working.Input input) {
        return value(input) + " " + bare(Pointer.parse(input.symbol().reading().orElseThrow()));
    }

    private void steps(Working working, Assessment assessment, SheetLines lines) {
        Set<String> rules = new HashSet<>();
        Stream.of(Rule.values()).forEach(rule -> rules.add(rule.code()));
        List<Step> steps = working.steps().stream().filter(step -> !rules.contains(step.result())).toList();
        for (int i = 0; i < steps.size();) {
            int next = i + 1;
            while (next < steps.size() && isSame(steps.get(i), steps.get(next))) {
                next++;
            }
            if (next - i == 1) {
                lines.row(NAMES, name(steps.get(i)), line(steps.get(i), assessment));
            } else {
                together(steps.subList(i, next), assessment, lines);
            }
            i = next;
        }
    }

    /** Whether two steps are one formula, applied to two rows of a table. */
    private static boolean isSame(Step one, Step other) {
        return one.formula().code().equals(other.formula().code())
                && general(one).equals(general(other)) && !one.formula().equals(other.formula());
    }

    private static String general(Step step) {
        return step.formula().sign().replaceAll("\\d+$", "") + step.formula().expression()
                .replaceAll("(?<=[hDfkℓ′])\\d+", "");
    }

    private String name(Step step) {
        return wording.text("working.formula." + step.formula().code()) + " [" + step.formula().source() + "]";
    }

    private String line(Step step, Assessment assessment) {
        String formula = numbers.formula(step.formula());
        boolean general = step.formula().code().equals(NO_NUMBERS);
        String put = general ? "" : numbers.substituted(step);
        return step.formula().sign() + " = " + formula + (general ? "" : " = " + put) + result(step, put, assessment);
    }

    /** The result, unless what was put in is that number already. */
    private String result(Step step, String put, Assessment assessment) {
        boolean intermediate = Result.ofKey(step.result()).isEmpty() && !step.result().startsWith("methods.");
        double spread = Result.ofKey(step.result()).flatMap(assessment::counted)
                .map(Estimate::standardUncertainty).orElse(step.standardUncertainty().orElse(0));
        String value = intermediate ? numbers.si(step.value(), step.unit())
                : numbers.both(step.value(), spread, step.unit());
        return put.equals(numbers.number(step.value())) ? value.substring(put.length()) : " = " + value;
    }

    private void together(List<Step> steps, Assessment assessment, SheetLines lines) {
        String text = general(steps.get(0));
        String sign = steps.get(0).formula().sign().replaceAll("\\d+$", "");
        List<String> parts = new ArrayList<>();
        parts.add(sign + " = " + text.substring(sign.length()).replace(" · ", "·").replace(" − ", "−"));
        steps.forEach(step -> parts.add(step.formula().sign() + " = " + numbers.substituted(step)
                + result(step, numbers.substituted(step), assessment)));
        lines.row(NAMES, name(steps.get(0)), String.join("; ", parts));
    }

    private void findings(Assessment assessment, Working working, SheetLines lines) {
        for (Finding finding : assessment.findings()) {
            String formula = working.stepOf(finding.code()).filter(step -> hasFormula(finding.rule()))
                    .map(step -> numbers.formula(step.formula()) + " = ").orElse("");
            String observed = telling.observed(finding, finding.observed());
            String text = formula + observed + limit("working.near", finding, finding.near(),
                    finding.probabilityNear()) + limit("working.overloaded", finding, finding.overloaded(),
                    finding.probabilityOverloaded());
            String level = wording.text("working.level." + finding.level().code());
            lines.row(RULES, level + " ".repeat(Math.max(1, LEVELS - level.length()))
                    + wording.text("rule." + finding.code()) + " [" + finding.source() + "]", text);
        }
        assessment.levelAtDesignFeed().ifPresent(level -> lines.item(
                wording.text("verdict.at-design-feed", telling.level(level))));
        telling.tell(assessment).repeat().ifPresent(lines::item);
    }

    private static boolean hasFormula(Rule rule) {
        return rule != Rule.SKIRTS_OVER_BUDGET && rule != Rule.SEAL_DEFECT;
    }

    private String limit(String key, Finding finding, OptionalDouble limit, OptionalDouble probability) {
        return limit.isEmpty() ? "" : wording.text(key, telling.limit(finding, limit.getAsDouble()),
                wording.percent(probability.orElse(0)));
    }
}
