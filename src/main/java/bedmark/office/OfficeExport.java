package bedmark.office;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.journal.Digest;
import bedmark.journal.Fault;
import bedmark.journal.NamedPath;
import bedmark.journal.Progress;
import bedmark.json.AssessmentWriter;
import bedmark.json.JsonWriter;
import bedmark.office.FlatColumn.FlatRow;
import bedmark.survey.merge.Copy;
import java.io.IOException;
import java.io.Writer;
import java.net.URLEncoder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.time.Instant;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.Stream;

/**
 * Everything that came, as files that any analysis engine reads: line-delimited JSON with the whole survey and its
 * assessment, and a flat CSV table with a data dictionary, both in folders {@code plant=…/month=…}. Nothing in them
 * depends on the order in which packs came, so that two offices that received the same write the same bytes.
 */
public final class OfficeExport {
    private static final int AT_ONCE = 500;
    private static final String DICTIONARY = "data-dictionary.csv";
    private static final String REGISTERS = "registers";
    private static final String JSON = "json";
    private static final String TABLE = "table";
    /** How long a folder name may be before it is cut: the systems that we know take 255 bytes. */
    private static final int LONGEST_NAME = 160;
    private static final int HEAD_OF_NAME = 80;
    private static final DateTimeFormatter MONTH = DateTimeFormatter.ofPattern("yyyy-MM").withZone(ZoneOffset.UTC);

    private final OfficeStore store;

    public OfficeExport(OfficeStore store) {
        this.store = store;
    }

    /**
     * Writes the export.
     *
     * @param out a folder that is not there yet, or is empty
     * @return the number of surveys
     * @throws Refused {@code folder-is-file}, {@code folder-unreadable}, {@code export-folder-full},
     *                 {@code export-not-saved}; the folder is empty then, so that it can be tried again
     */
    public long write(Path out, Progress progress) {
        try {
            NamedPath.requireFolderOrNothing(out);
            Files.createDirectories(out);
            try (Stream<Path> held = Files.list(out)) {
                if (held.findAny().isPresent()) {
                    throw new Refused(Defect.in(out.toString(), "export-folder-full"));
                }
            }
            return write(out, out.resolve(DICTIONARY), progress);
        } catch (IOException e) {
            throw new Refused(Defect.in(out.toString(), "export-not-saved", Fault.reason(e)), e);
        }
    }

    private long write(Path out, Path dictionary, Progress progress) throws IOException {
        try {
            Files.writeString(dictionary, dictionary());
            registers(out.resolve(REGISTERS));
            return surveys(out, progress);
        } catch (IOException | RuntimeException e) {
            // The folder was empty: what lies in it is a part of this export.
            dictionary.toFile().delete();
            for (String part : List.of(REGISTERS, JSON, TABLE)) {
                clear(out.resolve(part));
            }
            throw e;
        }
    }

    /** Deletes what can be deleted, the innermost first. */
    private static void clear(Path folder) throws IOException {
        if (Files.exists(folder)) {
            try (Stream<Path> held = Files.walk(folder)) {
                held.sorted(Comparator.reverseOrder()).forEach(one -> one.toFile().delete());
            }
        }
    }

    private static String dictionary() {
        StringBuilder text = new StringBuilder(Csv.row(List.of("column", "type", "unit", "says")));
        FlatColumn.ALL.forEach(column ->
                text.append(Csv.row(List.of(column.name(), column.type(), column.unit(), column.says()))));
        return text.toString();
    }

    private void registers(Path folder) throws IOException {
        Files.createDirectories(folder);
        for (Map.Entry<String, byte[]> register : registerVersions().entrySet()) {
            Files.write(folder.resolve(register.getKey() + ".json"), register.getValue());
        }
    }

    private long surveys(Path out, Progress progress) throws IOException {
        List<String> digests = contents();
        for (int from = 0; from < digests.size(); from += AT_ONCE) {
            progress.at(from, digests.size());
            SortedMap<String, StringBuilder> json = new TreeMap<>();
            SortedMap<String, StringBuilder> table = new TreeMap<>();
            for (FlatRow row : store.rows(digests.subList(from, Math.min(digests.size(), from + AT_ONCE)))) {
                String part = "plant=" + folderName(row.copy().zone().plant())
                        + "/month=" + MONTH.format(Instant.ofEpochMilli(row.copy().moment()));
                json.computeIfAbsent(part, key -> new StringBuilder()).append(line(row)).append('\n');
                table.computeIfAbsent(part, key -> new StringBuilder()).append(Csv.row(FlatColumn.ALL.stream()
                        .map(column -> column.cell().apply(row)).toList()));
            }
            append(out.resolve(JSON), "surveys.jsonl", json, "");
            append(out.resolve(TABLE), "surveys.csv", table,
                    Csv.row(FlatColumn.ALL.stream().map(FlatColumn::name).toList()));
        }
        progress.at(digests.size(), digests.size());
        return digests.size();
    }

    /** A name of its own for each plant: a long id is cut, and what follows {@code ~} tells it from others like it. */
    static String folderName(String plant) {
        String name = URLEncoder.encode(plant, StandardCharsets.UTF_8);
        return name.length() <= LONGEST_NAME ? name : name.substring(0, HEAD_OF_NAME) + "~"
                + Digest.of(plant.getBytes(StandardCharsets.UTF_8)).hex();
    }

    private static void append(Path folder, String name, SortedMap<String, StringBuilder> parts, String head)
            throws IOException {
        for (Map.Entry<String, StringBuilder> part : parts.entrySet()) {
            Path file = folder.resolve(part.getKey()).resolve(name);
            boolean begun = Files.exists(file);
            Files.createDirectories(file.getParent());
            try (Writer writer = Files.newBufferedWriter(file, StandardOpenOption.CREATE, StandardOpenOption.APPEND)) {
                writer.append(begun ? "" : head).append(part.getValue());
            }
        }
    }

    private static String line(FlatRow row) {
        Branch branch = Branch.EMPTY.with("content", row.copy().digest())
                .with("plant", row.copy().zone().plant())
                .with("register", row.copy().origin().register())
                .with("counts", Node.flag(row.counts()))
                .with("survey", row.survey().document());
        if (row.judged().isPresent()) {
            branch = branch.with("assessment", AssessmentWriter.write(row.judged().get().assessment()));
        }
        return new String(JsonWriter.compact(branch), StandardCharsets.UTF_8);
    }

    /** The digests of everything that came, by zone, survey and revision. */
    private List<String> contents() {
        return store.ask(tables -> tables.copies().stream().map(Copy::digest).toList());
    }

    /** Every version of every register that a survey was made with, by digest. */
    private SortedMap<String, byte[]> registerVersions() {
        return store.ask(tables -> {
            SortedMap<String, byte[]> versions = new TreeMap<>();
            tables.registers().forEach(digest -> versions.put(digest, tables.register(digest).orElseThrow()));
            return versions;
        });
    }
}
