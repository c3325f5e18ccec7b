package bedmark.json;

import java.lang.invoke.MethodHandles;
import java.lang.invoke.VarHandle;
import java.nio.ByteOrder;

/** What can be told of the bytes of a JSON text without reading it, eight of them at once. */
public final class JsonScan {
    private static final VarHandle EIGHT =
            MethodHandles.byteArrayViewVarHandle(long[].class, ByteOrder.LITTLE_ENDIAN);
    private static final long EACH = 0x0101_0101_0101_0101L;
    private static final long HIGHEST = 0x80 * EACH;
    private static final long OTHERS = 0x7F * EACH;
    /** The bit by which {@code '['} differs from <code>'{'</code>. */
    private static final int CURLY = '{' ^ '[';

    /** Bits of which a control character has none. */
    private static final int NO_CONTROL = 0xE0;
    /** An odd number without a pattern, by which bits are spread. */
    private static final long SPREAD = 0x9E37_79B9_7F4A_7C15L;

    private JsonScan() {
    }

    /**
     * The most values that a text may hold. A list or object that is not empty holds one value more than it has commas,
     * so that commas and opening brackets together bound them from above, wherever they stand.
     */
    public static int mostValues(byte[] text) {
        int values = 1;
        int i = 0;
        for (; i <= text.length - Long.BYTES; i += Long.BYTES) {
            long eight = (long) EIGHT.get(text, i);
            values += Long.bitCount(zeros(eight ^ ',' * EACH) | zeros((eight | CURLY * EACH) ^ '{' * EACH));
        }
        for (; i < text.length; i++) {
            values += text[i] == ',' || (text[i] | CURLY) == '{' ? 1 : 0;
        }
        return values;
    }

    static boolean isAscii(byte[] bytes) {
        long all = 0;
        int i = 0;
        for (; i <= bytes.length - Long.BYTES; i += Long.BYTES) {
            all |= (long) EIGHT.get(bytes, i);
        }
        for (; i < bytes.length; i++) {
            all |= bytes[i];
        }
        return (all & HIGHEST) == 0;
    }

    /**
     * Where a byte stands first.
     *
     * @param wanted ASCII
     * @param from   the place to begin at
     * @return -1 where it does not stand there or later
     */
    static int find(byte[] bytes, char wanted, int from) {
        int i = from;
        for (; i <= bytes.length - Long.BYTES; i += Long.BYTES) {
            long found = zeros((long) EIGHT.get(bytes, i) ^ wanted * EACH);
            if (found != 0) {
                return i + Long.numberOfTrailingZeros(found) / Byte.SIZE;
            }
        }
        for (; i < bytes.length; i++) {
            if (bytes[i] == wanted) {
                return i;
            }
        }
        return -1;
    }

    /**
     * Where a text ends or is no longer what it looks like: at a quote, a backslash or a control character.
     *
     * @param from the place to begin at
     * @param to   the place to stop before
     * @return {@code to} where none of them stands before it
     */
    static int endOfText(byte[] bytes, int from, int to) {
        int i = from;
        for (; i <= to - Long.BYTES; i += Long.BYTES) {
            long eight = (long) EIGHT.get(bytes, i);
            long found = zeros(eight ^ '"' * EACH) | zeros(eight ^ '\\' * EACH) | zeros(eight & NO_CONTROL * EACH);
            if (found != 0) {
                return i + Long.numberOfTrailingZeros(found) / Byte.SIZE;
            }
        }
        while (i < to && bytes[i] != '"' && bytes[i] != '\\' && (bytes[i] & NO_CONTROL) != 0) {
            i++;
        }
        return i;
    }

    /** A number by which most texts differ: of their length and of their first and last eight bytes. */
    static long mix(byte[] bytes, int from, int to) {
        long mixed = to - from;
        if (to - from >= Long.BYTES) {
            return ((long) EIGHT.get(bytes, from) * SPREAD + mixed) * SPREAD + (long) EIGHT.get(bytes, to - Long.BYTES);
        }
        for (int i = from; i < to; i++) {
            mixed = mixed * SPREAD + bytes[i];
        }
        return mixed;
    }

    /** The highest bit of each byte that is 0, and nothing else. */
    private static long zeros(long eight) {
        return ~((eight & OTHERS) + OTHERS | eight | OTHERS);
    }
}
