package bedmark.json;

import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.CoderResult;
import java.nio.charset.StandardCharsets;

/** Tells what is UTF-8 without keeping its text. */
final class Utf8 {
    private static final int PIECE = 1 << 13;

    private Utf8() {
    }

    /** Whether the bytes are UTF-8 from their first to their last. */
    static boolean holds(byte[] bytes) {
        if (JsonScan.isAscii(bytes)) {
            return true;
        }
        CharsetDecoder decoder = StandardCharsets.UTF_8.newDecoder();
        ByteBuffer rest = ByteBuffer.wrap(bytes);
        CharBuffer piece = CharBuffer.allocate(PIECE);
        CoderResult result = decoder.decode(rest, piece, true);
        while (result.isOverflow()) {
            piece.clear();
            result = decoder.decode(rest, piece, true);
        }
        return result.isUnderflow();
    }
}
