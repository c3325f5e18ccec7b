package bedmark.index;

import bedmark.journal.Digest;
import java.nio.charset.StandardCharsets;
import java.util.Optional;

/** The digest over a row's values, since the database does not notice when its file changes under it. */
final class RowSeal {
    private RowSeal() {
    }

    /** @param values each of which says in its text all that it holds; where there may be none, an optional one */
    static byte[] of(Object... values) {
        StringBuilder row = new StringBuilder();
        for (Object value : values) {
            if (value instanceof Optional<?> optional && optional.isEmpty()) {
                row.append('-');
            } else {
                String text = value instanceof Optional<?> optional ? optional.get().toString() : value.toString();
                row.append(text.length()).append(':').append(text);
            }
        }
        return Digest.of(row.toString().getBytes(StandardCharsets.UTF_8)).bytes();
    }
}
