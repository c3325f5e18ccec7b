package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.nio.charset.StandardCharsets;
import java.security.GeneralSecurityException;
import java.security.KeyFactory;
import java.security.PublicKey;
import java.security.Signature;
import java.security.spec.X509EncodedKeySpec;
import java.util.Arrays;
import java.util.Base64;

/** The public half of a device key: what a pack carries, and what proves its signature. */
final class DeviceIdentity {
    static final String ALGORITHM = "Ed25519";

    private static final String BEGIN = "-----BEGIN PUBLIC KEY-----\n";
    private static final String END = "\n-----END PUBLIC KEY-----\n";

    private final PublicKey key;

    DeviceIdentity(PublicKey key) {
        this.key = key;
    }

    /**
     * Reads exactly what {@link #text()} writes and no other spelling of the same key.
     *
     * @throws Refused {@code pack-key-wrong}
     */
    static DeviceIdentity read(byte[] bytes, String where) {
        String text = new String(bytes, StandardCharsets.ISO_8859_1);
        try {
            if (text.startsWith(BEGIN) && text.endsWith(END) && text.length() > BEGIN.length() + END.length()) {
                byte[] encoded = Base64.getDecoder()
                        .decode(text.substring(BEGIN.length(), text.length() - END.length()));
                DeviceIdentity identity = new DeviceIdentity(KeyFactory.getInstance(ALGORITHM)
                        .generatePublic(new X509EncodedKeySpec(encoded)));
                if (Arrays.equals(bytes, identity.text())) {
                    return identity;
                }
            }
        } catch (IllegalArgumentException | GeneralSecurityException e) {
            throw new Refused(Defect.in(where, "pack-key-wrong"), e);
        }
        throw new Refused(Defect.in(where, "pack-key-wrong"));
    }

    /** The key in the PEM form that other programs read. */
    byte[] text() {
        return (BEGIN + Base64.getEncoder().encodeToString(key.getEncoded()) + END)
                .getBytes(StandardCharsets.US_ASCII);
    }

    Fingerprint fingerprint() {
        return Fingerprint.of(key);
    }

    /** Whether the device that holds the other half signed exactly these bytes. */
    boolean proves(byte[] message, byte[] signature) {
        try {
            Signature verifier = Signature.getInstance(ALGORITHM);
            verifier.initVerify(key);
            verifier.update(message);
            return verifier.verify(signature);
        } catch (GeneralSecurityException e) {
            return false;
        }
    }
}
