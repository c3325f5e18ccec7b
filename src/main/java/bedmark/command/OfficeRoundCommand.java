package bedmark.command;

import bedmark.document.Refused;
import bedmark.office.OfficeStore;
import bedmark.office.RoundDesk;
import bedmark.office.register.RegisterDesk;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** Writes a round file for the tablets. */
@Command(name = "round", mixinStandardHelpOptions = true,
        description = "Writes a signed round file: register, forms, limits, notes and last results for the tablets.",
        footer = {"", "Exit codes: 0 written; 2 bad use; 3 unreadable store, or the file can't be written."})
final class OfficeRoundCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Mixin
    private OfficeDesk desk;

    @Option(names = "--plant", paramLabel = "ID", description = "The plant, where there are several.")
    private Optional<String> plant;

    @Option(names = "--round", paramLabel = "ID", description = "Only this round; may stand several times.")
    private List<String> rounds = List.of();

    @Option(names = "--out", paramLabel = "FILE", required = true, description = "The file, such as next.round.json.")
    private Path out;

    OfficeRoundCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        try (ProgressLine progress = new ProgressLine(surroundings); OfficeStore store = desk.open(surroundings,
                progress)) {
            List<String> known = List.copyOf(store.registers().keySet());
            String id = plant.or(() -> known.size() == 1 ? Optional.of(known.get(0)) : Optional.empty())
                    .orElseThrow(() -> new Refused(RegisterDesk.unclear(known)));
            new RoundDesk(store).send(id, rounds, out, OffsetDateTime.now(surroundings.clock()), desk.person());
            progress.done();
            surroundings.say("office.round.written", out, store.key().fingerprint());
        }
        return ExitCode.FINE;
    }
}
