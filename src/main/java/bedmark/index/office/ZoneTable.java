package bedmark.index.office;

import bedmark.survey.merge.ZoneId;
import java.sql.Array;
import java.util.Collection;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;

/**
 * The loading zones: {@code zone} holds what the tables are asked by, {@code zone_block} the rest of them, packed many
 * into a row, so that a list of all zones is read quickly.
 */
final class ZoneTable {
    private static final String NEW_ZONE = "insert into zone (zone, plant, clashes, judged) values (?, ?, 0, true)";
    private static final String STALE = "update zone set judged = false where zone = ?";
    private static final String STANDS = "update zone set latest = ?, clashes = ?, judged = ?, level = null, "
            + "drive_share = null, saving_wh = null where zone = ?";
    private static final String JUDGED = "update zone set judged = true, level = ?, drive_share = ?, saving_wh = ? "
            + "where zone = ?";
    private static final String BLOCK = "update zone_block set zones = ? where block = ?";
    private static final String NEW_BLOCK = "insert into zone_block (zones, block) values (?, ?)";
    private static final String WORST = "select zone from zone where level = ? order by level, "
            + "drive_share desc nulls last, saving_wh desc nulls last limit ?";

    private final Link link;

    ZoneTable(Link link) {
        this.link = link;
    }

    /** Blocks that work is done on, those of them that are there read at once. */
    private final class Blocks {
        private final Set<String> there = new HashSet<>();
        private final Map<String, ZoneBlock> blocks = new TreeMap<>();

        Blocks(Collection<String> keys) {
            link.each("select block, zones" + OfficeTables.WANTED + "zone_block on block = wanted", row -> {
                there.add(row.getString(1));
                blocks.put(row.getString(1), ZoneBlock.of(row.getString(1), row.getBytes(2)));
            }, link.texts(keys));
        }

        ZoneBlock of(ZoneId zone) {
            return blocks.computeIfAbsent(ZoneBlock.key(zone), ZoneBlock::new);
        }

        /** Names a zone, which is made where it is not there. */
        void name(ZoneNames names) {
            ZoneId zone = names.zone();
            if (!of(zone).holds(zone)) {
                link.batch(NEW_ZONE, zone.key(), zone.plant());
            }
            of(zone).name(names);
        }

        void write() {
            blocks.values().stream().filter(ZoneBlock::changed).forEach(block ->
                    link.batch(there.contains(block.key()) ? BLOCK : NEW_BLOCK, block.bytes(), block.key()));
            link.runBatch(NEW_ZONE);
            link.runBatch(BLOCK);
            link.runBatch(NEW_BLOCK);
        }
    }

    private Blocks blocks(Collection<ZoneId> zones) {
        return new Blocks(zones.stream().map(ZoneBlock::key).toList());
    }

    /** Names zones; those that are not there are made, those of the plant that are not named are out of register. */
    void name(String plant, String plantName, Collection<ZoneNames> zones) {
        Blocks blocks = new Blocks(ZoneBlock.keys(plant));
        Set<ZoneId> unnamed = new TreeSet<>();
        blocks.blocks.values().forEach(block -> unnamed.addAll(block.zones()));
        zones.forEach(names -> {
            unnamed.remove(names.zone());
            blocks.name(names);
        });
        unnamed.forEach(zone -> blocks.name(ZoneNames.unregistered(zone, plantName)));
        blocks.write();
    }

    /** Makes rows for those of the zones that have none: today's register does not name them. */
    void addUnnamed(Collection<ZoneId> zones, String plantName) {
        Blocks blocks = blocks(zones);
        new TreeSet<>(zones).stream().filter(zone -> !blocks.of(zone).holds(zone)).forEach(zone ->
                blocks.name(ZoneNames.unregistered(zone, plantName)));
        blocks.write();
    }

    /** Says what counts of zones; they wait to be judged where there is something to judge. */
    void put(Collection<Standing> standings) {
        Blocks blocks = blocks(standings.stream().map(Standing::zone).toList());
        for (Standing one : standings) {
            link.batch(STANDS, one.latest().orElse(null), one.clashes(), one.latest().isEmpty(), one.zone().key());
            blocks.of(one.zone()).put(one);
        }
        link.runBatch(STANDS);
        blocks.write();
    }

    /** Keeps what was judged; nothing for a zone that can't be. */
    void judge(Map<ZoneId, Optional<Verdict>> verdicts) {
        Blocks blocks = blocks(verdicts.keySet());
        verdicts.forEach((zone, verdict) -> {
            link.batch(JUDGED, verdict.map(Verdict::level).orElse(null), real(verdict.map(Verdict::driveShare)),
                    real(verdict.map(Verdict::savingWh)), zone.key());
            blocks.of(zone).judge(zone, verdict);
        });
        link.runBatch(JUDGED);
        blocks.write();
    }

    private static Object real(Optional<OptionalDouble> value) {
        return value.filter(OptionalDouble::isPresent).map(OptionalDouble::getAsDouble).orElse(null);
    }

    /**
     * What was judged of zones whose latest result, or one dated ahead that may be newer, loaded one of these drives no
     * longer holds.
     */
    void stale(Collection<String> drives) {
        link.rows("select z.zone, z.judged" + OfficeTables.WANTED + "survey s on s.drive = wanted "
                + "join zone z on z.zone = s.zone where z.latest = s.digest or s.came is not null",
                row -> row.getBoolean(2) ? Optional.of(row.getString(1)) : Optional.<String>empty(),
                link.texts(drives)).stream().flatMap(Optional::stream).forEach(zone -> link.batch(STALE, zone));
        link.runBatch(STALE);
    }

    List<ZoneId> ids() {
        return link.rows("select zone from zone", row -> ZoneId.ofKey(row.getString(1)));
    }

    /** Zones that wait to be judged, at most so many. */
    List<ZoneId> waiting(int atMost) {
        return link.rows("select zone from zone where judged = false order by zone limit ?",
                row -> ZoneId.ofKey(row.getString(1)), atMost);
    }

    long countWaiting() {
        return link.rows("select count(*) from zone where judged = false", row -> row.getLong(1)).get(0);
    }

    /** Every zone as it stands. */
    List<PackedZone> all() {
        PackedZones zones = new PackedZones();
        link.each("select zones from zone_block", row -> zones.add(row.getBytes(1)));
        return zones;
    }

    /** Those zones of a level that load their drives most, then would save most; an index holds them in that order. */
    List<PackedZone> worst(int level, int atMost) {
        return zones(link.rows(WORST, row -> ZoneId.ofKey(row.getString(1)), level, atMost));
    }

    Optional<PackedZone> zone(ZoneId zone) {
        return zones(List.of(zone)).stream().findFirst();
    }

    /** Those of the zones that are there, in their order. */
    private List<PackedZone> zones(List<ZoneId> wanted) {
        Map<String, byte[]> blocks = new HashMap<>();
        link.each("select block, zones" + OfficeTables.WANTED + "zone_block on block = wanted", row ->
                blocks.put(row.getString(1), row.getBytes(2)), link.texts(wanted.stream().map(ZoneBlock::key).toList()));
        return wanted.stream().flatMap(zone -> Optional.ofNullable(blocks.get(ZoneBlock.key(zone)))
                .flatMap(block -> PackedZone.find(block, zone)).stream()).toList();
    }
}
