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

    /** The highest bit of each byte that is 0, and nothing else. */
    private static long zeros(long eight) {
        return ~((eight & OTHERS) + OTHERS | eight | OTHERS);
    }
}
