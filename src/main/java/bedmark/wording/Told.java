package bedmark.wording;

import java.util.List;
import java.util.Optional;

/**
 * An assessment as a person reads it at a glance.
 *
 * @param sentence what is the case
 * @param sure     how sure that is
 * @param against  the number that makes the verdict, against its limit
 * @param atDesign the verdict at design feed, or that it holds at today's feed only
 * @param figures  the numbers that count, each with its spread
 * @param action   the one thing that helps most, and what it saves
 * @param repeat   the reading to take again, where that would settle the verdict
 */
public record Told(String sentence, Optional<String> sure, Optional<String> against,
                   Optional<String> atDesign, List<Figure> figures, Optional<String> action,
                   Optional<String> repeat) {
    public Told {
        figures = List.copyOf(figures);
    }

    /**
     * One number.
     *
     * @param label  what it is
     * @param number formatted, without its unit
     * @param rest   spread and unit, smaller beside it
     */
    public record Figure(String label, String number, String rest) {
    }
}
