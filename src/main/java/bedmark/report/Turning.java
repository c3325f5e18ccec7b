package bedmark.report;

import java.awt.geom.AffineTransform;
import java.nio.BufferUnderflowException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;

/** How a camera was held, as its photo says (tag 0x0112 of EXIF in a JPEG file); mirrored photos are left as they are. */
enum Turning {
    UPRIGHT,
    UPSIDE_DOWN,
    /** The photo's upper side lies at the right. */
    QUARTER_RIGHT,
    /** The photo's upper side lies at the left. */
    QUARTER_LEFT;

    private static final int JPEG = 0xFFD8;
    private static final int APP1 = 0xFFE1;
    private static final int SCAN = 0xFFDA;
    private static final long EXIF = 0x4578_6966_0000L;
    private static final int TIFF_LITTLE = 0x4949;
    private static final int ORIENTATION = 0x0112;
    private static final int ENTRY = 12;
    private static final int TWO_BYTES = 0xFFFF;

    /** What the bytes of a photo say; upright where they say nothing. */
    static Turning of(byte[] photo) {
        try {
            ByteBuffer bytes = ByteBuffer.wrap(photo);
            if (two(bytes) != JPEG) {
                return UPRIGHT;
            }
            for (int marker = two(bytes); marker != SCAN; marker = two(bytes)) {
                int length = two(bytes) - 2;
                if (marker == APP1 && length > 6 && ((long) two(bytes) << 32 | bytes.getInt() & 0xFFFF_FFFFL) == EXIF) {
                    return ofExif(bytes.slice(bytes.position(), length - 6));
                }
                bytes.position(bytes.position() + (marker == APP1 && length > 6 ? length - 6 : length));
            }
            return UPRIGHT;
        } catch (BufferUnderflowException | IllegalArgumentException | IndexOutOfBoundsException e) {
            return UPRIGHT;
        }
    }

    private static Turning ofExif(ByteBuffer tiff) {
        tiff.order(two(tiff) == TIFF_LITTLE ? ByteOrder.LITTLE_ENDIAN : ByteOrder.BIG_ENDIAN);
        tiff.position(tiff.getInt(4));
        int first = tiff.position() + 2;
        int entries = two(tiff);
        for (int i = 0; i < entries; i++) {
            if ((tiff.getShort(first + i * ENTRY) & TWO_BYTES) == ORIENTATION) {
                return switch (tiff.getShort(first + i * ENTRY + 8)) {
                    case 3 -> UPSIDE_DOWN;
                    case 6 -> QUARTER_RIGHT;
                    case 8 -> QUARTER_LEFT;
                    default -> UPRIGHT;
                };
            }
        }
        return UPRIGHT;
    }

    private static int two(ByteBuffer bytes) {
        return bytes.getShort() & TWO_BYTES;
    }

    /** Whether width and height change places. */
    boolean swapsSides() {
        return this == QUARTER_RIGHT || this == QUARTER_LEFT;
    }

    /** Sets a photo of that size upright, its upper left corner at 0, 0. */
    AffineTransform upright(int width, int height) {
        return switch (this) {
            case UPRIGHT -> new AffineTransform();
            case UPSIDE_DOWN -> new AffineTransform(-1, 0, 0, -1, width, height);
            case QUARTER_RIGHT -> new AffineTransform(0, 1, -1, 0, height, 0);
            case QUARTER_LEFT -> new AffineTransform(0, -1, 1, 0, 0, width);
        };
    }
}
