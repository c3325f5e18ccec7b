package bedmark.journal;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.vault.DataKey;
import java.util.Optional;

/** How the payloads of a journal lie on disk: as they are, or sealed with the store's key. */
public final class Cover {

    /** Payloads lie as they are. */
    public static final Cover PLAIN = new Cover(Optional.empty());

    private final Optional<DataKey> key;

    private Cover(Optional<DataKey> key) {
        this.key = key;
    }

    /** Payloads are sealed with this key, or lie as they are where there is none. */
    public static Cover of(Optional<DataKey> key) {
        return key.isPresent() ? new Cover(key) : PLAIN;
    }

    Frame.Form form() {
        return key.isPresent() ? Frame.Form.SEALED : Frame.Form.PLAIN;
    }

    /** An entry's frame with this payload. */
    Frame entry(long sequence, Digest previous, byte[] payload) {
        return new Frame(Frame.Kind.ENTRY, form(), sequence, previous,
                key.map(one -> one.seal(payload, sequence)).orElse(payload));
    }

    /**
     * The payload of an entry's frame.
     *
     * @return nothing where a sealed journal holds something that was not sealed with its key for this entry
     * @throws Refused {@code journal-sealed} where it is sealed and there is no key
     */
    Optional<byte[]> payload(Frame frame) {
        if (frame.form() == Frame.Form.PLAIN) {
            return key.isPresent() ? Optional.empty() : Optional.of(frame.payload());
        }
        return key.orElseThrow(() -> new Refused(Defect.in("journal", "journal-sealed")))
                .open(frame.payload(), frame.sequence());
    }
}
