package bedmark.wording;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.words.Words;
import java.time.DateTimeException;
import java.time.LocalDate;
import java.time.Month;
import java.time.format.TextStyle;
import java.util.Locale;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;

/**
 * A day as a person types it: {@code 2027-01-31}, with the month in letters, or in figures where
 * these are read one way only. With strokes the day comes first in Spanish; in English half of the readers take it for
 * the month, so that it is not read at all.
 */
public final class TypedDay {
    private static final LocalDate EXAMPLE = LocalDate.of(2027, 1, 31);
    private static final Pattern ISO = Pattern.compile("(\\d{4})-(\\d{1,2})-(\\d{1,2})");
    private static final Pattern POINTS = Pattern.compile("(\\d{1,2})\\.\\s*(\\d{1,2})\\.\\s*(\\d{4})");
    private static final Pattern STROKES = Pattern.compile("(\\d{1,2})[/-](\\d{1,2})[/-](\\d{4})");
    private static final Pattern LETTERS =
            Pattern.compile("(\\d{1,2})\\.?\\s*(?:de\\s+)?(\\p{L}{3,})\\.?,?\\s*(?:del?\\s+)?(\\d{4})");

    private final Wording wording;

    public TypedDay(Wording wording) {
        this.wording = wording;
    }

    /**
     * Reads what was typed.
     *
     * @return nothing where nothing was typed
     * @throws Refused {@code day-unreadable}
     */
    public Optional<LocalDate> read(String typed) {
        String text = typed.strip();
        if (text.isEmpty()) {
            return Optional.empty();
        }
        try {
            return Optional.of(day(text).orElseThrow(() -> unreadable(text)));
        } catch (DateTimeException e) {
            // Such as 31 February.
            throw unreadable(text);
        }
    }

    private Refused unreadable(String text) {
        return new Refused(Defect.in(text, "day-unreadable", EXAMPLE.toString(), wording.day(EXAMPLE)));
    }

    private Optional<LocalDate> day(String text) {
        Matcher iso = ISO.matcher(text);
        if (iso.matches()) {
            return Optional.of(LocalDate.of(number(iso, 1), number(iso, 2), number(iso, 3)));
        }
        Matcher letters = LETTERS.matcher(text);
        if (letters.matches()) {
            return month(letters.group(2)).map(month -> LocalDate.of(number(letters, 3), month, number(letters, 1)));
        }
        boolean dayFirst = locale().getLanguage().equals("es");
        return Stream.of(POINTS.matcher(text), STROKES.matcher(text)).filter(Matcher::matches)
                .filter(figures -> dayFirst || figures.pattern() == POINTS).findFirst()
                .map(figures -> LocalDate.of(number(figures, 3), number(figures, 2), number(figures, 1)));
    }

    /** A month by its name or the start of it. What was typed before the words were changed is read after it too. */
    private Optional<Month> month(String letters) {
        return Stream.concat(Stream.of(locale()), Words.LANGUAGES.stream())
                .flatMap(language -> month(letters, language).stream()).findFirst();
    }

    private static Optional<Month> month(String letters, Locale language) {
        return Stream.of(Month.values()).filter(month -> month.getDisplayName(TextStyle.FULL, language)
                .toLowerCase(language).startsWith(letters.toLowerCase(language))).findFirst();
    }

    private Locale locale() {
        return wording.words().locale();
    }

    private static int number(Matcher matcher, int group) {
        return Integer.parseInt(matcher.group(group));
    }
}
