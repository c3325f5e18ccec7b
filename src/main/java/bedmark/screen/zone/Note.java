package bedmark.screen.zone;

import bedmark.form.Field;
import bedmark.form.Judgement;
import bedmark.quantity.TypedNumber;

/** Something to say below a cell. */
public sealed interface Note {

    /** What is wrong or doubtful about an answer. */
    record Judged(Judgement judgement, Field field) implements Note {
    }

    /** Why the typing is no number. */
    record NoNumber(TypedNumber.Reason reason) implements Note {
    }

    /** The field must be answered before the survey can be completed. */
    record Gap(Field field) implements Note {
    }

    /** A depth can be measured on an isolated belt only. */
    record IsolateFirst() implements Note {
    }

    /** Whether the answer is questioned and may yet be right. */
    default boolean isDoubt() {
        return this instanceof Judged judged && judged.judgement() instanceof Judgement.Doubt;
    }

    /** Whether something has to be mended, rather than thought over or added. */
    default boolean isWrong() {
        return this instanceof NoNumber || this instanceof IsolateFirst
                || this instanceof Judged judged && judged.judgement() instanceof Judgement.Refusal;
    }
}
