package bedmark.screen.zone;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.screen.Glass;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Light;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import javafx.scene.layout.VBox;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A place asks its row once how high it is at a width; nobody may see that it does not ask again. */
class RowPlaceTest {
    private static final int ACTS = 40;
    private static final double[] WIDTHS = {-1, 320, 490};

    @TempDir
    private Path temp;

    private final VBox list = new VBox();
    private final Map<SlotRow, RowPlace> places = new HashMap<>();
    private final Map<SlotRow, Set<List<Double>>> seen = new HashMap<>();

    @Test
    void placeIsAsHighAsItsRowIsNow() throws Exception {
        try (Fidget person = new Fidget(temp.resolve("store"))) {
            Glass.on(() -> {
                Glass.show(list, Light.DAY, Density.standard(), 490, 800);
                for (int i = 0; i < ACTS; i++) {
                    person.act();
                    for (SlotRow row : person.model().rowsProperty().get()) {
                        RowPlace shown = places.computeIfAbsent(row, asked -> built(person, asked));
                        shown.update();
                        RowPlace fresh = built(person, row);
                        List<Double> heights = heights(shown);
                        assertEquals(heights(fresh), heights, "row " + row.place() + " after act " + i);
                        seen.computeIfAbsent(row, asked -> new HashSet<>()).add(heights);
                        list.getChildren().remove(fresh);
                    }
                }
                list.getScene().getWindow().hide();
                return null;
            });
        }
        assertTrue(seen.values().stream().anyMatch(heights -> heights.size() > 1), "a row is not always as high");
    }

    private RowPlace built(Fidget person, SlotRow row) {
        RowPlace place = new RowPlace(row, person.model(), person.wording(), false);
        list.getChildren().add(place);
        place.build();
        return place;
    }

    /** How high the place would be, and how high it has to be, at each width. */
    private static List<Double> heights(RowPlace place) {
        place.applyCss();
        return Arrays.stream(WIDTHS)
                .mapToObj(width -> List.of(place.prefHeight(width), place.minHeight(width)))
                .flatMap(List::stream).toList();
    }
}
