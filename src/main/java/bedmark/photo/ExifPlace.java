package bedmark.photo;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.Optional;

/**
 * Finds the Exif block in the first bytes of a JPEG (segment APP1, CIPA DC-008) or a PNG (chunk eXIf, PNG 1.5
 * extensions). Every step goes forward and stays within the bytes.
 */
final class ExifPlace {
    private static final byte[] NAME = "Exif\0\0".getBytes(StandardCharsets.US_ASCII);
    private static final int PNG_SIGNATURE = 8;
    private static final int APP1 = 0xE1;
    private static final int START_OF_SCAN = 0xDA;

    private ExifPlace() {
    }

    /** The block from its byte order mark on. */
    static Optional<byte[]> in(byte[] start) {
        if (start.length > 4 && (start[0] & 0xFF) == 0xFF && (start[1] & 0xFF) == 0xD8) {
            return jpeg(start);
        }
        return start.length > PNG_SIGNATURE && start[0] == (byte) 0x89 && start[1] == 'P' ? png(start)
                : Optional.empty();
    }

    private static Optional<byte[]> jpeg(byte[] bytes) {
        int at = 2;
        while (at + 4 <= bytes.length && (bytes[at] & 0xFF) == 0xFF) {
            int marker = bytes[at + 1] & 0xFF;
            if (marker == 0xFF) {
                at++;
                continue;
            }
            int length = (bytes[at + 2] & 0xFF) << 8 | bytes[at + 3] & 0xFF;
            int body = at + 4;
            int end = at + 2 + length;
            if (marker == START_OF_SCAN || length < 2 || end > bytes.length) {
                return Optional.empty();
            }
            if (marker == APP1 && end - body >= NAME.length
                    && Arrays.equals(bytes, body, body + NAME.length, NAME, 0, NAME.length)) {
                return Optional.of(Arrays.copyOfRange(bytes, body + NAME.length, end));
            }
            at = end;
        }
        return Optional.empty();
    }

    private static Optional<byte[]> png(byte[] bytes) {
        ByteBuffer buffer = ByteBuffer.wrap(bytes);
        long at = PNG_SIGNATURE;
        while (at + 8 <= bytes.length) {
            long length = Integer.toUnsignedLong(buffer.getInt((int) at));
            String kind = new String(bytes, (int) at + 4, 4, StandardCharsets.US_ASCII);
            long end = at + 8 + length;
            if (end > bytes.length) {
                return Optional.empty();
            }
            if (kind.equals("eXIf")) {
                return Optional.of(Arrays.copyOfRange(bytes, (int) at + 8, (int) end));
            }
            at = end + 4;
        }
        return Optional.empty();
    }
}
