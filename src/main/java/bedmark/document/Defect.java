package bedmark.document;

import java.util.List;
import java.util.Objects;

/**
 * Something wrong with an input, without words: the words are in the bundle {@code bedmark.words.defect} under the
 * code, with {@code {0}} for the place and {@code {1}…} for the details.
 *
 * @param code    lower-case words joined by hyphens, such as {@code unit-unknown}
 * @param where   a JSON Pointer, file name or other place that a person can find; empty for the whole input
 * @param details what the sentence names, in the order of its placeholders
 */
public record Defect(String code, String where, List<String> details) {
    public Defect {
        Objects.requireNonNull(code);
        Objects.requireNonNull(where);
        details = List.copyOf(details);
    }

    public static Defect at(Pointer where, String code, String... details) {
        return new Defect(code, where.toString(), List.of(details));
    }

    public static Defect in(String where, String code, String... details) {
        return new Defect(code, where, List.of(details));
    }

    /** The same defect, seen from a document that holds this one at {@code base}. */
    public Defect below(Pointer base) {
        return new Defect(code, base + where, details);
    }
}
