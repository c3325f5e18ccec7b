package bedmark.command;

import bedmark.office.OfficeStore;
import bedmark.office.register.RegisterDesk;
import bedmark.office.register.RegisterFolder;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** Writes a register as tables. */
@Command(name = "export-register", mixinStandardHelpOptions = true,
        description = "Writes a plant's register as CSV tables, which import-register takes back.",
        footer = {"", "Exit codes: 0 written; 2 bad use; 3 unreadable store, or a table can't be written."})
final class OfficeExportRegisterCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Mixin
    private OfficeDesk desk;

    @Option(names = "--plant", paramLabel = "ID", description = "The plant, where there are several.")
    private Optional<String> plant;

    @Option(names = "--out", paramLabel = "DIR", required = true, description = "The folder for the tables.")
    private Path out;

    OfficeExportRegisterCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        try (ProgressLine progress = new ProgressLine(surroundings); OfficeStore store = desk.open(surroundings,
                progress)) {
            int tables = RegisterFolder.write(new RegisterDesk(store).head(plant, List.of()), out);
            progress.done();
            surroundings.say("office.register.written", out, tables);
            return ExitCode.FINE;
        }
    }
}
