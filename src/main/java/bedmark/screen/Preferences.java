package bedmark.screen;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.quantity.Unit;
import bedmark.quantity.UnitSystem;
import bedmark.screen.theme.TextSize;
import java.math.BigDecimal;
import java.util.LinkedHashMap;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/**
 * How one person likes the screens; kept with the store, and no part of a survey.
 *
 * @param person        the name that stands beside each entry; empty until it is given
 * @param locale        language and number format
 * @param units         units that are asked first and shown
 * @param chosenUnits   for a unit of that system the one of the same dimension that the person likes better
 * @param lighting      which light the screen is set for
 * @param gloves        whether targets have glove size
 * @param dpi           dots per inch of the glass
 * @param text          how large type is
 * @param exportFolder  where packs went last
 * @param watchedFolder where the tablet's camera app puts its photos
 * @param officeFolder  where packs that were looked at were received last
 */
public record Preferences(String person, Locale locale, UnitSystem units, Map<Unit, Unit> chosenUnits,
                          Lighting lighting, boolean gloves, double dpi, TextSize text,
                          Optional<String> exportFolder, Optional<String> watchedFolder,
                          Optional<String> officeFolder) {

    /** The density of a 10.1-inch screen of 1280 by 800 dots. */
    public static final double USUAL_DPI = 149;

    public Preferences {
        chosenUnits = Map.copyOf(chosenUnits);
        chosenUnits.forEach((usual, chosen) -> {
            if (usual.dimension() != chosen.dimension()) {
                throw new IllegalArgumentException(chosen + " does not measure what " + usual + " does");
            }
        });
    }

    /** What a new tablet starts with. */
    public static Preferences standard() {
        return new Preferences("", Locale.ENGLISH, UnitSystem.METRIC, Map.of(), Lighting.DAY, false, USUAL_DPI,
                TextSize.STANDARD, Optional.empty(), Optional.empty(), Optional.empty());
    }

    /** Reads what was kept; what is not there is as on a new tablet. */
    public static Preferences of(Branch document) {
        Preferences standard = standard();
        // Before the clock could be followed, night was a flag.
        Lighting flag = document.flag("night").orElse(false) ? Lighting.NIGHT : Lighting.DAY;
        return new Preferences(document.text("person").orElse(""),
                document.text("locale").map(Locale::forLanguageTag).orElse(standard.locale),
                document.text("units").flatMap(UnitSystem::ofCode).orElse(standard.units), readUnits(document),
                document.text("lighting").flatMap(Lighting::ofCode).orElse(flag),
                document.flag("gloves").orElse(false),
                document.number("dpi").map(BigDecimal::doubleValue).filter(dpi -> dpi >= 60 && dpi <= 600)
                        .orElse(USUAL_DPI),
                document.text("text").flatMap(TextSize::ofCode).orElse(TextSize.STANDARD),
                document.text("exportFolder"), document.text("watchedFolder"), document.text("officeFolder"));
    }

    private static Map<Unit, Unit> readUnits(Branch document) {
        Map<Unit, Unit> chosen = new LinkedHashMap<>();
        document.branch("chosenUnits").ifPresent(units -> units.members().keySet().forEach(key -> {
            Optional<Unit> usual = Unit.ofCode(key);
            Optional<Unit> liked = units.text(key).flatMap(Unit::ofCode);
            if (usual.isPresent() && liked.isPresent() && usual.get().dimension() == liked.get().dimension()) {
                chosen.put(usual.get(), liked.get());
            }
        }));
        return chosen;
    }

    public Branch document() {
        Branch liked = Branch.EMPTY;
        for (Map.Entry<Unit, Unit> choice : chosenUnits.entrySet()) {
            liked = liked.with(choice.getKey().code(), choice.getValue().code());
        }
        Branch document = Branch.EMPTY.with("person", person).with("locale", locale.toLanguageTag())
                .with("units", units.code()).with("chosenUnits", liked).with("lighting", lighting.code())
                .with("gloves", Node.flag(gloves)).with("dpi", Node.number(BigDecimal.valueOf(dpi)))
                .with("text", text.code());
        Branch exporting = exportFolder.map(folder -> document.with("exportFolder", folder)).orElse(document);
        Branch watching = watchedFolder.map(folder -> exporting.with("watchedFolder", folder)).orElse(exporting);
        return officeFolder.map(folder -> watching.with("officeFolder", folder)).orElse(watching);
    }

    public Preferences withPerson(String name) {
        return new Preferences(name, locale, units, chosenUnits, lighting, gloves, dpi, text, exportFolder,
                watchedFolder, officeFolder);
    }

    public Preferences withLocale(Locale other) {
        return new Preferences(person, other, units, chosenUnits, lighting, gloves, dpi, text, exportFolder,
                watchedFolder, officeFolder);
    }

    public Preferences withUnits(UnitSystem other) {
        return new Preferences(person, locale, other, chosenUnits, lighting, gloves, dpi, text, exportFolder,
                watchedFolder, officeFolder);
    }

    /** Asks and shows in another unit what the unit system has its own one for. */
    public Preferences withChosenUnit(Unit usual, Unit liked) {
        Map<Unit, Unit> chosen = new LinkedHashMap<>(chosenUnits);
        if (usual == liked) {
            chosen.remove(usual);
        } else {
            chosen.put(usual, liked);
        }
        return new Preferences(person, locale, units, chosen, lighting, gloves, dpi, text, exportFolder,
                watchedFolder, officeFolder);
    }

    public Preferences withLighting(Lighting other) {
        return new Preferences(person, locale, units, chosenUnits, other, gloves, dpi, text, exportFolder,
                watchedFolder, officeFolder);
    }

    /** Sets the screen for night or day, whatever the clock says. */
    public Preferences withNight(boolean dark) {
        return withLighting(dark ? Lighting.NIGHT : Lighting.DAY);
    }

    /** Whether the screen is set for night, whatever the clock says. */
    public boolean night() {
        return lighting == Lighting.NIGHT;
    }

    public Preferences withGloves(boolean worn) {
        return new Preferences(person, locale, units, chosenUnits, lighting, worn, dpi, text, exportFolder,
                watchedFolder, officeFolder);
    }

    public Preferences withDpi(double density) {
        return new Preferences(person, locale, units, chosenUnits, lighting, gloves, density, text, exportFolder,
                watchedFolder, officeFolder);
    }

    public Preferences withText(TextSize size) {
        return new Preferences(person, locale, units, chosenUnits, lighting, gloves, dpi, size, exportFolder,
                watchedFolder, officeFolder);
    }

    public Preferences withExportFolder(String folder) {
        return new Preferences(person, locale, units, chosenUnits, lighting, gloves, dpi, text, Optional.of(folder),
                watchedFolder, officeFolder);
    }

    public Preferences withWatchedFolder(Optional<String> folder) {
        return new Preferences(person, locale, units, chosenUnits, lighting, gloves, dpi, text, exportFolder, folder,
                officeFolder);
    }

    public Preferences withOfficeFolder(String folder) {
        return new Preferences(person, locale, units, chosenUnits, lighting, gloves, dpi, text, exportFolder,
                watchedFolder, Optional.of(folder));
    }
}
