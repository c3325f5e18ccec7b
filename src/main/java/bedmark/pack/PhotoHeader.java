package bedmark.pack;

import bedmark.document.Defect;
import java.io.ByteArrayInputStream;
import java.io.DataInputStream;
import java.io.EOFException;
import java.io.IOException;
import java.io.InputStream;
import java.util.Optional;
import java.util.zip.CRC32;

/**
 * Looks at the first bytes of a photo without decoding it: is it a JPEG (ITU-T T.81) or a PNG (ISO/IEC 15948), and
 * how large would it become in memory?
 */
public final class PhotoHeader {
    private static final int JPEG = 0xFFD8;
    private static final int PNG_START = 0x8950;
    private static final long PNG_REST = 0x4E47_0D0A_1A0AL;
    private static final int PNG_HEADER = 0x4948_4452;
    private static final int PNG_HEADER_BYTES = 13;

    private final String shown;
    private final DataInputStream in;
    private final PackLimits limits;

    private PhotoHeader(String shown, InputStream in, PackLimits limits) {
        this.shown = shown;
        this.in = new DataInputStream(in);
        this.limits = limits;
    }

    /**
     * What speaks against a photo: {@code zip-nested-archive}, {@code pack-photo-kind}, {@code pack-photo-damaged}
     * or {@code pack-photo-too-large}.
     *
     * @param in read only as far as the header goes
     */
    public static Optional<Defect> doubt(String shown, InputStream in, PackLimits limits) throws IOException {
        return new PhotoHeader(shown, in, limits).doubt();
    }

    private Optional<Defect> doubt() throws IOException {
        try {
            int start = in.readUnsignedShort();
            if (start == JPEG) {
                return jpeg();
            } else if (start == PNG_START) {
                return in.readUnsignedShort() == (int) (PNG_REST >>> 32)
                        && in.readInt() == (int) PNG_REST ? png() : defect("pack-photo-kind");
            }
            return defect(isArchive(start) ? "zip-nested-archive" : "pack-photo-kind");
        } catch (EOFException e) {
            return defect("pack-photo-damaged");
        }
    }

    /** The beginnings of ZIP, gzip, 7z, RAR, bzip2 and xz; whatever else it is, it is no photo. */
    private static boolean isArchive(int start) {
        return switch (start) {
            case 0x504B, 0x1F8B, 0x377A, 0x5261, 0x425A, 0xFD37 -> true;
            default -> false;
        };
    }

    private Optional<Defect> png() throws IOException {
        int length = in.readInt();
        byte[] chunk = new byte[4 + PNG_HEADER_BYTES];
        in.readFully(chunk);
        CRC32 crc = new CRC32();
        crc.update(chunk);
        DataInputStream fields = new DataInputStream(new ByteArrayInputStream(chunk));
        if (length != PNG_HEADER_BYTES || fields.readInt() != PNG_HEADER
                || Integer.toUnsignedLong(in.readInt()) != crc.getValue()) {
            return defect("pack-photo-damaged");
        }
        return judged(Integer.toUnsignedLong(fields.readInt()), Integer.toUnsignedLong(fields.readInt()));
    }

    /** Walks the segments up to the frame header, which holds the size; it comes before the first scan. */
    private Optional<Defect> jpeg() throws IOException {
        while (true) {
            if (in.readUnsignedByte() != 0xFF) {
                return defect("pack-photo-damaged");
            }
            int marker = in.readUnsignedByte();
            while (marker == 0xFF) {
                marker = in.readUnsignedByte();
            }
            if (marker < 0xC0 || marker >= 0xD0 && marker <= 0xDA) {
                return defect("pack-photo-damaged");
            }
            int length = in.readUnsignedShort() - 2;
            if (length < 0) {
                return defect("pack-photo-damaged");
            }
            if (isFrame(marker)) {
                in.readUnsignedByte();
                int height = in.readUnsignedShort();
                return judged(in.readUnsignedShort(), height);
            }
            in.readFully(new byte[length]);
        }
    }

    private static boolean isFrame(int marker) {
        return marker <= 0xCF && marker != 0xC4 && marker != 0xC8 && marker != 0xCC;
    }

    private Optional<Defect> judged(long width, long height) {
        if (width == 0 || height == 0) {
            return defect("pack-photo-damaged");
        }
        boolean tooLarge = width > limits.photoSide() || height > limits.photoSide()
                || width * height > limits.photoPixels();
        return tooLarge ? Optional.of(Defect.in(shown, "pack-photo-too-large", Long.toString(width),
                Long.toString(height))) : Optional.empty();
    }

    private Optional<Defect> defect(String code) {
        return Optional.of(Defect.in(shown, code));
    }
}
