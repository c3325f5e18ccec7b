package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Pointer;
import java.util.Map;
import java.util.Optional;

/**
 * A document as it was read, with the line and column of every key and item.
 *
 * @param root   the object that the text holds
 * @param places where each value begins in the text
 */
public record Document(Branch root, Map<Pointer, Place> places) {
    public Document {
        places = Map.copyOf(places);
    }

    /** A line and a column of a text, each from 1. */
    public record Place(int line, int column) {
    }

    /** Where the value at a pointer, or the nearest value around it, begins. */
    public Optional<Place> placeOf(Pointer pointer) {
        for (int length = pointer.tokens().size(); length >= 0; length--) {
            Place place = places.get(new Pointer(pointer.tokens().subList(0, length)));
            if (place != null) {
                return Optional.of(place);
            }
        }
        return Optional.empty();
    }
}
