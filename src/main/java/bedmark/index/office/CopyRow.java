package bedmark.index.office;

import bedmark.document.Pointer;
import bedmark.survey.InspectionStatus;
import bedmark.survey.merge.Copy;
import bedmark.survey.merge.Origin;
import bedmark.survey.merge.ZoneId;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.HashMap;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.UUID;

/**
 * A content of a survey to be taken in.
 *
 * @param pack    digest of the pack that it came in, which holds its photos
 * @param content the survey's document
 */
public record CopyRow(Copy copy, String pack, byte[] content) {
    static final String COLUMNS =
            "digest, id, revision, supersedes, zone, round, status, begun, finished, made, register, "
                    + "conveyor, came";
    static final String INSERT = "insert into survey (" + COLUMNS + ", drive, pack, content) values ";

    Object[] values() {
        Origin origin = copy.origin();
        return new Object[] {copy.digest(), copy.id(), copy.revision(), copy.supersedes().orElse(null),
            copy.zone().key(), copy.round(), copy.status().name(), boxed(copy.begun()), boxed(copy.finished()),
            origin.createdAt(), origin.register(), origin.conveyor(), boxed(copy.came()), drive(copy), pack, content};
    }

    /** As the office takes it in at a moment (ms since 1970). */
    public CopyRow receivedAt(long moment) {
        return new CopyRow(copy.receivedAt(moment), pack, content);
    }

    /** The same content, which came in one pack and then in another one. */
    CopyRow or(CopyRow later) {
        return new CopyRow(copy.or(later.copy), pack, content);
    }

    /** What loads one drive together: the zones of one conveyor on one round. */
    static String drive(Copy copy) {
        return Pointer.of(copy.zone().plant(), copy.round(), copy.origin().conveyor()).toString();
    }

    /** Reads rows, of which many are about the same zones. */
    static Link.RowReader<Copy> reader() {
        Map<String, ZoneId> zones = new HashMap<>();
        return row -> read(row, zones.computeIfAbsent(row.getString(5), ZoneId::ofKey));
    }

    private static Copy read(ResultSet row, ZoneId zone) throws SQLException {
        return new Copy(row.getString(1), row.getObject(2, UUID.class), row.getInt(3),
                Optional.ofNullable(row.getObject(4, UUID.class)), zone,
                row.getString(6), InspectionStatus.valueOf(row.getString(7)), number(row, 8),
                number(row, 9), new Origin(row.getLong(10), row.getString(11), row.getString(12)),
                number(row, 13));
    }

    static Object boxed(OptionalLong value) {
        return value.isPresent() ? (Object) value.getAsLong() : null;
    }

    static OptionalLong number(ResultSet row, int column) throws SQLException {
        long value = row.getLong(column);
        return row.wasNull() ? OptionalLong.empty() : OptionalLong.of(value);
    }
}
