package bedmark.index.office;

import bedmark.survey.InspectionStatus;
import bedmark.survey.merge.ZoneId;
import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeMap;
import org.flywaydb.core.api.MigrationVersion;
import org.flywaydb.core.api.migration.Context;
import org.flywaydb.core.api.migration.JavaMigration;

/** The migration between the zones of thirty columns and those that are packed: SQL alone can't pack. */
final class PackZones implements JavaMigration {
    private static final String BEFORE = "select plant, transfer, plant_name, area, conveyor, conveyor_tag, tag, asset, "
            + "material, registered, visit, visit_status, visited, latest, moment, clashes, clock_wrong, level, "
            + "incomplete, drive_share, skirt_power, saving_wh, saving_cost, saving_co2, remedy, energy_wh, cost, co2, "
            + "energy_kind, currency, findings from zone_before order by plant";
    private static final String AFTER = "insert into zone_block (block, zones) values (?, ?)";

    @Override
    public MigrationVersion getVersion() {
        return MigrationVersion.fromVersion("4");
    }

    @Override
    public String getDescription() {
        return "packed zones";
    }

    @Override
    public Integer getChecksum() {
        return null;
    }

    @Override
    public boolean canExecuteInTransaction() {
        return true;
    }

    @Override
    public void migrate(Context context) throws SQLException {
        try (Statement before = context.getConnection().createStatement();
                ResultSet row = before.executeQuery(BEFORE);
                PreparedStatement after = context.getConnection().prepareStatement(AFTER)) {
            Map<String, ZoneBlock> blocks = new TreeMap<>();
            String plant = "";
            while (row.next()) {
                if (!row.getString(1).equals(plant)) {
                    insert(blocks, after);
                    plant = row.getString(1);
                }
                pack(row, blocks);
            }
            insert(blocks, after);
        }
    }

    /** A plant's blocks are held until all of its zones are in them. */
    private static void insert(Map<String, ZoneBlock> blocks, PreparedStatement after) throws SQLException {
        for (ZoneBlock block : blocks.values()) {
            after.setString(1, block.key());
            after.setBytes(2, block.bytes());
            after.addBatch();
        }
        after.executeBatch();
        blocks.clear();
    }

    private static void pack(ResultSet row, Map<String, ZoneBlock> blocks) throws SQLException {
        ZoneId zone = new ZoneId(row.getString(1), row.getString(2));
        ZoneBlock block = blocks.computeIfAbsent(ZoneBlock.key(zone), ZoneBlock::new);
        block.name(new ZoneNames(zone, row.getString(3), row.getString(4), row.getString(5), row.getString(6),
                row.getString(7), row.getString(8), row.getString(9), row.getBoolean(10)));
        block.put(new Standing(zone, Optional.ofNullable(row.getString(11)),
                Optional.ofNullable(row.getString(12)).map(InspectionStatus::valueOf), CopyRow.number(row, 13),
                Optional.ofNullable(row.getString(14)), CopyRow.number(row, 15), row.getInt(16), row.getBoolean(17)));
        block.judge(zone, verdict(row));
    }

    private static Optional<Verdict> verdict(ResultSet row) throws SQLException {
        int level = row.getInt(18);
        return row.wasNull() ? Optional.empty() : Optional.of(new Verdict(level, row.getBoolean(19), real(row, 20),
                real(row, 21), real(row, 22), real(row, 23), real(row, 24), Optional.ofNullable(row.getString(25)),
                real(row, 26), real(row, 27), real(row, 28), Optional.ofNullable(row.getString(29)),
                Optional.ofNullable(row.getString(30)), row.getString(31)));
    }

    private static OptionalDouble real(ResultSet row, int column) throws SQLException {
        double value = row.getDouble(column);
        return row.wasNull() ? OptionalDouble.empty() : OptionalDouble.of(value);
    }
}
