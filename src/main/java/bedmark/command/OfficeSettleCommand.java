package bedmark.command;

import bedmark.office.Findings;
import bedmark.office.OfficeStore;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Decides between contents that clash. */
@Command(name = "settle", mixinStandardHelpOptions = true,
        description = "Decides a conflict for one side; the others are kept and no longer count.")
final class OfficeSettleCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Mixin
    private OfficeDesk desk;

    @Mixin
    private ZoneChoice zones;

    @Parameters(index = "0", paramLabel = "TRANSFER", description = "The transfer point's id or tag.")
    private String transfer;

    @Parameters(index = "1", paramLabel = "SIDE", description = "The side that counts: the start of its digest.")
    private String side;

    @Option(names = "--reason", paramLabel = "TEXT", required = true, description = "Why.")
    private String reason;

    OfficeSettleCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        try (ProgressLine progress = new ProgressLine(surroundings); OfficeStore store = desk.open(surroundings,
                progress)) {
            new Findings(store).settle(zones.zone(store, transfer), side, reason, desk.person());
            progress.done();
            surroundings.out().println(surroundings.words().text("office.settled", transfer, side));
        }
        return ExitCode.FINE;
    }
}
