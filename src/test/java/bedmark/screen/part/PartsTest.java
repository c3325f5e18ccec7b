package bedmark.screen.part;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.quantity.Quality;
import bedmark.screen.Glass;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Icon;
import bedmark.screen.theme.Light;
import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.OptionalInt;
import javafx.css.PseudoClass;
import javafx.scene.Node;
import javafx.scene.Scene;
import javafx.scene.control.Button;
import javafx.scene.control.Label;
import javafx.scene.layout.VBox;
import org.junit.jupiter.api.Test;

class PartsTest {

    @Test
    void qualityGoesRoundThePossibleOnes() throws Exception {
        Glass.on(() -> {
            List<Quality> chosen = new ArrayList<>();
            QualityButton button = new QualityButton(Quality.ESTIMATED, Samples::word, chosen::add);
            button.possibleProperty().set(EnumSet.of(Quality.ESTIMATED, Quality.SUSPECT));
            button.fire();
            button.fire();
            assertEquals(List.of(Quality.SUSPECT, Quality.ESTIMATED), chosen);
            assertEquals("estimated", button.getText());
            return "";
        });
    }

    @Test
    void ghostIsNoValue() throws Exception {
        Glass.on(() -> {
            FieldBox box = new FieldBox("depth", () -> { });
            box.ghostProperty().set("was 121");
            assertEquals("", box.valueProperty().get());
            return "";
        });
    }

    @Test
    void fieldComesInHandByFocusToo() throws Exception {
        Glass.on(() -> {
            List<String> chosen = new ArrayList<>();
            FieldBox first = new FieldBox("first", () -> chosen.add("first"));
            FieldBox second = new FieldBox("second", () -> chosen.add("second"));
            Scene scene = Glass.show(new VBox(first, second), Light.DAY, Density.standard(), 300, 300);
            chosen.clear();
            second.requestFocus();
            assertEquals(List.of("second"), chosen);
            scene.getWindow().hide();
            return "";
        });
    }

    @Test
    void messageTakesRoomOnlyWhileItSaysSomething() throws Exception {
        Glass.on(() -> {
            ReadingRow row = Samples.depth("4.0 m", "9000", "was 142", Quality.MEASURED, false);
            Scene scene = Glass.show(new VBox(row), Light.DAY, Density.standard(), 440, 300);
            double without = row.getHeight();
            row.box().judgementProperty().set(Judgement.WRONG);
            row.messageProperty().set("Deeper than the board is high.");
            scene.getRoot().layout();
            assertTrue(row.getHeight() > without + 15);
            assertTrue(row.lookup(".message").getPseudoClassStates().contains(PseudoClass.getPseudoClass("wrong")));
            scene.getWindow().hide();
            return "";
        });
    }

    @Test
    void verdictSaysEverythingInWordsToo() throws Exception {
        Glass.on(() -> {
            VerdictBlock block = new VerdictBlock(List.of());
            block.show(Samples.OVERLOADED);
            assertTrue(block.getAccessibleText().startsWith("overloaded. Overloaded: the bed"));
            PseudoClass overloaded = PseudoClass.getPseudoClass("overloaded");
            assertTrue(block.lookup(".sentence").getPseudoClassStates().contains(overloaded));
            block.show(Samples.INCOMPLETE);
            assertTrue(block.getAccessibleText().startsWith("incomplete. "));
            assertFalse(block.lookup(".sentence").getPseudoClassStates().contains(overloaded));
            return "";
        });
    }

    @Test
    void eightyTicksFitTheStrip() throws Exception {
        Glass.on(() -> {
            RoundTicks strip = Samples.ticks(80);
            Scene scene = Glass.show(new VBox(strip), Light.DAY, Density.standard(), 430, 60);
            double last = Double.NEGATIVE_INFINITY;
            for (Node tick : strip.getChildrenUnmodifiable()) {
                assertTrue(tick.getBoundsInParent().getMinX() > last);
                last = tick.getBoundsInParent().getMaxX();
            }
            assertTrue(last <= 430);
            strip.show(List.of(), OptionalInt.empty());
            assertEquals(0, strip.getChildrenUnmodifiable().size());
            scene.getWindow().hide();
            return "";
        });
    }

    @Test
    void narrowStripShowsTheTicksAroundTheOneInHand() throws Exception {
        Glass.on(() -> {
            RoundTicks strip = Samples.ticks(24);
            Scene scene = Glass.show(new VBox(strip), Light.DAY, Density.standard(), 76, 60);
            List<Node> shown = strip.getChildrenUnmodifiable().stream().filter(Node::isVisible).toList();
            assertTrue(shown.contains(strip.getChildrenUnmodifiable().get(7)));
            double last = Double.NEGATIVE_INFINITY;
            for (Node tick : shown) {
                assertTrue(tick.getBoundsInParent().getMinX() >= Math.max(0, last + 1));
                last = tick.getBoundsInParent().getMaxX();
            }
            assertTrue(last <= 76 && shown.size() > 3);
            scene.getWindow().hide();
            return "";
        });
    }

    @Test
    void buttonOfAnIconHasItsName() throws Exception {
        Glass.on(() -> {
            Button button = ActionButton.of(Icon.CAMERA, Weight.PLAIN, "photos", () -> { });
            assertEquals("photos", button.getAccessibleText());
            return "";
        });
    }

    @Test
    void leadNamesItsBox() throws Exception {
        Glass.on(() -> {
            ReadingRow row = Samples.depth("4.0 m", "262", "", Quality.MEASURED, false);
            assertEquals(row.box(), ((Label) row.lookup(".lead")).getLabelFor());
            return "";
        });
    }
}
