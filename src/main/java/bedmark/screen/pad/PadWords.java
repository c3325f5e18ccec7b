package bedmark.screen.pad;

import java.util.Objects;
import java.util.function.Function;

/**
 * The words of the pad.
 *
 * @param back      face of the key to the field before
 * @param next      face of the key to the next field
 * @param history   name of the key that shows what happened to the field
 * @param undo      face of the key that takes the last entry back
 * @param backspace name of the key that takes one sign away
 * @param decimal   name of the key of the decimal sign
 * @param fraction  name of the key of the quarters
 * @param sign      name of the key that turns the sign round
 * @param note      the sentence for each refusal
 */
public record PadWords(String back, String next, String history, String undo, String backspace, String decimal, String fraction,
                       String sign, Function<PadNote, String> note) {
    public PadWords {
        Objects.requireNonNull(back);
        Objects.requireNonNull(next);
        Objects.requireNonNull(history);
        Objects.requireNonNull(undo);
        Objects.requireNonNull(backspace);
        Objects.requireNonNull(decimal);
        Objects.requireNonNull(fraction);
        Objects.requireNonNull(sign);
        Objects.requireNonNull(note);
    }
}
