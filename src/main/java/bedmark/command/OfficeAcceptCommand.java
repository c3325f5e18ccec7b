package bedmark.command;

import bedmark.engine.verdict.Rule;
import bedmark.office.Findings;
import bedmark.office.OfficeStore;
import bedmark.survey.OfficeDeed;
import bedmark.survey.merge.ZoneId;
import java.time.LocalDate;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Accepts or shelves a finding, or takes that back. */
@Command(name = "accept", mixinStandardHelpOptions = true,
        description = "Accepts or shelves a finding. It comes back when it is worse, or when the day has passed.",
        footer = {"", "Exit codes: 0 noted; 2 bad use; 3 no such zone or finding, or unreadable store."})
final class OfficeAcceptCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Spec
    private CommandSpec spec;

    @Mixin
    private OfficeDesk desk;

    @Mixin
    private ZoneChoice zones;

    @Parameters(index = "0", paramLabel = "TRANSFER", description = "The transfer point's id or tag.")
    private String transfer;

    @Parameters(index = "1", paramLabel = "RULE", description = "The finding's rule, such as bed-over-design.")
    private String rule;

    @Option(names = "--reason", paramLabel = "TEXT", required = true, description = "Why.")
    private String reason;

    @Option(names = "--until", paramLabel = "DAY", description = "The last day on which it stays away (2027-01-31).")
    private Optional<LocalDate> until;

    @Option(names = "--shelve", description = "Look again at the day instead of living with it.")
    private boolean shelve;

    @Option(names = "--reopen", description = "Take an earlier answer back.")
    private boolean reopen;

    OfficeAcceptCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        Rule known = Rule.ofCode(rule).orElseThrow(() ->
                new ParameterException(spec.commandLine(), "there is no rule '" + rule + "'"));
        if (reopen && (shelve || until.isPresent())) {
            throw new ParameterException(spec.commandLine(),
                    "--reopen takes an answer back; --shelve and --until give one");
        }
        try (ProgressLine progress = new ProgressLine(surroundings); OfficeStore store = desk.open(surroundings,
                progress)) {
            ZoneId zone = zones.zone(store, transfer);
            Findings findings = new Findings(store);
            if (reopen) {
                findings.reopen(zone, known, reason, desk.person());
            } else {
                findings.answer(zone, known, shelve ? OfficeDeed.Answer.SHELVED : OfficeDeed.Answer.ACCEPTED, reason,
                        desk.person(), until, LocalDate.now(surroundings.clock()));
            }
            progress.done();
            surroundings.say("office.accept." + outcome(), transfer,
                    surroundings.words().text("rule." + rule), until.map(LocalDate::toString).orElse(""));
        }
        return ExitCode.FINE;
    }

    private String outcome() {
        if (reopen) {
            return "reopened";
        }
        return shelve ? "shelved" : until.isPresent() ? "accepted" : "accepted-for-good";
    }
}
