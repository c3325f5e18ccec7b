package bedmark.command;

import bedmark.office.OfficeStore;
import bedmark.office.Refusal;
import bedmark.office.Refusals;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** Lists the packs that were refused and are not in. */
@Command(name = "refused", mixinStandardHelpOptions = true,
        description = {"Lists the packs that were refused in the last 90 days and did not come in since, the last at the",
            "head, with the reason and the tablet as far as that is proved."},
        footer = {"", "Exit codes: 0 listed; 2 bad use; 3 unreadable store."})
final class OfficeRefusedCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Mixin
    private OfficeDesk desk;

    @Option(names = "--json", description = "Print JSON lines, one pack each.")
    private boolean json;

    OfficeRefusedCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        List<Refusal> refusals;
        try (ProgressLine progress = new ProgressLine(surroundings); OfficeStore store = desk.open(surroundings,
                progress)) {
            refusals = new Refusals(store, surroundings.clock()).open();
        }
        RefusalText text = new RefusalText(surroundings.wording());
        refusals.forEach(one -> surroundings.out().println(json ? text.json(one) : text.line(one)));
        if (refusals.isEmpty() && !json) {
            surroundings.out().println(surroundings.words().text("office.refused.none"));
        }
        return ExitCode.FINE;
    }
}
