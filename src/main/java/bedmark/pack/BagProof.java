package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.Base64;
import java.util.Map;

/**
 * Proves a bag: the signature over the tag manifest, the tag manifest over every tag file, the manifests over every
 * payload file; nothing is missing and nothing is there that they don't list.
 */
final class BagProof {
    private final PackContent content;
    private final PackLimits limits;

    private BagProof(PackContent content, PackLimits limits) {
        this.content = content;
        this.limits = limits;
    }

    /**
     * @return the device that signed
     * @throws Refused with a {@code bag-…} code, {@code pack-key-wrong} or {@code pack-signature-wrong}
     */
    static DeviceIdentity prove(PackContent content, BagShape shape, PackLimits limits) {
        BagProof proof = new BagProof(content, limits);
        proof.checkDigests(Bag.TAG_MANIFEST, Sha256.BAG_NAME, false);
        for (String algorithm : shape.algorithms()) {
            proof.checkDigests(Bag.MANIFEST_START + algorithm + Bag.TEXT, algorithm, true);
        }
        proof.checkDeclaration();
        proof.checkOxum();
        return signer(content.kept());
    }

    private void checkDigests(String manifestName, String algorithm, boolean ofPayload) {
        int hexDigits = Sha256.begin(DigestStream.ALGORITHMS.get(algorithm)).getDigestLength() * 2;
        Map<String, String> listed = Manifest.read(content.kept().get(manifestName), manifestName, hexDigits,
                ofPayload, limits.entries()).digests();
        for (String path : listed.keySet()) {
            if (!content.files().containsKey(path)) {
                throw new Refused(Defect.in(EntryName.shown(path), "bag-file-missing"));
            }
        }
        for (PackEntry entry : content.files().values()) {
            String digest = listed.get(entry.name());
            boolean needed = Bag.isPayload(entry.name()) == ofPayload && !Bag.BESIDE.contains(entry.name());
            if (digest == null && needed) {
                throw new Refused(Defect.in(EntryName.shown(entry.name()), "bag-file-unlisted"));
            } else if (digest != null && !digest.equals(entry.digests().get(algorithm))) {
                throw new Refused(Defect.in(EntryName.shown(entry.name()), "bag-digest-wrong"));
            }
        }
    }

    private void checkDeclaration() {
        String text = text(Bag.DECLARATION).replaceAll("\\r\\n?", "\n");
        if (!text.equals(Bag.DECLARATION_TEXT) && !(text + "\n").equals(Bag.DECLARATION_TEXT)) {
            throw new Refused(Defect.in(Bag.DECLARATION, "bag-declaration-wrong"));
        }
    }

    /** Bytes and count of the payload, as {@code bag-info.txt} says them. */
    private void checkOxum() {
        long bytes = 0;
        long count = 0;
        for (PackEntry entry : content.files().values()) {
            if (Bag.isPayload(entry.name())) {
                bytes += entry.slot().size();
                count++;
            }
        }
        String expected = BagInfo.oxum(bytes, count);
        if (text(Bag.INFO).lines().noneMatch(expected::equals)) {
            throw new Refused(Defect.in(Bag.INFO, "bag-oxum-wrong", bytes + "." + count));
        }
    }

    /**
     * The device that signed the tag manifest.
     *
     * @param kept holds tag manifest, signature and key
     * @throws Refused {@code pack-key-wrong}, {@code pack-signature-wrong}
     */
    static DeviceIdentity signer(Map<String, byte[]> kept) {
        DeviceIdentity identity = DeviceIdentity.read(kept.get(Bag.KEY), Bag.KEY);
        byte[] text = kept.get(Bag.SIGNATURE);
        byte[] signature;
        try {
            signature = Base64.getDecoder().decode(new String(text, StandardCharsets.UTF_8).strip());
        } catch (IllegalArgumentException e) {
            throw new Refused(Defect.in(Bag.SIGNATURE, "pack-signature-wrong"), e);
        }
        if (!Arrays.equals(text, signatureText(signature))
                || !identity.proves(kept.get(Bag.TAG_MANIFEST), signature)) {
            throw new Refused(Defect.in(Bag.SIGNATURE, "pack-signature-wrong"));
        }
        return identity;
    }

    /** A signature as packs carry it: base64 in one line. */
    static byte[] signatureText(byte[] signature) {
        return (Base64.getEncoder().encodeToString(signature) + "\n").getBytes(StandardCharsets.US_ASCII);
    }

    private String text(String name) {
        return new String(content.kept().get(name), StandardCharsets.UTF_8);
    }
}
