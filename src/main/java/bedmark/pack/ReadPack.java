package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Progress;
import bedmark.survey.Bundle;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.channels.FileChannel;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** A pack that was found sound: its bundle in memory, its photos still in the file. */
public final class ReadPack {
    private final Path file;
    private final byte[] bundleText;
    private final Bundle bundle;
    private final Fingerprint fingerprint;
    private final Map<PackedPhoto, ZipSlot> photos;

    /** @param bundleText nobody else's from now on */
    ReadPack(Path file, byte[] bundleText, Bundle bundle, Fingerprint fingerprint,
             Map<PackedPhoto, ZipSlot> photos) {
        this.file = file;
        this.bundleText = bundleText;
        this.bundle = bundle;
        this.fingerprint = fingerprint;
        this.photos = Collections.unmodifiableMap(new LinkedHashMap<>(photos));
    }

    public Path file() {
        return file;
    }

    /** The exact bytes of {@code data/bundle.json}. */
    public byte[] bundleText() {
        return bundleText.clone();
    }

    public Bundle bundle() {
        return bundle;
    }

    /** Of the device that signed; the signature is valid, trust is another question. */
    public Fingerprint fingerprint() {
        return fingerprint;
    }

    /** The photos in the order of their names. */
    public List<PackedPhoto> photos() {
        return List.copyOf(photos.keySet());
    }

    /**
     * Copies a photo out, proving its digest once more, since the file may have changed since it was judged. The
     * caller keeps the copy only after this returned.
     *
     * @throws IOException where the file can't be read or {@code out} can't be written
     * @throws Refused     {@code pack-photo-differs} or a {@code zip-…} code where the photo is no longer the same
     */
    public void copy(PackedPhoto photo, OutputStream out) throws IOException {
        ZipSlot slot = photos.get(photo);
        if (slot == null) {
            throw new IllegalArgumentException("not in this pack: " + photo);
        }
        try (FileChannel channel = FileChannel.open(file, StandardOpenOption.READ);
                DigestStream content = new DigestStream(new EntryStream(new ZipBytes(channel, channel.size()), slot),
                        List.of(Sha256.BAG_NAME), new Work(Progress.NONE, slot.size()))) {
            content.transferTo(out);
            Map<String, String> digests = content.finish();
            if (!digests.get(Sha256.BAG_NAME).equals(photo.sha256())) {
                throw new Refused(Defect.in(EntryName.shown(photo.name()), "pack-photo-differs"));
            }
        }
    }
}
