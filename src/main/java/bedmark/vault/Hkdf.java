package bedmark.vault;

import java.security.GeneralSecurityException;
import javax.crypto.Mac;
import javax.crypto.spec.SecretKeySpec;

/** The expanding half of HKDF with SHA-256 (RFC 5869, 2.3), one block: {@code HMAC(key, info || 0x01)}. */
final class Hkdf {
    private static final String MAC = "HmacSHA256";

    private Hkdf() {
    }

    /** @return 32 bytes */
    static byte[] expand(byte[] key, byte[] info) {
        try {
            Mac mac = Mac.getInstance(MAC);
            mac.init(new SecretKeySpec(key, MAC));
            mac.update(info);
            mac.update((byte) 1);
            return mac.doFinal();
        } catch (GeneralSecurityException e) {
            throw new IllegalStateException(e);
        }
    }
}
