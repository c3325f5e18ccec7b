package bedmark.json;

import java.nio.charset.StandardCharsets;

/** Texts that a file can hold: escapes can smuggle half a surrogate pair into one. */
final class WellFormed {
    private WellFormed() {
    }

    /** Whether every text that valid UTF-8 holds is sure to be one: nothing in it is written as the code of a character. */
    static boolean isSure(byte[] utf8) {
        for (int at = JsonScan.find(utf8, '\\', 0); at >= 0; at = JsonScan.find(utf8, '\\', at + 1)) {
            if (at + 1 < utf8.length && utf8[at + 1] == 'u') {
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
