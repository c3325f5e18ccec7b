package bedmark.command;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.office.OfficeStore;
import bedmark.office.RankQuery;
import bedmark.quantity.UnitSystem;
import bedmark.report.PdfReport;
import bedmark.report.ReportContent;
import bedmark.report.ReportOptions;
import bedmark.report.ReportTables;
import bedmark.report.paper.PaperSize;
import bedmark.report.table.CsvTable;
import bedmark.report.table.WorkbookFile;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.io.BufferedOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.io.OutputStreamWriter;
import java.io.Writer;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.time.Duration;
import java.time.OffsetDateTime;
import java.util.Locale;
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

    @Option(names = "--language", paramLabel = "en|es", description = "Language of the report (default: that of here).")
    private Optional<String> language;

    @Option(names = "--paper", paramLabel = "a4|letter", defaultValue = "a4",
            description = "Size of the pages (default: ${DEFAULT-VALUE}).")
    private String paper;

    /** The kinds of file. */
    private enum Kind {
        PDF, XLSX, CSV
    }

    OfficeReportCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        Kind kind = kind();
        Words words = language.map(this::words).orElse(surroundings.words());
        UnitSystem system = UnitSystem.ofCode(units).orElseThrow(() -> bad("--units is metric or us, not '" + units + "'"));
        PaperSize size = PaperSize.ofCode(paper).orElseThrow(() -> bad("--paper is a4 or letter, not '" + paper + "'"));
        if (staleAfter < 1) {
            throw bad("--stale-after is a number of days from 1 on");
        }
        RankQuery query = RankQuery.ALL.ofPlant(plant).ofArea(area).staleAfter(Duration.ofDays(staleAfter));
        try (ProgressLine progress = new ProgressLine(surroundings);
                OfficeStore store = desk.open(surroundings, progress)) {
            ReportContent content = ReportContent.of(store, query, OffsetDateTime.now(surroundings.clock()),
                    progress::at).orElseThrow();
            ReportOptions options = new ReportOptions(new Wording(words, system), size,
                    (zone, sha256) -> store.photo(zone, sha256), "Bedmark " + ProgramVersion.number(),
                    progress::at);
            whole(target -> write(kind, content, options, target));
            progress.done();
            surroundings.out().println(surroundings.words().text("report.written", out, content.zones().size()));
        }
        return ExitCode.FINE;
    }

    private Kind kind() {
        String name = String.valueOf(out.getFileName()).toLowerCase(Locale.ROOT);
        for (Kind kind : Kind.values()) {
            if (name.endsWith("." + kind.name().toLowerCase(Locale.ROOT))) {
                return kind;
            }
        }
        throw bad("--out is a file .pdf, .xlsx or .csv, not '" + out + "'");
    }

    private Words words(String code) {
        return Words.LANGUAGES.stream().filter(locale -> locale.getLanguage().equals(code)).findFirst()
                .map(Words::new).orElseThrow(() -> bad("--language is en or es, not '" + code + "'"));
    }

    private ParameterException bad(String sentence) {
        return new ParameterException(spec.commandLine(), sentence);
    }

    private static void write(Kind kind, ReportContent content, ReportOptions options, OutputStream target)
            throws IOException {
        switch (kind) {
            case PDF -> new PdfReport(content, options).write(target);
            case XLSX -> {
                ReportTables tables = new ReportTables(content, options);
                WorkbookFile.write(tables.all(), tables.dictionary(), "1.0", target);
            }
            case CSV -> {
                Writer writer = new OutputStreamWriter(target, StandardCharsets.UTF_8);
                CsvTable.write(new ReportTables(content, options).zones(), writer);
                writer.flush();
            }
        }
    }

    /** Something that is written to a stream. */
    private interface Writing {
        void to(OutputStream target) throws IOException;
    }

    /** The file is there whole or not at all; one that was there before stays until then. */
    private void whole(Writing writing) {
        Path file = out.toAbsolutePath();
        Path part = file.resolveSibling(file.getFileName() + ".part");
        try {
            try (OutputStream target = new BufferedOutputStream(Files.newOutputStream(part))) {
                writing.to(target);
            }
            Files.move(part, file, StandardCopyOption.REPLACE_EXISTING);
        } catch (IOException e) {
            part.toFile().delete();
            throw new Refused(Defect.in(out.toString(), "report-unwritable"), e);
        }
    }
}
