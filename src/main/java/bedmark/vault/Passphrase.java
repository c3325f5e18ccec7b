package bedmark.vault;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.security.GeneralSecurityException;
import java.text.Normalizer;
import javax.crypto.SecretKeyFactory;
import javax.crypto.spec.PBEKeySpec;

/** What a person types to open a store; the same letters count as the same whichever keyboard made them (NFC). */
public final class Passphrase {

    /** The fewest characters of a new one (NIST SP 800-63B, 5.1.1). */
    public static final int SHORTEST = 8;
    private static final int KEY_BITS = 256;

    private final String text;

    private Passphrase(String text) {
        this.text = text;
    }

    /** What somebody typed; line ends around it don't count. */
    public static Passphrase of(String typed) {
        return new Passphrase(Normalizer.normalize(typed.replaceAll("[\\r\\n]+$", ""), Normalizer.Form.NFC));
    }

    /**
     * The same, to be used for a store from now on.
     *
     * @throws Refused {@code passphrase-too-short}
     */
    public static Passphrase chosen(String typed) {
        Passphrase passphrase = of(typed);
        if (passphrase.text.codePointCount(0, passphrase.text.length()) < SHORTEST) {
            throw new Refused(Defect.in("", "passphrase-too-short", Integer.toString(SHORTEST)));
        }
        return passphrase;
    }

    public boolean sameAs(Passphrase other) {
        return text.equals(other.text);
    }

    /** PBKDF2 with HMAC-SHA-256 (RFC 8018), 32 bytes. */
    byte[] derive(byte[] salt, int iterations) {
        PBEKeySpec spec = new PBEKeySpec(text.toCharArray(), salt, iterations, KEY_BITS);
        try {
            return SecretKeyFactory.getInstance("PBKDF2WithHmacSHA256").generateSecret(spec).getEncoded();
        } catch (GeneralSecurityException e) {
            throw new IllegalStateException(e);
        } finally {
            spec.clearPassword();
        }
    }

    /** Says nothing of what was typed. */
    @Override
    public String toString() {
        return "a passphrase";
    }
}
