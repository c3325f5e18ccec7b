package bedmark.bench;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.index.office.OfficeTables;
import bedmark.index.office.Standing;
import bedmark.index.office.Verdict;
import bedmark.index.office.ZoneNames;
import bedmark.journal.Digest;
import bedmark.journal.Progress;
import bedmark.json.BundleReader;
import bedmark.office.OfficeOptions;
import bedmark.office.OfficeStore;
import bedmark.office.RankQuery;
import bedmark.office.RankedZone;
import bedmark.office.Received;
import bedmark.pack.DeviceKey;
import bedmark.pack.PackLimits;
import bedmark.pack.PackReader;
import bedmark.pack.PackWriter;
import bedmark.pack.PhotoSource;
import bedmark.survey.Bundle;
import bedmark.survey.InspectionStatus;
import bedmark.survey.merge.ZoneId;
import java.io.File;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.Statement;
import java.time.Clock;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.Random;
import java.util.UUID;
import java.util.stream.Stream;

/** The office: receiving beside the least that a database could do with the same rows, and ranking many zones. */
final class OfficeSuite implements Suite {
    private static final int SURVEYS = 100;
    private static final int PLANTS = 10;
    private static final int ZONES = 200_000;
    private static final int SHOWN = 200;
    /** Turns of each side, one after the other; those counted come when the compiler is done. */
    private static final int TURNS = 15;
    private static final int COUNTED = 7;
    private static final String ROWS = "select digest, id, revision, supersedes, zone, round, status, begun, finished, "
            + "made, register, conveyor, drive, pack, content from survey order by pack";

    private final Random random = new Random(3);

    @Override
    public String name() {
        return "office";
    }

    @Override
    public List<Row> run() throws Exception {
        Path folder = Files.createTempDirectory("bedmark-office-bench");
        try {
            Path tablet = Files.createDirectories(folder.resolve("tablet"));
            List<Path> packs = packs(folder, tablet, 100);
            List<Path> few = packs.subList(0, packs.size() / 10);
            double[] received = new double[TURNS];
            double[] inserted = new double[TURNS];
            double[] ten = new double[TURNS];
            List<Object[]> rows = List.of();
            for (int turn = 0; turn < TURNS; turn++) {
                Path office = folder.resolve("office" + turn);
                Path bare = folder.resolve("bare" + turn);
                received[turn] = receive(office, tablet, packs);
                rows = rows.isEmpty() ? rows(office) : rows;
                inserted[turn] = insert(bare, packs, rows);
                ten[turn] = receive(folder.resolve("ten" + turn), tablet, few);
                for (String used : List.of("office", "bare", "ten")) {
                    delete(folder.resolve(used + turn));
                }
            }
            double[] rank = rank(folder.resolve("rank"));
            return List.of(
                    over("office, 100 packs of 100 surveys received over JDBC batch inserts of the same rows and "
                            + "SHA-256 of the same bytes, turn by turn, medians of the last " + COUNTED + " of "
                            + TURNS, settled(received), settled(inserted)),
                    over("the same, the first turn of a process that just started", received[0], inserted[0]),
                    new Row("office, the same packs proved and nothing kept, by one thread",
                            proved(packs), "s CPU", 2 * settled(inserted), true),
                    new Row("office, 10 times the surveys: times the time, medians",
                            settled(received) / settled(ten), "", 11, true),
                    new Row("office, 200,000 zones, just opened: the worst 200", rank[0], "s", 1, true),
                    new Row("office, 200,000 zones, just opened: all ranked, 200 of them looked at", rank[1], "s", 1,
                            true),
                    new Row("office, 200,000 zones, just opened: all ranked and looked at", rank[2], "s", 2, true),
                    new Row("office, 200,000 zones: all ranked once more, 200 of them looked at", rank[3], "s", 1,
                            true));
        } finally {
            delete(folder);
        }
    }

    private static void delete(Path folder) throws IOException {
        try (Stream<Path> files = Files.walk(folder)) {
            files.sorted(Comparator.reverseOrder()).map(Path::toFile).forEach(File::delete);
        }
    }

    private static Row over(String what, double received, double inserted) {
        return new Row(String.format(Locale.ROOT, "%s (%.2f over %.2f s)", what, received, inserted),
                received / inserted, "×", 2, true);
    }

