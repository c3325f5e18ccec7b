package bedmark.words;

import java.text.MessageFormat;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.MissingResourceException;
import java.util.ResourceBundle;
import java.util.concurrent.ConcurrentHashMap;

/**
 * The words of one language. A key is {@code bundle.key}: the part before the first dot names the resource bundle
 * {@code bedmark/words/<bundle>.properties}. Numbers are put in already formatted, as texts.
 */
public final class Words {

    /** The languages that are complete. */
    public static final List<Locale> LANGUAGES = List.of(Locale.ENGLISH, Locale.forLanguageTag("es"));

    private static final ResourceBundle.Control NO_FALLBACK =
            ResourceBundle.Control.getNoFallbackControl(ResourceBundle.Control.FORMAT_PROPERTIES);

    private final Locale locale;
    /** The texts that were asked for: a screen says the same ones at each key. */
    private final Map<String, MessageFormat> texts = new ConcurrentHashMap<>();

    /**
     * @param locale language of the words and format of the numbers; a language without words gets the English ones
     */
    public Words(Locale locale) {
        this.locale = locale;
    }

    /** A language's own name for itself, with a capital as at the start of a line. */
    public static String nameOf(Locale language) {
        String name = language.getDisplayLanguage(language);
        return name.substring(0, 1).toUpperCase(language) + name.substring(1);
    }

    public Locale locale() {
        return locale;
    }

    /** The language alone, as in the language maps of a form. */
    public String language() {
        return locale.getLanguage();
    }

    /**
     * The text of a key, with the arguments put in.
     *
     * @throws MissingResourceException where no bundle has the key; a test walks all keys that the code uses
     */
    public String text(String key, Object... arguments) {
        MessageFormat text = texts.computeIfAbsent(key, this::read);
        // Formats may be used by one thread at a time, and reports are told beside the screen.
        synchronized (text) {
            return text.format(arguments);
        }
    }

    private MessageFormat read(String key) {
        int dot = key.indexOf('.');
        if (dot < 0) {
            throw new MissingResourceException("a key names its bundle: " + key, "Words", key);
        }
        return new MessageFormat(bundle(key.substring(0, dot)).getString(key.substring(dot + 1)), locale);
    }

    /** Whether there is a text for the key. */
    public boolean has(String key) {
        int dot = key.indexOf('.');
        return dot > 0 && bundle(key.substring(0, dot)).containsKey(key.substring(dot + 1));
    }

    private ResourceBundle bundle(String name) {
        return ResourceBundle.getBundle("bedmark.words." + name, locale, NO_FALLBACK);
    }
}
