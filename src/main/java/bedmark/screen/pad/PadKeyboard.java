package bedmark.screen.pad;

import java.util.Map;
import java.util.Optional;
import javafx.scene.Node;
import javafx.scene.control.TextInputControl;
import javafx.scene.input.KeyCode;
import javafx.scene.input.KeyEvent;

/** Lets a keyboard do what the keys of the pad do. */
public final class PadKeyboard {
    private static final Map<KeyCode, PadKey> CONTROLS = Map.of(
            KeyCode.BACK_SPACE, PadKey.BACKSPACE, KeyCode.ENTER, PadKey.NEXT, KeyCode.UP, PadKey.STEP_UP,
            KeyCode.DOWN, PadKey.STEP_DOWN);

    private final PadModel model;

    private PadKeyboard(PadModel model) {
        this.model = model;
    }

    /**
     * Listens to what is typed in the form, wherever the focus is, but for fields that take text themselves: digits,
     * point and comma, {@code /} for the quarters, {@code -} for the sign, U for the unit, the arrows for the steps,
     * Enter for the next field and Shift-Enter for the one before, Control-Z for the last entry back, H for the history. Tab stays the
     * way from control to control.
     */
    public static void listen(Node form, PadModel model) {
        PadKeyboard keyboard = new PadKeyboard(model);
        form.addEventHandler(KeyEvent.KEY_PRESSED, keyboard::pressed);
        form.addEventHandler(KeyEvent.KEY_TYPED, keyboard::typed);
    }

    private void pressed(KeyEvent event) {
        control(event).filter(key -> !(event.getTarget() instanceof TextInputControl)).filter(model::offers)
                .ifPresent(key -> {
                    model.press(key);
                    event.consume();
                });
    }

    private static Optional<PadKey> control(KeyEvent event) {
        if (event.isShortcutDown() && event.getCode() == KeyCode.Z) {
            return Optional.of(PadKey.UNDO);
        }
        if (event.isShiftDown() && event.getCode() == KeyCode.ENTER) {
            return Optional.of(PadKey.BACK);
        }
        return Optional.ofNullable(CONTROLS.get(event.getCode()));
    }

    private void typed(KeyEvent event) {
        if (event.getTarget() instanceof TextInputControl || event.isShortcutDown()
                || event.getCharacter().length() != 1) {
            return;
        }
        char sign = event.getCharacter().charAt(0);
        if (sign >= '0' && sign <= '9') {
            model.press(PadKey.digit(sign - '0'));
        } else if (sign == '.' || sign == ',') {
            model.pressSign(sign);
        } else {
            other(Character.toLowerCase(sign)).ifPresent(model::press);
        }
    }

    private static Optional<PadKey> other(char sign) {
        return switch (sign) {
            case '/' -> Optional.of(PadKey.FRACTION);
            case '-' -> Optional.of(PadKey.SIGN);
            case 'h' -> Optional.of(PadKey.HISTORY);
            case 'u' -> Optional.of(PadKey.UNIT);
            default -> Optional.empty();
        };
    }
}
