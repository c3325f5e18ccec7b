package bedmark.document;

import java.util.ArrayList;
import java.util.List;

/**
 * A place in a document, as a JSON Pointer (RFC 6901).
 *
 * @param tokens the unescaped reference tokens from the root down; none for the whole document
 */
public record Pointer(List<String> tokens) {

    /** The whole document. */
    public static final Pointer ROOT = new Pointer(List.of());

    public Pointer {
        tokens = List.copyOf(tokens);
    }

    /** The place of those tokens. */
    public static Pointer of(String... tokens) {
        return new Pointer(List.of(tokens));
    }

    /**
     * Reads the notation of RFC 6901.
     *
     * @throws IllegalArgumentException where the text is neither empty nor begins with a slash
     */
    public static Pointer parse(String text) {
        if (text.isEmpty()) {
            return ROOT;
        }
        if (text.charAt(0) != '/') {
            throw new IllegalArgumentException("a JSON Pointer begins with '/': " + text);
        }
        List<String> tokens = new ArrayList<>();
        for (String part : text.substring(1).split("/", -1)) {
            tokens.add(part.replace("~1", "/").replace("~0", "~"));
        }
        return new Pointer(tokens);
    }

    public Pointer child(String token) {
        List<String> longer = new ArrayList<>(tokens);
        longer.add(token);
        return new Pointer(longer);
    }

    public Pointer child(int index) {
        return child(Integer.toString(index));
    }

    public boolean isRoot() {
        return tokens.isEmpty();
    }

    /** The place without its first token. */
    Pointer tail() {
        return new Pointer(tokens.subList(1, tokens.size()));
    }

    String head() {
        return tokens.get(0);
    }

    /** The last token. */
    public String last() {
        return tokens.get(tokens.size() - 1);
    }

    /**
     * The place within a list that a token says, as RFC 6901 writes one.
     *
     * @return 0 or more; -1 where it says none, or one of more than nine digits
     */
    public static int index(String token) {
        if (token.isEmpty() || token.length() > 9 || token.charAt(0) == '0' && token.length() > 1) {
            return -1;
        }
        int index = 0;
        for (int i = 0; i < token.length(); i++) {
            char digit = token.charAt(i);
            if (digit < '0' || digit > '9') {
                return -1;
            }
            index = 10 * index + digit - '0';
        }
        return index;
    }

    /** Whether {@code other} is this place or lies below it. */
    public boolean holds(Pointer other) {
        return other.tokens.size() >= tokens.size() && other.tokens.subList(0, tokens.size()).equals(tokens);
    }

    @Override
    public String toString() {
        StringBuilder text = new StringBuilder();
        for (String token : tokens) {
            text.append('/').append(token.replace("~", "~0").replace("/", "~1"));
        }
        return text.toString();
    }
}
