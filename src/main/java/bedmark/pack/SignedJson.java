package bedmark.pack;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.json.JsonWriter;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.Base64;

/**
 * A JSON document that carries {@code key} (the signer's public key as PEM) and {@code signature} (Ed25519 over the
 * exact bytes of the same document without {@code signature}, without spaces and line ends, as base64). It is proved
 * outside with {@code jq -cj 'del(.signature)'} and {@code openssl pkeyutl -verify -rawin}.
 */
final class SignedJson {
    static final String KEY = "key";
    static final String SIGNATURE = "signature";

    private SignedJson() {
    }

    /** The file's exact bytes; the same document and key always give the same. */
    static byte[] text(Branch document, DeviceKey signer) {
        Branch signed = document.without(SIGNATURE)
                .with(KEY, new String(signer.publicText(), StandardCharsets.US_ASCII));
        return JsonWriter.indented(signed.with(SIGNATURE,
                Base64.getEncoder().encodeToString(signer.sign(JsonWriter.compact(signed)))));
    }

    /**
     * Proves a document. Only the spelling that {@link #text} writes is let in, so that one document is one file.
     *
     * @param bytes    the file
     * @param document what they say
     * @return whose key signed it; whether that is trusted is for the reader to decide
     * @throws Refused {@code signed-key-wrong}, {@code signed-signature-wrong}
     */
    static Fingerprint prove(byte[] bytes, Branch document) {
        DeviceIdentity signer;
        byte[] signature;
        try {
            signer = DeviceIdentity.read(document.text(KEY).orElse("").getBytes(StandardCharsets.UTF_8), "/key");
        } catch (Refused e) {
            throw new Refused(Defect.in("/key", "signed-key-wrong"), e);
        }
        try {
            signature = Base64.getDecoder().decode(document.text(SIGNATURE).orElse(""));
        } catch (IllegalArgumentException e) {
            throw new Refused(Defect.in("/signature", "signed-signature-wrong"), e);
        }
        Branch signed = document.without(SIGNATURE);
        boolean spelled = Arrays.equals(bytes, JsonWriter.indented(signed.with(SIGNATURE,
                Base64.getEncoder().encodeToString(signature))));
        if (!spelled || !signer.proves(JsonWriter.compact(signed), signature)) {
            throw new Refused(Defect.in("/signature", "signed-signature-wrong"));
        }
        return signer.fingerprint();
    }
}
