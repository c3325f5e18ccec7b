package bedmark.index.office;

import bedmark.journal.Digest;
import bedmark.survey.merge.Copy;
import bedmark.survey.merge.ZoneId;
import java.nio.file.Path;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.Collection;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import java.util.UUID;
import java.util.function.Supplier;

/** The office's tables, by what the office does with them. Used by one thread. */
public final class OfficeTables implements AutoCloseable {

    /** The version of the tables: the number of the last migration. */
    static final String SCHEMA = "9";
    private static final String DEED = "insert into deed (seq, made_at, person, device, code, payload) "
            + "values (?, ?, ?, ?, ?, ?)";
    private static final String MOVED = "update survey set made = ?, register = ?, conveyor = ?, drive = ?, "
            + "came = ? where digest = ?";
    /** Many values are joined: a database that finds rows by an index would compare each with all of them once more. */
    static final String WANTED = " from unnest(cast(? as varchar array)) as wanted (wanted) join ";
    private static final Map<String, String> TABLES = Map.of("deed", "seq", "pack", "sha256", "register", "digest",
            "plant", "id", "survey", "digest", "zone", "zone", "zone_block", "block");

    private final Link link;
    private final ZoneTable zones;
    private final RefusalTable refusals;
    private final boolean server;

    private OfficeTables(Link link, boolean server) {
        this.link = link;
        this.zones = new ZoneTable(link);
        this.refusals = new RefusalTable(link);
        this.server = server;
    }

    /** Whether a text names a database server rather than a folder. */
    public static boolean isServer(String url) {
        return OfficeDatabase.server(url);
    }

    /** The tables of a folder, made where there are none. */
    public static OfficeTables of(Path folder) {
        return new OfficeTables(OfficeDatabase.open(OfficeDatabase.url(folder)), false);
    }

    /** The tables of a database server. */
    public static OfficeTables of(String url) {
        return new OfficeTables(OfficeDatabase.open(url), true);
    }

    /** That there is no server to ask just now. */
    public static OfficeBroken away() {
        return new OfficeBroken("the server is away");
    }

    /** Whether the database still answers, so that a failure was not that of the connection. */
    public boolean alive() {
        return link.alive();
    }

    /** Does work whole, or not at all. */
    public <T> T whole(Supplier<T> work) {
        return link.whole(work);
    }

    /** Waits until no other desk writes; it holds until the work that it stands in is done. */
    public void alone() {
        if (server) {
            link.rows("select content from settings where name = 'schema' for update", row -> row.getString(1));
        }
    }

    public Optional<String> setting(String name) {
        return link.rows("select content from settings where name = ?", row -> row.getString(1), name).stream()
                .findFirst();
    }

    public void set(String name, String content) {
        if (link.run("update settings set content = ? where name = ?", content, name) == 0) {
            link.run("insert into settings (name, content) values (?, ?)", name, content);
        }
    }

    /** The number of the last deed; 0 where there is none. */
    public long lastDeed() {
        return link.rows("select coalesce(max(seq), 0) from deed", row -> row.getLong(1)).get(0);
    }

    public void add(DeedRow deed) {
        link.run(DEED, deed.sequence(), deed.at(), deed.person(), deed.device(), deed.code(), deed.payload());
    }

    /** Whether a desk did a deed of that kind at that moment: told apart from one that was cut off in between. */
    public boolean did(UUID device, String at, String code) {
        return !link.rows("select 1 from deed where device = ? and made_at = ? and code = ?", row -> row.getInt(1),
                device, at, code).isEmpty();
    }

    /** The deeds of one kind after a number, in their order. */
    public List<DeedRow> deeds(Collection<String> codes, long after) {
        return link.rows("select seq, made_at, person, device, code, payload from deed where code = any(?) and seq > ? "
                + "order by seq", row -> new DeedRow(row.getLong(1), row.getString(2), row.getString(3),
                row.getObject(4, UUID.class), row.getString(5), row.getBytes(6)), link.texts(codes), after);
    }

    public boolean hasPack(String sha256) {
        return !link.rows("select 1 from pack where sha256 = ?", row -> row.getInt(1), sha256).isEmpty();
    }

    /** @param content the pack itself, where no folder holds it */
    public void addPack(String sha256, long sequence, Optional<byte[]> content) {
        link.run("insert into pack (sha256, seq, content) values (?, ?, ?)", sha256, sequence, content.orElse(null));
    }

