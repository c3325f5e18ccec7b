package bedmark.json;

import java.util.Arrays;

/**
 * Finds the end of an object at a glance, where everything up to it is strict JSON beyond doubt, as most of what
 * programs write is. It is sure of nothing that is written with an escape or an exponent, is very long or lies very deep,
 * and of no object with very many keys; whatever it is not sure of the parser reads.
 */
final class QuickPass {
    private static final int SPACE = 0x20;
    /** More keys of one object would make comparing them slow. */
    private static final int MANY = 64;
    /** A text of so many bytes or more is left to the parser. */
    private static final int LONG = 1 << 14;
    private static final int KEYS_AT_FIRST = 128;

    private final byte[] text;
    /** A place beyond the text: given where it is not sure. */
    private final int unsure;
    /** Of every key of the objects that are open: its mix, where it begins and where it ends. */
    private long[] mixes = new long[KEYS_AT_FIRST];
    private int[] begins = new int[KEYS_AT_FIRST];
    private int[] ends = new int[KEYS_AT_FIRST];
    private int keys;
    private int deepest;

    /** @param text valid UTF-8 */
    QuickPass(byte[] text) {
        this.text = text;
        this.unsure = text.length + 1;
    }

    /**
     * The place of the bracket that ends an object.
     *
     * @param from   the place after the bracket that begins the object
     * @param levels how many objects and lists may stand in each other there, the object itself among them
     * @return -1 where that is not sure
     */
    int end(int from, int levels) {
        keys = 0;
        deepest = levels;
        int after = object(from, 1);
        return after == unsure ? -1 : after - 1;
    }

    /** Each takes the place to begin at, for objects and lists that after the bracket, and gives the place behind. */
    private int object(int from, int depth) {
        int own = keys;
        long marks = 0;
        int at = blank(from);
        if (is(at, '}')) {
            return at + 1;
        }
        while (is(at, '"')) {
            int end = text(at + 1);
            if (end == unsure || keys - own == MANY) {
                return unsure;
            }
            long mixed = JsonScan.mix(text, at + 1, end - 1);
            long mark = 1L << (mixed ^ mixed >>> Integer.SIZE);
            if ((marks & mark) != 0 && isTaken(own, mixed, at + 1, end - 1)) {
                return unsure;
            }
            marks |= mark;
            take(mixed, at + 1, end - 1);
            at = blank(end);
            if (!is(at, ':')) {
                return unsure;
            }
            at = blank(value(blank(at + 1), depth));
            if (is(at, '}')) {
                keys = own;
                return at + 1;
            } else if (!is(at, ',')) {
                return unsure;
            }
            at = blank(at + 1);
        }
        return unsure;
    }

    private int array(int from, int depth) {
        int at = blank(from);
        if (is(at, ']')) {
            return at + 1;
        }
        while (true) {
            at = blank(value(at, depth));
            if (is(at, ']')) {
                return at + 1;
            } else if (!is(at, ',')) {
                return unsure;
            }
            at = blank(at + 1);
        }
    }

    private int value(int at, int depth) {
        if (at >= text.length) {
            return unsure;
        }
        return switch (text[at]) {
            case '"' -> text(at + 1);
            case '{' -> depth == deepest ? unsure : object(at + 1, depth + 1);
            case '[' -> depth == deepest ? unsure : array(at + 1, depth + 1);
            case 't' -> word(at, "true");
            case 'f' -> word(at, "false");
            case 'n' -> word(at, "null");
            default -> number(at);
        };
    }

    private int text(int from) {
        int last = Math.min(text.length, from + LONG);
        int at = JsonScan.endOfText(text, from, last);
        return at < last && text[at] == '"' ? at + 1 : unsure;
    }

    private int word(int at, String word) {
        for (int i = 0; i < word.length(); i++) {
            if (!is(at + i, word.charAt(i))) {
                return unsure;
            }
        }
        return at + word.length();
    }

    /** One without an exponent, that is held as it is written. */
    private int number(int from) {
        int whole = is(from, '-') ? from + 1 : from;
        int at = digits(whole);
        if (at == whole || text[whole] == '0' && at > whole + 1) {
            return unsure;
        }
        if (is(at, '.')) {
            int fraction = at + 1;
            at = digits(fraction);
            if (at == fraction) {
                return unsure;
            }
        }
        return is(at, 'e') || is(at, 'E') || at - from > Decimals.LONGEST ? unsure : at;
    }

    private int digits(int from) {
        int at = from;
        while (at < text.length && text[at] >= '0' && text[at] <= '9') {
            at++;
        }
        return at;
    }

    private int blank(int from) {
        int at = from;
        while (at < text.length && text[at] <= SPACE
                && (text[at] == ' ' || text[at] == '\n' || text[at] == '\r' || text[at] == '\t')) {
            at++;
        }
        return at;
    }

    private boolean is(int at, char wanted) {
        return at < text.length && text[at] == wanted;
    }

    private boolean isTaken(int own, long mixed, int from, int to) {
        for (int i = own; i < keys; i++) {
            if (mixes[i] == mixed && Arrays.equals(text, begins[i], ends[i], text, from, to)) {
                return true;
            }
        }
        return false;
    }

    private void take(long mixed, int from, int to) {
        if (keys == mixes.length) {
            mixes = Arrays.copyOf(mixes, 2 * keys);
            begins = Arrays.copyOf(begins, 2 * keys);
            ends = Arrays.copyOf(ends, 2 * keys);
        }
        mixes[keys] = mixed;
        begins[keys] = from;
        ends[keys++] = to;
    }
}
