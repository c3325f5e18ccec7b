package bedmark.screen.office;

import bedmark.office.register.Meanings;
import bedmark.quantity.Unit;
import bedmark.quantity.UnitSystem;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * The units in the register's cells. The register names them by codes that every program reads; a person sees and types
 * what stands on a drawing: {@code lb/ft³} for {@code [lb_av]/[cft_i]}.
 */
final class RegisterUnits {
    private static final Pattern MEASURED = Pattern.compile("([+-]?[0-9][0-9.,eE+-]*)\\s*(\\S.*)");

    private RegisterUnits() {
    }

    /** A cell's text as a person reads it. */
    static String shown(Wording wording, String list, String key, String held) {
        Matcher matcher = MEASURED.matcher(held);
        return !matcher.matches() ? held : Meanings.units(list, key).stream()
                .filter(unit -> unit.code().equals(matcher.group(2))).findFirst()
                .map(unit -> matcher.group(1) + " " + wording.symbol(unit)).orElse(held);
    }

    /** What a person typed, with the unit's code; in whichever language they know the unit. */
    static String typed(String list, String key, String text) {
        Matcher matcher = MEASURED.matcher(text);
        return !matcher.matches() ? text : Meanings.units(list, key).stream()
                .filter(unit -> names(unit, matcher.group(2).strip())).findFirst()
                .map(unit -> matcher.group(1) + " " + unit.code()).orElse(text);
    }

    private static boolean names(Unit unit, String symbol) {
        return Words.LANGUAGES.stream().anyMatch(language ->
                new Wording(new Words(language), UnitSystem.METRIC).symbol(unit).equals(symbol));
    }
}
