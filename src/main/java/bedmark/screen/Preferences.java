package bedmark.screen;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.quantity.UnitSystem;
import java.math.BigDecimal;
import java.util.Locale;
import java.util.Optional;

/**
 * How one person likes the tablet; kept with the store, and no part of a survey.
 *
 * @param person       the name that stands beside each entry; empty until it is given
 * @param locale       language and number format
 * @param units        units that are asked first and shown
 * @param night        whether the screen is dark
 * @param gloves       whether targets have glove size
 * @param dpi          dots per inch of the screen
 * @param exportFolder where packs went last
 */
public record Preferences(String person, Locale locale, UnitSystem units, boolean night, boolean gloves, double dpi,
                          Optional<String> exportFolder) {

    /** The density of a 10.1-inch screen of 1280 by 800 dots. */
    public static final double USUAL_DPI = 149;

    /** What a new tablet starts with. */
    public static Preferences standard() {
        return new Preferences("", Locale.ENGLISH, UnitSystem.METRIC, false, false, USUAL_DPI, Optional.empty());
    }

    /** Reads what was kept; what is not there is as on a new tablet. */
    public static Preferences of(Branch document) {
        Preferences standard = standard();
        return new Preferences(document.text("person").orElse(""),
                document.text("locale").map(Locale::forLanguageTag).orElse(standard.locale),
                document.text("units").flatMap(UnitSystem::ofCode).orElse(standard.units),
                document.flag("night").orElse(false), document.flag("gloves").orElse(false),
                document.number("dpi").map(BigDecimal::doubleValue).filter(dpi -> dpi >= 60 && dpi <= 600)
                        .orElse(USUAL_DPI),
                document.text("exportFolder"));
    }

    public Branch document() {
        Branch document = Branch.EMPTY.with("person", person).with("locale", locale.toLanguageTag())
                .with("units", units.code()).with("night", Node.flag(night)).with("gloves", Node.flag(gloves))
                .with("dpi", Node.number(BigDecimal.valueOf(dpi)));
        return exportFolder.map(folder -> document.with("exportFolder", folder)).orElse(document);
    }

    public Preferences withPerson(String name) {
        return new Preferences(name, locale, units, night, gloves, dpi, exportFolder);
    }

    public Preferences withLocale(Locale other) {
        return new Preferences(person, other, units, night, gloves, dpi, exportFolder);
    }

    public Preferences withUnits(UnitSystem other) {
        return new Preferences(person, locale, other, night, gloves, dpi, exportFolder);
    }

    public Preferences withNight(boolean dark) {
        return new Preferences(person, locale, units, dark, gloves, dpi, exportFolder);
    }

    public Preferences withGloves(boolean worn) {
        return new Preferences(person, locale, units, night, worn, dpi, exportFolder);
    }

    public Preferences withDpi(double density) {
        return new Preferences(person, locale, units, night, gloves, density, exportFolder);
    }

    public Preferences withExportFolder(String folder) {
        return new Preferences(person, locale, units, night, gloves, dpi, Optional.of(folder));
    }
}
