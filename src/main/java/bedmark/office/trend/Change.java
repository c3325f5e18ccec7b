package bedmark.office.trend;

import java.time.Instant;

/**
 * Something about a zone that is not as it was: what follows is not the same story, and is not read as one trend with
 * what was before.
 *
 * @param at   the first survey after it
 * @param from how it was when its regime began; of seals, when they were worn most
 * @param to   how it is since
 */
public record Change(Kind kind, Instant at, String from, String to) {
    /** What changed. */
    public enum Kind {
        MATERIAL("material"),
        SPEED("speed"),
        SEALS("seals"),
        BOARDS("boards");

        private final String code;

        Kind(String code) {
            this.code = code;
        }

        public String code() {
            return code;
        }
    }
}
