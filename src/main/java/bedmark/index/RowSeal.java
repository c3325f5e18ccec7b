package bedmark.index;

import bedmark.journal.Digest;
import java.nio.charset.StandardCharsets;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** The digest over a row's values, since the database does not notice when its file changes under it. */
final class RowSeal {
    private RowSeal() {
    }

    static byte[] of(Object... values) {
        String row = Stream.of(values).map(String::valueOf).map(value -> value.length() + ":" + value)
                .collect(Collectors.joining());
        return Digest.of(row.getBytes(StandardCharsets.UTF_8)).bytes();
    }
}
