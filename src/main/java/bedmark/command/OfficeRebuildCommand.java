package bedmark.command;

import bedmark.office.OfficeOptions;
import bedmark.office.OfficeStore;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Parameters;

/** Makes the tables of an office in a folder anew. */
@Command(name = "rebuild", mixinStandardHelpOptions = true,
        description = "Makes the tables of an office in a folder anew from its journal and its packs.",
        footer = {"", "Exit codes: 0 made; 3 made of what can still be read, the rest named in one line each."})
final class OfficeRebuildCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Parameters(paramLabel = "DIR", description = "The office's folder.")
    private Path folder;

    OfficeRebuildCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        OfficeCheckCommand.require(folder);
        try (ProgressLine progress = new ProgressLine(surroundings); OfficeStore store = OfficeStore.rebuild(folder,
                OfficeOptions.of(surroundings.clock()).withProgress(progress::at))) {
            store.found().forEach(defect -> surroundings.err().println("bedmark: "
                    + surroundings.wording().sentence(defect)));
            surroundings.say("command.office.rebuilt", store.packs().size(), folder);
            return store.found().isEmpty() ? ExitCode.FINE : ExitCode.UNREADABLE;
        }
    }
}
