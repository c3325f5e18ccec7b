package bedmark.form;

import java.util.List;

/** One of the answers that a field offers: a code for the document, words for the person. */
public record Choice(String code, Texts label) {

    static boolean has(List<Choice> choices, String code) {
        return choices.stream().anyMatch(choice -> choice.code.equals(code));
    }
}
