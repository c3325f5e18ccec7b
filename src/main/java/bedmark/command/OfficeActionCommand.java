package bedmark.command;

import bedmark.engine.verdict.Rule;
import bedmark.office.Actions;
import bedmark.office.OfficeStore;
import bedmark.survey.OfficeDeed;
import bedmark.survey.merge.ZoneId;
import java.time.LocalDate;
import java.util.Optional;
import java.util.concurrent.Callable;
import java.util.stream.Stream;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Writes an action down, changes one, or lists all as CSV. */
@Command(name = "action", mixinStandardHelpOptions = true,
        description = "Writes down what is to be done at a transfer point; without one, lists all as CSV.",
        footer = {"", "Exit codes: 0 written down or listed; 2 bad use; 3 no such zone or action, or unreadable "
                + "store."})
final class OfficeActionCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Spec
    private CommandSpec spec;

    @Mixin
    private OfficeDesk desk;

    @Mixin
    private ZoneChoice zones;

    @Parameters(paramLabel = "TRANSFER", arity = "0..1", description = "The transfer point's id or tag.")
    private Optional<String> transfer;

    @Option(names = "--text", paramLabel = "TEXT", description = "What is to be done.")
    private Optional<String> text;

    @Option(names = "--finding", paramLabel = "RULE", description = "The finding that it is about.")
    private Optional<String> finding;

    @Option(names = "--owner", paramLabel = "NAME", description = "Who sees to it.")
    private Optional<String> owner;

    @Option(names = "--due", paramLabel = "DAY", description = "By when (2027-01-31).")
    private Optional<LocalDate> due;

    @Option(names = "--work-order", paramLabel = "NUMBER", description = "Its number in the maintenance system.")
    private Optional<String> workOrder;

    @Option(names = "--change", paramLabel = "ID", description = "Change this action instead of adding one.")
    private Optional<String> change;

    @Option(names = "--done", description = "It was done.")
    private boolean done;

    OfficeActionCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        Usage.require(spec, transfer.isEmpty() || change.isEmpty(),
                "TRANSFER adds an action and --change changes one; give one of them");
        Usage.require(spec, transfer.isPresent() || change.isPresent() || !anythingGiven(),
                "name the TRANSFER that this is to be done at, or the action with --change");
        Usage.require(spec, transfer.isEmpty() || !done,
                "--done is about an action that is there; name it with --change");
        finding.filter(code -> !code.isEmpty()).ifPresent(code -> Usage.require(spec, Rule.ofCode(code).isPresent(),
                "--finding knows no rule '" + code + "'"));
        try (ProgressLine progress = new ProgressLine(surroundings); OfficeStore store = desk.open(surroundings,
                progress)) {
            Actions actions = new Actions(store);
            if (change.isPresent()) {
                OfficeDeed.ActionSet old = actions.named(change.get());
                actions.set(new OfficeDeed.ActionSet(old.action(), old.zone(), finding.orElse(old.finding()),
                        text.orElse(old.text()), owner.orElse(old.owner()), due.or(old::due),
                        workOrder.orElse(old.workOrder()), done || old.done()), desk.person());
            } else if (transfer.isPresent()) {
                ZoneId zone = zones.zone(store, transfer.get());
                progress.done();
                surroundings.out().println(actions.add(zone, finding.orElse(""), text.orElse(""), owner.orElse(""),
                        due, workOrder.orElse(""), desk.person()));
                return ExitCode.FINE;
            }
            progress.done();
            surroundings.out().print(actions.csv());
            return ExitCode.FINE;
        }
    }

    private boolean anythingGiven() {
        return done || zones.given() || due.isPresent()
                || Stream.of(text, finding, owner, workOrder).anyMatch(Optional::isPresent);
    }
}
