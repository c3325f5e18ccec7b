package bedmark.command;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;

/** Opens the tablet app; without a display it says so and assesses the sample round instead. */
@Command(name = "open", mixinStandardHelpOptions = true,
        description = "Opens the tablet app (the default without a command).")
final class OpenCommand implements Callable<Integer> {
    private static final String SAMPLE_ROUND = "round-under-way.json";

    private final Surroundings surroundings;

    @Option(names = "--store", paramLabel = "DIR", description = "Folder of the store; made when it is not there.")
    private Optional<Path> store;

    @Option(names = "--demo", description = "Load the demo plant at once where the store is empty.")
    private boolean demo;

    OpenCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() throws Exception {
        return open(surroundings, store.orElseGet(OpenCommand::ownStore), demo);
    }

    static int open(Surroundings surroundings, Path store, boolean demo) throws Exception {
        Optional<Path> samples = surroundings.home().map(home -> home.resolve("sample-surveys"))
                .filter(Files::isDirectory);
        if (surroundings.opening().open(store, samples, demo)) {
            return ExitCode.FINE;
        }
        surroundings.out().println(surroundings.words().text("command.no-display"));
        surroundings.out().println();
        new AssessCommand(surroundings).assess(samples.orElseThrow(() ->
                new Refused(Defect.in("", "home-absent"))).resolve(SAMPLE_ROUND));
        return ExitCode.FINE;
    }

    /** Where a person's own surveys are kept unless they say otherwise. */
    static Path ownStore() {
        return Path.of(System.getProperty("user.home"), ".bedmark");
    }
}
