package bedmark.office;

import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Rule;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/**
 * One result judged twice: by the register that it was made with, and by today's.
 *
 * @param own   by the register that it was made with
 * @param today by today's
 */
public record Rejudged(JudgedZone own, JudgedZone today) {

    /**
     * A rule that the two registers judge differently, each at the feed at which it is worse.
     *
     * @param own   within where the rule finds nothing
     * @param today within where the rule finds nothing
     */
    public record Turn(Rule rule, Level own, Level today) {
    }

    /** The rules that are judged differently. */
    public List<Turn> turns() {
        Map<Rule, Level> then = levels(own);
        Map<Rule, Level> now = levels(today);
        return Stream.of(Rule.values()).map(rule -> new Turn(rule, then.getOrDefault(rule, Level.WITHIN),
                now.getOrDefault(rule, Level.WITHIN))).filter(turn -> turn.own() != turn.today()).toList();
    }

    /** Whether anyone who reads the two levels would read something else. */
    public boolean differs() {
        return own.assessment().level() != today.assessment().level()
                || !own.assessment().levelAtDesignFeed().equals(today.assessment().levelAtDesignFeed())
                || !turns().isEmpty();
    }

    private static Map<Rule, Level> levels(JudgedZone zone) {
        return FindingLine.of(zone.assessment()).stream().collect(Collectors.toMap(FindingLine::rule,
                FindingLine::level, Level::or));
    }
}
