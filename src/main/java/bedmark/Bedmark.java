package bedmark;

/** The program: wires its parts by hand and hands over to a command or to the screen. */
public final class Bedmark {
    private Bedmark() {
    }

    public static void main(String... arguments) {
        throw new UnsupportedOperationException("not wired yet");
    }
}
