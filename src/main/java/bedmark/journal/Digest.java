package bedmark.journal;

import java.nio.ByteBuffer;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.Arrays;
import java.util.HexFormat;

/** A SHA-256 digest. */
public final class Digest {

    /** Its length in bytes. */
    public static final int BYTES = 32;

    /** What stands for the hash before the first entry. */
    static final Digest NOTHING = new Digest(new byte[BYTES]);

    private final byte[] bytes;

    private Digest(byte[] bytes) {
        this.bytes = bytes;
    }

    /** A digest that was computed before. */
    public static Digest ofBytes(byte[] bytes) {
        if (bytes.length != BYTES) {
            throw new IllegalArgumentException("a digest has " + BYTES + " bytes");
        }
        return new Digest(bytes.clone());
    }

    /** The digest of the remaining bytes, which stay unread. */
    public static Digest of(ByteBuffer content) {
        MessageDigest sha = sha256();
        sha.update(content.duplicate());
        return new Digest(sha.digest());
    }

    public static Digest of(byte[] content) {
        return of(ByteBuffer.wrap(content));
    }

    /** A SHA-256 computation for content that does not fit in memory. */
    public static MessageDigest sha256() {
        try {
            return MessageDigest.getInstance("SHA-256");
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java platform has SHA-256", e);
        }
    }

    public byte[] bytes() {
        return bytes.clone();
    }

    /** 64 lower-case hexadecimal digits. */
    public String hex() {
        return HexFormat.of().formatHex(bytes);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Digest digest && Arrays.equals(bytes, digest.bytes);
    }

    @Override
    public int hashCode() {
        return Arrays.hashCode(bytes);
    }

    @Override
    public String toString() {
        return hex();
    }
}
