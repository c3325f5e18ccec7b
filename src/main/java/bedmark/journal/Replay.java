package bedmark.journal;

import java.util.UUID;

/** Takes the entries that a journal holds while it is opened. */
public interface Replay {

    /**
     * Comes once, before the entries.
     *
     * @param journal the journal's identity
     * @param resumed whether only the entries after the given mark follow; otherwise all do
     */
    void begin(UUID journal, boolean resumed);

    void entry(long sequence, Place place, byte[] payload);
}
