package bedmark.engine.uncertainty;

import java.util.List;

/**
 * A reading that cannot be: negative, a zero length, a board beyond the wing rolls. Merely implausible readings are
 * computed and flagged instead.
 */
public final class ImpossibleReading extends RuntimeException {
    private final String code;
    private final String readingName;
    private final transient List<String> arguments;

    /**
     * @param code        lower-case words joined by hyphens
     * @param readingName the JSON Pointer of the reading
     * @param arguments   what a sentence about it names; numbers in SI
     */
    public ImpossibleReading(String code, String readingName, String... arguments) {
        super(code + " at " + readingName + " " + List.of(arguments));
        this.code = code;
        this.readingName = readingName;
        this.arguments = List.of(arguments);
    }

    public String code() {
        return code;
    }

    public String readingName() {
        return readingName;
    }

    public List<String> arguments() {
        return arguments;
    }
}
