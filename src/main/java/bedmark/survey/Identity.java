package bedmark.survey;

import bedmark.document.Branch;
import bedmark.document.Node;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.TreeMap;

/**
 * Whether two documents say the same: the SHA-256 of their values, whatever the order of keys and the spaces in the
 * text that they came from. A number is the same only with the same trailing zeros, since that is how it was read.
 */
public final class Identity {
    private Identity() {
    }

    /** 64 lower-case hexadecimal digits, the same for equal documents and for no others. */
    public static String of(Node document) {
        StringBuilder text = new StringBuilder();
        write(document, text);
        return HexFormat.of().formatHex(sha256().digest(text.toString().getBytes(StandardCharsets.UTF_8)));
    }

    private static MessageDigest sha256() {
        try {
            return MessageDigest.getInstance("SHA-256");
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java platform has SHA-256", e);
        }
    }

    /** Each value with its kind and length before it, so that no two documents have the same writing. */
    private static void write(Node node, StringBuilder text) {
        if (node instanceof Branch branch) {
            text.append('{').append(branch.members().size()).append(':');
            new TreeMap<>(branch.members()).forEach((key, value) -> {
                word('k', key, text);
                write(value, text);
            });
        } else if (node instanceof Node.Series series) {
            text.append('[').append(series.items().size()).append(':');
            series.items().forEach(item -> write(item, text));
        } else if (node instanceof Node.Text words) {
            word('t', words.value(), text);
        } else if (node instanceof Node.Decimal number) {
            word('n', number.value().unscaledValue() + "e" + number.value().scale(), text);
        } else if (node instanceof Node.Flag flag) {
            text.append(flag.value() ? '+' : '-');
        } else {
            text.append('0');
        }
    }

    private static void word(char kind, String word, StringBuilder text) {
        text.append(kind).append(word.length()).append(':').append(word);
    }
}
