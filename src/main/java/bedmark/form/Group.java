package bedmark.form;

import bedmark.document.Pointer;
import java.util.Optional;
import java.util.stream.Stream;

/** Where in a survey the answer of a field lies. */
public enum Group {
    /** Numbers that the engine reads, and what a form adds to them. */
    READINGS("readings", Pointer.of("readings")),
    /** What was seen. */
    OBSERVATIONS("observations", Pointer.of("observations")),
    /** The survey itself: notes, the permit. */
    SURVEY("survey", Pointer.ROOT);

    private final String code;
    private final Pointer base;

    Group(String code, Pointer base) {
        this.code = code;
        this.base = base;
    }

    /** The word used in form files. */
    public String code() {
        return code;
    }

    /** The place of an answer with that key. */
    public Pointer where(String key) {
        return base.child(key);
    }

    public static Optional<Group> ofCode(String code) {
        return Stream.of(values()).filter(group -> group.code.equals(code)).findFirst();
    }
}
