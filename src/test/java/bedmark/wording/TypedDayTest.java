package bedmark.wording;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import bedmark.document.Refused;
import bedmark.quantity.UnitSystem;
import bedmark.words.Words;
import java.time.LocalDate;
import java.util.Locale;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class TypedDayTest {
    private static final LocalDate DAY = LocalDate.of(2027, 1, 31);

    private static Wording wording(String language) {
        return new Wording(new Words(Locale.forLanguageTag(language)), UnitSystem.METRIC);
    }

    private static Optional<LocalDate> read(String language, String typed) {
        return new TypedDay(wording(language)).read(typed);
    }

    @ParameterizedTest
    @CsvSource({"en, 2027-01-31", "en, 31.1.2027", "en, 31. 01. 2027", "en, 31 Jan 2027", "en, 31 january 2027",
            "en, 31 Jan. 2027", "es, 2027-1-31", "es, 31/1/2027", "es, 31-01-2027", "es, 31.1.2027", "es, 31 ene 2027",
            "es, 31 de enero de 2027", "en, 31 ene 2027", "es, 31 Jan 2027"})
    void aDayIsReadInEveryWayThatItIsWritten(String language, String typed) {
        assertEquals(Optional.of(DAY), read(language, typed));
    }

    @ParameterizedTest
    @ValueSource(strings = {"en", "es"})
    void whatIsShownIsReadAgain(String language) {
        for (int month = 1; month <= 12; month++) {
            LocalDate day = LocalDate.of(2027, month, 5);
            assertEquals(Optional.of(day), read(language, wording(language).day(day)));
        }
    }

    @ParameterizedTest
    @CsvSource({"en, tomorrow", "en, 1/2/2027", "en, 2027-02-30", "en, 31.1.27", "en, 31 janero 2027", "es, 31/13/2027",
            "es, pronto"})
    void whatIsNoDayOrCouldBeTwoIsRefusedWithAnExample(String language, String typed) {
        Refused refused = assertThrows(Refused.class, () -> read(language, typed));
        assertEquals("day-unreadable", refused.defect().code());
        assertEquals(typed, refused.defect().where());
        assertEquals(wording(language).day(DAY), refused.defect().details().get(1));
    }

    @Test
    void nothingTypedIsNoDay() {
        assertEquals(Optional.empty(), read("en", "  "));
    }
}
