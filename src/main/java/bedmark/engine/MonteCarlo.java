package bedmark.engine;

import bedmark.engine.drag.DragMethod;
import bedmark.engine.uncertainty.Distribution;
import bedmark.engine.verdict.Chance;
import bedmark.engine.verdict.Rule;
import java.util.Collections;
import java.util.EnumMap;
import java.util.Map;

/**
 * What came of drawing the readings of a zone many times (JCGM 101:2008): the check of the first order, and what counts
 * where a depth is so uncertain that its square is no longer near enough to a straight line. The same seed gives the
 * same numbers on every device.
 *
 * <p>Each reading is drawn from the normal distribution about its value; one that cannot be, such as a negative depth,
 * is drawn again. What the zones of a conveyor take from the same row of the register is drawn once for all of them. The
 * disagreement of the drag methods, where it counts, is drawn evenly over their range, in all zones alike, and enters
 * the rules on power alone.
 *
 * @param trials        how often everything was drawn
 * @param results       the distribution of each number that could be computed in every trial
 * @param methods       the same of the material drag by each method
 * @param chances       how often each rule was broken at today's feed
 * @param chancesAtDesign the same at design throughput; none where that cannot be judged
 */
public record MonteCarlo(int trials, Map<Result, Distribution> results, Map<DragMethod, Distribution> methods,
        Map<Rule, Chance> chances, Map<Rule, Chance> chancesAtDesign) {

    public MonteCarlo {
        results = copy(Result.class, results);
        methods = copy(DragMethod.class, methods);
        chances = copy(Rule.class, chances);
        chancesAtDesign = copy(Rule.class, chancesAtDesign);
    }

    private static <K extends Enum<K>, V> Map<K, V> copy(Class<K> keys, Map<K, V> values) {
        Map<K, V> copy = new EnumMap<>(keys);
        copy.putAll(values);
        return Collections.unmodifiableMap(copy);
    }
}
