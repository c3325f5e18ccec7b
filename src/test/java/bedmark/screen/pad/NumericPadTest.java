package bedmark.screen.pad;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.screen.Glass;
import bedmark.screen.part.Samples;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Hand;
import bedmark.screen.theme.Light;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import javafx.beans.property.SimpleBooleanProperty;
import javafx.event.Event;
import javafx.scene.Node;
import javafx.scene.Scene;
import javafx.scene.control.Button;
import javafx.scene.control.Label;
import javafx.scene.control.TextField;
import javafx.scene.input.KeyCode;
import javafx.scene.input.KeyEvent;
import javafx.scene.layout.VBox;
import org.junit.jupiter.api.Test;

class NumericPadTest {
    private final List<PadCommand> commands = new ArrayList<>();
    private final PadModel model = new PadModel(commands::add);

    private static Button key(Node pad, PadKey key) {
        return (Button) pad.lookup("#pad-" + key.name().toLowerCase(Locale.ROOT).replace('_', '-'));
    }

    @Test
    void everyKeyIsThereAndNamed() throws Exception {
        Glass.on(() -> {
            NumericPad pad = new NumericPad(model, Samples.WORDS, new SimpleBooleanProperty(true));
            model.open(Samples.INCHES, "");
            for (PadKey key : PadKey.values()) {
                assertFalse(key(pad, key).getAccessibleText().isBlank(), key.name());
            }
            assertTrue(key(pad, PadKey.SIGN).isDisabled());
            assertEquals("+¼", key(pad, PadKey.STEP_UP).getText());
            model.close();
            assertTrue(key(pad, PadKey.DIGIT_1).isDisabled());
            return "";
        });
    }

    @Test
    void pressedKeysType() throws Exception {
        Glass.on(() -> {
            NumericPad pad = new NumericPad(model, Samples.WORDS, new SimpleBooleanProperty(true));
            model.open(Samples.INCHES, "");
            key(pad, PadKey.DIGIT_9).fire();
            key(pad, PadKey.FRACTION).fire();
            key(pad, PadKey.NEXT).fire();
            assertEquals(List.of(new PadCommand.Typed("9"), new PadCommand.Typed("9 1/4"), new PadCommand.WentOn()),
                    commands);
            return "";
        });
    }

    @Test
    void refusalIsSeen() throws Exception {
        Glass.on(() -> {
            NumericPad pad = new NumericPad(model, Samples.WORDS, new SimpleBooleanProperty(true));
            model.open(Samples.MILLIMETRES, "");
            Label note = (Label) pad.lookup(".pad-note");
            assertFalse(note.isVisible());
            key(pad, PadKey.DECIMAL).fire();
            key(pad, PadKey.DECIMAL).fire();
            assertTrue(note.isVisible());
            assertEquals("One decimal point is there already.", note.getText());
            return "";
        });
    }

    @Test
    void keysAreAsLargeAsTheHandNeeds() throws Exception {
        Glass.on(() -> {
            for (Hand hand : Hand.values()) {
                NumericPad pad = new NumericPad(model, Samples.WORDS, new SimpleBooleanProperty(true));
                model.open(Samples.INCHES, "");
                Density density = new Density(149, hand);
                Scene scene = Glass.show(new VBox(pad), Light.DAY, density, 439, 700);
                Set<Node> keys = pad.lookupAll(".pad-key");
                assertEquals(PadKey.values().length, keys.size());
                for (Node key : keys) {
                    assertTrue(key.getLayoutBounds().getHeight() / density.perMm() >= hand.target() - 1e-6);
                    assertTrue(key.getLayoutBounds().getWidth() / density.perMm() >= 12);
                }
                scene.getWindow().hide();
            }
            return "";
        });
    }

    private static void type(Node target, String sign) {
        Event.fireEvent(target, new KeyEvent(KeyEvent.KEY_TYPED, sign, sign, KeyCode.UNDEFINED, false, false, false,
                false));
    }

    private static void press(Node target, KeyCode code, boolean shift, boolean control) {
        Event.fireEvent(target, new KeyEvent(KeyEvent.KEY_PRESSED, "", "", code, shift, control, false, false));
    }

    @Test
    void keyboardDoesTheSame() throws Exception {
        Glass.on(() -> {
            Button anything = new Button();
            VBox form = new VBox(anything);
            PadKeyboard.listen(form, model);
            model.open(Samples.INCHES, "");
            type(anything, "9");
            type(anything, "/");
            press(anything, KeyCode.BACK_SPACE, false, false);
            press(anything, KeyCode.UP, false, false);
            press(anything, KeyCode.DOWN, false, false);
            type(anything, "u");
            press(anything, KeyCode.Z, false, true);
            press(anything, KeyCode.ENTER, true, false);
            press(anything, KeyCode.ENTER, false, false);
            assertEquals(List.of(new PadCommand.Typed("9"), new PadCommand.Typed("9 1/4"), new PadCommand.Typed("9"),
                    new PadCommand.Stepped(1), new PadCommand.Stepped(-1), new PadCommand.UnitSwitched(),
                    new PadCommand.Undone(), new PadCommand.WentBack(), new PadCommand.WentOn()), commands);
            return "";
        });
    }

    @Test
    void keyboardLeavesTextFieldsAlone() throws Exception {
        Glass.on(() -> {
            TextField notes = new TextField();
            VBox form = new VBox(notes);
            PadKeyboard.listen(form, model);
            model.open(Samples.INCHES, "");
            type(notes, "9");
            press(notes, KeyCode.BACK_SPACE, false, false);
            assertEquals(List.of(), commands);
            return "";
        });
    }
}
