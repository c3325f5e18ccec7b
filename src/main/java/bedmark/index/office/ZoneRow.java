package bedmark.index.office;

import bedmark.survey.InspectionStatus;
import bedmark.survey.merge.ZoneId;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A zone as it stands.
 *
 * @param verdict nothing while it was not judged, or could not be
 */
public record ZoneRow(ZoneNames names, Standing standing, boolean judged, Optional<Verdict> verdict) {
    static final String COLUMNS = "plant, transfer, plant_name, area, conveyor, conveyor_tag, tag, asset, material, "
            + "registered, visit, visit_status, visited, latest, moment, clashes, clock_wrong, judged, level, "
            + "incomplete, drive_share, skirt_power, saving_wh, saving_cost, saving_co2, remedy, energy_wh, cost, co2, "
            + "energy_kind, currency, findings";

    static ZoneRow read(ResultSet row) throws SQLException {
        ZoneId zone = new ZoneId(row.getString(1), row.getString(2));
        ZoneNames names = new ZoneNames(zone, row.getString(3), row.getString(4), row.getString(5), row.getString(6),
                row.getString(7), row.getString(8), row.getString(9), row.getBoolean(10));
        Standing standing = new Standing(zone, Optional.ofNullable(row.getString(11)),
                Optional.ofNullable(row.getString(12)).map(InspectionStatus::valueOf),
                CopyRow.number(row, 13), Optional.ofNullable(row.getString(14)), CopyRow.number(row, 15),
                row.getInt(16), row.getBoolean(17));
        int level = row.getInt(19);
        Optional<Verdict> verdict = row.wasNull() ? Optional.empty() : Optional.of(new Verdict(level,
                row.getBoolean(20), real(row, 21), real(row, 22), real(row, 23), real(row, 24), real(row, 25),
                Optional.ofNullable(row.getString(26)), real(row, 27), real(row, 28), real(row, 29),
                Optional.ofNullable(row.getString(30)), Optional.ofNullable(row.getString(31)), row.getString(32)));
        return new ZoneRow(names, standing, row.getBoolean(18), verdict);
    }

    private static OptionalDouble real(ResultSet row, int column) throws SQLException {
        double value = row.getDouble(column);
        return row.wasNull() ? OptionalDouble.empty() : OptionalDouble.of(value);
    }
}
