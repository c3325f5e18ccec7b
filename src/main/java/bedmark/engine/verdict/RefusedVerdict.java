package bedmark.engine.verdict;

/**
 * A rule that could be looked at, but not judged: what it would need lies outside the methods.
 *
 * @param because the code of the assumption that says why
 */
public record RefusedVerdict(Rule rule, String because) {
}
