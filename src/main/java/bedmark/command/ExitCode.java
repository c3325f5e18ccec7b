package bedmark.command;

/** The exit codes that scripts rely on. */
final class ExitCode {
    /** Done; nothing is overloaded, undecided or incomplete. */
    static final int FINE = 0;
    /** Something is overloaded. */
    static final int OVERLOADED = 1;
    /** Some surveys are known with another content; of commands that take surveys in. */
    static final int DIFFERING = 1;
    /** The call's words are off. */
    static final int BAD_USE = 2;
    /** An input can't be read; the reason stands on standard error in one line. */
    static final int UNREADABLE = 3;
    /** Nothing is overloaded, but something is undecided or incomplete. */
    static final int UNSETTLED = 4;

    private ExitCode() {
    }
}
