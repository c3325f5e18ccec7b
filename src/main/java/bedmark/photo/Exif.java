package bedmark.photo;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.OptionalLong;

/**
 * Reads three entries of an Exif block (TIFF 6.0 with the tags of CIPA DC-008) and no other: orientation, original
 * time, and that time's offset. Two directories are looked through once each, entry by entry; a pointer that leads out
 * of the block leads nowhere. Nothing is followed in circles and nothing is allocated by a length that the block tells.
 */
final class Exif {
    private static final int ORIENTATION = 0x0112;
    private static final int EXIF_DIRECTORY = 0x8769;
    private static final int TIME_ORIGINAL = 0x9003;
    private static final int OFFSET_ORIGINAL = 0x9011;
    private static final int TIFF = 42;
    private static final int ENTRY = 12;
    private static final int ASCII = 2;
    private static final int SHORT = 3;
    private static final int LONG = 4;
    private static final int LONGEST_TEXT = 32;

    private final ByteBuffer block;

    private Exif(ByteBuffer block) {
        this.block = block;
    }

    static PhotoFacts read(byte[] bytes) {
        ByteBuffer block = ByteBuffer.wrap(bytes);
        if (bytes.length < 8 || bytes[0] != bytes[1] || bytes[0] != 'I' && bytes[0] != 'M') {
            return PhotoFacts.NONE;
        }
        block.order(bytes[0] == 'I' ? ByteOrder.LITTLE_ENDIAN : ByteOrder.BIG_ENDIAN);
        if (block.getShort(2) != TIFF) {
            return PhotoFacts.NONE;
        }
        Exif exif = new Exif(block);
        long first = Integer.toUnsignedLong(block.getInt(4));
        OptionalLong second = exif.entry(first, EXIF_DIRECTORY, LONG).stream()
                .mapToLong(at -> Integer.toUnsignedLong(block.getInt(at + 8))).findFirst();
        Orientation orientation = exif.entry(first, ORIENTATION, SHORT).stream()
                .mapToObj(at -> Orientation.ofCode(Short.toUnsignedInt(block.getShort(at + 8))))
                .flatMap(Optional::stream).findFirst().orElse(Orientation.UPRIGHT);
        if (second.isEmpty()) {
            return new PhotoFacts(orientation, Optional.empty(), Optional.empty());
        }
        return new PhotoFacts(orientation, exif.text(second.getAsLong(), TIME_ORIGINAL).flatMap(PhotoFacts::time),
                exif.text(second.getAsLong(), OFFSET_ORIGINAL).flatMap(PhotoFacts::zone));
    }

    /** Where an entry of a directory starts; nothing where the directory is not whole or holds none of that kind. */
    private OptionalInt entry(long directory, int tag, int kind) {
        if (directory < 8 || directory + 2 > block.capacity()) {
            return OptionalInt.empty();
        }
        int count = Short.toUnsignedInt(block.getShort((int) directory));
        for (int i = 0; i < count; i++) {
            long at = directory + 2 + (long) i * ENTRY;
            if (at + ENTRY > block.capacity()) {
                return OptionalInt.empty();
            }
            if (Short.toUnsignedInt(block.getShort((int) at)) == tag
                    && Short.toUnsignedInt(block.getShort((int) at + 2)) == kind) {
                return OptionalInt.of((int) at);
            }
        }
        return OptionalInt.empty();
    }

    private Optional<String> text(long directory, int tag) {
        return entry(directory, tag, ASCII).stream().mapToObj(this::text).flatMap(Optional::stream).findFirst();
    }

    private Optional<String> text(int entry) {
        long length = Integer.toUnsignedLong(block.getInt(entry + 4));
        long at = length <= 4 ? entry + 8 : Integer.toUnsignedLong(block.getInt(entry + 8));
        if (length > LONGEST_TEXT || at + length > block.capacity()) {
            return Optional.empty();
        }
        byte[] text = new byte[(int) length];
        block.get((int) at, text);
        return Optional.of(new String(text, StandardCharsets.US_ASCII).replace("\0", "").strip());
    }
}
