package bedmark.command;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.office.OfficeStore;
import bedmark.office.RankQuery;
import bedmark.quantity.UnitSystem;
import bedmark.report.ReportContent;
import bedmark.report.ReportFile;
import bedmark.report.ReportOptions;
import bedmark.report.paper.PaperSize;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.nio.file.Path;
import java.time.Duration;
import java.time.OffsetDateTime;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** Writes the report of an office store. */
@Command(name = "report", mixinStandardHelpOptions = true,
        description = {"Writes the report: a PDF to read, a workbook or CSV to reckon with.",
            "The ending of the file says which."},
        footer = {"", "Exit codes: 0 written; 2 bad use; 3 unreadable store, or the file can't be written."})
final class OfficeReportCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Spec
    private CommandSpec spec;

    @Mixin
    private OfficeDesk desk;

    @Option(names = "--out", paramLabel = "FILE", required = true, description = "A file .pdf, .xlsx or .csv.")
    private Path out;

    @Option(names = "--plant", paramLabel = "ID", description = "Only this plant.")
    private Optional<String> plant;

    @Option(names = "--area", paramLabel = "NAME", description = "Only this area.")
    private Optional<String> area;

    @Option(names = "--stale-after", paramLabel = "DAYS", defaultValue = "200",
            description = "How long a survey that found nothing counts (default: ${DEFAULT-VALUE}).")
    private int staleAfter;

    @Option(names = "--units", paramLabel = "metric|us", defaultValue = "metric",
            description = "Units of the report (default: ${DEFAULT-VALUE}).")
    private String units;

    @Option(names = "--language", paramLabel = "en|es",
            description = "Language of the report (default: that of this machine, English where it is neither).")
    private Optional<String> language;

    @Option(names = "--paper", paramLabel = "a4|letter", defaultValue = "a4",
            description = "Size of the pages (default: ${DEFAULT-VALUE}).")
    private String paper;

    OfficeReportCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        ReportFile.Kind kind = ReportFile.Kind.of(out).orElseThrow(() ->
                bad("--out is a file .pdf, .xlsx or .csv, not '" + out + "'"));
        Words words = language.map(this::words).orElse(surroundings.words());
        UnitSystem system = UnitSystem.ofCode(units).orElseThrow(() ->
                bad("--units is metric or us, not '" + units + "'"));
        PaperSize size = PaperSize.ofCode(paper).orElseThrow(() -> bad("--paper is a4 or letter, not '" + paper + "'"));
        if (staleAfter < 1) {
            throw bad("--stale-after is a number of days from 1 on");
        }
        RankQuery query = RankQuery.ALL.ofPlant(plant).ofArea(area).staleAfter(Duration.ofDays(staleAfter));
        try (ProgressLine progress = new ProgressLine(surroundings);
                OfficeStore store = desk.open(surroundings, progress)) {
            KnownNames.require(spec, store, query);
            ReportContent content = ReportContent.of(store, query, OffsetDateTime.now(surroundings.clock()),
                    progress::at).orElseThrow(this::stopped);
            ReportOptions options = new ReportOptions(new Wording(words, system), size,
                    (zone, sha256) -> store.photo(zone, sha256), "Bedmark " + ProgramVersion.number(),
                    progress::at);
            if (!ReportFile.write(out, kind, content, options)) {
                throw stopped();
            }
            progress.done();
            surroundings.say("report.written", out, content.zones().size());
        }
        return ExitCode.FINE;
    }

    private Refused stopped() {
        return new Refused(Defect.in(out.toString(), "report-stopped"));
    }

    private Words words(String code) {
        return Words.LANGUAGES.stream().filter(locale -> locale.getLanguage().equals(code)).findFirst()
                .map(Words::new).orElseThrow(() -> bad("--language is en or es, not '" + code + "'"));
    }

    private ParameterException bad(String sentence) {
        return new ParameterException(spec.commandLine(), sentence);
    }
}
