package bedmark.command;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.office.OfficeStore;
import bedmark.office.register.RegisterDesk;
import bedmark.office.register.RegisterTables;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
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
            Map<String, String> files = RegisterTables.of(new RegisterDesk(store).head(plant, List.of()));
            Files.createDirectories(out);
            for (Map.Entry<String, String> file : files.entrySet()) {
                Files.writeString(out.resolve(file.getKey()), file.getValue());
            }
            progress.done();
            surroundings.say("office.register.written", out, files.size());
            return ExitCode.FINE;
        } catch (IOException e) {
            throw new Refused(Defect.in(out.toString(), "export-not-saved", String.valueOf(e.getMessage())), e);
        }
    }
}
