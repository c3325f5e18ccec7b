package bedmark.json;

import java.nio.charset.StandardCharsets;

/** Texts that a file can hold: escapes can smuggle half a surrogate pair into one. */
final class WellFormed {
    private WellFormed() {
    }

    /** Whether every text that valid UTF-8 holds is sure to be one: nothing in it is written as the code of a character. */
    static boolean isSure(byte[] utf8) {
        for (int i = 1; i < utf8.length; i++) {
            if (utf8[i] == 'u' && utf8[i - 1] == '\\') {
                return false;
            }
        }
        return true;
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
