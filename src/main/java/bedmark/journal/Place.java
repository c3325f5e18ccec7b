package bedmark.journal;

import java.util.Objects;

/**
 * Where an entry lies.
 *
 * @param segment the segment's number
 * @param offset  where it begins in the file, in bytes
 * @param length  its whole length, in bytes
 * @param hash    SHA-256 of all its bytes
 */
public record Place(int segment, long offset, int length, Digest hash) {
    public Place {
        Objects.requireNonNull(hash);
        if (segment < 1 || offset < 0 || length < 0) {
            throw new IllegalArgumentException("no place in a journal: " + segment + ", " + offset + ", " + length);
        }
    }

    /** Where the next entry begins, or the segment ends. */
    public long end() {
        return offset + length;
    }
}
