package bedmark.screen.part;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.screen.Glass;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Light;
import java.util.List;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.TimeUnit;
import java.util.function.Supplier;
import javafx.application.Platform;
import javafx.scene.Parent;
import javafx.scene.Scene;
import javafx.scene.control.Label;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;

class SteadyTest {
    private static final String SHORT = "Overloaded";
    private static final String AS_SHORT = "Near limit";
    private static final String LONG = "The bed is deeper than the boards stand high, all along the zone. ".repeat(3);

    private final Counted around = new Counted();
    private Label words;
    private Region below;
    private Scene scene;

    /** Counts how often it is laid out. */
    private static final class Counted extends VBox {
        private int times;

        @Override
        protected void layoutChildren() {
            times++;
            super.layoutChildren();
        }
    }

    @BeforeEach
    void showWords() throws Exception {
        Glass.on(() -> {
            words = Labels.wrapped("sentence", SHORT);
            below = new Region();
            below.setPrefHeight(20);
            around.getChildren().addAll(new Steady(new VBox(words)), below);
            scene = Glass.show(around, Light.DAY, Density.standard(), 300, 400);
            return null;
        });
        inTheNextFrame(() -> { }, () -> null);
    }

    @AfterEach
    void hide() throws Exception {
        Glass.on(() -> {
            scene.getWindow().hide();
            return null;
        });
    }

    @Test
    void partThatGrowsOrShrinksMovesWhatIsBelowInTheSameFrame() throws Exception {
        double before = Glass.on(below::getLayoutY);
        List<Double> longer = inTheNextFrame(() -> words.setText(LONG), this::heightAndPlace);
        assertTrue(longer.get(1) >= 3 * before, "it takes lines more: " + longer);
        assertEquals(longer.get(0), longer.get(1), "all of it is seen");
        List<Double> shorter = inTheNextFrame(() -> words.setText(SHORT), this::heightAndPlace);
        assertEquals(List.of(before, before), shorter);
    }

    @Test
    void wordThatIsTooWideLeavesThePartAsWideAsItsRoom() throws Exception {
        double room = Glass.on(() -> words.getParent().getLayoutBounds().getWidth());
        Glass.on(() -> {
            words.setWrapText(false);
            words.setMinWidth(Region.USE_PREF_SIZE);
            return null;
        });
        assertEquals(room, inTheNextFrame(() -> {
            words.setText(LONG);
            // Something else may have the screen laid out just then.
            words.getParent().getParent().requestLayout();
        }, () -> words.getParent().getLayoutBounds().getWidth()));
        assertEquals(room, inTheNextFrame(() -> words.setText(SHORT),
                () -> words.getParent().getLayoutBounds().getWidth()));
    }

    private List<Double> heightAndPlace() {
        Parent held = words.getParent();
        return List.of(held.prefHeight(held.getLayoutBounds().getWidth()), below.getLayoutY());
    }

    @Test
    void wordsThatTakeNoMoreRoomAreNoMatterOfTheScreenAround() throws Exception {
        int before = Glass.on(() -> around.times);
        int after = inTheNextFrame(() -> words.setText(AS_SHORT), () -> around.times);
        assertEquals(before, after);
        assertEquals(AS_SHORT, Glass.on(words::getText));
        int grown = inTheNextFrame(() -> words.setText(LONG), () -> around.times);
        assertTrue(grown > after, "it counts");
    }

    /** Does something, and looks at what the very next frame would draw. */
    private <T> T inTheNextFrame(Runnable change, Supplier<T> seen) throws Exception {
        CompletableFuture<T> result = new CompletableFuture<>();
        Glass.on(() -> {
            scene.addPostLayoutPulseListener(new Runnable() {
                @Override
                public void run() {
                    scene.removePostLayoutPulseListener(this);
                    try {
                        result.complete(seen.get());
                    } catch (RuntimeException e) {
                        result.completeExceptionally(e);
                    }
                }
            });
            change.run();
            Platform.requestNextPulse();
            return null;
        });
        return result.get(20, TimeUnit.SECONDS);
    }
}
