package bedmark.index.office;

import java.util.UUID;

/**
 * One deed as it is kept.
 *
 * @param payload the journal entry's payload
 */
public record DeedRow(long sequence, String at, String person, UUID device, String code, byte[] payload) {
}
