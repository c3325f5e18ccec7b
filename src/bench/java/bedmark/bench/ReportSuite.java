package bedmark.bench;

import bedmark.journal.Progress;
import bedmark.json.BundleReader;
import bedmark.office.OfficeOptions;
import bedmark.office.OfficeStore;
import bedmark.office.RankQuery;
import bedmark.pack.DeviceKey;
import bedmark.pack.PackWriter;
import bedmark.quantity.UnitSystem;
import bedmark.report.PdfReport;
import bedmark.report.ReportContent;
import bedmark.report.ReportOptions;
import bedmark.report.ReportPhotos;
import bedmark.report.ReportTables;
import bedmark.report.paper.PaperSize;
import bedmark.report.table.WorkbookFile;
import bedmark.survey.Bundle;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** A report of 100 loading zones from an office store, from ranking to the file, made once in a fresh program. */
final class ReportSuite implements Suite {
    private static final int ZONES = 100;

    @Override
    public String name() {
        return "report";
    }

    @Override
    public List<Row> run() throws IOException {
        try (BenchFolder folder = BenchFolder.make("report"); OfficeStore store = store(folder.path())) {
            ReportOptions options = new ReportOptions(new Wording(new Words(Locale.ENGLISH), UnitSystem.METRIC),
                    PaperSize.A4, ReportPhotos.NONE, "Bedmark", Progress.NONE);
            double pdf = seconds(folder.path().resolve("report.pdf"), out ->
                    new PdfReport(content(store), options).write(out));
            double workbook = seconds(folder.path().resolve("report.xlsx"), out -> {
                ReportTables tables = new ReportTables(content(store), options);
                WorkbookFile.write(tables.all(), tables.dictionary(), "1.0", out);
            });
            return List.of(new Row("report of 100 zones as PDF", pdf, "s", 20, true),
                    new Row("report of 100 zones as a workbook", workbook, "s", 20, true));
        }
    }

    private static ReportContent content(OfficeStore store) {
        ReportContent content = ReportContent.of(store, RankQuery.ALL, OffsetDateTime.parse("2026-04-01T08:00:00Z"),
                Progress.NONE).orElseThrow();
        if (content.examined().size() != ZONES) {
            throw new IllegalStateException("only " + content.examined().size() + " zones were judged");
        }
        return content;
    }

    private static OfficeStore store(Path folder) {
        Path tablet = folder.resolve("tablet");
        Bundle bundle = BundleReader.read(BenchPlant.bundle(ZONES).getBytes(StandardCharsets.UTF_8));
        Path pack = folder.resolve("round.zip");
        PackWriter.write(bundle, (name, sha256) -> Optional.empty(), DeviceKey.of(tablet), pack, Progress.NONE);
        OfficeStore store = OfficeStore.open(folder.resolve("office"), OfficeOptions.of(Clock.systemUTC()));
        store.trust(DeviceKey.of(tablet).fingerprint().text(), "", "bench");
        store.receive(List.of(pack), "bench", Progress.NONE);
        return store;
    }

    /** Something that is written to a file. */
    private interface Writing {
        void to(OutputStream out) throws IOException;
    }

    private static double seconds(Path file, Writing writing) throws IOException {
        long begun = System.nanoTime();
        try (OutputStream out = Files.newOutputStream(file)) {
            writing.to(out);
        }
        return (System.nanoTime() - begun) / 1e9;
    }
}
