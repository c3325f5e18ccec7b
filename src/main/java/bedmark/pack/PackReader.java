package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Fault;
import bedmark.journal.Progress;
import bedmark.json.JsonReader;
import bedmark.survey.Bundle;
import java.io.IOException;
import java.nio.channels.ClosedByInterruptException;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Function;

/**
 * Reads packs that come from anywhere. A pack is either sound in every respect or refused with one reason; nothing
 * is unpacked to disk, and memory does not grow with the photos. It is read three times: by our own strict view,
 * and by the Java library's two views, which must agree with it. Whether the signing device is trusted is for the
 * receiver to decide, by the fingerprint.
 */
public final class PackReader {
    private static final int VIEWS = 3;

    private final PackLimits limits;
    private final Function<byte[], Bundle> bundles;

    /**
     * @param bundles turns the bytes of {@code data/bundle.json} into a bundle, or refuses them; the only place where
     *                a pack's JSON is read
     */
    public PackReader(PackLimits limits, Function<byte[], Bundle> bundles) {
        this.limits = limits;
        this.bundles = bundles;
    }

    /** Reads a pack's bundle strictly as JSON, without the published schema. */
    public static ReadPack open(Path file, PackLimits limits) {
        return new PackReader(limits, bytes -> new Bundle(JsonReader.read(bytes).root()))
                .open(file, Progress.NONE);
    }

    /**
     * Proves a pack.
     *
     * @throws Refused with the one reason; {@code pack-cancelled} where the person stopped it
     */
    public ReadPack open(Path file, Progress progress) {
        if (!Files.isRegularFile(file)) {
            throw new Refused(Defect.in(file.toString(), "pack-absent"));
        }
        try (FileChannel channel = FileChannel.open(file, StandardOpenOption.READ)) {
            return read(file, new ZipBytes(channel, channel.size()), progress);
        } catch (ClosedByInterruptException e) {
            throw new Refused(Defect.in("", "pack-cancelled"), e);
        } catch (IOException e) {
            throw new Refused(Defect.in(file.toString(), "pack-unreadable", Fault.reason(e)), e);
        }
    }

    private ReadPack read(Path file, ZipBytes bytes, Progress progress) throws IOException {
        if (bytes.size() > limits.packBytes()) {
            throw new Refused(Defect.in(file.toString(), "pack-too-large", Long.toString(limits.packBytes())));
        }
        List<ZipSlot> slots = ZipDirectory.read(bytes, limits);
        BagShape shape = BagShape.of(slots);
        Work work = new Work(progress, VIEWS * slots.stream().mapToLong(ZipSlot::size).sum());
        PackContent content = PackContent.read(bytes, slots, shape, limits, work);
        ZipViews.check(file, content, work);
        DeviceIdentity signer = BagProof.prove(content, shape, limits);
        for (PackEntry entry : content.files().values()) {
            entry.doubt().ifPresent(doubt -> {
                throw new Refused(doubt);
            });
        }
        byte[] text = BundleText.bounded(content.kept().get(Bag.BUNDLE), limits);
        Bundle bundle = bundles.apply(text);
        return new ReadPack(file, text, bundle, signer.fingerprint(), photos(content, PhotoClaims.of(bundle)));
    }

    /** The photos of the pack are those that its bundle names, no more and no fewer. */
    private static Map<PackedPhoto, ZipSlot> photos(PackContent content, Map<String, PackedPhoto> claims) {
        Map<PackedPhoto, ZipSlot> photos = new LinkedHashMap<>();
        for (PackedPhoto claim : claims.values()) {
            PackEntry entry = content.files().get(Bag.PHOTOS + claim.name());
            if (entry == null) {
                throw new Refused(Defect.in(EntryName.shown(claim.name()), "pack-photo-missing"));
            } else if (!entry.sha256().equals(claim.sha256()) || entry.slot().size() != claim.bytes()) {
                throw new Refused(Defect.in(EntryName.shown(claim.name()), "pack-photo-differs"));
            }
            photos.put(claim, entry.slot());
        }
        for (PackEntry entry : content.files().values()) {
            if (Bag.isPhoto(entry.name())) {
                if (!claims.containsKey(entry.name().substring(Bag.PHOTOS.length()))) {
                    throw new Refused(Defect.in(EntryName.shown(entry.name()), "pack-photo-unclaimed"));
                }
            } else if (Bag.isPayload(entry.name()) && !entry.name().equals(Bag.BUNDLE)) {
                throw new Refused(Defect.in(EntryName.shown(entry.name()), "bag-file-foreign"));
            }
        }
        return photos;
    }
}
