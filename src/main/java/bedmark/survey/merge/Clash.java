package bedmark.survey.merge;

import java.util.List;
import java.util.Objects;

/**
 * Contents that can't all be right. None overwrites another; a person decides.
 *
 * @param sides at least two, in time order
 */
public record Clash(Kind kind, List<Copy> sides) {

    /** How contents clash. */
    public enum Kind {
        /** The same revision of the same survey came with different contents. */
        SAME_REVISION("same-revision"),
        /** Two surveys correct the same one. */
        TWO_CORRECTIONS("two-corrections");

        private final String code;

        Kind(String code) {
            this.code = code;
        }

        public String code() {
            return code;
        }
    }

    public Clash {
        Objects.requireNonNull(kind);
        sides = sides.stream().sorted(Copy.IN_TIME).toList();
        if (sides.size() < 2) {
            throw new IllegalArgumentException("a clash has two sides");
        }
    }

    /** Whether a content is one of the sides. */
    public boolean has(Copy copy) {
        return sides.stream().anyMatch(side -> side.digest().equals(copy.digest()));
    }
}
