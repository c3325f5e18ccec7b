package bedmark.index.office;

/** The office's database failed, or says what can't be. Nothing of the transaction under way counts. */
public final class OfficeBroken extends RuntimeException {
    OfficeBroken(Throwable cause) {
        super(cause.getMessage(), cause);
    }

    OfficeBroken(String what) {
        super(what);
    }
}
