package bedmark.engine.working;

import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A formula as it is printed. The expression is plain mathematical notation in SI: signs, decimal numbers,
 * {@code + − · /}, {@code ²} and {@code ³}, {@code √} before a sign or a bracket, {@code sin cos tan} before a sign,
 * {@code min(…, …)} and {@code max(…, …)}, and {@code π}. It stands beside the code that computes it, and a test
 * evaluates the one against the other.
 *
 * @param code       lower-case words joined by hyphens; the key of its name
 * @param sign       of what comes out, such as {@code Fm}
 * @param expression of the signs that go in
 * @param general    the same for any number of stations, to be printed before the numbers; empty where the expression
 *                   itself is printed
 * @param source     mark of the source: S1…S12, R, C, A, D
 */
public record Formula(String code, String sign, String expression, String general, String source) {
    private static final Pattern WORD = Pattern.compile("\\p{L}[\\p{L}0-9′]*");
    private static final Set<String> NO_SIGNS = Set.of("sin", "cos", "tan", "min", "max", "π");

    /** A formula that is printed as it is. */
    public static Formula of(String code, String sign, String expression, String source) {
        return new Formula(code, sign, expression, "", source);
    }

    /** The signs in the expression, each once, in their order. */
    public List<String> signs() {
        Set<String> signs = new LinkedHashSet<>();
        WORD.matcher(expression).results().map(match -> match.group()).filter(word -> !NO_SIGNS.contains(word))
                .forEach(signs::add);
        return List.copyOf(signs);
    }

    /** The expression with something else in the place of each sign. */
    public String substituted(Map<String, String> replacements) {
        return WORD.matcher(expression).replaceAll(match -> Matcher.quoteReplacement(
                replacements.getOrDefault(match.group(), match.group())));
    }

    /** The same formula of other signs. */
    public Formula withSigns(Map<String, String> others) {
        return new Formula(code, others.getOrDefault(sign, sign), substituted(others), general, source);
    }
}
