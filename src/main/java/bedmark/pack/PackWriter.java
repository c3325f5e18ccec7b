package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.FileLayer;
import bedmark.journal.NamedPath;
import bedmark.journal.Progress;
import bedmark.json.JsonWriter;
import bedmark.survey.Bundle;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.ReadOnlyFileSystemException;
import java.security.DigestOutputStream;
import java.security.MessageDigest;
import java.util.HexFormat;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.zip.CRC32;

/**
 * Writes a pack: a BagIt 1.0 bag (RFC 8493) as a ZIP file, signed by the device. Its entries, in this order:
 *
 * <table>
 * <caption>Entries of a pack</caption>
 * <tr><td>{@code bagit.txt}</td><td>the bag's declaration</td></tr>
 * <tr><td>{@code bag-info.txt}</td><td>{@code Bag-Software-Agent}, {@code Bagging-Date} (the day of the bundle's
 * {@code createdAt}), {@code External-Identifier} (the bundle's id), {@code Payload-Oxum}</td></tr>
 * <tr><td>{@code manifest-sha256.txt}</td><td>digests of all payload files</td></tr>
 * <tr><td>{@code tagmanifest-sha256.txt}</td><td>digests of the three files above</td></tr>
 * <tr><td>{@code signature-ed25519.txt}</td><td>Ed25519 signature over the exact bytes of the tag manifest, 64 bytes
 * as base64 in one line; not in the tag manifest</td></tr>
 * <tr><td>{@code device-key.txt}</td><td>the device's public key, X.509 as PEM; not in the tag manifest</td></tr>
 * <tr><td>{@code data/bundle.json}</td><td>the bundle</td></tr>
 * <tr><td>{@code data/photos/…}</td><td>the photos that its surveys name, in the order of their names</td></tr>
 * </table>
 *
 * <p>The bag lies at the top of the archive, so that {@code unzip} and {@code sha256sum -c manifest-sha256.txt} in
 * the folder unpacked to prove it. (RFC 8493 recommends a base folder for serialized bags; the reader takes both.)
 * No entry is compressed and none has a time: the same bundle, photos and key always give the same file.
 */
public final class PackWriter {
    private static final PackLimits LIMITS = PackLimits.STANDARD;

    private final FileLayer disk;

    PackWriter(FileLayer disk) {
        this.disk = disk;
    }

    /**
     * Writes a pack whole or not at all: into a hidden file beside {@code out}, forced, moved into place in one step
     * (an older pack of that name stays until then), folder forced.
     *
     * @param bundle   its photos must be named with {@code file}, {@code sha256} and {@code bytes}
     * @param photos   where the named photos lie
     * @param key      the device that signs
     * @param out      the pack's file, in a folder that exists
     * @param progress hears bytes read and written, and may cancel
     * @throws Refused where something is missing or wrong in bundle or photos ({@code key-absent},
     *                 {@code pack-photo-…}, {@code name-…}, {@code zip-…}), or the folder takes no pack
     *                 ({@code pack-folder-missing}, {@code pack-folder-read-only}, {@code pack-disk-full},
     *                 {@code pack-target-folder}, {@code file-not-plain}, {@code pack-not-saved}),
     *                 or {@code pack-cancelled}
     */
    public static WrittenPack write(Bundle bundle, PhotoSource photos, DeviceKey key, Path out, Progress progress) {
        return new PackWriter(FileLayer.disk()).writePack(bundle, photos, key, out, progress);
    }

    WrittenPack writePack(Bundle bundle, PhotoSource photos, DeviceKey key, Path out, Progress progress) {
        Path target = out.toAbsolutePath();
        checkTarget(target);
        byte[] text = BundleText.bounded(JsonWriter.compact(bundle.document()), LIMITS);
        SortedMap<String, PackedPhoto> claims = PhotoClaims.of(bundle);
        long photoBytes = claims.values().stream().mapToLong(PackedPhoto::bytes).sum();
        Work work = new Work(progress, 2 * photoBytes);
        Map<String, SourcePhoto> found = new LinkedHashMap<>();
        for (PackedPhoto claim : claims.values()) {
            found.put(Bag.PHOTOS + claim.name(), SourcePhoto.find(claim, photos, LIMITS, work));
        }
        Map<String, byte[]> texts = texts(bundle, text, claims, key);
        StoredZip zip = new StoredZip();
        texts.forEach((name, bytes) -> zip.add(name, bytes.length, crc(bytes)));
        found.forEach((name, photo) -> zip.add(name, photo.claim().bytes(), photo.crc()));
        checkPlan(zip);
        return save(out, zip, texts, found, key, work);
    }

