package bedmark.report;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.engine.Result;
import bedmark.journal.Progress;
import bedmark.office.JudgedZone;
import bedmark.office.OfficeStore;
import bedmark.office.Offices;
import bedmark.office.Place;
import bedmark.quantity.UnitSystem;
import bedmark.report.paper.PaperSize;
import bedmark.report.table.CsvTable;
import bedmark.survey.Bundle;
import bedmark.wording.Telling;
import bedmark.wording.Told;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.regex.Pattern;
import java.util.stream.IntStream;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.text.PDFTextStripper;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class PdfReportTest {
    private static final int CAPTION_WORDS = 200;

    @TempDir
    static Path folder;
    private static OfficeStore store;
    private static ReportContent content;
    private static byte[] english;
    private static byte[] spanish;

    @BeforeAll
    static void write() {
        store = Reports.demo(folder);
        content = Reports.content(store);
        english = Reports.pdf(content, options(Locale.ENGLISH, UnitSystem.METRIC, PaperSize.A4));
        spanish = Reports.pdf(content, options(Reports.SPANISH, UnitSystem.US, PaperSize.LETTER));
    }

    @AfterAll
    static void close() {
        store.close();
    }

    private static ReportOptions options(Locale language, UnitSystem units, PaperSize paper) {
        return Reports.options(language, units, paper, Reports.photos(store));
    }

    /** The text of each page, spaces of all kinds as one. */
    private static List<String> pages(byte[] pdf) throws IOException {
        try (PDDocument document = Loader.loadPDF(pdf)) {
            List<String> pages = new ArrayList<>();
            for (int i = 1; i <= document.getNumberOfPages(); i++) {
                PDFTextStripper stripper = new PDFTextStripper();
                stripper.setStartPage(i);
                stripper.setEndPage(i);
                pages.add(plain(stripper.getText(document)));
            }
            return pages;
        }
    }

    private static String plain(String text) {
        return text.replaceAll("[\\s\\u00A0]+", " ").strip();
    }

    @Test
    void everyZoneStandsInItWithItsNumbers() throws IOException {
        check(english, new Wording(new Words(Locale.ENGLISH), UnitSystem.METRIC), "Working of ");
        check(spanish, new Wording(new Words(Reports.SPANISH), UnitSystem.US), "Cálculo de ");
    }

    /** A zone that is overloaded by its own register, and that another one would not judge so. */
    private static ReportZone rejudged() {
        ReportZone zone = content.at(Place.OVERLOADED).get(0);
        Examined own = zone.examined().orElseThrow();
        JudgedZone judged = own.judged();
        JudgedZone today = new JudgedZone(judged.zone(), judged.copy(), judged.survey(), judged.register(),
                content.at(Place.WITHIN).get(0).examined().orElseThrow().assessment());
        return new ReportZone(zone.ranked(), Optional.of(new Examined(judged, Optional.of(today), own.assessor(),
                own.form())), Optional.empty());
    }

    @Test
    void aZoneThatTodaysRegisterJudgesOtherwiseSaysBoth() throws IOException {
        ReportZone zone = rejudged();
        ReportContent one = new ReportContent(Reports.AT, List.of(), List.of(zone));
        ReportOptions options = options(Locale.ENGLISH, UnitSystem.METRIC, PaperSize.A4);
        String page = pages(Reports.pdf(one, options)).stream().filter(text -> text.startsWith("Working of "
                + zone.tag())).findFirst().orElseThrow();
        assertTrue(page.contains("Latest survey: Overloaded by the register that it was made with, Within limits by "
                + "today's."), page);
        assertTrue(page.contains("Bed against the depth laid out: Overloaded then, Within limits by today's."), page);
        StringBuilder csv = new StringBuilder();
        CsvTable.write(new ReportTables(one, options).zones(), csv);
        assertTrue(csv.toString().contains(",level,levelAtDesignFeed,levelByToday,"), csv::toString);
        assertTrue(Pattern.compile(",overloaded,overloaded,[a-z]*,within,").matcher(csv).find(), csv::toString);
        assertTrue(pages(english).stream().noneMatch(text -> text.contains("by the register that it was made with")),
                "nothing is said where both agree");
    }

    @Test
    void aLongCaptionLeavesThePhotoItsRoom(@TempDir Path beside) throws IOException {
        Path tablet = beside.resolve("tablet");
        Branch round = Offices.sample("round-under-way").document();
        List<Node> surveys = round.branches("surveys").stream().<Node>map(survey -> survey.with("photos",
                new Node.Series(survey.branches("photos").stream().<Node>map(photo -> photo.with("caption",
                        "spillage ".repeat(CAPTION_WORDS).strip())).toList()))).toList();
        try (OfficeStore other = Offices.trusting(beside.resolve("office"), tablet)) {
            other.receive(List.of(Offices.pack(new Bundle(round.with("surveys", new Node.Series(surveys))), tablet,
                    beside.resolve("round.zip"))), "Ida Marsh", Progress.NONE);
            byte[] pdf = Reports.pdf(Reports.content(other), Reports.options(Locale.ENGLISH, UnitSystem.METRIC,
                    PaperSize.A4, Reports.photos(other)));
            List<String> captioned = pages(pdf).stream().filter(page -> page.contains("spillage spillage")).toList();
            assertFalse(captioned.isEmpty());
            for (String page : captioned) {
                int words = page.split("spillage", -1).length - 1;
                assertTrue(words < CAPTION_WORDS, () -> "the whole caption: " + words + " words");
                assertTrue(Pattern.compile("spi?l?l?a?g?e?…").matcher(page).find(), page);
            }
        }
    }

    private static void check(byte[] pdf, Wording wording, String working) throws IOException {
        List<String> pages = pages(pdf);
        assertEquals(24, content.zones().size());
        for (ReportZone zone : content.zones()) {
            Examined examined = zone.examined().orElseThrow();
            List<String> own = pages.stream().filter(page -> page.startsWith(working + zone.tag())).toList();
            assertEquals(1, own.size(), zone.tag());
            double drag = examined.assessment().get(Result.SKIRT_DRAG).orElseThrow().value();
            BigDecimal digits = new BigDecimal(drag).round(new MathContext(4, RoundingMode.HALF_EVEN))
                    .stripTrailingZeros();
            String newtons = "F = Fm \\+ Fs" + ".* = " + Pattern.quote(plain(wording.format().exact(
                    digits.scale() < 0 ? digits.setScale(0) : digits))) + " N.*";
            assertTrue(own.get(0).contains(examined.transfer().from().orElse("")), zone.tag());
            assertTrue(own.get(0).matches(".*" + newtons), newtons);
        }
        for (ReportZone zone : content.at(Place.OVERLOADED)) {
            Told told = new Telling(wording, zone.examined().orElseThrow().form())
                    .tell(zone.examined().orElseThrow().assessment());
            String page = pages.stream().filter(text -> text.contains("· " + zone.tag())).findFirst().orElseThrow();
            told.figures().forEach(figure -> assertTrue(page.contains(plain(figure.number() + " " + figure.rest())),
                    figure + " of " + zone.tag()));
            assertTrue(page.contains(plain(told.sentence())) || page.contains(plain(told.sentence())
                    .substring(0, 40)), told.sentence());
        }
    }

    @Test
    void theWorkingOfAZoneTakesOnePage() throws IOException {
        for (byte[] pdf : List.of(english, spanish)) {
            List<String> pages = pages(pdf);
            int first = IntStream.range(0, pages.size()).filter(i -> pages.get(i).startsWith("Working of")
                    || pages.get(i).startsWith("Cálculo de")).findFirst().orElseThrow();
            assertEquals(content.examined().size(), pages.size() - first);
        }
    }

    @Test
    void pagesAreNumbered() throws IOException {
        List<String> pages = pages(english);
        for (int i = 0; i < pages.size(); i++) {
            assertTrue(pages.get(i).endsWith("Page " + (i + 1) + " of " + pages.size()), pages.get(i));
        }
    }

    @Test
    void whatWasNotInspectedIsNamedWithItsReason() throws IOException {
        String text = String.join("\n", pages(english));
        assertTrue(content.at(Place.NOT_INSPECTED).size() > 2);
        assertTrue(text.contains("Not accessible: walkway buried under chips"));
    }

    @Test
    void theCautionAndTheSourcesStandInIt() throws IOException {
        String text = String.join("\n", pages(english));
        assertTrue(text.contains("A running belt kills."));
        assertTrue(text.contains("JCGM 100"));
        assertTrue(text.contains("not a design or a licensed engineer's sign-off"));
    }

    @Test
    void theSameReportIsTheSameBytes() {
        assertArrayEquals(english, Reports.pdf(content, options(Locale.ENGLISH, UnitSystem.METRIC, PaperSize.A4)));
    }

    @Test
    void aReportOfNothingSaysSo() throws IOException {
        ReportContent nothing = new ReportContent(Reports.AT, List.of(), List.of());
        String text = String.join("\n", pages(Reports.pdf(nothing, Reports.options(Locale.ENGLISH, UnitSystem.METRIC,
                PaperSize.A4, ReportPhotos.NONE))));
        assertTrue(text.contains("nothing surveyed yet"));
        assertTrue(text.contains("No loading zone of 0 is overloaded."));
        assertFalse(text.contains("NaN"));
    }

    @Test
    void aStoppedReportIsNotWritten() throws IOException {
        ReportOptions stopped = new ReportOptions(new Wording(new Words(Locale.ENGLISH), UnitSystem.METRIC),
                PaperSize.A4, ReportPhotos.NONE, "Bedmark", new Progress() {
                    @Override
                    public void at(long done, long total) {
                        assertTrue(done <= total);
                    }

                    @Override
                    public boolean cancelled() {
                        return true;
                    }
                });
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        assertFalse(new PdfReport(content, stopped).write(out));
        assertEquals(0, out.size());
    }
}