    /** A pack's bytes, where the tables hold them. */
    public Optional<byte[]> pack(String sha256) {
        return link.rows("select content from pack where sha256 = ?", row -> Optional.ofNullable(row.getBytes(1)),
                sha256).stream().flatMap(Optional::stream).findFirst();
    }

    public Optional<PlantRow> plant(String id) {
        return link.rows("select id, made, own, digest, register, content from plant where id = ?",
                OfficeTables::plant, id).stream().findFirst();
    }

    public List<PlantRow> plants() {
        return link.rows("select id, made, own, digest, register, content from plant order by id",
                OfficeTables::plant);
    }

    private static PlantRow plant(ResultSet row) throws SQLException {
        return new PlantRow(row.getString(1), row.getLong(2), row.getBoolean(3), row.getString(4), row.getString(5),
                row.getBytes(6));
    }

    public void put(PlantRow plant) {
        link.run("delete from plant where id = ?", plant.id());
        link.run("insert into plant (id, made, own, digest, register, content) values (?, ?, ?, ?, ?, ?)", plant.id(),
                plant.made(), plant.own(), plant.digest(), plant.register(), plant.content());
    }

    /** Says when the content was made last that a plant has already. */
    public void madeAgain(PlantRow plant) {
        link.run("update plant set made = ? where id = ?", plant.made(), plant.id());
    }

    /** Keeps a version of a register; nothing happens where it is there. */
    public void addRegister(String digest, String plant, byte[] content) {
        if (link.rows("select 1 from register where digest = ?", row -> row.getInt(1), digest).isEmpty()) {
            link.run("insert into register (digest, plant, content) values (?, ?, ?)", digest, plant, content);
        }
    }

    public Optional<byte[]> register(String digest) {
        return link.rows("select content from register where digest = ?", row -> sound(digest, row.getBytes(1)), digest)
                .stream().findFirst();
    }

    /** The digests of all versions of registers. */
    public List<String> registers() {
        return link.rows("select digest from register order by plant, digest", row -> row.getString(1));
    }

    /**
     * Takes contents in; those that are there are not touched, but may turn out to have left their tablet earlier. What
     * was judged of other zones that loaded the same drives no longer holds; their own zones wait for {@link #put}.
     *
     * @return those that are new or turned out so
     */
    public List<Copy> add(List<CopyRow> rows) {
        Map<String, CopyRow> fresh = new LinkedHashMap<>();
        rows.forEach(row -> fresh.merge(row.copy().digest(), row, CopyRow::or));
        Map<String, Copy> known = copiesOf(fresh.keySet());
        List<Copy> touched = new ArrayList<>();
        known.forEach((digest, before) -> {
            Copy after = before.or(fresh.remove(digest).copy());
            if (!after.equals(before)) {
                move(before, after);
                touched.add(after);
            }
        });
        fresh.values().forEach(row -> touched.add(row.copy()));
        // Before they are here: it finds none of them then, which are most of those that load these drives.
        staleDrives(fresh.values().stream().map(CopyRow::copy).toList());
        link.insert(CopyRow.INSERT, fresh.values().stream().map(CopyRow::values).toList());
        return touched;
    }

    private void move(Copy before, Copy after) {
        link.run(MOVED, after.origin().createdAt(), after.origin().register(), after.origin().conveyor(),
                CopyRow.drive(after), CopyRow.boxed(after.came()), after.digest());
        staleDrives(List.of(before, after));
    }

    /** Everything that came about some zones. */
    public List<Copy> copies(Collection<ZoneId> zones) {
        return link.rows("select " + CopyRow.COLUMNS + WANTED + "survey on zone = wanted", CopyRow.reader(),
                link.texts(zones.stream().map(ZoneId::key).toList()));
    }

    /** Everything that came, by digest. */
    public List<Copy> copies() {
        return link.rows("select " + CopyRow.COLUMNS + " from survey order by zone, id, revision, digest",
                CopyRow.reader());
    }

    /** What loaded the same drives as some contents. */
    public List<Copy> companions(Collection<Copy> copies) {
        return link.rows("select " + CopyRow.COLUMNS + WANTED + "survey on drive = wanted", CopyRow.reader(),
                link.texts(copies.stream().map(CopyRow::drive).distinct().toList()));
    }