    private static double settled(double[] turns) {
        double[] last = Arrays.copyOfRange(turns, TURNS - COUNTED, TURNS);
        Arrays.sort(last);
        return last[COUNTED / 2];
    }

    /** Packs as a tablet makes them: the demo plant's register, form and surveys, each survey with an id of its own. */
    private List<Path> packs(Path folder, Path tablet, int count) throws IOException {
        Branch sample = BundleReader.read(Files.readAllBytes(Path.of("sample-surveys/round-2026-03.json"))).document();
        List<Branch> surveys = sample.branches("surveys").stream().filter(survey -> !survey.has("supersedes")).toList();
        DeviceKey key = DeviceKey.of(tablet);
        List<Path> packs = new ArrayList<>();
        for (int pack = 0; pack < count; pack++) {
            List<Node> held = new ArrayList<>();
            for (int i = 0; i < SURVEYS; i++) {
                held.add(surveys.get(i % surveys.size()).without("photos")
                        .with("id", new UUID(random.nextLong(), random.nextLong()).toString())
                        .with("round", "round-" + pack + "-" + i / surveys.size()));
            }
            Path out = folder.resolve("pack" + pack + ".zip");
            Branch plant = sample.branch("plant").orElseThrow().with("id", "plant-" + pack % PLANTS);
            PackWriter.write(new Bundle(sample.with("id", UUID.randomUUID().toString()).with("plant", plant)
                    .with("surveys", new Node.Series(held))), PhotoSource.folder(folder), key, out, Progress.NONE);
            packs.add(out);
        }
        return packs;
    }

    private static double receive(Path office, Path tablet, List<Path> packs) {
        try (OfficeStore store = OfficeStore.open(office, OfficeOptions.of(Clock.systemUTC()))) {
            store.trust(DeviceKey.of(tablet).fingerprint().text(), "", "bench");
            long start = System.nanoTime();
            List<Received> received = store.receive(packs, "bench", Progress.NONE);
            double time = (System.nanoTime() - start) / 1e9;
            if (!received.stream().allMatch(one -> one instanceof Received.Taken taken && taken.fresh() == SURVEYS)) {
                throw new IllegalStateException("not everything was received");
            }
            return time;
        }
    }

    /** What proof costs: archive, bag, digests, signature, strict JSON, schema and references of every pack. */
    private static double proved(List<Path> packs) {
        double best = Double.POSITIVE_INFINITY;
        for (int turn = 0; turn < 2; turn++) {
            long start = ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime();
            for (Path pack : packs) {
                new PackReader(PackLimits.STANDARD, BundleReader::readUnjudged).open(pack, Progress.NONE);
            }
            best = Math.min(best, (ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime() - start) / 1e9);
        }
        return best;
    }

    /** The rows that receiving made. */
    private static List<Object[]> rows(Path office) throws Exception {
        List<Object[]> rows = new ArrayList<>();
        try (Connection from = DriverManager.getConnection("jdbc:h2:file:" + office.resolve("index/office"), "", "");
                ResultSet read = from.createStatement().executeQuery(ROWS)) {
            while (read.next()) {
                Object[] row = new Object[15];
                for (int i = 0; i < row.length; i++) {
                    row[i] = i == 14 ? read.getBytes(15) : read.getObject(i + 1);
                }
                rows.add(row);
            }
        }
        return rows;
    }

    /** What no office could do without; each pack whole. */
    private static double insert(Path folder, List<Path> packs, List<Object[]> rows) throws Exception {
        String schema = Files.readString(Path.of("src/main/resources/bedmark/index/office/V1__office.sql"))
                .replace("${bytes}", "blob").replaceAll("(?m)^--.*$", "");
        try (Connection into = DriverManager.getConnection("jdbc:h2:file:" + folder.resolve("office")
                + ";WRITE_DELAY=0", "", ""); Statement layOut = into.createStatement()) {
            for (String command : schema.split(";")) {
                if (!command.isBlank()) {
                    layOut.execute(command);
                }
            }
            into.setAutoCommit(false);
            long start = System.nanoTime();
            for (Path pack : packs) {
                MessageDigest.getInstance("SHA-256").digest(Files.readAllBytes(pack));
            }
            try (PreparedStatement insert = into.prepareStatement("insert into survey values (?, ?, ?, ?, ?, ?, ?, ?, "
                    + "?, ?, ?, ?, ?, ?, ?)")) {
                for (int i = 0; i < rows.size(); i++) {
                    for (int column = 0; column < 15; column++) {
                        insert.setObject(column + 1, rows.get(i)[column]);
                    }
                    insert.addBatch();
                    if ((i + 1) % SURVEYS == 0) {
                        insert.executeBatch();
                        into.commit();
                    }
                }
            }
            return (System.nanoTime() - start) / 1e9;
        }
    }

