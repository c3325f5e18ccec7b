package bedmark.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.office.OfficeStore;
import bedmark.quantity.UnitSystem;
import bedmark.report.paper.PaperSize;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.StreamSupport;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.contentstream.operator.Operator;
import org.apache.pdfbox.cos.COSArray;
import org.apache.pdfbox.cos.COSBase;
import org.apache.pdfbox.cos.COSDictionary;
import org.apache.pdfbox.cos.COSInteger;
import org.apache.pdfbox.cos.COSName;
import org.apache.pdfbox.cos.COSObject;
import org.apache.pdfbox.pdfparser.PDFStreamParser;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.PDPage;
import org.apache.pdfbox.pdmodel.font.PDFont;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.verapdf.gf.foundry.VeraGreenfieldFoundryProvider;
import org.verapdf.pdfa.Foundries;
import org.verapdf.pdfa.PDFAParser;
import org.verapdf.pdfa.flavours.PDFAFlavour;
import org.verapdf.pdfa.results.TestAssertion;
import org.verapdf.pdfa.results.ValidationResult;

/** What a screen reader and an archive need of the report (after ISO 14289-1), found again in the written file. */
class AccessiblePdfTest {
    private static final Set<String> TYPES = Set.of("Document", "H1", "H2", "H3", "P", "L", "LI", "LBody", "Table",
            "THead", "TBody", "TR", "TH", "TD", "Figure", "Caption");

    @TempDir
    static Path folder;
    private static byte[] written;
    private static PDDocument document;

    @BeforeAll
    static void write() throws IOException {
        try (OfficeStore store = Reports.demo(folder)) {
            written = Reports.pdf(Reports.content(store), Reports.options(Reports.SPANISH, UnitSystem.METRIC,
                    PaperSize.A4, Reports.photos(store)));
            document = Loader.loadPDF(written);
        }
    }

    @AfterAll
    static void close() throws IOException {
        document.close();
    }

    /** The rules of ISO 14289-1 (PDF/UA-1) that a machine can check, by their reference validator. */
    @Test
    void theValidatorFindsNothingAgainstTheStandard() throws Exception {
        VeraGreenfieldFoundryProvider.initialise();
        try (PDFAParser parser = Foundries.defaultInstance().createParser(new ByteArrayInputStream(written),
                PDFAFlavour.PDFUA_1)) {
            ValidationResult result = Foundries.defaultInstance().createValidator(PDFAFlavour.PDFUA_1, false)
                    .validate(parser);
            assertTrue(result.getTotalAssertions() > 10_000);
            assertEquals(List.of(), result.getTestAssertions().stream()
                    .filter(one -> one.getStatus() == TestAssertion.Status.FAILED)
                    .map(one -> one.getRuleId().getClause() + " " + one.getMessage()).distinct().toList());
            assertTrue(result.isCompliant());
        }
    }

    private static List<COSDictionary> elements() {
        List<COSDictionary> found = new ArrayList<>();
        gather(document.getDocumentCatalog().getStructureTreeRoot().getCOSObject().getDictionaryObject(COSName.K),
                found);
        return found;
    }

    private static void gather(COSBase kid, List<COSDictionary> found) {
        COSBase base = kid instanceof COSObject object ? object.getObject() : kid;
        if (base instanceof COSArray array) {
            array.forEach(one -> gather(one, found));
        } else if (base instanceof COSDictionary element && element.containsKey(COSName.S)) {
            found.add(element);
            gather(element.getDictionaryObject(COSName.K), found);
        }
    }

    @Test
    void theDocumentSaysItsTitleItsLanguageAndThatItIsTagged() throws IOException {
        assertTrue(document.getDocumentCatalog().getMarkInfo().isMarked());
        assertEquals("es", document.getDocumentCatalog().getLanguage());
        assertTrue(document.getDocumentCatalog().getViewerPreferences().displayDocTitle());
        assertEquals("Zonas de carga: Ostermere Lime and Clinker Works",
                document.getDocumentInformation().getTitle());
        String metadata = new String(document.getDocumentCatalog().getMetadata().toByteArray(),
                StandardCharsets.UTF_8);
        assertTrue(metadata.contains("<pdfuaid:part>1</pdfuaid:part>"));
        assertTrue(metadata.contains("Zonas de carga: Ostermere"));
    }

    @Test
    void everyElementIsOfAStandardTypeAndOneIsTheTitle() {
        List<String> types = elements().stream().map(one -> one.getNameAsString(COSName.S)).toList();
        assertTrue(TYPES.containsAll(types), () -> types.toString());
        assertEquals(1, types.stream().filter("H1"::equals).count());
        assertTrue(types.stream().filter("Table"::equals).count() > 3);
    }

