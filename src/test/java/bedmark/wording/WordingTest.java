package bedmark.wording;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Defect;
import bedmark.quantity.UnitSystem;
import bedmark.words.Words;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class WordingTest {
    private static final Wording ENGLISH = new Wording(new Words(Locale.ENGLISH), UnitSystem.METRIC);
    private static final Wording SPANISH = new Wording(new Words(Locale.forLanguageTag("es")), UnitSystem.METRIC);

    @ParameterizedTest
    @CsvSource({"0, < 1 %", "0.004, < 1 %", "0.034, 3 %", "0.97, 97 %", "0.9951, > 99 %", "1, > 99 %"})
    void probabilityIsNeverToldAsCertain(double probability, String told) {
        assertEquals(told, ENGLISH.probability(probability).replace('\u00a0', ' ').replace('\u202f', ' '));
    }

    @ParameterizedTest
    @CsvSource({"0, 0 %", "0.004, < 1 %", "0.996, 100 %", "1, 100 %", "1.26, 126 %"})
    void shareIsRounded(double share, String told) {
        assertEquals(told, ENGLISH.percent(share).replace('\u00a0', ' ').replace('\u202f', ' '));
    }

    @Test
    void aReasonThatANewerProgramWroteDownIsToldWithoutItsWords() {
        String told = ENGLISH.sentence(Defect.in("a.zip", "pack-of-tomorrow", "7"));
        assertTrue(told.contains("pack-of-tomorrow") && told.contains("a.zip"), told);
    }

    @Test
    void codesAmongTheDetailsOfADefectArePutInWords() {
        Defect defect = Defect.in("/surveys/0", "kind-wrong", "object");
        assertEquals("At /surveys/0: an object is expected here; write that.", ENGLISH.sentence(defect));
        assertEquals("En /surveys/0: aquí se espera un objeto; escríbalo así.", SPANISH.sentence(defect));
    }

    @Test
    void aKindOfFailureAmongTheDetailsIsPutInWords() {
        Defect defect = Defect.in("/stick", "export-not-saved", "AccessDeniedException");
        assertTrue(ENGLISH.sentence(defect).contains("(no right to it)"), ENGLISH.sentence(defect));
        assertTrue(SPANISH.sentence(defect).contains("(sin permiso)"), SPANISH.sentence(defect));
    }

    @Test
    void sentenceIsOneLineWhateverTheInputBrings() {
        assertEquals("At /x: material \"a b c\" is not in the register; name one of its materials.",
                ENGLISH.sentence(Defect.in("/x", "material-unknown", "a\nb\u001bc")));
    }
}
