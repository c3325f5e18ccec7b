package bedmark.index.office;

import bedmark.document.Pointer;
import bedmark.survey.merge.ZoneId;
import java.nio.ByteBuffer;
import java.util.Collection;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.stream.IntStream;
import java.util.zip.CRC32C;

/**
 * Some zones of one plant, packed into one row of the table {@code zone_block}: a sixteenth of the plant's, always the
 * same ones, in the order of their ids, so that the same zones make the same bytes however they came in.
 */
final class ZoneBlock {
    /** Small enough that a pack need not write all of a large plant, and large enough that all plants are few rows. */
    private static final int OF_A_PLANT = 16;
    private static final byte[] NONE = {};
    private static final int SUM = Integer.BYTES;
    /** Most zones need less (bytes). */
    private static final int ROOM_FOR_ONE = 256;

    private final String key;
    private final Map<ZoneId, Parts> zones = new TreeMap<>();
    private boolean changed;

    /** @param verdict empty where there is none */
    private record Parts(byte[] names, byte[] standing, byte[] verdict) {
    }

    ZoneBlock(String key) {
        this.key = key;
    }

    static ZoneBlock of(String key, byte[] bytes) {
        ZoneBlock block = new ZoneBlock(key);
        PackedReader in = proved(bytes);
        while (!in.atEnd()) {
            block.zones.put(PackedZone.zone(in), new Parts(in.bytes(), in.bytes(), in.bytes()));
        }
        return block;
    }

    /** The key of the block that holds a zone, or would hold it. */
    static String key(ZoneId zone) {
        return key(zone.plant(), Math.floorMod(zone.transfer().hashCode(), OF_A_PLANT));
    }

    private static String key(String plant, int block) {
        return Pointer.of(plant, Integer.toString(block)).toString();
    }

    /** The keys of all blocks that a plant may have. */
    static List<String> keys(String plant) {
        return IntStream.range(0, OF_A_PLANT).mapToObj(block -> key(plant, block)).toList();
    }

    String key() {
        return key;
    }

    /** Whether it differs from what was read. */
    boolean changed() {
        return changed;
    }

    Collection<ZoneId> zones() {
        return List.copyOf(zones.keySet());
    }

    boolean holds(ZoneId zone) {
        return zones.containsKey(zone);
    }

    /** Names a zone; one that is new waits for somebody to come to it. */
    void name(ZoneNames names) {
        Parts before = zones.get(names.zone());
        put(names.zone(), before == null
                ? new Parts(PackedZone.pack(names), PackedZone.pack(Standing.none(names.zone())), NONE)
                : new Parts(PackedZone.pack(names), before.standing, before.verdict));
    }

    /** Says what counts of a zone; what was judged of it no longer holds. */
    void put(Standing standing) {
        Parts before = zones.get(standing.zone());
        if (before != null) {
            put(standing.zone(), new Parts(before.names, PackedZone.pack(standing), NONE));
        }
    }

    void judge(ZoneId zone, Optional<Verdict> verdict) {
        Parts before = zones.get(zone);
        if (before != null) {
            put(zone, new Parts(before.names, before.standing, verdict.map(PackedZone::pack).orElse(NONE)));
        }
    }

    private void put(ZoneId zone, Parts parts) {
        zones.put(zone, parts);
        changed = true;
    }

    /** The zones behind a check sum over them, since a database does not notice when its file changes under it. */
    byte[] bytes() {
        PackedWriter out = new PackedWriter(ROOM_FOR_ONE * zones.size());
        zones.forEach((zone, parts) -> PackedZone.write(out, zone, parts.names, parts.standing, parts.verdict));
        byte[] packed = out.bytes();
        return ByteBuffer.allocate(SUM + packed.length).putInt(sum(packed, 0)).put(packed).array();
    }

    /**
     * Reads the zones of a block's bytes.
     *
     * @throws OfficeBroken where they are not as they were written
     */
    static PackedReader proved(byte[] bytes) {
        if (bytes.length < SUM || ByteBuffer.wrap(bytes).getInt() != sum(bytes, SUM)) {
            throw new OfficeBroken("a block of zones is not as it was written");
        }
        return new PackedReader(bytes, SUM);
    }

    private static int sum(byte[] bytes, int from) {
        CRC32C sum = new CRC32C();
        sum.update(bytes, from, bytes.length - from);
        return (int) sum.getValue();
    }
}
