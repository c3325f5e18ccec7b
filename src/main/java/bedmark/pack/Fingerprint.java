package bedmark.pack;

import java.security.PublicKey;
import java.util.Locale;
import java.util.Optional;

/**
 * A device key's fingerprint: SHA-256 over the X.509 form of the public key, as 16 groups of four lower-case
 * hexadecimal digits joined by hyphens, so that two people can compare it aloud.
 */
public record Fingerprint(String text) {
    public Fingerprint {
        if (!text.matches("[0-9a-f]{4}(-[0-9a-f]{4}){15}")) {
            throw new IllegalArgumentException("no fingerprint: " + text);
        }
    }

    static Fingerprint of(PublicKey key) {
        return grouped(Sha256.hex(key.getEncoded()));
    }

    /** Reads what a person typed or pasted: any case; hyphens, colons and spaces anywhere. */
    public static Optional<Fingerprint> parse(String typed) {
        String digits = typed.replaceAll("[-:\\s]", "").toLowerCase(Locale.ROOT);
        return digits.matches("[0-9a-f]{64}") ? Optional.of(grouped(digits)) : Optional.empty();
    }

    private static Fingerprint grouped(String digits) {
        return new Fingerprint(digits.replaceAll("(.{4})(?=.)", "$1-"));
    }

    @Override
    public String toString() {
        return text;
    }
}
