package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.quantity.Dimension;
import bedmark.quantity.Unit;
import bedmark.quantity.UnitSystem;
import bedmark.screen.theme.Light;
import bedmark.screen.theme.TextSize;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.time.LocalTime;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class PreferencesTest {

    @Test
    void everySettingComesBackAsItWas() {
        Preferences all = new Preferences("A. Vale", Locale.forLanguageTag("es"), UnitSystem.US,
                Map.of(Unit.INCH, Unit.MILLIMETRE, Unit.HORSEPOWER, Unit.KILOWATT), Lighting.CLOCK, true, 224,
                TextSize.LARGE, Optional.of("/media/stick"), Optional.of("/home/camera"),
                Optional.of("/srv/office"));
        assertEquals(all, Preferences.of(all.document()));
        assertEquals(Preferences.standard(), Preferences.of(Branch.EMPTY));
    }

    @Test
    void nightOfAnEarlierVersionIsStillNight() {
        assertEquals(Lighting.NIGHT, Preferences.of(Branch.EMPTY.with("night", Node.flag(true))).lighting());
    }

    @Test
    void whatCannotBeIsAsOnANewTablet() {
        Branch odd = Branch.EMPTY.with("dpi", Node.number(5)).with("lighting", "dim").with("text", "huge")
                .with("chosenUnits", Branch.EMPTY.with("mm", "kW").with("furlong", "m"));
        assertEquals(Preferences.standard(), Preferences.of(odd));
        assertThrows(IllegalArgumentException.class, () ->
                Preferences.standard().withChosenUnit(Unit.METRE, Unit.KILOWATT));
    }

    @Test
    void aUnitOfOnesOwnIsShownAndTakenBack() {
        Preferences own = Preferences.standard().withChosenUnit(Unit.MILLIMETRE, Unit.CENTIMETRE)
                .withChosenUnit(Unit.KILOWATT, Unit.HORSEPOWER);
        Wording wording = new Wording(new Words(Locale.ENGLISH), own.units(), own.chosenUnits());
        assertEquals(Unit.CENTIMETRE, wording.smallLength());
        assertEquals(Unit.HORSEPOWER, wording.unit(Dimension.POWER));
        assertEquals(Unit.METRE, wording.unit(Dimension.LENGTH));
        assertEquals(Map.of(Unit.KILOWATT, Unit.HORSEPOWER),
                own.withChosenUnit(Unit.MILLIMETRE, Unit.MILLIMETRE).chosenUnits());
    }

    @Test
    void theClockBringsTheNight() {
        assertEquals(Light.NIGHT, Lighting.CLOCK.at(LocalTime.of(5, 59)));
        assertEquals(Light.DAY, Lighting.CLOCK.at(LocalTime.of(6, 0)));
        assertEquals(Light.DAY, Lighting.CLOCK.at(LocalTime.of(18, 59)));
        assertEquals(Light.NIGHT, Lighting.CLOCK.at(LocalTime.of(19, 0)));
        assertEquals(Light.NIGHT, Lighting.NIGHT.at(LocalTime.NOON));
        assertEquals(Light.DAY, Lighting.DAY.at(LocalTime.MIDNIGHT));
    }
}
