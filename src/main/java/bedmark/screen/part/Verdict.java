package bedmark.screen.part;

import bedmark.screen.theme.LevelShape;
import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * What the verdict block shows.
 *
 * @param level     its shape
 * @param levelWord the level in one word, for who cannot see the shape
 * @param sentence  the verdict as a sentence
 * @param sure      how sure it is
 * @param figures   up to four numbers
 * @param advice    the one action that helps most, or the reading to take next
 */
public record Verdict(LevelShape level, String levelWord, String sentence, String sure, List<Figure> figures,
                      Optional<String> advice) {
    /** How many figures a glance takes in. */
    public static final int FIGURES = 4;

    public Verdict {
        Objects.requireNonNull(level);
        Objects.requireNonNull(levelWord);
        Objects.requireNonNull(sentence);
        Objects.requireNonNull(sure);
        figures = List.copyOf(figures);
        Objects.requireNonNull(advice);
        if (figures.size() > FIGURES) {
            throw new IllegalArgumentException("a glance takes in four figures");
        }
    }
}
