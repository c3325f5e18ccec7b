package bedmark.wording;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.engine.Assessment;
import bedmark.engine.Assumption;
import bedmark.engine.working.Symbol;
import bedmark.engine.working.Working;
import bedmark.form.FieldForm;
import bedmark.quantity.Quality;
import bedmark.quantity.QuantityFormat;
import bedmark.survey.Survey;
import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.stream.Stream;

/**
 * The working of one zone as a calculation sheet, about a page: what was read and registered, every formula with its
 * name, source, numbers and result, how far the methods lie apart, the findings at both feeds with their limits, what
 * would help, and what was assumed.
 */
public final class CalculationSheet {
    /** Columns of a line. */
    public static final int WIDTH = 100;

    /** Assumptions that begin with the reading that they are about. */
    private static final Set<String> OF_ROWS = Set.of("first-order-coarse", "bed-below-boards", "wear-line-is-history");

    private final Wording wording;
    private final FieldForm form;
    private final SheetNumbers numbers;
    private final SheetVerdict verdict;

    public CalculationSheet(Wording wording, FieldForm form) {
        this.wording = wording;
        this.form = form;
        numbers = new SheetNumbers(wording);
        verdict = new SheetVerdict(wording, form, numbers);
    }

    /** A sentence in lines of the sheet's width. */
    public static List<String> wrapped(String sentence) {
        SheetLines lines = new SheetLines(WIDTH);
        lines.add(new SheetPart.Sentence(sentence));
        return lines.all();
    }

    /** The lines of the sheet below its head. */
    public List<String> lines(Survey survey, Assessment assessment, Working working) {
        SheetLines lines = new SheetLines(WIDTH);
        parts(survey, assessment, working).forEach(lines::add);
        return lines.all();
    }

    /** The parts of the sheet below its head. */
    public List<SheetPart> parts(Survey survey, Assessment assessment, Working working) {
        List<SheetPart> parts = new ArrayList<>();
        parts.add(new SheetPart.Heading(wording.text("working.readings")));
        parts.add(readings(working, survey));
        parts.add(new SheetPart.Heading(wording.text("working.registered")));
        parts.add(new SheetPart.Flow(working.inputs().stream()
                .filter(input -> input.symbol().reading().isPresent() && !isReading(input.symbol()))
                .map(this::given).toList()));
        parts.add(new SheetPart.Heading(wording.text("working.steps")));
        parts.addAll(new SheetSteps(wording, numbers).parts(working, assessment));
        verdict.methods(assessment).ifPresent(parts::add);
        parts.add(new SheetPart.Heading(wording.text("working.findings")));
        parts.addAll(verdict.findings(survey, assessment, working));
        List<SheetPart> remedies = verdict.remedies(assessment);
        if (!remedies.isEmpty()) {
            parts.add(new SheetPart.Heading(wording.text("working.remedies")));
            parts.addAll(remedies);
        }
        if (!assessment.assumptions().isEmpty()) {
            parts.add(new SheetPart.Sentence(
                    wording.text("working.assumptions", String.join(" ", assumptions(assessment)))));
        }
        if (!assessment.missing().isEmpty()) {
            parts.add(new SheetPart.Sentence(wording.text("working.missing", String.join(", ",
                    assessment.missing().stream().map(place -> wording.reading(place, form)).toList()))));
        }
        return parts;
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

    private SheetPart.Flow readings(Working working, Survey survey) {
        List<String> single = new ArrayList<>();
        List<String> rows = new ArrayList<>();
        for (Working.Input input : working.inputs()) {
            if (!isReading(input.symbol())) {
                continue;
            }
            Pointer place = Pointer.parse(input.symbol().reading().orElseThrow());
            boolean inRow = place.tokens().stream().anyMatch(token -> Pointer.index(token) >= 0);
            (inRow ? rows : single).add(inRow ? value(input) + mark(survey, place)
                    : value(input) + mark(survey, place) + " " + label(place));
        }
        single.addAll(rows);
        single.addAll(sealRows(survey));
        return new SheetPart.Flow(single);
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

    /** How sure the person was, where it was not simply measured: the heading says so. */
    private String mark(Survey survey, Pointer place) {
        Optional<Node> node = survey.document().at(place);
        return node.filter(Branch.class::isInstance).flatMap(found -> ((Branch) found).text("quality"))
                .filter(quality -> !quality.equals(Quality.MEASURED.code()))
                .map(quality -> " " + wording.text("screen.quality." + quality)).orElse("");
    }

    private String given(Working.Input input) {
        return value(input) + " " + bare(Pointer.parse(input.symbol().reading().orElseThrow()));
    }
}