    /**
     * The head of the list from a store just opened; then from one opened anew the whole list, and that with every zone
     * looked at; then the best whole list of those that follow.
     */
    private double[] rank(Path office) throws IOException {
        fill(Files.createDirectories(office.resolve("index")));
        double[] times = {0, 0, 0, Double.POSITIVE_INFINITY};
        try (OfficeStore store = OfficeStore.open(office, OfficeOptions.of(Clock.systemUTC()))) {
            long start = System.nanoTime();
            if (store.worst(RankQuery.ALL, SHOWN, Progress.NONE).size() != SHOWN) {
                throw new IllegalStateException("not everything was ranked");
            }
            times[0] = since(start);
        }
        try (OfficeStore store = OfficeStore.open(office, OfficeOptions.of(Clock.systemUTC()))) {
            for (int i = 0; i < 5; i++) {
                long start = System.nanoTime();
                List<RankedZone> ranked = store.rank();
                look(ranked.subList(0, SHOWN));
                double time = since(start);
                if (ranked.size() != ZONES) {
                    throw new IllegalStateException("ranked " + ranked.size());
                }
                look(ranked);
                if (i == 0) {
                    times[1] = time;
                    times[2] = since(start);
                } else {
                    times[3] = Math.min(times[3], time);
                }
            }
        }
        return times;
    }

    private static double since(long start) {
        return (System.nanoTime() - start) / 1e9;
    }

    /** A list puts a zone together only when it is looked at. */
    private static void look(List<RankedZone> ranked) {
        RankedZone before = ranked.get(0);
        for (RankedZone zone : ranked) {
            int place = before.place().compareTo(zone.place());
            if (place > 0 || place == 0 && before.driveShare().orElseThrow() < zone.driveShare().orElseThrow()) {
                throw new IllegalStateException("ranked wrongly: " + zone);
            }
            before = zone;
        }
    }

    /** A transaction for each plant, as packs that are received make one. */
    private void fill(Path index) {
        try (OfficeTables tables = OfficeTables.of(index)) {
            for (int plant = 0; plant < 100; plant++) {
                int one = plant;
                tables.whole(() -> fill(tables, one));
            }
        }
    }

    private boolean fill(OfficeTables tables, int plant) {
        List<ZoneNames> names = new ArrayList<>();
        List<Standing> standings = new ArrayList<>();
        Map<ZoneId, Optional<Verdict>> verdicts = new HashMap<>();
        for (int i = 0; i < ZONES / 100; i++) {
            ZoneId zone = new ZoneId("plant-" + plant, "TP-" + i);
            String digest = digest(zone);
            names.add(new ZoneNames(zone, "Plant " + plant, "Area " + i % 7, "C" + i / 3, "C" + i / 3, "TP-" + i,
                    "A-" + i, "Limestone", true));
            standings.add(new Standing(zone, Optional.of(digest), Optional.of(InspectionStatus.INSPECTED),
                    OptionalLong.of(1_750_000_000_000L + i), Optional.of(digest),
                    OptionalLong.of(1_750_000_000_000L + i), 0, false));
            verdicts.put(zone, Optional.of(new Verdict(random.nextInt(5), false, share(), share(), share(),
                    OptionalDouble.empty(), OptionalDouble.empty(), Optional.of("widen-boards"), share(),
                    OptionalDouble.empty(), OptionalDouble.empty(), Optional.of("electrical"), Optional.of("EUR"),
                    i % 3 == 0 ? "bed-over-design near 1.15 0.05" : "")));
        }
        tables.name("plant-" + plant, "Plant " + plant, names);
        tables.put(standings);
        tables.judge(verdicts);
        return true;
    }

    /** As long as that of a survey. */
    private static String digest(ZoneId zone) {
        return Digest.of(zone.key().getBytes(StandardCharsets.UTF_8)).hex();
    }

    private OptionalDouble share() {
        return OptionalDouble.of(random.nextDouble());
    }
}
