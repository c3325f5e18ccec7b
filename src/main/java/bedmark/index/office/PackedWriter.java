package bedmark.index.office;

import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.HexFormat;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;

/**
 * Packs values into bytes, one after the other, for a {@link PackedReader} that knows which follow: a text is the number
 * of its bytes and UTF-8, a number that may be missing has a byte before it, whatever is longer than a byte stands with
 * its highest byte first.
 */
final class PackedWriter {
    /** A count takes no more. */
    private static final int COUNT_BYTES = 5;

    private static final String HEX = "0123456789abcdef";
    private static final byte[] NO_HEX = {};

    private byte[] bytes;
    private int end;

    /** @param room bytes for which the array need not be made anew */
    PackedWriter(int room) {
        this.bytes = new byte[room];
    }

    PackedWriter flag(boolean value) {
        room(1);
        bytes[end++] = (byte) (value ? 1 : 0);
        return this;
    }

    /** @param value at least 0 */
    PackedWriter count(int value) {
        room(COUNT_BYTES);
        int rest = value;
        while (rest > 0x7f) {
            bytes[end++] = (byte) (rest | 0x80);
            rest >>>= 7;
        }
        bytes[end++] = (byte) rest;
        return this;
    }

    PackedWriter text(String value) {
        return block(value.getBytes(StandardCharsets.UTF_8));
    }

    /** A text that is not there is told from one that is empty. */
    PackedWriter text(Optional<String> value) {
        return value.isPresent() ? block(value.get().getBytes(StandardCharsets.UTF_8), 1) : count(0);
    }

    /** Bytes with their number before them. */
    PackedWriter block(byte[] block) {
        return block(block, 0);
    }

    private PackedWriter block(byte[] block, int more) {
        count(block.length + more);
        room(block.length);
        System.arraycopy(block, 0, bytes, end, block.length);
        end += block.length;
        return this;
    }

    /** A digest as the bytes that it writes in hexadecimal digits; a text that is none as it is. */
    PackedWriter digest(Optional<String> value) {
        if (value.isEmpty()) {
            return count(0);
        }
        byte[] hex = hex(value.get());
        return hex.length == 0 ? count(1).text(value.get()) : count(2).block(hex);
    }

    private static byte[] hex(String text) {
        for (int i = 0; i < text.length(); i++) {
            if (HEX.indexOf(text.charAt(i)) < 0) {
                return NO_HEX;
            }
        }
        return text.length() % 2 == 0 ? HexFormat.of().parseHex(text) : NO_HEX;
    }

    PackedWriter whole(OptionalLong value) {
        return value.isPresent() ? flag(true).eight(value.getAsLong()) : flag(false);
    }

    PackedWriter real(OptionalDouble value) {
        return value.isPresent() ? flag(true).eight(Double.doubleToLongBits(value.getAsDouble())) : flag(false);
    }

    private PackedWriter eight(long value) {
        room(Long.BYTES);
        for (int shift = Long.SIZE - Byte.SIZE; shift >= 0; shift -= Byte.SIZE) {
            bytes[end++] = (byte) (value >>> shift);
        }
        return this;
    }

    private void room(int more) {
        if (bytes.length - end < more) {
            bytes = Arrays.copyOf(bytes, Math.max(bytes.length * 2, end + more));
        }
    }

    /** What was packed. */
    byte[] bytes() {
        return Arrays.copyOf(bytes, end);
    }
}
