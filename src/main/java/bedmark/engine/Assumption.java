package bedmark.engine;

import java.util.List;

/**
 * Something that was taken for granted, and that whoever reads the result must know.
 *
 * @param code      lower-case words joined by hyphens
 * @param arguments what a sentence about it names: codes, JSON Pointers, numbers in SI
 */
public record Assumption(String code, List<String> arguments) {
    public Assumption {
        arguments = List.copyOf(arguments);
    }

    public static Assumption of(String code, String... arguments) {
        return new Assumption(code, List.of(arguments));
    }
}
