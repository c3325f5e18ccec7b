package bedmark.office;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.engine.Assessment;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Rule;
import bedmark.engine.verdict.Sense;
import java.math.BigDecimal;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/**
 * A finding in the numbers that tell whether it became worse.
 *
 * @param observed            in the rule's unit
 * @param standardUncertainty of the observed, in the same unit
 */
public record FindingLine(Rule rule, Level level, double observed, double standardUncertainty) {
    /** How many standard uncertainties of the difference tell worse from the same. */
    private static final double COVERAGE = 2;
    private static final Map<String, Level> LEVELS =
            Stream.of(Level.values()).collect(Collectors.toMap(Level::code, Function.identity()));
    private static final Map<String, Rule> RULES =
            Stream.of(Rule.values()).collect(Collectors.toMap(Rule::code, Function.identity()));

    /** Everything of an assessment that is not within its limits, today or at design feed. */
    static List<FindingLine> of(Assessment assessment) {
        return Stream.concat(assessment.findings().stream(), assessment.findingsAtDesign().stream())
                .filter(finding -> finding.level() != Level.WITHIN)
                .collect(Collectors.toMap(Finding::rule, FindingLine::line, FindingLine::worse)).values().stream()
                .sorted((one, other) -> one.rule.compareTo(other.rule)).toList();
    }

    private static FindingLine line(Finding finding) {
        return new FindingLine(finding.rule(), finding.level(), finding.observed(), finding.standardUncertainty());
    }

    private static FindingLine worse(FindingLine one, FindingLine other) {
        return one.level.compareTo(other.level) >= 0 ? one : other;
    }

    /** Whether it is worse than it was: in level, or in its number by more than both numbers' uncertainty. */
    boolean worseThan(FindingLine before) {
        if (level != before.level) {
            return level.compareTo(before.level) > 0;
        }
        double grown = rule.sense() == Sense.OVER ? observed - before.observed : before.observed - observed;
        return grown > COVERAGE * Math.hypot(standardUncertainty, before.standardUncertainty);
    }

    static String write(List<FindingLine> findings) {
        return findings.stream().map(line -> String.join(" ", line.rule.code(), line.level.code(),
                Double.toString(line.observed), Double.toString(line.standardUncertainty)))
                .collect(Collectors.joining("\n"));
    }

    static List<FindingLine> read(String text) {
        return text.lines().map(line -> {
            String[] parts = line.split(" ");
            return new FindingLine(rule(parts[0]), level(parts[1]), Double.parseDouble(parts[2]),
                    Double.parseDouble(parts[3]));
        }).toList();
    }

    /** As a deed keeps it. */
    Branch document() {
        return Branch.EMPTY.with("level", level.code()).with("observed", Node.number(BigDecimal.valueOf(observed)))
                .with("standardUncertainty", Node.number(BigDecimal.valueOf(standardUncertainty)));
    }

    /** What {@link #document()} made of the finding of a rule. */
    static FindingLine of(Rule rule, Branch document) {
        return new FindingLine(rule, level(document.text("level").orElseThrow()),
                document.number("observed").orElseThrow().doubleValue(),
                document.number("standardUncertainty").orElseThrow().doubleValue());
    }

    private static Rule rule(String code) {
        return Optional.ofNullable(RULES.get(code)).orElseThrow();
    }

    private static Level level(String code) {
        return Optional.ofNullable(LEVELS.get(code)).orElseThrow();
    }
}
