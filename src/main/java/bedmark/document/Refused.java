package bedmark.document;

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

    public Defect defect() {
        return defect;
    }
}
