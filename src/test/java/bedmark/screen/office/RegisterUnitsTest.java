package bedmark.screen.office;

import static org.junit.jupiter.api.Assertions.assertEquals;

import bedmark.office.register.Meanings;
import bedmark.office.register.RegisterGrid;
import bedmark.quantity.Unit;
import bedmark.quantity.UnitSystem;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Units of the register as a person reads and types them. */
class RegisterUnitsTest {
    private static Wording wording(Locale language) {
        return new Wording(new Words(language), UnitSystem.METRIC);
    }

    @Test
    void everyUnitOfEveryColumnIsShownInWordsAndReadAgain() {
        for (Locale language : Words.LANGUAGES) {
            for (String list : RegisterGrid.lists()) {
                for (String key : Meanings.keys(list)) {
                    for (Unit unit : Meanings.units(list, key)) {
                        String shown = RegisterUnits.shown(wording(language), list, key, "12.50 " + unit.code());
                        assertEquals("12.50 " + wording(language).symbol(unit), shown);
                        assertEquals("12.50 " + unit.code(), RegisterUnits.typed(list, key, shown));
                    }
                }
            }
        }
    }

    @ParameterizedTest
    @CsvSource({"38°, 38 deg", "85 lb/pie³, 85 [lb_av]/[cft_i]", "85 lb/ft³, 85 [lb_av]/[cft_i]", "much, much",
            "12 furlong, 12 furlong", "12, 12"})
    void whatIsTypedIsReadAsItIsWrittenOrStays(String typed, String read) {
        String key = typed.contains("°") ? "surchargeAngle" : "bulkDensity";
        assertEquals(read, RegisterUnits.typed("materials", key, typed));
    }

    @Test
    void aNameThatLooksLikeAMeasureStays() {
        assertEquals("2 deg", RegisterUnits.typed("materials", "name", "2 deg"));
        assertEquals("2 deg", RegisterUnits.shown(wording(Locale.ENGLISH), "materials", "name", "2 deg"));
    }
}
