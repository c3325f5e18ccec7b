package bedmark.index.office;

import bedmark.journal.Digest;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Types;
import java.util.Comparator;

/** One row of one of the office's tables. */
public record RowId(String table, String key) implements Comparable<RowId> {
    private static final Comparator<RowId> ORDER = Comparator.comparing(RowId::table).thenComparing(RowId::key);

    @Override
    public int compareTo(RowId other) {
        return ORDER.compare(this, other);
    }

    /** Of all columns, each with its length, so that nothing moves from one into the next. */
    static String digest(ResultSet row) throws SQLException {
        MessageDigest sha = Digest.sha256();
        for (int i = 1; i <= row.getMetaData().getColumnCount(); i++) {
            byte[] value = bytes(row, i);
            sha.update(ByteBuffer.allocate(Integer.BYTES).putInt(0, value == null ? -1 : value.length));
            if (value != null) {
                sha.update(value);
            }
        }
        return Digest.ofBytes(sha.digest()).hex();
    }

    private static byte[] bytes(ResultSet row, int column) throws SQLException {
        int type = row.getMetaData().getColumnType(column);
        if (type == Types.BLOB || type == Types.VARBINARY || type == Types.BINARY) {
            return row.getBytes(column);
        }
        String text = row.getString(column);
        return text == null ? null : text.getBytes(StandardCharsets.UTF_8);
    }
}
