package bedmark.command;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.NamedPath;
import bedmark.json.JsonReader;
import bedmark.office.OfficeStore;
import bedmark.office.register.Draft;
import bedmark.office.register.RegisterDesk;
import bedmark.office.register.RegisterImport;
import bedmark.office.register.Table;
import bedmark.office.register.Tables;
import bedmark.wording.Wording;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.Callable;
import java.util.stream.Stream;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Takes a register in from tables. */
@Command(name = "import-register", mixinStandardHelpOptions = true,
        description = {"Takes plants, areas, materials, conveyors, loading zones, rounds, limits, seal rates and",
            "instruments in. CSV files are named after what they hold (plant.csv, areas.csv, materials.csv,",
            "conveyors.csv, transfers.csv, rounds.csv, limits.csv, sealRates.csv, instruments.csv), the sheets of a",
            "workbook likewise. A column's head is its key, with the unit in brackets where the cells name none:",
            "beltWidth [mm]."},
        footer = {"", "Exit codes: 0 taken in; 3 something is wrong, each bad row is named and nothing was taken in;",
            "2 bad use."})
final class OfficeImportRegisterCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Mixin
    private OfficeDesk desk;

    @Parameters(paramLabel = "FILE|FOLDER", arity = "1..*", description = "CSV files, workbooks (.xlsx), or folders.")
    private List<Path> inputs;

    @Option(names = "--plant", paramLabel = "ID", description = "The plant; made where it is not there.")
    private Optional<String> plant;

    @Option(names = "--map", paramLabel = "HEAD=KEY", description = "What a column holds whose head does not say so.")
    private Map<String, String> map = Map.of();

    @Option(names = "--check", description = "Only say what would be taken in.")
    private boolean check;

    OfficeImportRegisterCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() throws Exception {
        List<Table> tables = new ArrayList<>();
        for (Path file : files()) {
            tables.addAll(Tables.read(file));
        }
        try (ProgressLine progress = new ProgressLine(surroundings); OfficeStore store = desk.open(surroundings,
                progress)) {
            RegisterDesk register = new RegisterDesk(store);
            Draft draft = RegisterImport.draft(register.head(plant, forms()), tables, map);
            progress.done();
            draft.mapping().forEach(this::tell);
            if (!draft.sound()) {
                draft.defects().forEach(defect -> surroundings.err().println("bedmark: "
                        + Wording.plain(surroundings.wording().sentence(defect))));
                surroundings.err().println("bedmark: " + surroundings.wording().sentence(
                        Defect.in("", "draft-unsound", Integer.toString(draft.defects().size()))));
                return ExitCode.UNREADABLE;
            }
            if (!check) {
                register.take(draft, "import", desk.person());
            }
            surroundings.say(check ? "office.import.would" : "office.import.done",
                    draft.added(), draft.changed(), draft.same());
        }
        return ExitCode.FINE;
    }

    private void tell(Draft.Mapped column) {
        surroundings.out().println(Wording.plain(surroundings.words().text(column.key().isEmpty()
                ? "office.import.unused" : "office.import.column", column.source(), column.head(), column.list(),
                column.key(), column.unit())).stripTrailing());
    }

    private List<Path> files() throws IOException {
        List<Path> files = new ArrayList<>();
        for (Path input : inputs) {
            if (Files.isDirectory(input)) {
                NamedPath.requireFolder(input);
                try (Stream<Path> held = Files.list(input)) {
                    held.filter(file -> file.getFileName().toString().toLowerCase(Locale.ROOT)
                            .matches(".*\\.(csv|xlsx)")).sorted().forEach(files::add);
                }
            } else {
                NamedPath.requireFile(input);
                files.add(input);
            }
        }
        if (files.isEmpty()) {
            throw new Refused(Defect.in(inputs.get(0).toString(), "table-none"));
        }
        return files;
    }

    /** The forms that are laid out with the program, for a plant that has none. */
    private List<Branch> forms() throws IOException {
        Path folder = surroundings.home().map(home -> home.resolve("field-forms")).filter(Files::isDirectory)
                .orElse(null);
        if (folder == null) {
            return List.of();
        }
        List<Branch> forms = new ArrayList<>();
        try (Stream<Path> held = Files.list(folder)) {
            for (Path file : held.filter(one -> one.toString().endsWith(".json")
                    && !one.toString().endsWith(".schema.json")).sorted().toList()) {
                forms.add(JsonReader.read(Files.readAllBytes(file)).root());
            }
        }
        return forms;
    }
}
