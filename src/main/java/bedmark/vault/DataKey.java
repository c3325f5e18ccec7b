package bedmark.vault;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.HexFormat;
import java.util.Optional;
import java.util.UUID;

/**
 * The random 256-bit key of one store. It seals nothing itself: each use has a key of its own, made with the expanding
 * half of HKDF (RFC 5869, SHA-256), whose extracting half is for keys that are not uniform.
 */
public final class DataKey {
    static final int BYTES = 32;

    private final UUID id;
    private final byte[] key;
    private final byte[] journalKey;

    DataKey(UUID id, byte[] key) {
        this.id = id;
        this.key = key.clone();
        this.journalKey = derived("bedmark journal 1", new byte[0]);
    }

    /** A new one. */
    public static DataKey random() {
        return new DataKey(UUID.randomUUID(), Gcm.random(BYTES));
    }

    /** Names the key; no secret. */
    public UUID id() {
        return id;
    }

    /**
     * Seals the payload of a journal entry: a random nonce (12 bytes), then ciphertext and tag of AES-256-GCM, bound to
     * the key's id and the entry's number, so that no entry passes for another one. A random nonce is good for 2^32
     * entries (NIST SP 800-38D, 8.3), a thousand times what a journal holds.
     */
    public byte[] seal(byte[] payload, long sequence) {
        byte[] nonce = Gcm.random(Gcm.NONCE);
        byte[] sealed = Gcm.seal(journalKey, nonce, bound(sequence), payload, payload.length);
        return ByteBuffer.allocate(nonce.length + sealed.length).put(nonce).put(sealed).array();
    }

    /** Opens a payload; nothing where it is not what was sealed with this key for this entry. */
    public Optional<byte[]> open(byte[] sealed, long sequence) {
        if (sealed.length < Gcm.NONCE + Gcm.TAG) {
            return Optional.empty();
        }
        return Gcm.open(journalKey, Arrays.copyOf(sealed, Gcm.NONCE), bound(sequence), sealed, Gcm.NONCE,
                sealed.length - Gcm.NONCE);
    }

    private byte[] bound(long sequence) {
        return ByteBuffer.allocate(24).putLong(id.getMostSignificantBits()).putLong(id.getLeastSignificantBits())
                .putLong(sequence).array();
    }

    /** The password of the index database's own file encryption, hexadecimal; 256 bits, so that nobody guesses it. */
    public String indexPassword() {
        return HexFormat.of().formatHex(derived("bedmark index 1", new byte[0]));
    }

    /** The key of one sealed file. */
    byte[] fileKey(byte[] salt) {
        return derived("bedmark file 1", salt);
    }

    byte[] bytes() {
        return key.clone();
    }

    private byte[] derived(String use, byte[] salt) {
        byte[] name = use.getBytes(StandardCharsets.US_ASCII);
        return Hkdf.expand(key, ByteBuffer.allocate(name.length + salt.length).put(name).put(salt).array());
    }
}
