package bedmark.screen.pad;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.screen.part.Samples;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class PadModelTest {
    private static final PadSetup ALL = new PadSetup('.', true, true,
            Optional.of(new PadSetup.Steps("−¼", "+¼")), Optional.of("in | mm"));

    private final List<PadCommand> commands = new ArrayList<>();
    private final PadModel pad = new PadModel(commands::add);

    /** Presses keys written as a row of signs: digits, {@code . f s < } and the like. */
    private void press(String keys) {
        for (char key : keys.toCharArray()) {
            pad.press(switch (key) {
                case '.' -> PadKey.DECIMAL;
                case 'f' -> PadKey.FRACTION;
                case 's' -> PadKey.SIGN;
                case '<' -> PadKey.BACKSPACE;
                default -> PadKey.digit(key - '0');
            });
        }
    }

    @ParameterizedTest
    @CsvSource(ignoreLeadingAndTrailingWhitespace = true, value = {"262,262", "2.05,2.05", ".5,0.5", "05,5", "00,0",
        "9f,9 1/4", "9ff,9 1/2", "9fff,9 3/4", "9ffff,9", "f,1/4", "ff,1/2", "12s,-12", "12ss,12", "s5,-5", "s0,-0",
        "s05,-5", "262<,26", "9f<,9", "f<,''", "9sf,-9 1/4", "s9f<,-9", "1.50,1.50", "1.<2,12", "sf,-1/4"})
    void keysMakeNumbers(String keys, String text) {
        pad.open(ALL, "");
        press(keys);
        assertEquals(text, pad.textProperty().get());
    }

    @ParameterizedTest
    @CsvSource({"1.5,.,SECOND_DECIMAL_SIGN", "9f,.,DECIMAL_AFTER_FRACTION", "9f,5,DIGIT_AFTER_FRACTION",
        "1.5,f,FRACTION_AFTER_DECIMAL", "123456789012,3,TOO_LONG"})
    void whatCouldMeanTwoThingsIsRefusedAndSaid(String before, String key, PadNote note) {
        pad.open(ALL, "");
        press(before);
        String text = pad.textProperty().get();
        int told = commands.size();
        press(key);
        assertEquals(Optional.of(note), pad.noteProperty().get());
        assertEquals(text, pad.textProperty().get());
        assertEquals(told, commands.size());
    }

    @Test
    void nextKeyTakesTheNoteAway() {
        pad.open(ALL, "");
        press("1..");
        assertTrue(pad.noteProperty().get().isPresent());
        press("5");
        assertTrue(pad.noteProperty().get().isEmpty());
        assertEquals("1.5", pad.textProperty().get());
    }

    @Test
    void everyChangeIsTold() {
        pad.open(ALL, "");
        press("26<");
        assertEquals(List.of(new PadCommand.Typed("2"), new PadCommand.Typed("26"), new PadCommand.Typed("2")),
                commands);
    }

    @Test
    void openingTellsNothing() {
        pad.open(ALL, "262");
        pad.take("267");
        pad.close();
        assertEquals(List.of(), commands);
    }

    @Test
    void firstDigitTakesThePlaceOfAFreshNumber() {
        pad.open(ALL, "262");
        assertTrue(pad.freshProperty().get());
        press("30");
        assertEquals("30", pad.textProperty().get());
        assertFalse(pad.freshProperty().get());
    }

    @Test
    void otherKeysWorkOnAFreshNumber() {
        pad.open(ALL, "262");
        press("<");
        assertEquals("26", pad.textProperty().get());
        pad.open(ALL, "9");
        press("f");
        assertEquals("9 1/4", pad.textProperty().get());
    }

    @Test
    void numberFromElsewhereIsFreshAgain() {
        pad.open(ALL, "");
        press("262");
        pad.take("267");
        press("1");
        assertEquals("1", pad.textProperty().get());
    }

    @Test
    void commandsGoOutAsTheyArePressed() {
        pad.open(ALL, "262");
        for (PadKey key : List.of(PadKey.STEP_DOWN, PadKey.STEP_UP, PadKey.UNIT, PadKey.UNDO, PadKey.BACK,
                PadKey.NEXT)) {
            pad.press(key);
        }
        assertEquals(List.of(new PadCommand.Stepped(-1), new PadCommand.Stepped(1), new PadCommand.UnitSwitched(),
                new PadCommand.Undone(), new PadCommand.WentBack(), new PadCommand.WentOn()), commands);
        assertEquals("262", pad.textProperty().get());
    }

    @Test
    void signIsOfferedOnlyWhereItMakesSense() {
        pad.open(Samples.MILLIMETRES, "26");
        press("sf");
        assertEquals("26", pad.textProperty().get());
        assertFalse(pad.offers(PadKey.SIGN));
        assertFalse(pad.offers(PadKey.FRACTION));
        assertTrue(pad.offers(PadKey.STEP_UP));
    }

    @Test
    void closedPadDoesNothing() {
        press("26");
        pad.pressSign('.');
        assertEquals("", pad.textProperty().get());
        assertEquals(List.of(), commands);
    }

    @Test
    void decimalSignIsThatOfTheLocale() {
        PadSetup comma = new PadSetup(',', false, false, Optional.empty(), Optional.empty());
        pad.open(comma, "");
        press("2.5");
        assertEquals("2,5", pad.textProperty().get());
        press(".");
        assertEquals(Optional.of(PadNote.SECOND_DECIMAL_SIGN), pad.noteProperty().get());
    }

    @Test
    void commaIsNotGuessedAtWhereTheLocaleWritesAPoint() {
        pad.open(ALL, "");
        press("1");
        pad.pressSign(',');
        press("2");
        assertEquals("12", pad.textProperty().get());
        pad.pressSign(',');
        assertEquals(Optional.of(PadNote.OTHER_DECIMAL_SIGN), pad.noteProperty().get());
    }

    @Test
    void fractionsAreShownAsOneSign() {
        pad.open(ALL, "");
        press("s9ff");
        assertEquals("−9\u00A0½", pad.shownBinding().get());
        pad.take("3/4");
        assertEquals("¾", pad.shownBinding().get());
    }
}
