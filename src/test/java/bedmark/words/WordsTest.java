package bedmark.words;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.Locale;
import java.util.MissingResourceException;
import org.junit.jupiter.api.Test;

class WordsTest {

    @Test
    void textTakesOtherWordsEachTime() {
        Words words = new Words(Locale.ENGLISH);
        assertEquals("1 \u00B7 side", words.text("screen.zone.line", "1", "side"));
        assertEquals("2 \u00B7 type", words.text("screen.zone.line", "2", "type"));
    }

    @Test
    void eachLanguageHasTextsOfItsOwn() {
        assertEquals("Yes", new Words(Locale.ENGLISH).text("screen.yes"));
        assertEquals("S\u00ED", new Words(Locale.forLanguageTag("es")).text("screen.yes"));
    }

    @Test
    void textThatThereIsNotIsRefusedEachTime() {
        Words words = new Words(Locale.ENGLISH);
        for (int i = 0; i < 2; i++) {
            assertThrows(MissingResourceException.class, () -> words.text("screen.no-such-text"));
            assertThrows(MissingResourceException.class, () -> words.text("nobundle"));
        }
    }
}
