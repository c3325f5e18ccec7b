package bedmark.command;

import bedmark.engine.verdict.Rule;
import bedmark.office.OfficeStore;
import bedmark.office.Place;
import bedmark.office.RankQuery;
import bedmark.office.RankedZone;
import bedmark.quantity.UnitSystem;
import bedmark.wording.Wording;
import java.time.Duration;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.ArgGroup;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** Lists the loading zones of an office store, worst first. */
@Command(name = "rank", mixinStandardHelpOptions = true,
        description = "Lists the loading zones of all plants, worst first.",
        footer = {"", "Exit codes: 0 all within or near their limits; 1 something overloaded; 4 none overloaded, but",
            "something undecided, incomplete, not inspected or stale; 2 bad use; 3 unreadable store."})
final class OfficeRankCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Spec
    private CommandSpec spec;

    @Mixin
    private OfficeDesk desk;

    @Option(names = "--plant", paramLabel = "ID", description = "Only this plant.")
    private Optional<String> plant;

    @Option(names = "--area", paramLabel = "NAME", description = "Only this area.")
    private Optional<String> area;

    @Option(names = "--material", paramLabel = "NAME", description = "Only zones of this material.")
    private Optional<String> material;

    @Option(names = "--finding", paramLabel = "RULE", description = "Only zones with this finding.")
    private Optional<String> finding;

    @Option(names = "--older-than", paramLabel = "DAYS",
            description = "Only zones surveyed longer ago (0 or more days), or never.")
    private Optional<Integer> olderThan;

    @Option(names = "--stale-after", paramLabel = "DAYS", defaultValue = "200",
            description = "How long a survey that found nothing counts, from 1 day on (default: ${DEFAULT-VALUE}).")
    private int staleAfter;

    @Option(names = "--limit", paramLabel = "N", description = "Only the N worst, from 1 on.")
    private Optional<Integer> limit;

    @ArgGroup
    private Output output = new Output();

    @Option(names = "--units", paramLabel = "metric|us", defaultValue = "metric",
            description = "Units of the text (default: ${DEFAULT-VALUE}); JSON and CSV are SI.")
    private String units;

    /** One way of printing. */
    static final class Output {
        @Option(names = "--json", description = "Print JSON lines, one zone each.")
        private boolean json;

        @Option(names = "--csv", description = "Print CSV (RFC 4180).")
        private boolean csv;
    }

    OfficeRankCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        UnitSystem system = UnitSystem.ofCode(units).orElseThrow(() ->
                new ParameterException(spec.commandLine(), "--units is metric or us, not '" + units + "'"));
        Optional<Rule> rule = finding.map(code -> Rule.ofCode(code).orElseThrow(() ->
                new ParameterException(spec.commandLine(), "--finding knows no rule '" + code + "'")));
        Usage.require(spec, staleAfter >= 1, "--stale-after is a number of days from 1 on, not " + staleAfter);
        limit.ifPresent(most -> Usage.require(spec, most >= 1, "--limit is a number of zones from 1 on, not " + most));
        olderThan.ifPresent(days -> Usage.require(spec, days >= 0,
                "--older-than is a number of days from 0 on, not " + days));
        RankQuery query = RankQuery.ALL.ofPlant(plant).ofArea(area).ofMaterial(material).with(rule)
                .olderThan(olderThan.map(Duration::ofDays)).staleAfter(Duration.ofDays(staleAfter));
        List<RankedZone> ranked;
        try (ProgressLine progress = new ProgressLine(surroundings); OfficeStore store = desk.open(surroundings,
                progress)) {
            KnownNames.require(spec, store, query);
            ranked = limit.isPresent() ? store.worst(query, limit.get(), progress::at)
                    : store.rank(query, progress::at);
        }
        RankText text = new RankText(new Wording(surroundings.words(), system));
        if (output.json) {
            ranked.forEach(zone -> surroundings.out().println(RankText.json(zone)));
        } else if (output.csv) {
            surroundings.out().print(RankText.csv(ranked));
        } else {
            text.print(ranked, surroundings.out());
        }
        surroundings.out().flush();
        return exitCode(ranked);
    }

    private static int exitCode(List<RankedZone> ranked) {
        Place worst = ranked.isEmpty() ? Place.WITHIN : ranked.get(0).place();
        return switch (worst) {
            case OVERLOADED -> ExitCode.OVERLOADED;
            case UNDECIDED, INCOMPLETE, NOT_INSPECTED, STALE -> ExitCode.UNSETTLED;
            case NEAR, WITHIN -> ExitCode.FINE;
        };
    }
}
