package bedmark.command;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;

/** Opens the tablet app; without a display it says so and assesses the sample round instead. */
@Command(name = "open", mixinStandardHelpOptions = true,
        description = "Opens the tablet app (the default without a command).")
final class OpenCommand implements Callable<Integer> {
    private static final String SAMPLE_ROUND = "sample-surveys/round-under-way.json";

    private final Surroundings surroundings;

    @Option(names = "--store", paramLabel = "DIR", description = "Folder of the store; made when it is not there.")
    private Optional<Path> store;

    @Option(names = "--demo", description = "Fill an empty store with the demo plant.")
    private boolean demo;

    OpenCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() throws Exception {
        return open(surroundings, store.orElseGet(OpenCommand::ownStore),
                demo ? Optional.of(samples(surroundings)) : Optional.empty());
    }

    static int open(Surroundings surroundings, Path store, Optional<Path> demo) throws Exception {
        if (surroundings.opening().open(store, demo)) {
            return ExitCode.FINE;
        }
        surroundings.out().println(surroundings.words().text("command.no-display"));
        surroundings.out().println();
        new AssessCommand(surroundings).assess(home(surroundings).resolve(SAMPLE_ROUND));
        return ExitCode.FINE;
    }

    /** Where a person's own surveys are kept unless they say otherwise. */
    static Path ownStore() {
        return Path.of(System.getProperty("user.home"), ".bedmark");
    }

    private static Path samples(Surroundings surroundings) {
        return home(surroundings).resolve("sample-surveys");
    }

    private static Path home(Surroundings surroundings) {
        return surroundings.home().orElseThrow(() -> new Refused(Defect.in("", "home-absent")));
    }
}
