package bedmark.form;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Set;

/**
 * One text in several languages, as a form file holds it.
 *
 * @param byLanguage language code of ISO 639 ({@code en}, {@code es}) to text; English is always there
 */
public record Texts(Map<String, String> byLanguage) {

    /** The language that stands in where another one is missing. */
    public static final String FALLBACK = "en";
    /** The languages that every form is complete in. */
    public static final Set<String> COMPLETE = Set.of("en", "es");

    public Texts {
        byLanguage = Collections.unmodifiableMap(new LinkedHashMap<>(byLanguage));
        if (!byLanguage.containsKey(FALLBACK)) {
            throw new IllegalArgumentException("a text without English");
        }
    }

    /** A text in English and Spanish. */
    public static Texts of(String english, String spanish) {
        return new Texts(Map.of("en", english, "es", spanish));
    }

    /** The text in a language, or in English where the form lacks it. */
    public String in(String language) {
        return byLanguage.getOrDefault(language, byLanguage.get(FALLBACK));
    }
}
