package bedmark.command;

import bedmark.office.OfficeStore;
import bedmark.office.Refusal;
import bedmark.office.Refusals;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** Lists the packs that were refused and are not in. */
@Command(name = "refused", mixinStandardHelpOptions = true,
        description = {"Lists the packs that were refused in the last 90 days and did not come in since, the last",
            "at the head, with the reason and the tablet as far as that is proved."},
        footer = {"", "Exit codes: 0 listed; 2 bad use; 3 unreadable store."})
final class OfficeRefusedCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Mixin
    private OfficeDesk desk;

    @Spec
    private CommandSpec spec;

    @Option(names = "--json", description = "Print JSON lines, one pack each.")
    private boolean json;

    @Option(names = "--put-away", paramLabel = "FILE|SHA-256",
            description = "Take one from the list that nobody waits for any more; refused again, it is there again.")
    private Optional<String> putAway;

    OfficeRefusedCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        List<Refusal> refusals;
        try (ProgressLine progress = new ProgressLine(surroundings); OfficeStore store = desk.open(surroundings,
                progress)) {
            Refusals noted = new Refusals(store, surroundings.clock());
            putAway.ifPresent(named -> noted.putAway(named(noted.open(), named)));
            refusals = noted.open();
        }
        RefusalText text = new RefusalText(surroundings.wording());
        refusals.forEach(one -> surroundings.out().println(json ? text.json(one) : text.line(one)));
        if (refusals.isEmpty() && !json) {
            surroundings.say("office.refused.none");
        }
        return ExitCode.FINE;
    }

    private Refusal named(List<Refusal> refusals, String named) {
        return refusals.stream().filter(one -> one.turned().file().equals(Path.of(named).toAbsolutePath().normalize())
                || one.turned().content().filter(content -> content.sha256().equals(named)).isPresent()).findFirst()
                .orElseThrow(() -> new ParameterException(spec.commandLine(),
                        "--put-away '" + named + "' is no refused pack; see the list for its file"));
    }
}
