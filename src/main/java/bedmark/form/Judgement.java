package bedmark.form;

import bedmark.document.Node;
import bedmark.document.Pointer;
import java.util.List;

/**
 * What there is to say about an answer, without words: the words are in the bundle {@code bedmark.words.judgement}
 * under the code, with {@code {0}} for the field's label and {@code {1}…} for the details.
 */
public sealed interface Judgement {

    /** The place in the survey; inside a table, the cell. */
    Pointer where();

    /** Lower-case words joined by hyphens. */
    String code();

    /** What the sentence names: quantities, plain numbers and texts, formatted by the one who shows them. */
    List<Node> details();

    /** Impossible: the survey is not completed while this stands. */
    record Refusal(Pointer where, String code, List<Node> details) implements Judgement {
        public Refusal {
            details = List.copyOf(details);
        }
    }

    /** Implausible: questioned once, in words, and then believed. */
    record Doubt(Pointer where, String code, List<Node> details) implements Judgement {
        public Doubt {
            details = List.copyOf(details);
        }
    }

    static Judgement refusal(Pointer where, String code, Node... details) {
        return new Refusal(where, code, List.of(details));
    }

    static Judgement doubt(Pointer where, String code, Node... details) {
        return new Doubt(where, code, List.of(details));
    }
}
