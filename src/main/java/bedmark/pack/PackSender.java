package bedmark.pack;

import bedmark.document.Branch;
import bedmark.document.Refused;
import bedmark.json.JsonReader;
import java.io.IOException;
import java.nio.channels.FileChannel;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * Who signed a pack, as far as that is proved though the pack is not sound: the signature over the tag manifest by the
 * key that lies beside it and, digest by digest, the bundle that it covers. Whether the key is trusted is for the
 * receiver to decide.
 *
 * @param name what the tablet calls itself in the bundle; nothing where that can't be read or is not what was signed
 */
public record PackSender(Fingerprint fingerprint, Optional<String> name) {
    private static final Set<String> LOOKED_AT =
            Set.of(Bag.TAG_MANIFEST, Bag.SIGNATURE, Bag.KEY, Bag.MANIFEST, Bag.BUNDLE);
    private static final int HEX_DIGITS = 64;

    /** Looks at a pack that was refused; nothing where no signature is proved. */
    public static Optional<PackSender> of(Path file, PackLimits limits) {
        try (FileChannel channel = FileChannel.open(file, StandardOpenOption.READ)) {
            ZipBytes bytes = new ZipBytes(channel, channel.size());
            List<ZipSlot> slots = ZipDirectory.read(bytes, limits);
            BagShape shape = BagShape.of(slots);
            Map<String, byte[]> kept = new HashMap<>();
            for (ZipSlot slot : slots) {
                if (LOOKED_AT.contains(shape.inBag(slot))) {
                    read(bytes, slot, shape.inBag(slot), limits).ifPresent(text ->
                            kept.put(shape.inBag(slot), text));
                }
            }
            return kept.keySet().containsAll(Set.of(Bag.TAG_MANIFEST, Bag.SIGNATURE, Bag.KEY))
                    ? Optional.of(new PackSender(BagProof.signer(kept).fingerprint(), name(kept, limits)))
                    : Optional.empty();
        } catch (Refused | IOException e) {
            // Why it is refused is told already.
            return Optional.empty();
        }
    }

    /** A file of the bag, where it is whole. */
    private static Optional<byte[]> read(ZipBytes bytes, ZipSlot slot, String name, PackLimits limits)
            throws IOException {
        if (slot.size() > (name.equals(Bag.BUNDLE) ? limits.bundleBytes() : limits.tagFileBytes())) {
            return Optional.empty();
        }
        try (EntryStream content = new EntryStream(bytes, slot)) {
            return Optional.of(content.readAllBytes());
        } catch (Refused e) {
            return Optional.empty();
        }
    }

    private static Optional<String> name(Map<String, byte[]> kept, PackLimits limits) {
        try {
            return lists(kept, Bag.TAG_MANIFEST, Bag.MANIFEST, limits) && lists(kept, Bag.MANIFEST, Bag.BUNDLE, limits)
                    ? JsonReader.read(BundleText.bounded(kept.get(Bag.BUNDLE), limits)).root().branch("device")
                            .orElse(Branch.EMPTY).text("name")
                    : Optional.empty();
        } catch (Refused e) {
            return Optional.empty();
        }
    }

    /** Whether a file is the very one that a manifest lists. */
    private static boolean lists(Map<String, byte[]> kept, String manifest, String file, PackLimits limits) {
        return kept.containsKey(manifest) && kept.containsKey(file) && Sha256.hex(kept.get(file)).equals(
                Manifest.read(kept.get(manifest), manifest, HEX_DIGITS, Bag.isPayload(file), limits.entries())
                        .digests().get(file));
    }
}
