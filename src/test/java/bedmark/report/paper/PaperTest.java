package bedmark.report.paper;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.picture.Face;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.text.PDFTextStripper;
import org.junit.jupiter.api.Test;

class PaperTest {
    private static final Booklet.Imprint IMPRINT = new Booklet.Imprint("A <title> & more\u0000", Locale.ENGLISH, "Bedmark",
            OffsetDateTime.parse("2026-04-01T08:00:00Z"));

    private static String written(String text) throws IOException {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        try (Booklet booklet = new Booklet(PaperSize.A4, IMPRINT)) {
            new Flow(booklet).paragraph("P", text, Lettering.plain(10));
            booklet.write(out, leaf -> { });
        }
        try (PDDocument document = Loader.loadPDF(out.toByteArray())) {
            return new PDFTextStripper().getText(document).strip();
        }
    }

    @Test
    void numbersArePlainWhateverTheLocale() {
        Locale before = Locale.getDefault();
        try {
            Locale.setDefault(Locale.GERMANY);
            assertEquals("0.5", Operators.number(0.5));
            assertEquals("0", Operators.number(-0.000_01));
            assertEquals("12345678.912", Operators.number(12_345_678.912_3));
            assertEquals("100", Operators.number(1e2));
        } finally {
            Locale.setDefault(before);
        }
        assertThrows(IllegalArgumentException.class, () -> Operators.number(Double.NaN));
    }

    @Test
    void whatTheTypefaceLacksIsWrittenInTheSpareOne() throws IOException {
        assertEquals("ρ ≤ √2 · h² − ±½", written("ρ ≤ √2 · h² − ±½"));
        assertEquals("Каменоломня Ωμέγα", written("Каменоломня Ωμέγα"));
    }

    @Test
    void spacesAndHyphensOfOneMeaningAreOne() throws IOException {
        assertEquals("5 kW a-b", written("5\u202FkW a\u2011b").replace('\u00A0', ' '));
    }

    @Test
    void whatNoFaceKnowsIsMarkedAndWhatCommandsIsASpace() throws IOException {
        assertEquals("a\uFFFDb", written("a\uD83D\uDEA7b"));
        assertEquals("a b", written("a\u202Eb"));
    }

    /** Every sign of the words and formulas that a report may hold has a glyph in a face. */
    @Test
    void everySignOfTheWordsHasAGlyph() throws IOException {
        Set<Integer> signs = new TreeSet<>();
        try (Stream<Path> files = Files.walk(Path.of("src/main"))) {
            for (Path file : files.filter(path -> path.toString().contains("words")
                    || path.toString().contains("engine")).filter(Files::isRegularFile).toList()) {
                Files.readString(file).codePoints().filter(sign -> sign > ' ').forEach(signs::add);
            }
        }
        try (PDDocument document = new PDDocument()) {
            Faces faces = new Faces(document);
            String all = signs.stream().map(Character::toString).collect(Collectors.joining());
            assertTrue(signs.contains((int) 'ρ') && signs.contains((int) '≤'));
            for (Face face : Face.values()) {
                long unknown = all.codePoints().filter(sign -> faces.runs(Character.toString(sign), face).stream()
                        .anyMatch(run -> run.codes().equals(faces.runs("\uFFFD", face).get(0).codes()))).count();
                assertEquals(0, unknown, face.toString());
            }
        }
    }

    @Test
    void brokenLinesFitAndLoseNothing() throws IOException {
        try (Booklet booklet = new Booklet(PaperSize.LETTER, IMPRINT)) {
            Flow flow = new Flow(booklet);
            Random random = new Random(7);
            for (int i = 0; i < 300; i++) {
                String text = random.ints(1 + random.nextInt(80), 0, 30).mapToObj(sign -> sign < 4 ? " "
                        : Character.toString('a' + sign - 4)).collect(Collectors.joining());
                double width = 12 + random.nextInt(200);
                List<String> lines = flow.broken(text, Lettering.plain(9), width);
                assertEquals(text.replace(" ", ""), String.join("", lines).replace(" ", ""));
                lines.forEach(line -> assertTrue(flow.measured(line, Lettering.plain(9)) <= width
                        || line.length() == 1, line));
            }
        }
    }

    @Test
    void aTableGoesOnUnderItsHead() throws IOException {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        try (Booklet booklet = new Booklet(PaperSize.A4, IMPRINT)) {
            Flow flow = new Flow(booklet);
            new Grid(flow, List.of(Grid.Column.text("Name of it", 1), Grid.Column.number("Number", 1)), 10).set(
                    Stream.iterate(1, i -> i + 1).limit(100).map(i -> List.of(Grid.Cell.of("row " + i),
                            Grid.Cell.of(Integer.toString(i)))).toList());
            booklet.write(out, leaf -> { });
        }
        try (PDDocument document = Loader.loadPDF(out.toByteArray())) {
            assertTrue(document.getNumberOfPages() > 2);
            for (int page = 1; page <= document.getNumberOfPages(); page++) {
                PDFTextStripper stripper = new PDFTextStripper();
                stripper.setStartPage(page);
                stripper.setEndPage(page);
                assertTrue(stripper.getText(document).startsWith("Name of it Number"), "page " + page);
            }
        }
    }
}
