package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Pointer;
import java.util.Comparator;
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

    /** The same defect with the line and column of its place: {@code /surveys/0/id (12:5)}. */
    public Defect placed(Defect defect) {
        return placeOf(pointer(defect))
                .map(place -> new Defect(defect.code(), (defect.where() + " (" + place.line() + ":" + place.column()
                        + ")").strip(), defect.details()))
                .orElse(defect);
    }

    /** Defects of this document as a person meets them who reads its text from the top. */
    Comparator<Defect> inTextOrder() {
        return Comparator.<Defect>comparingInt(defect -> placeOf(pointer(defect)).map(Place::line).orElse(0))
                .thenComparingInt(defect -> placeOf(pointer(defect)).map(Place::column).orElse(0))
                .thenComparing(Defect::where).thenComparing(Defect::code);
    }

    private static Pointer pointer(Defect defect) {
        return Pointer.parse(defect.where());
    }
}
