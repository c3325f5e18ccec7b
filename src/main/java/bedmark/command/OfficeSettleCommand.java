package bedmark.command;

import bedmark.office.Conflict;
import bedmark.office.Findings;
import bedmark.office.OfficeStore;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Decides between contents that clash. */
@Command(name = "settle", mixinStandardHelpOptions = true,
        description = {"Decides a conflict for one side; the others are kept and no longer count.",
            "Without arguments it lists the conflicts that wait, with the digest of each side."},
        footer = {"", "Exit codes: 0 decided or listed; 2 bad use; 3 no such zone or side, or unreadable store."})
final class OfficeSettleCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Spec
    private CommandSpec spec;

    @Mixin
    private OfficeDesk desk;

    @Mixin
    private ZoneChoice zones;

    @Parameters(index = "0", paramLabel = "TRANSFER", arity = "0..1",
            description = "The transfer point's id or tag.")
    private Optional<String> transfer;

    @Parameters(index = "1", paramLabel = "SIDE", arity = "0..1",
            description = "The side that counts: the start of its digest.")
    private Optional<String> side;

    @Option(names = "--reason", paramLabel = "TEXT", description = "Why; needed where a conflict is decided.")
    private Optional<String> reason;

    @Option(names = "--json", description = "Print JSON lines, one conflict that waits each.")
    private boolean json;

    OfficeSettleCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        boolean listing = transfer.isEmpty() && reason.isEmpty();
        Usage.require(spec, listing || side.isPresent() && reason.isPresent(),
                "to decide a conflict give TRANSFER, SIDE and --reason; without all three the conflicts are listed");
        Usage.require(spec, listing || !json, "--json is for the list of conflicts; leave it away to decide one");
        try (ProgressLine progress = new ProgressLine(surroundings); OfficeStore store = desk.open(surroundings,
                progress)) {
            if (listing) {
                zones.requirePlant(store);
                List<Conflict> waiting = Conflict.waiting(store, zones.plant());
                progress.done();
                list(waiting);
            } else {
                new Findings(store).settle(zones.zone(store, transfer.get()), side.get(), reason.get(),
                        desk.person());
                progress.done();
                surroundings.say("office.settled", transfer.get(), side.get());
            }
        }
        return ExitCode.FINE;
    }

    private void list(List<Conflict> waiting) {
        if (json) {
            waiting.forEach(conflict -> surroundings.out().println(ConflictText.json(conflict)));
        } else {
            new ConflictText(surroundings.wording()).print(waiting, surroundings.out());
        }
        surroundings.out().flush();
    }
}
