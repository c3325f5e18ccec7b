package bedmark.pack;

import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

/** The digest that packs rely on. */
final class Sha256 {

    /** Its name in the file names of a bag. */
    static final String BAG_NAME = "sha256";

    private Sha256() {
    }

    static MessageDigest begin() {
        return begin("SHA-256");
    }

    /** @param algorithm a name that every Java platform knows */
    static MessageDigest begin(String algorithm) {
        try {
            return MessageDigest.getInstance(algorithm);
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException(e);
        }
    }

    static String hex(byte[] bytes) {
        return hex(begin(), bytes);
    }

    static String hex(MessageDigest digest, byte[] bytes) {
        return HexFormat.of().formatHex(digest.digest(bytes));
    }
}
