package bedmark.vault;

import java.security.GeneralSecurityException;
import java.security.SecureRandom;
import java.util.Optional;
import javax.crypto.AEADBadTagException;
import javax.crypto.Cipher;
import javax.crypto.spec.GCMParameterSpec;
import javax.crypto.spec.SecretKeySpec;

/** AES-256-GCM with a nonce of 96 bits and a tag of 128 bits (NIST SP 800-38D). */
final class Gcm {
    static final int NONCE = 12;
    static final int TAG = 16;
    private static final SecureRandom RANDOM = new SecureRandom();

    private Gcm() {
    }

    static byte[] random(int length) {
        byte[] bytes = new byte[length];
        RANDOM.nextBytes(bytes);
        return bytes;
    }

    /** @return ciphertext and tag */
    static byte[] seal(byte[] key, byte[] nonce, byte[] bound, byte[] plain, int length) {
        try {
            return cipher(Cipher.ENCRYPT_MODE, key, nonce, bound).doFinal(plain, 0, length);
        } catch (GeneralSecurityException e) {
            throw new IllegalStateException(e);
        }
    }

    /** @return nothing where the bytes are not what was sealed with this key, nonce and bound data */
    static Optional<byte[]> open(byte[] key, byte[] nonce, byte[] bound, byte[] sealed, int from, int length) {
        try {
            return Optional.of(cipher(Cipher.DECRYPT_MODE, key, nonce, bound).doFinal(sealed, from, length));
        } catch (AEADBadTagException e) {
            return Optional.empty();
        } catch (GeneralSecurityException e) {
            throw new IllegalStateException(e);
        }
    }

    private static Cipher cipher(int mode, byte[] key, byte[] nonce, byte[] bound) throws GeneralSecurityException {
        Cipher cipher = Cipher.getInstance("AES/GCM/NoPadding");
        cipher.init(mode, new SecretKeySpec(key, "AES"), new GCMParameterSpec(TAG * 8, nonce));
        cipher.updateAAD(bound);
        return cipher;
    }
}
