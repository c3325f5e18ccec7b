package bedmark.picture;

import java.util.Objects;
import java.util.Optional;
import java.util.function.DoubleFunction;

/**
 * The words and formatted numbers of a zone picture. What stands beside something unknown says what is missing; it is
 * drawn lightly.
 *
 * @param feed         beside the feed arrow
 * @param beltSpeed    beside the arrow of the belt's travel
 * @param boardTop     the height of the boards
 * @param boardTopWord below it
 * @param zoneLength   on the dimension line along the zone
 * @param limit        the allowed depth
 * @param limitWord    below it
 * @param heights      says how many times heights are drawn taller than lengths; asked only where they are
 * @param prompt       in the zone while it has no depth
 * @param clearWidth   on the dimension line between the boards
 * @param sectionTitle over the cross-section: where it is cut
 * @param sectionNote  under the cross-section: the seals, in words
 */
public record Captions(String feed, String beltSpeed, String boardTop, String boardTopWord, String zoneLength,
                       String limit, String limitWord, DoubleFunction<String> heights, Optional<String> prompt,
                       String clearWidth, String sectionTitle, String sectionNote) {
    /** The same with other words beside the arrow of the belt's travel. */
    public Captions withBeltSpeed(String words) {
        return new Captions(feed, words, boardTop, boardTopWord, zoneLength, limit, limitWord, heights, prompt,
                clearWidth, sectionTitle, sectionNote);
    }

    public Captions {
        Objects.requireNonNull(feed);
        Objects.requireNonNull(beltSpeed);
        Objects.requireNonNull(boardTop);
        Objects.requireNonNull(boardTopWord);
        Objects.requireNonNull(zoneLength);
        Objects.requireNonNull(limit);
        Objects.requireNonNull(limitWord);
        Objects.requireNonNull(heights);
        Objects.requireNonNull(prompt);
        Objects.requireNonNull(clearWidth);
        Objects.requireNonNull(sectionTitle);
        Objects.requireNonNull(sectionNote);
    }
}
