package bedmark.json;

import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonToken;
import java.io.IOException;
import java.util.Arrays;
import java.util.HashSet;
import java.util.Set;

/** Reads over values as strictly as others are read, and keeps nothing of them. */
final class PassedOver {
    /** Keys that are compared one by one; few objects have more. */
    private static final int COMPARED = 24;

    private final JsonParser parser;
    private final boolean sure;
    private String[] keys = new String[COMPARED];
    private int held;

    /** @param sure whether every text is known to be well-formed and of sensible length */
    PassedOver(JsonParser parser, boolean sure) {
        this.parser = parser;
        this.sure = sure;
    }

    /**
     * Reads to the end of the value that begins with a token.
     *
     * @return false as soon as there is something that reading refuses
     */
    boolean isStrict(JsonToken token) throws IOException {
        return switch (token) {
            case START_OBJECT -> object();
            case START_ARRAY -> array();
            case VALUE_STRING -> sure || text();
            case VALUE_NUMBER_INT, VALUE_NUMBER_FLOAT -> Decimals.holds(parser.getTextCharacters(),
                    parser.getTextOffset(), parser.getTextLength());
            case VALUE_TRUE, VALUE_FALSE, VALUE_NULL -> true;
            default -> false;
        };
    }

    private boolean array() throws IOException {
        for (JsonToken item = parser.nextToken(); item != JsonToken.END_ARRAY; item = parser.nextToken()) {
            if (!isStrict(item)) {
                return false;
            }
        }
        return true;
    }

    private boolean object() throws IOException {
        int begin = held;
        Set<String> many = Set.of();
        while (parser.nextToken() != JsonToken.END_OBJECT) {
            String key = parser.currentName();
            if (many.isEmpty() && held - begin == COMPARED) {
                many = new HashSet<>(Arrays.asList(keys).subList(begin, held));
            }
            boolean fresh = many.isEmpty() ? compared(key, begin) : many.add(key);
            if (!fresh || !sure && !WellFormed.is(key) || !isStrict(parser.nextToken())) {
                return false;
            }
        }
        held = begin;
        return true;
    }

    /** Takes a key of the object whose keys begin there; false where it has it already. */
    private boolean compared(String key, int begin) {
        int hash = key.hashCode();
        for (int i = begin; i < held; i++) {
            if (keys[i].hashCode() == hash && keys[i].equals(key)) {
                return false;
            }
        }
        if (held == keys.length) {
            keys = Arrays.copyOf(keys, 2 * held);
        }
        keys[held++] = key;
        return true;
    }

    private boolean text() throws IOException {
        char[] text = parser.getTextCharacters();
        int end = parser.getTextOffset() + parser.getTextLength();
        for (int i = parser.getTextOffset(); i < end; i++) {
            if (Character.isSurrogate(text[i])) {
                return WellFormed.is(parser.getText());
            }
        }
        return true;
    }
}
