package bedmark.screen;

import java.util.Locale;

/**
 * The language of what the toolkit words by itself, such as the months of a calendar and the menu of a text field. It
 * asks for nothing but the machine's, so that this is set to the program's own.
 */
public final class ToolkitLanguage {
    private ToolkitLanguage() {
    }

    /**
     * Lets the toolkit speak a language; its weeks start on Monday. What is on the screen must be made anew.
     *
     * @param locale language and number format that the person chose
     */
    public static void set(Locale locale) {
        Locale.setDefault(new Locale.Builder().setLocale(locale).setUnicodeLocaleKeyword("fw", "mon").build());
    }
}
