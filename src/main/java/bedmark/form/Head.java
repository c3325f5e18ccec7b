package bedmark.form;

import bedmark.document.Pointer;
import java.util.Objects;
import java.util.Optional;

/**
 * What fields of every kind have in common.
 *
 * @param key        unique in the form; also the key of the answer in the survey
 * @param group      where in the survey the answer lies
 * @param label      a few words beside the field
 * @param help       how to take the reading
 * @param required   whether a survey is incomplete without an answer
 * @param requiredIf when an answer is required though {@code required} is not set
 * @param shownIf    when the field is shown; always where absent. A hidden field is never required, and keeps what
 *                   it holds
 * @param caution    the safety caution beside the field
 */
public record Head(String key, Group group, Texts label, Optional<Texts> help, boolean required,
                   Optional<Condition> requiredIf, Optional<Condition> shownIf, Optional<Caution> caution) {
    public Head {
        Objects.requireNonNull(key);
        Objects.requireNonNull(group);
        Objects.requireNonNull(label);
        Objects.requireNonNull(help);
        Objects.requireNonNull(requiredIf);
        Objects.requireNonNull(shownIf);
        Objects.requireNonNull(caution);
    }

    /** A head with a key, a group and a label alone. */
    public static Head of(String key, Group group, Texts label) {
        return new Head(key, group, label, Optional.empty(), false, Optional.empty(), Optional.empty(),
                Optional.empty());
    }

    public Head require() {
        return new Head(key, group, label, help, true, requiredIf, shownIf, caution);
    }

    public Head requireIf(Condition condition) {
        return new Head(key, group, label, help, required, Optional.of(condition), shownIf, caution);
    }

    public Head showIf(Condition condition) {
        return new Head(key, group, label, help, required, requiredIf, Optional.of(condition), caution);
    }

    public Head with(Caution beside) {
        return new Head(key, group, label, help, required, requiredIf, shownIf, Optional.of(beside));
    }

    /** The place of the answer in a survey. */
    public Pointer where() {
        return group.where(key);
    }
}
