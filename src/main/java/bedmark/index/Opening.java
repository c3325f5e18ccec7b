package bedmark.index;

import bedmark.document.Defect;
import java.util.List;

/**
 * What opening a store found and did.
 *
 * @param rebuilt  whether the index was made anew
 * @param replayed entries that the index took in
 * @param found    what a person should know: a torn tail that was cut off and kept, entries that are damaged
 */
public record Opening(boolean rebuilt, long replayed, List<Defect> found) {
    public Opening {
        found = List.copyOf(found);
    }
}
