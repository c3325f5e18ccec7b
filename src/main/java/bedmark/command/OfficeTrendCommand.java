package bedmark.command;

import bedmark.json.JsonWriter;
import bedmark.office.JudgedZone;
import bedmark.office.OfficeStore;
import bedmark.office.trend.TrendDocument;
import bedmark.office.trend.ZoneTrend;
import bedmark.report.TrendTelling;
import bedmark.quantity.UnitSystem;
import bedmark.survey.merge.ZoneId;
import bedmark.wording.Wording;
import java.nio.charset.StandardCharsets;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** One loading zone over time. */
@Command(name = "trend", mixinStandardHelpOptions = true,
        description = "Follows one loading zone over time: depth, drag, power and seals, with what changed.",
        footer = {"", "Exit codes: 0 told; 2 bad use; 3 no such zone, or unreadable store."})
final class OfficeTrendCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Spec
    private CommandSpec spec;

    @Mixin
    private OfficeDesk desk;

    @Mixin
    private ZoneChoice zones;

    @Parameters(paramLabel = "TRANSFER", description = "The transfer point's id or tag.")
    private String transfer;

    @Option(names = "--json", description = "Print JSON, SI.")
    private boolean json;

    @Option(names = "--units", paramLabel = "metric|us", defaultValue = "metric",
            description = "Units of the text (default: ${DEFAULT-VALUE}).")
    private String units;

    OfficeTrendCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        UnitSystem system = UnitSystem.ofCode(units).orElseThrow(() ->
                new ParameterException(spec.commandLine(), "--units is metric or us, not '" + units + "'"));
        try (ProgressLine progress = new ProgressLine(surroundings); OfficeStore store = desk.open(surroundings,
                progress)) {
            ZoneId zone = zones.zone(store, transfer);
            ZoneTrend trend = store.trend(zone);
            Optional<JudgedZone> own = store.judged(zone);
            Optional<JudgedZone> today = store.judgedToday(zone);
            progress.done();
            if (json) {
                surroundings.out().print(new String(JsonWriter.indented(TrendDocument.of(trend, own, today)),
                        StandardCharsets.UTF_8));
            } else {
                new TrendTelling(new Wording(surroundings.words(), system)).lines(trend, own, today)
                        .forEach(line -> surroundings.out().println(line));
            }
            surroundings.out().flush();
        }
        return ExitCode.FINE;
    }
}
