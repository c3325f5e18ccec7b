package bedmark.document;

import java.util.function.Supplier;

/** An input is refused; nothing was changed. The one reason is the defect. */
public final class Refused extends RuntimeException {
    private final transient Defect defect;

    public Refused(Defect defect) {
        super(defect.code() + " at " + defect.where() + " " + defect.details());
        this.defect = defect;
    }

    public Refused(Defect defect, Throwable cause) {
        this(defect);
        initCause(cause);
    }

    /** Reads something that lies at {@code base}, so that a refusal names its whole place. */
    public static <T> T below(Pointer base, Supplier<T> reading) {
        try {
            return reading.get();
        } catch (Refused e) {
            throw new Refused(e.defect.below(base), e);
        }
    }

    /** Why something failed, for a person: the reason of a refusal, else that the program itself failed. */
    public static Defect reason(Exception failure) {
        return failure instanceof Refused refused ? refused.defect
                : Defect.in("", "program-failed", failure.getClass().getSimpleName());
    }

    public Defect defect() {
        return defect;
    }
}
