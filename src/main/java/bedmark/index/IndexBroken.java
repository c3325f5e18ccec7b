package bedmark.index;

/** The index can't be trusted any more: it fails, or says what can't be. It is made anew; nothing is lost by that. */
final class IndexBroken extends RuntimeException {
    IndexBroken(String what) {
        super(what);
    }

    IndexBroken(Throwable cause) {
        super(cause.getMessage(), cause);
    }
}
