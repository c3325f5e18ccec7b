package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Pointer;
import java.util.Comparator;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.atomic.AtomicReference;
import java.util.function.Supplier;

/** A document as it was read. The line and column of every key and item are found when they are first asked for. */
public final class Document {
    private final Branch root;
    private final Supplier<Map<Pointer, Place>> finding;
    private final AtomicReference<Map<Pointer, Place>> places = new AtomicReference<>();

    /**
     * @param root    the object that the text holds
     * @param finding finds where each value begins in the text; it costs more than reading did, and most documents have
     *                nothing wrong
     */
    Document(Branch root, Supplier<Map<Pointer, Place>> finding) {
        this.root = root;
        this.finding = finding;
    }

    /** A document that has no text of its own. */
    Document(Branch root) {
        this(root, Map::of);
    }

    public Branch root() {
        return root;
    }

    /** A line and a column of a text, each from 1. */
    public record Place(int line, int column) {
    }

    /** Where the value at a pointer, or the nearest value around it, begins. */
    public Optional<Place> placeOf(Pointer pointer) {
        Map<Pointer, Place> known = places.updateAndGet(found -> found == null ? finding.get() : found);
        for (int length = pointer.tokens().size(); length >= 0; length--) {
            Place place = known.get(new Pointer(pointer.tokens().subList(0, length)));
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
