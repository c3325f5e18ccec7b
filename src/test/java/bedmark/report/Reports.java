package bedmark.report;

import bedmark.journal.Progress;
import bedmark.office.OfficeStore;
import bedmark.office.Offices;
import bedmark.office.RankQuery;
import bedmark.quantity.UnitSystem;
import bedmark.report.paper.PaperSize;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Locale;

/** Reports of the demo plant for tests. */
final class Reports {
    static final OffsetDateTime AT = OffsetDateTime.parse("2026-10-01T09:00:00+02:00");
    static final Locale SPANISH = Locale.forLanguageTag("es");

    private Reports() {
    }

    /** An office that holds the demo plant's two rounds. */
    static OfficeStore demo(Path folder) {
        Path tablet = folder.resolve("tablet");
        OfficeStore store = Offices.trusting(folder.resolve("office"), tablet);
        for (String round : List.of("round-2025-09", "round-2026-03", "round-under-way")) {
            store.receive(List.of(Offices.pack(Offices.sample(round), tablet, folder.resolve(round + ".zip"))),
                    "Ida Marsh", Progress.NONE);
        }
        return store;
    }

    static ReportContent content(OfficeStore store) {
        return ReportContent.of(store, RankQuery.ALL, AT, Progress.NONE).orElseThrow();
    }

    static ReportOptions options(Locale language, UnitSystem units, PaperSize paper, ReportPhotos photos) {
        return new ReportOptions(new Wording(new Words(language), units), paper, photos, "Bedmark", Progress.NONE);
    }

    static ReportPhotos photos(OfficeStore store) {
        return (zone, sha256) -> store.photo(zone, sha256);
    }

    static byte[] pdf(ReportContent content, ReportOptions options) {
        try (ByteArrayOutputStream bytes = new ByteArrayOutputStream()) {
            new PdfReport(content, options).write(bytes);
            return bytes.toByteArray();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
