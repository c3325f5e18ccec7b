package bedmark.index.office;

import java.nio.charset.StandardCharsets;

/**
 * Texts that many rows hold, such as areas, materials and units: most are made once. What comes about is the same
 * whichever thread asks; two of them at once may make a text twice.
 */
final class RepeatedTexts {
    /** A power of two. */
    private static final int KEPT = 4096;
    private static final int LONGEST = 40;
    private static final String[] TEXTS = new String[KEPT];

    private RepeatedTexts() {
    }

    /** The text of some bytes of UTF-8. */
    static String of(byte[] bytes, int at, int length) {
        if (length == 0) {
            return "";
        }
        if (length > LONGEST) {
            return new String(bytes, at, length, StandardCharsets.UTF_8);
        }
        int hash = length;
        for (int i = at; i < at + length; i++) {
            hash = hash * 31 + bytes[i];
        }
        int place = (hash ^ hash >>> 15) & KEPT - 1;
        String known = TEXTS[place];
        if (known == null || !is(known, bytes, at, length)) {
            known = new String(bytes, at, length, StandardCharsets.UTF_8);
            TEXTS[place] = known;
        }
        return known;
    }

    /** Whether that is the text; never where it holds more than plain letters. */
    private static boolean is(String text, byte[] bytes, int at, int length) {
        if (text.length() != length) {
            return false;
        }
        for (int i = 0; i < length; i++) {
            if (text.charAt(i) != bytes[at + i]) {
                return false;
            }
        }
        return true;
    }
}
