package bedmark.vault;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.json.JsonReader;
import bedmark.json.JsonWriter;
import java.nio.ByteBuffer;
import java.security.GeneralSecurityException;
import java.security.MessageDigest;
import java.util.Arrays;
import java.util.Base64;
import java.util.HexFormat;
import java.util.UUID;

/**
 * A data key as it lies on disk: wrapped with AES-256-GCM under a key that PBKDF2 makes from the passphrase. Without
 * the passphrase nobody opens it, its maker no more than anybody else.
 *
 * @param iterations of PBKDF2
 * @param wrapped    the 32 bytes of the key and the tag
 */
public record WrappedKey(UUID id, int iterations, byte[] salt, byte[] nonce, byte[] wrapped) {

    /** The recommended count for PBKDF2 with HMAC-SHA-256 at the time of writing (OWASP, 2023). */
    public static final int ITERATIONS = 600_000;

    /** The format's name. */
    static final String FORMAT = "bedmark.passphrase";
    private static final int VERSION = 1;
    private static final int FEWEST = 1000;
    private static final int MOST = 100_000_000;
    private static final String KDF = "PBKDF2WithHmacSHA256";
    private static final String SUM = "sha256";

    /** Wraps a key under a passphrase, with a salt and a nonce of its own. */
    public static WrappedKey wrap(DataKey key, Passphrase passphrase, int iterations) {
        byte[] salt = Gcm.random(16);
        byte[] nonce = Gcm.random(Gcm.NONCE);
        byte[] wrapped = Gcm.seal(passphrase.derive(salt, iterations), nonce, bound(key.id()), key.bytes(),
                DataKey.BYTES);
        return new WrappedKey(key.id(), iterations, salt, nonce, wrapped);
    }

    /**
     * The key.
     *
     * @throws Refused {@code passphrase-wrong}
     */
    public DataKey unwrap(Passphrase passphrase) {
        return Gcm.open(passphrase.derive(salt, iterations), nonce, bound(id), wrapped, 0, wrapped.length)
                .map(key -> new DataKey(id, key))
                .orElseThrow(() -> new Refused(Defect.in("", "passphrase-wrong")));
    }

    private static byte[] bound(UUID id) {
        return ByteBuffer.allocate(16).putLong(id.getMostSignificantBits()).putLong(id.getLeastSignificantBits())
                .array();
    }

    /** The file's bytes; a checksum among them tells damage from a wrong passphrase. */
    public byte[] text() {
        Branch document = Branch.EMPTY.with("format", FORMAT).with("version", Node.number(VERSION))
                .with("id", id.toString()).with("kdf", KDF).with("iterations", Node.number(iterations))
                .with("salt", base64(salt)).with("nonce", base64(nonce)).with("key", base64(wrapped));
        return JsonWriter.indented(document.with(SUM, sum(document)));
    }

    /**
     * Reads a file.
     *
     * @param where the file's name, for the refusal
     * @throws Refused {@code passphrase-file-damaged}, {@code passphrase-file-unknown} where a later version wrote it
     */
    public static WrappedKey read(byte[] text, String where) {
        try {
            Branch document = JsonReader.read(text).root();
            if (FORMAT.equals(document.text("format").orElse("")) && sum(document.without(SUM))
                    .equals(document.text(SUM).orElse(""))) {
                return read(document, where);
            }
        } catch (Refused e) {
            if (e.defect().code().equals("passphrase-file-unknown")) {
                throw e;
            }
            throw new Refused(Defect.in(where, "passphrase-file-damaged"), e);
        } catch (IllegalArgumentException | ArithmeticException e) {
            throw new Refused(Defect.in(where, "passphrase-file-damaged"), e);
        }
        throw new Refused(Defect.in(where, "passphrase-file-damaged"));
    }

    private static WrappedKey read(Branch document, String where) {
        int version = document.number("version").orElseThrow(IllegalArgumentException::new).intValueExact();
        if (version != VERSION || !KDF.equals(document.text("kdf").orElse(""))) {
            throw new Refused(Defect.in(where, "passphrase-file-unknown", Integer.toString(version)));
        }
        int iterations = document.number("iterations").orElseThrow(IllegalArgumentException::new).intValueExact();
        WrappedKey read = new WrappedKey(document.uuid("id").orElseThrow(IllegalArgumentException::new), iterations,
                bytes(document, "salt"), bytes(document, "nonce"), bytes(document, "key"));
        if (iterations < FEWEST || iterations > MOST || read.salt.length < 16 || read.nonce.length != Gcm.NONCE
                || read.wrapped.length != DataKey.BYTES + Gcm.TAG) {
            throw new IllegalArgumentException("no wrapped key");
        }
        return read;
    }

    private static byte[] bytes(Branch document, String key) {
        return Base64.getDecoder().decode(document.text(key).orElseThrow(IllegalArgumentException::new));
    }

    private static String base64(byte[] bytes) {
        return Base64.getEncoder().encodeToString(bytes);
    }

    private static String sum(Branch document) {
        try {
            return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256")
                    .digest(JsonWriter.compact(document)));
        } catch (GeneralSecurityException e) {
            throw new IllegalStateException(e);
        }
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof WrappedKey key && Arrays.equals(text(), key.text());
    }

    @Override
    public int hashCode() {
        return Arrays.hashCode(wrapped);
    }

    @Override
    public String toString() {
        return "the wrapped key " + id;
    }
}
