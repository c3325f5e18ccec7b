package bedmark.index.office;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.Optional;
import java.util.OptionalLong;

/**
 * A pack that was refused.
 *
 * @param pack        what it is told apart by
 * @param file        the file's whole name, as the machine that received says it
 * @param sha256      hexadecimal; nothing where the file could not be read to its end
 * @param bytes       the file's size, where that was read
 * @param device      the tablet's name, where the signature proves it
 * @param fingerprint of the key, where the signature is proved
 * @param why         the reason as a JSON document
 * @param first       when it was refused first (ms since 1970)
 * @param last        when it was refused last (ms since 1970)
 */
public record RefusalRow(String pack, String file, Optional<String> sha256, OptionalLong bytes,
                         Optional<String> device, Optional<String> fingerprint, String why, long first, long last) {
    static final String COLUMNS = "pack, file, sha256, bytes, device, fingerprint, why, first_at, last_at";

    static RefusalRow read(ResultSet row) throws SQLException {
        return new RefusalRow(row.getString(1), row.getString(2), Optional.ofNullable(row.getString(3)),
                CopyRow.number(row, 4), Optional.ofNullable(row.getString(5)), Optional.ofNullable(row.getString(6)),
                row.getString(7), row.getLong(8), row.getLong(9));
    }

    Object[] values() {
        return new Object[] {pack, file, sha256.orElse(null), CopyRow.boxed(bytes), device.orElse(null),
            fingerprint.orElse(null), why, first, last};
    }
}
