package bedmark.screen;

import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.Icon;
import bedmark.words.Words;
import java.util.Locale;
import java.util.function.UnaryOperator;
import javafx.beans.property.ObjectProperty;

/** The two buttons by which a window at a desk is set to another language and another light. */
public final class LookButtons {
    private LookButtons() {
    }

    /** Goes to the other language, whose own name stands on it. */
    public static ActionButton language(ObjectProperty<Preferences> preferences) {
        Locale other = Words.LANGUAGES.stream().filter(language -> !language.getLanguage()
                .equals(preferences.get().locale().getLanguage())).findFirst().orElseThrow();
        ActionButton button = new ActionButton(Weight.PLAIN, Words.nameOf(other), () ->
                change(preferences, now -> now.withLocale(other)));
        button.setId("language");
        return button;
    }

    /** Goes to the next light, whose sign stands on it: day, night, by the clock. */
    public static ActionButton light(ObjectProperty<Preferences> preferences) {
        Lighting next = preferences.get().lighting().next();
        Icon sign = switch (next) {
            case DAY -> Icon.SUN;
            case NIGHT -> Icon.MOON;
            case CLOCK -> Icon.HISTORY;
        };
        ActionButton button = ActionButton.of(sign, Weight.PLAIN,
                new Words(preferences.get().locale()).text("settings.light." + next.code()), () ->
                        change(preferences, now -> now.withLighting(next)));
        button.setId("light");
        return button;
    }

    private static void change(ObjectProperty<Preferences> preferences, UnaryOperator<Preferences> change) {
        preferences.set(change.apply(preferences.get()));
    }
}
