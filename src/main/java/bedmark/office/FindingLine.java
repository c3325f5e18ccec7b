package bedmark.office;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.engine.Assessment;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Rule;
import bedmark.engine.verdict.Sense;
import java.math.BigDecimal;
import java.util.Iterator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/**
 * A finding in the numbers that tell whether it became worse, at today's feed and at design feed apart: the one may
 * become worse behind the other.
 *
 * @param today    as the zone runs; nothing where that is within its limits
 * @param atDesign at design feed; nothing where that is within its limits, or can't be judged
 */
public record FindingLine(Rule rule, Optional<Seen> today, Optional<Seen> atDesign) {
    /** How many standard uncertainties of the difference tell worse from the same. */
    private static final double COVERAGE = 2;
    private static final String NOTHING = "-";
    private static final String TODAY = "today";
    private static final String AT_DESIGN = "atDesignFeed";
    private static final Map<String, Level> LEVELS =
            Stream.of(Level.values()).collect(Collectors.toMap(Level::code, Function.identity()));
    private static final Map<String, Rule> RULES =
            Stream.of(Rule.values()).collect(Collectors.toMap(Rule::code, Function.identity()));

    /**
     * What is not within its limits at one feed.
     *
     * @param observed            in the rule's unit
     * @param standardUncertainty of the observed, in the same unit
     */
    public record Seen(Level level, double observed, double standardUncertainty) {

        private boolean worseThan(Seen before, Sense sense) {
            if (level != before.level) {
                return level.compareTo(before.level) > 0;
            }
            double grown = sense == Sense.OVER ? observed - before.observed : before.observed - observed;
            return grown > COVERAGE * Math.hypot(standardUncertainty, before.standardUncertainty);
        }

        private String write() {
            return level.code() + " " + observed + " " + standardUncertainty;
        }

        private Branch document() {
            return Branch.EMPTY.with("level", level.code()).with("observed", Node.number(BigDecimal.valueOf(observed)))
                    .with("standardUncertainty", Node.number(BigDecimal.valueOf(standardUncertainty)));
        }

        private static Seen of(Branch document) {
            return new Seen(FindingLine.level(document.text("level").orElseThrow()),
                    document.number("observed").orElseThrow().doubleValue(),
                    document.number("standardUncertainty").orElseThrow().doubleValue());
        }
    }

    public FindingLine {
        if (today.isEmpty() && atDesign.isEmpty()) {
            throw new IllegalArgumentException("nothing is found: " + rule.code());
        }
    }

    /** Everything of an assessment that is not within its limits, today or at design feed. */
    public static List<FindingLine> of(Assessment assessment) {
        Map<Rule, Seen> today = seen(assessment.findings());
        Map<Rule, Seen> atDesign = seen(assessment.findingsAtDesign());
        return Stream.of(Rule.values()).filter(rule -> today.containsKey(rule) || atDesign.containsKey(rule))
                .map(rule -> new FindingLine(rule, Optional.ofNullable(today.get(rule)),
                        Optional.ofNullable(atDesign.get(rule)))).toList();
    }

    private static Map<Rule, Seen> seen(List<Finding> findings) {
        return findings.stream().filter(finding -> finding.level() != Level.WITHIN).collect(Collectors.toMap(
                Finding::rule, one -> new Seen(one.level(), one.observed(), one.standardUncertainty()),
                (one, other) -> one.level().compareTo(other.level()) >= 0 ? one : other));
    }

    /** The worse of the two feeds in level; today's where they are the same. */
    private Seen worst() {
        return Stream.of(today, atDesign).flatMap(Optional::stream)
                .reduce((one, other) -> one.level.compareTo(other.level) >= 0 ? one : other).orElseThrow();
    }

    /** At the feed at which it is worse. */
    public Level level() {
        return worst().level;
    }

    /** At the feed that is worse in level, in the rule's unit. */
    public double observed() {
        return worst().observed;
    }

    /** Of the observed, in the same unit. */
    public double standardUncertainty() {
        return worst().standardUncertainty;
    }

    /**
     * Whether it is worse than it was, today or at design feed: in level, or in its number by more than both numbers'
     * uncertainty.
     */
    boolean worseThan(FindingLine before) {
        return worse(today, before.today) || worse(atDesign, before.atDesign);
    }

    private boolean worse(Optional<Seen> now, Optional<Seen> then) {
        return now.isPresent() && (then.isEmpty() || now.get().worseThan(then.get(), rule.sense()));
    }

    static String write(List<FindingLine> findings) {
        return findings.stream().map(line -> String.join(" ", line.rule.code(),
                        line.today.map(Seen::write).orElse(NOTHING), line.atDesign.map(Seen::write).orElse(NOTHING)))
                .collect(Collectors.joining("\n"));
    }

    /** A line of an earlier program, which lasts until the zone is judged once more, has one number for both feeds. */
    static List<FindingLine> read(String text) {
        return text.lines().map(line -> {
            Iterator<String> parts = List.of(line.split(" ")).iterator();
            Rule rule = rule(parts.next());
            Optional<Seen> today = seen(parts);
            return new FindingLine(rule, today, parts.hasNext() ? seen(parts) : today);
        }).toList();
    }

    private static Optional<Seen> seen(Iterator<String> parts) {
        String first = parts.next();
        return first.equals(NOTHING) ? Optional.empty() : Optional.of(new Seen(level(first),
                Double.parseDouble(parts.next()), Double.parseDouble(parts.next())));
    }

    /** As a deed keeps it: the worse of both feeds, and each by itself. */
    Branch document() {
        Branch document = worst().document();
        document = today.isPresent() ? document.with(TODAY, today.get().document()) : document;
        return atDesign.isPresent() ? document.with(AT_DESIGN, atDesign.get().document()) : document;
    }

    /**
     * What {@link #document()} made of the finding of a rule. An earlier program kept one number and not of which feed:
     * it stands for both, so that whatever is worse than it comes back.
     */
    static FindingLine of(Rule rule, Branch document) {
        Optional<Seen> today = document.branch(TODAY).map(Seen::of);
        Optional<Seen> atDesign = document.branch(AT_DESIGN).map(Seen::of);
        Optional<Seen> either = today.isPresent() || atDesign.isPresent() ? Optional.empty()
                : Optional.of(Seen.of(document));
        return new FindingLine(rule, today.or(() -> either), atDesign.or(() -> either));
    }

    private static Rule rule(String code) {
        return Optional.ofNullable(RULES.get(code)).orElseThrow();
    }

    private static Level level(String code) {
        return Optional.ofNullable(LEVELS.get(code)).orElseThrow();
    }
}