    @Test
    void everyFigureIsToldInWords() {
        List<COSDictionary> figures = elements().stream()
                .filter(one -> one.getNameAsString(COSName.S).equals("Figure")).toList();
        assertTrue(figures.size() > 7);
        assertTrue(figures.stream().allMatch(one -> one.getString(COSName.ALT).length() > 5));
    }

    @Test
    void everyRowHasACellForEachColumn() {
        for (COSDictionary table : elements()) {
            if (table.getNameAsString(COSName.S).equals("Table")) {
                List<COSDictionary> inside = new ArrayList<>();
                gather(table, inside);
                Set<Integer> widths = new HashSet<>();
                inside.stream().filter(one -> one.getNameAsString(COSName.S).equals("TR"))
                        .forEach(row -> widths.add(row.getCOSArray(COSName.K).size()));
                assertEquals(1, widths.size());
            }
        }
    }

    /** Everything on a page is content of an element or an artifact, and the tree and the pages name each other. */
    @Test
    void nothingOnAPageIsLeftOut() throws IOException {
        COSArray numbers = document.getDocumentCatalog().getStructureTreeRoot().getCOSObject()
                .getCOSDictionary(COSName.PARENT_TREE).getCOSArray(COSName.getPDFName("Nums"));
        int number = 0;
        for (PDPage page : document.getPages()) {
            COSArray parents = (COSArray) numbers.getObject(2 * number + 1);
            assertEquals(number, page.getCOSObject().getInt(COSName.STRUCT_PARENTS));
            Set<Integer> contents = new HashSet<>();
            boolean inside = false;
            List<COSBase> operands = new ArrayList<>();
            PDFStreamParser parser = new PDFStreamParser(page);
            for (Object token = parser.parseNextToken(); token != null; token = parser.parseNextToken()) {
                if (!(token instanceof Operator operator)) {
                    operands.add((COSBase) token);
                    continue;
                }
                String name = operator.getName();
                if (name.equals("BDC")) {
                    contents.add(((COSDictionary) operands.get(1)).getInt(COSName.MCID));
                }
                assertFalse(inside && (name.equals("BDC") || name.equals("BMC")), "contents do not lie in each other");
                inside = name.equals("BDC") || name.equals("BMC") || inside && !name.equals("EMC");
                assertTrue(inside || name.equals("EMC"), () -> "left out: " + name);
                operands.clear();
            }
            assertEquals(parents.size(), contents.size());
            for (int content : contents) {
                COSDictionary element = (COSDictionary) parents.getObject(content);
                assertTrue(names(element, content, page.getCOSObject()), "content " + content);
            }
            number++;
        }
    }

    private static boolean names(COSDictionary element, int content, COSDictionary page) {
        return StreamSupport.stream(element.getCOSArray(COSName.K).spliterator(), false)
                .map(kid -> kid instanceof COSObject object ? object.getObject() : kid).anyMatch(kid ->
                        kid instanceof COSInteger integer ? integer.intValue() == content
                                && element.getCOSDictionary(COSName.PG) == page
                                : kid instanceof COSDictionary one && one.getInt(COSName.MCID) == content
                                        && one.getCOSDictionary(COSName.PG) == page);
    }

    @Test
    void everyFaceIsEmbeddedAndTellsItsCharacters() throws IOException {
        for (PDPage page : document.getPages()) {
            for (COSName name : page.getResources().getFontNames()) {
                PDFont font = page.getResources().getFont(name);
                assertTrue(font.isEmbedded(), font.getName());
                assertTrue(font.getCOSObject().containsKey(COSName.TO_UNICODE), font.getName());
            }
        }
    }

    @Test
    void nothingLeadsOutOfTheDocument() {
        document.getDocument().getXrefTable().keySet().forEach(key -> {
            COSBase base = document.getDocument().getObjectFromPool(key).getObject();
            if (base instanceof COSDictionary dictionary) {
                assertFalse(dictionary.containsKey(COSName.URI) || dictionary.containsKey(COSName.JS)
                        || dictionary.containsKey(COSName.EMBEDDED_FILES), () -> key.toString());
            }
        });
    }

    @Test
    void theOutlineLeadsToEachPart() {
        List<String> titles = new ArrayList<>();
        document.getDocumentCatalog().getDocumentOutline().children().forEach(item -> titles.add(item.getTitle()));
        assertEquals(List.of("Resumen", "Las peores zonas", "La planta en energía", "Sin inspeccionar",
                "Todas las zonas de carga, primero las peores", "Método", "El cálculo de cada zona"), titles);
    }
}
