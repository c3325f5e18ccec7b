package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Fault;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.channels.ClosedByInterruptException;
import java.util.List;
import java.util.Optional;
import java.util.zip.CRC32;
import java.util.zip.CheckedInputStream;

/**
 * A photo on its way into a pack. It is read twice: first for the checksum that stands before it in the archive,
 * then to copy it, and only the copy is what the digest is proved on.
 *
 * @param claim what the bundle says of it
 * @param photo where it lies
 * @param crc   CRC-32 of the photo when it was first read
 */
record SourcePhoto(PackedPhoto claim, PhotoSource.Photo photo, long crc) {
    private static final int PIECE = 1 << 16;

    /**
     * Finds a photo and looks at it.
     *
     * @throws Refused {@code pack-photo-missing}, {@code pack-photo-differs}, {@code pack-photo-unreadable}, or what
     *                 {@link PhotoHeader} has against it
     */
    static SourcePhoto find(PackedPhoto claim, PhotoSource source, PackLimits limits, Work work) {
        PhotoSource.Photo photo = source.find(claim.name(), claim.sha256())
                .orElseThrow(() -> refused(claim, "pack-photo-missing"));
        try (DigestStream content = new DigestStream(photo.open(), List.of(), work)) {
            if (photo.size() != claim.bytes()) {
                throw refused(claim, "pack-photo-differs");
            }
            CheckedInputStream checked = new CheckedInputStream(content, new CRC32());
            Optional<Defect> doubt = PhotoHeader.doubt(EntryName.shown(claim.name()), checked, limits);
            doubt.ifPresent(defect -> {
                throw new Refused(defect);
            });
            checked.transferTo(OutputStream.nullOutputStream());
            return new SourcePhoto(claim, photo, checked.getChecksum().getValue());
        } catch (IOException e) {
            throw unreadable(claim, e);
        }
    }

    /**
     * Copies the photo.
     *
     * @throws IOException where {@code out} can't be written
     * @throws Refused     {@code pack-photo-differs} where the file is not, or no longer, what the bundle claims
     */
    void copy(OutputStream out, Work work) throws IOException {
        CRC32 sum = new CRC32();
        long count = 0;
        byte[] piece = new byte[PIECE];
        try (Reading reading = new Reading(work)) {
            for (int read = reading.next(piece); read > 0; read = reading.next(piece)) {
                count += read;
                if (count > claim.bytes()) {
                    throw refused(claim, "pack-photo-differs");
                }
                sum.update(piece, 0, read);
                out.write(piece, 0, read);
            }
            if (count != claim.bytes() || sum.getValue() != crc || !reading.sha256().equals(claim.sha256())) {
                throw refused(claim, "pack-photo-differs");
            }
        }
    }

    /** Tells a photo that can't be read from a pack that can't be written: the person mends them differently. */
    private final class Reading implements AutoCloseable {
        private final DigestStream content;

        Reading(Work work) {
            try {
                content = new DigestStream(photo.open(), List.of(Sha256.BAG_NAME), work);
            } catch (IOException e) {
                throw unreadable(claim, e);
            }
        }

        int next(byte[] piece) {
            try {
                return content.read(piece);
            } catch (IOException e) {
                throw unreadable(claim, e);
            }
        }

        String sha256() {
            try {
                return content.finish().get(Sha256.BAG_NAME);
            } catch (IOException e) {
                throw unreadable(claim, e);
            }
        }

        @Override
        public void close() {
            try {
                content.close();
            } catch (IOException e) {
                throw unreadable(claim, e);
            }
        }
    }

    private static Refused refused(PackedPhoto claim, String code) {
        return new Refused(Defect.in(EntryName.shown(claim.name()), code));
    }

    private static Refused unreadable(PackedPhoto claim, IOException e) {
        return new Refused(e instanceof ClosedByInterruptException ? Defect.in("", "pack-cancelled")
                : Defect.in(EntryName.shown(claim.name()), "pack-photo-unreadable", Fault.reason(e)), e);
    }
}
