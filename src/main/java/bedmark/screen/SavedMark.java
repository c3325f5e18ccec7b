package bedmark.screen;

import bedmark.wording.Wording;
import java.time.format.DateTimeFormatter;
import java.util.Optional;
import javafx.beans.binding.Bindings;
import javafx.beans.binding.StringBinding;

/** Says in the head of each screen whether everything is saved. */
final class SavedMark {
    private static final DateTimeFormatter TIME = DateTimeFormatter.ofPattern("HH:mm:ss");

    /** All digits of the screens' font are as wide as each other. */
    private static final String ANY_TIME = "00:00:00";

    private SavedMark() {
    }

    /** The words: not saved and why, being saved, or when it was saved. */
    static StringBinding of(Workplace workplace) {
        Scribe scribe = workplace.scribe();
        return Bindings.createStringBinding(() -> {
            Wording wording = workplace.wording();
            if (scribe.troubleProperty().get().filter(trouble -> !trouble.code().equals(Workplace.FAILED)).isPresent()) {
                return wording.text("screen.not-saved");
            }
            if (scribe.waitingProperty().get() > 0) {
                return wording.text("screen.saving");
            }
            return scribe.savedAtProperty().get().map(at -> wording.text("screen.saved", TIME.format(at)))
                    .orElse("");
        }, scribe.troubleProperty(), scribe.waitingProperty(), scribe.savedAtProperty(), workplace.wordingProperty());
    }

    /** As long as anything that it says. */
    static String longest(Wording wording) {
        return wording.text("screen.saved", ANY_TIME);
    }

    /** Why the last act is not saved, in one sentence. */
    static Optional<String> trouble(Workplace workplace) {
        return workplace.scribe().troubleProperty().get().map(workplace.wording()::sentence);
    }
}
