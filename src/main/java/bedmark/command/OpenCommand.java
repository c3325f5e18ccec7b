package bedmark.command;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Opens the tablet app or shows a file; without a display it says so and prints what can be read instead. */
@Command(name = "open", mixinStandardHelpOptions = true,
        description = "Opens the tablet app (the default without a command), or shows a pack, round file or receipt.")
final class OpenCommand implements Callable<Integer> {
    private static final String SAMPLE_ROUND = "round-under-way.json";

    private final Surroundings surroundings;

    @Spec
    private CommandSpec spec;

    @Parameters(paramLabel = "FILE", arity = "0..1", description = "A pack, round file or receipt to look at.")
    private Optional<Path> file;

    @Option(names = "--store", paramLabel = "DIR", description = "Folder of the store; made when it is not there.")
    private Optional<Path> store;

    @Option(names = "--demo", description = "Load the demo plant at once where the store is empty.")
    private boolean demo;

    OpenCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() throws Exception {
        if (file.isPresent()) {
            if (store.isPresent() || demo) {
                throw new ParameterException(spec.commandLine(), "a file is shown without --store and --demo");
            }
            return new FileShowing(surroundings).show(file.get());
        }
        return open(surroundings, store.orElseGet(OpenCommand::ownStore), demo);
    }

    static int open(Surroundings surroundings, Path store, boolean demo) throws Exception {
        Optional<Path> samples = surroundings.home().map(home -> home.resolve("sample-surveys"))
                .filter(Files::isDirectory);
        if (surroundings.opening().open(store, samples, demo)) {
            return ExitCode.FINE;
        }
        surroundings.say("command.no-display");
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
