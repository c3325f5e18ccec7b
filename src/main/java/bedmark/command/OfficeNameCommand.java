package bedmark.command;

import bedmark.office.OfficeStore;
import bedmark.wording.Wording;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Gives the office its name. */
@Command(name = "name", mixinStandardHelpOptions = true,
        description = "Gives the office the name that its receipts and round files carry; without NAME it tells it.",
        footer = {"", "Exit codes: 0 named or told; 2 bad use; 3 a name that does not fit, or unreadable store."})
final class OfficeNameCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Spec
    private CommandSpec spec;

    @Mixin
    private OfficeDesk desk;

    @Parameters(paramLabel = "NAME", arity = "0..1", description = "The office's name, as the tablets show it.")
    private Optional<String> name;

    OfficeNameCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        if (name.filter(String::isBlank).isPresent()) {
            throw new ParameterException(spec.commandLine(), "NAME is blank; write the office's name");
        }
        try (ProgressLine progress = new ProgressLine(surroundings); OfficeStore store = desk.open(surroundings,
                progress)) {
            name.ifPresent(store::rename);
            progress.done();
            surroundings.out().println(Wording.plain(named(surroundings, store.device().name())));
        }
        return ExitCode.FINE;
    }

    /** An office's name, or words for one that has none. */
    static String named(Surroundings surroundings, String office) {
        return office.isBlank() ? surroundings.words().text("arrival.nameless") : office;
    }
}
