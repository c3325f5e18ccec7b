package bedmark.command;

import bedmark.json.ReferenceData;
import bedmark.wording.Wording;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Parameters;

/** Writes the reference data that ships, for a site to edit. */
@Command(name = "write", mixinStandardHelpOptions = true,
        description = "Writes the shipped reference files and their schemas into a folder, for a site to edit.",
        footer = {"", "No file that is there is overwritten. Use them with: assess --reference DIR.",
            "Exit codes: 0 written; 3 not written."})
final class ReferenceWriteCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Parameters(paramLabel = "DIR", description = "The folder; made where it is not there.")
    private Path folder;

    ReferenceWriteCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        ReferenceData.write(folder).forEach(file ->
                surroundings.out().println(Wording.plain(file.toString())));
        return ExitCode.FINE;
    }
}
