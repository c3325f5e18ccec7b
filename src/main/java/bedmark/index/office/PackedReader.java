package bedmark.index.office;

import java.util.Arrays;
import java.util.HexFormat;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;

/** Reads what a {@link PackedWriter} packed, in the same order. Bytes that end too early are a broken table. */
final class PackedReader {
    private final byte[] bytes;
    private int at;

    /** @param at where to begin */
    PackedReader(byte[] bytes, int at) {
        this.bytes = bytes;
        this.at = at;
    }

    boolean atEnd() {
        return at == bytes.length;
    }

    int at() {
        return at;
    }

    /** Passes a text or a block over. */
    void pass() {
        skip(count());
    }

    /** Passes over what {@link #someText()} reads, and tells whether there is one. */
    boolean passSome() {
        int length = count();
        skip(Math.max(0, length - 1));
        return length > 0;
    }

    /** Passes over what {@link #digest()} reads, and tells whether there is one. */
    boolean passDigest() {
        boolean there = count() > 0;
        if (there) {
            pass();
        }
        return there;
    }

    private void skip(int length) {
        need(length);
        at += length;
    }

    /** How many bytes the block has that is read next. */
    int open() {
        return count();
    }

    /** Reads a block by itself; this one goes on behind it. */
    PackedReader block() {
        int length = count();
        PackedReader block = new PackedReader(bytes, at);
        skip(length);
        return block;
    }

    /** A block's bytes. */
    byte[] bytes() {
        int length = count();
        skip(length);
        return Arrays.copyOfRange(bytes, at - length, at);
    }

    boolean flag() {
        need(1);
        return bytes[at++] != 0;
    }

    int count() {
        int value = 0;
        for (int shift = 0; shift < Integer.SIZE; shift += 7) {
            need(1);
            byte next = bytes[at++];
            value |= (next & 0x7f) << shift;
            if (next >= 0) {
                return value;
            }
        }
        throw new OfficeBroken("a packed number does not end");
    }

    String text() {
        return text(count());
    }

    Optional<String> someText() {
        int length = count();
        return length == 0 ? Optional.empty() : Optional.of(text(length - 1));
    }

    private String text(int length) {
        need(length);
        String text = RepeatedTexts.of(bytes, at, length);
        skip(length);
        return text;
    }

    Optional<String> digest() {
        return switch (count()) {
            case 0 -> Optional.empty();
            case 1 -> Optional.of(text());
            case 2 -> Optional.of(hex(count()));
            default -> throw new OfficeBroken("a packed digest is none");
        };
    }

    private String hex(int length) {
        need(length);
        String hex = HexFormat.of().formatHex(bytes, at, at + length);
        skip(length);
        return hex;
    }

    OptionalLong whole() {
        return flag() ? OptionalLong.of(eight()) : OptionalLong.empty();
    }

    OptionalDouble real() {
        return flag() ? OptionalDouble.of(Double.longBitsToDouble(eight())) : OptionalDouble.empty();
    }

    private long eight() {
        need(Long.BYTES);
        long value = 0;
        for (int i = 0; i < Long.BYTES; i++) {
            value = value << Byte.SIZE | bytes[at++] & 0xff;
        }
        return value;
    }

    private void need(int count) {
        if (count < 0 || count > bytes.length - at) {
            throw new OfficeBroken("a packed row ends too early");
        }
    }
}
