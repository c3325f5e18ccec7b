package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.text.Normalizer;
import java.util.Locale;
import java.util.Optional;
import java.util.regex.Pattern;

/**
 * Names of files in a pack: relative, with slashes, and meaning the same on every system that might unpack them.
 */
final class EntryName {
    private static final int LONGEST = 512;
    private static final int LONGEST_SEGMENT = 255;
    private static final int LONGEST_SHOWN = 120;
    private static final Pattern DRIVE = Pattern.compile("[A-Za-z]:.*|//.*|\\\\\\\\.*", Pattern.DOTALL);
    private static final Pattern DEVICE = Pattern.compile(
            "(CON|PRN|AUX|NUL|CONIN\\$|CONOUT\\$|(COM|LPT)[0-9¹²³]) *([.:].*)?", Pattern.CASE_INSENSITIVE);
    /** Windows forbids most of these; a percent sign is written differently in a bag's manifest. */
    private static final Pattern FORBIDDEN = Pattern.compile("[<>:\"|?*%]");

    private EntryName() {
    }

    /** Nothing where the bytes are not UTF-8. */
    static Optional<String> decoded(byte[] bytes) {
        try {
            return Optional.of(StandardCharsets.UTF_8.newDecoder().onMalformedInput(CodingErrorAction.REPORT)
                    .onUnmappableCharacter(CodingErrorAction.REPORT).decode(ByteBuffer.wrap(bytes)).toString());
        } catch (CharacterCodingException e) {
            return Optional.empty();
        }
    }

    /**
     * Refuses a name that could lead somewhere else, or that some system would take for something else.
     *
     * @throws Refused with the code of {@link #hazard(String)}, naming the name
     */
    static String safe(String name) {
        hazard(name).ifPresent(code -> {
            throw new Refused(Defect.in(shown(name), code));
        });
        return name;
    }

    /** The code of what is wrong with a name. */
    static Optional<String> hazard(String name) {
        if (name.codePoints().anyMatch(EntryName::isInvisible)) {
            return Optional.of("name-control");
        } else if (DRIVE.matcher(name).matches()) {
            return Optional.of("name-drive");
        } else if (name.indexOf('\\') >= 0) {
            return Optional.of("name-backslash");
        } else if (name.startsWith("/")) {
            return Optional.of("name-absolute");
        }
        String[] segments = name.split("/", -1);
        for (String segment : segments) {
            if (segment.equals("..")) {
                return Optional.of("name-parent");
            }
        }
        for (String segment : segments) {
            if (DEVICE.matcher(segment).matches()) {
                return Optional.of("name-reserved");
            } else if (isUnsafe(segment)) {
                return Optional.of("name-unsafe");
            }
        }
        return name.getBytes(StandardCharsets.UTF_8).length > LONGEST ? Optional.of("name-unsafe") : Optional.empty();
    }

    private static boolean isUnsafe(String segment) {
        return segment.isEmpty() || segment.equals(".") || segment.endsWith(".") || segment.endsWith(" ")
                || segment.startsWith(" ") || FORBIDDEN.matcher(segment).find()
                || segment.getBytes(StandardCharsets.UTF_8).length > LONGEST_SEGMENT;
    }

    /** Control and format characters, line ends and halves of pairs: what a list of names would not show. */
    private static boolean isInvisible(int codePoint) {
        int kind = Character.getType(codePoint);
        return kind == Character.CONTROL || kind == Character.FORMAT || kind == Character.SURROGATE
                || kind == Character.LINE_SEPARATOR || kind == Character.PARAGRAPH_SEPARATOR;
    }

    /** Two names that fold to the same text are one file on some system. */
    static String folded(String name) {
        String once = Normalizer.normalize(name, Normalizer.Form.NFKC);
        return Normalizer.normalize(once.toUpperCase(Locale.ROOT).toLowerCase(Locale.ROOT), Normalizer.Form.NFKC);
    }

    /** A name from elsewhere, fit for one line on a terminal. */
    static String shown(String name) {
        StringBuilder text = new StringBuilder();
        name.codePoints().limit(LONGEST_SHOWN).forEach(codePoint -> {
            if (isInvisible(codePoint)) {
                text.append(String.format("\\u%04x", codePoint));
            } else {
                text.appendCodePoint(codePoint);
            }
        });
        return name.codePoints().count() > LONGEST_SHOWN ? text + "…" : text.toString();
    }
}
