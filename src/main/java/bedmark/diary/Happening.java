package bedmark.diary;

import java.util.Locale;

/** What is noted in the diary. Each is a fixed word, so that nothing that a person wrote can get in. */
public enum Happening {
    /** The program opened a store. */
    STORE_OPENED,
    /** The store was closed in good order. */
    STORE_CLOSED,
    /** Something failed that the program did not expect. */
    FAILED;

    String word() {
        return name().toLowerCase(Locale.ROOT).replace('_', '-');
    }
}
