package bedmark.office;

import bedmark.journal.Digest;
import bedmark.journal.Mark;
import bedmark.journal.Place;
import java.util.HexFormat;
import java.util.UUID;

/** How the tables keep how much of the journal they hold. */
final class MarkText {
    private static final int PARTS = 6;

    private MarkText() {
    }

    static String write(Mark mark) {
        Place place = mark.place();
        return String.join(" ", mark.journal().toString(), Long.toString(mark.sequence()),
                Integer.toString(place.segment()), Long.toString(place.offset()), Integer.toString(place.length()),
                place.hash().hex());
    }

    /** @throws IllegalArgumentException where it is none */
    static Mark read(String text) {
        String[] parts = text.split(" ");
        if (parts.length != PARTS) {
            throw new IllegalArgumentException("no mark: " + text);
        }
        return new Mark(UUID.fromString(parts[0]), Long.parseLong(parts[1]), new Place(Integer.parseInt(parts[2]),
                Long.parseLong(parts[3]), Integer.parseInt(parts[4]),
                Digest.ofBytes(HexFormat.of().parseHex(parts[5]))));
    }
}
