package bedmark.sample;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import java.util.ArrayList;
import java.util.List;

/**
 * Seals in the short notation of the tables: {@code left oblique worn 2.4, oblique 2.4; right none}. A side (or
 * {@code both}), then its segments as type, condition where it is not sound, and length where it is not the whole
 * zone's.
 */
final class SampleSeals {
    private SampleSeals() {
    }

    /** The {@code seals} of the readings. */
    static Node of(String notation, Quantity zoneLength) {
        List<Node> segments = new ArrayList<>();
        for (String part : notation.split(";")) {
            String[] words = part.strip().split(" ", 2);
            for (String side : words[0].equals("both") ? List.of("left", "right") : List.of(words[0])) {
                for (String segment : words[1].split(",")) {
                    segments.add(segment(side, segment.strip().split(" "), zoneLength));
                }
            }
        }
        return new Node.Series(segments);
    }

    private static Branch segment(String side, String[] words, Quantity zoneLength) {
        Branch segment = Branch.EMPTY.with("side", side).with("type", words[0]);
        if (!words[0].equals("none")) {
            segment = segment.with("condition", words.length > 1 && isWord(words[1]) ? words[1] : "sound");
        }
        String last = words[words.length - 1];
        Unit unit = zoneLength.unit();
        return segment.with("length", isWord(last) ? zoneLength : Quantity.of(last, unit));
    }

    private static boolean isWord(String text) {
        return Character.isLetter(text.charAt(0));
    }
}
