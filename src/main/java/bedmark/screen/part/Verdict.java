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
 * @param remarks   what stands in one line below the sentence: the number against its limit, the verdict at design feed
 * @param figures   up to four numbers
 * @param advice    the one action that helps most, or the reading to take next
 */
public record Verdict(LevelShape level, String levelWord, String sentence, String sure, List<Remark> remarks,
                      List<Figure> figures, Optional<String> advice) {
    /** How many figures a glance takes in. */
    public static final int FIGURES = 4;
    /** How many remarks stand in one line. */
    public static final int REMARKS = 2;

    /**
     * A remark, with the shape of the level that it is about, where it is about one.
     */
    public record Remark(Optional<LevelShape> level, String words) {
        public Remark {
            Objects.requireNonNull(level);
            Objects.requireNonNull(words);
        }
    }

    /** A verdict without remarks. */
    public Verdict(LevelShape level, String levelWord, String sentence, String sure, List<Figure> figures,
                   Optional<String> advice) {
        this(level, levelWord, sentence, sure, List.of(), figures, advice);
    }

    public Verdict {
        remarks = List.copyOf(remarks);
        Objects.requireNonNull(level);
        Objects.requireNonNull(levelWord);
        Objects.requireNonNull(sentence);
        Objects.requireNonNull(sure);
        figures = List.copyOf(figures);
        Objects.requireNonNull(advice);
        if (figures.size() > FIGURES || remarks.size() > REMARKS) {
            throw new IllegalArgumentException("a glance takes in four figures and two remarks");
        }
    }
}