    /** The contents with those digests. */
    public Map<String, Copy> copiesOf(Collection<String> digests) {
        Map<String, Copy> copies = new HashMap<>();
        link.rows("select " + CopyRow.COLUMNS + WANTED + "survey on digest = wanted", CopyRow.reader(),
                link.texts(digests)).forEach(copy -> copies.put(copy.digest(), copy));
        return copies;
    }

    /** The documents with those digests. */
    public Map<String, byte[]> contents(Collection<String> digests) {
        Map<String, byte[]> contents = new HashMap<>();
        link.rows("select digest, content" + WANTED + "survey on digest = wanted", row ->
                contents.put(row.getString(1), sound(row.getString(1), row.getBytes(2))), link.texts(digests));
        return contents;
    }

    /** The pack that a content came in. */
    public Optional<String> packOf(String digest) {
        return link.rows("select pack from survey where digest = ?", row -> row.getString(1), digest).stream()
                .findFirst();
    }

    /** Those of some zones that hold contents that were dated ahead. */
    public List<ZoneId> datedAhead(Collection<ZoneId> some) {
        return link.rows("select distinct zone" + WANTED + "survey on zone = wanted where came is not null",
                row -> ZoneId.ofKey(row.getString(1)), link.texts(some.stream().map(ZoneId::key).toList()));
    }

    private void staleDrives(Collection<Copy> copies) {
        zones.stale(copies.stream().map(CopyRow::drive).distinct().toList());
    }

    /** Names zones; those that are not there are made, those of the plant that are not named are out of register. */
    public void name(String plant, String plantName, Collection<ZoneNames> names) {
        zones.name(plant, plantName, names);
    }

    /** Makes rows for those of the zones that have none: today's register does not name them. */
    public void addUnnamed(Collection<ZoneId> unnamed, String plantName) {
        zones.addUnnamed(unnamed, plantName);
    }

    /** The packs that were refused. Nothing is proved by them, and whatever else lies here can be made without them. */
    public RefusalTable refusals() {
        return refusals;
    }

    /** Says what counts of zones; they wait to be judged where there is something to judge. */
    public void put(Collection<Standing> standings) {
        zones.put(standings);
    }

    /** Everything that came about some zones, each with the digest of the pack that it came in. */
    public Map<Copy, String> packsOf(Collection<ZoneId> zones) {
        Map<Copy, String> packs = new HashMap<>();
        Link.RowReader<Copy> reader = CopyRow.reader();
        link.each("select " + CopyRow.COLUMNS + ", pack" + WANTED + "survey on zone = wanted", row ->
                packs.put(reader.read(row), row.getString(14)), link.texts(zones.stream().map(ZoneId::key).toList()));
        return packs;
    }

    /** Every zone that there is. */
    public List<ZoneId> zoneIds() {
        return zones.ids();
    }

    /** Zones that wait to be judged, at most so many. */
    public List<ZoneId> waiting(int atMost) {
        return zones.waiting(atMost);
    }

    public long countWaiting() {
        return zones.countWaiting();
    }

    /** Keeps what was judged; nothing for a zone that can't be. */
    public void judge(Map<ZoneId, Optional<Verdict>> verdicts) {
        zones.judge(verdicts);
    }

    /** Every zone as it stands. */
    public List<PackedZone> zones() {
        return zones.all();
    }

    /** Those zones of a level that load their drives most, then would save most; an index holds them in that order. */
    public List<PackedZone> worst(int level, int atMost) {
        return zones.worst(level, atMost);
    }

    public Optional<PackedZone> zone(ZoneId zone) {
        return zones.zone(zone);
    }

    /** What is kept under its digest is what was taken in, or the tables are broken. */
    private static byte[] sound(String digest, byte[] content) {
        if (!Digest.of(content).hex().equals(digest)) {
            throw new OfficeBroken("a content is not that of its digest " + digest);
        }
        return content;
    }

    /** Every row of every table, by table and key, in a digest of its own: two offices are told apart by them. */
    public Map<RowId, String> rowDigests() {
        Map<RowId, String> digests = new TreeMap<>();
        TABLES.forEach((table, key) -> link.rows("select " + key + ", t.* from " + table + " t", row ->
                digests.put(new RowId(table, row.getString(1)), RowId.digest(row))));
        return digests;
    }

    @Override
    public void close() {
        link.close();
    }
}
