package bedmark.json;

import java.nio.charset.StandardCharsets;

/** Texts that a file can hold: escapes can smuggle half a surrogate pair into one. */
final class WellFormed {
    private WellFormed() {
    }

    static boolean is(String text) {
        for (int i = 0; i < text.length(); i++) {
            if (Character.isSurrogate(text.charAt(i))) {
                return StandardCharsets.UTF_8.newEncoder().canEncode(text);
            }
        }
        return true;
    }
}
