package bedmark.command;

import bedmark.office.OfficeExport;
import bedmark.office.OfficeStore;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** Writes everything for analysis engines. */
@Command(name = "export", mixinStandardHelpOptions = true,
        description = "Writes every survey with its assessment as JSON lines and as a flat table, by plant and month.",
        footer = {"", "Exit codes: 0 written; 2 bad use; 3 unreadable store, or the folder",
            "is not empty or can't be written."})
final class OfficeExportCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Mixin
    private OfficeDesk desk;

    @Option(names = "--out", paramLabel = "DIR", required = true, description = "A new or empty folder.")
    private Path out;

    OfficeExportCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        try (ProgressLine progress = new ProgressLine(surroundings); OfficeStore store = desk.open(surroundings,
                progress)) {
            long surveys = new OfficeExport(store).write(out, progress::at);
            progress.done();
            surroundings.say("office.exported", out, surveys);
        }
        return ExitCode.FINE;
    }
}