    private static void checkTarget(Path target) {
        if (Files.isDirectory(target)) {
            throw new Refused(Defect.in(target.toString(), "pack-target-folder"));
        } else if (!Files.isDirectory(target.getParent())) {
            throw new Refused(Defect.in(target.getParent().toString(), "pack-folder-missing"));
        }
        NamedPath.requireTarget(target);
    }

    /** The files that are small, in the order of the pack. */
    private static Map<String, byte[]> texts(Bundle bundle, byte[] bundleText, Map<String, PackedPhoto> claims,
                                             DeviceKey key) {
        SortedMap<String, String> payload = new TreeMap<>();
        payload.put(Bag.BUNDLE, Sha256.hex(bundleText));
        claims.values().forEach(claim -> payload.put(Bag.PHOTOS + claim.name(), claim.sha256()));
        long payloadBytes = bundleText.length + claims.values().stream().mapToLong(PackedPhoto::bytes).sum();
        Map<String, byte[]> texts = new LinkedHashMap<>();
        texts.put(Bag.DECLARATION, Bag.DECLARATION_TEXT.getBytes(StandardCharsets.UTF_8));
        texts.put(Bag.INFO, BagInfo.write(bundle, payloadBytes, payload.size()));
        texts.put(Bag.MANIFEST, Manifest.write(payload));
        SortedMap<String, String> tags = new TreeMap<>();
        texts.forEach((name, bytes) -> tags.put(name, Sha256.hex(bytes)));
        byte[] tagManifest = Manifest.write(tags);
        texts.put(Bag.TAG_MANIFEST, tagManifest);
        texts.put(Bag.SIGNATURE, BagProof.signatureText(key.sign(tagManifest)));
        texts.put(Bag.KEY, key.publicText());
        texts.put(Bag.BUNDLE, bundleText);
        return texts;
    }

    /** No pack leaves that a reader would refuse. */
    private static void checkPlan(StoredZip zip) {
        if (zip.slots().size() > LIMITS.entries()) {
            throw new Refused(Defect.in("", "zip-entries-too-many", Integer.toString(LIMITS.entries())));
        } else if (zip.size() > LIMITS.packBytes()) {
            throw new Refused(Defect.in("", "pack-too-large", Long.toString(LIMITS.packBytes())));
        }
        zip.slots().forEach(slot -> EntryName.safe(slot.name()));
        ZipNames.check(zip.slots());
        ZipSizes.check(zip.slots(), zip.size(), LIMITS);
    }

    private WrittenPack save(Path out, StoredZip zip, Map<String, byte[]> texts, Map<String, SourcePhoto> photos,
                             DeviceKey key, Work work) {
        Path target = out.toAbsolutePath();
        MessageDigest digest = Sha256.begin();
        StoredZip.Content content = (slot, into) -> {
            work.add(0);
            if (photos.containsKey(slot.name())) {
                photos.get(slot.name()).copy(into, work);
            } else {
                into.write(texts.get(slot.name()));
            }
        };
        try {
            checkRoom(target.getParent(), zip.size());
            new SafeFile(disk, target, false).write(into -> zip.write(new DigestOutputStream(into, digest), content));
        } catch (IOException | ReadOnlyFileSystemException e) {
            throw WriteFailure.of(e, target.getParent(), disk);
        }
        return new WrittenPack(out, HexFormat.of().formatHex(digest.digest()), zip.size(), photos.size(),
                key.fingerprint());
    }

    /** Some systems don't know their free space and say zero; then the writing itself will tell. */
    private void checkRoom(Path folder, long needed) throws IOException {
        long free = disk.usableSpace(folder);
        if (free > 0 && free < needed) {
            throw new Refused(Defect.in(folder.toString(), "pack-disk-full"));
        }
    }

    private static long crc(byte[] bytes) {
        CRC32 crc = new CRC32();
        crc.update(bytes);
        return crc.getValue();
    }
}
