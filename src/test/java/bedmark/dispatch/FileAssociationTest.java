package bedmark.dispatch;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.office.Offices;
import bedmark.pack.Receipt;
import bedmark.pack.ReceiptWriter;
import bedmark.pack.RoundFile;
import java.nio.file.FileSystems;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;
import java.util.function.Predicate;
import javax.xml.parsers.DocumentBuilderFactory;
import org.junit.jupiter.api.Test;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;

/** What the installed package tells the desktop fits the names that tablets and offices give their files. */
class FileAssociationTest {
    private static final Path PACKAGE = Path.of("src", "main", "package");
    private static final String PACK = "application/vnd.bedmark.pack+zip";
    private static final String ROUND = "application/vnd.bedmark.round+json";
    private static final String RECEIPT = "application/vnd.bedmark.receipt+json";

    /** Each type with its patterns, as the shared MIME-info specification has them. */
    private static Map<String, List<Element>> types() throws Exception {
        DocumentBuilderFactory factory = DocumentBuilderFactory.newInstance();
        Document document = factory.newDocumentBuilder().parse(PACKAGE.resolve("bedmark-mime.xml").toFile());
        Map<String, List<Element>> types = new LinkedHashMap<>();
        for (Element type : elements(document.getElementsByTagName("mime-type"))) {
            types.put(type.getAttribute("type"), elements(type.getElementsByTagName("glob")));
        }
        return types;
    }

    private static List<Element> elements(NodeList nodes) {
        List<Element> elements = new ArrayList<>();
        for (int i = 0; i < nodes.getLength(); i++) {
            elements.add((Element) nodes.item(i));
        }
        return elements;
    }

    /** The type of a name, by those patterns that a desktop takes. */
    private static Optional<String> type(String name, Predicate<String> taken) throws Exception {
        return types().entrySet().stream().filter(type -> type.getValue().stream()
                .map(glob -> glob.getAttribute("pattern")).filter(taken).anyMatch(pattern ->
                        FileSystems.getDefault().getPathMatcher("glob:" + pattern).matches(Path.of(name))))
                .map(Map.Entry::getKey).findFirst();
    }

    private static String pack() {
        return Dispatch.fileName(Offices.sample("round-2026-03"));
    }

    @Test
    void packsAndRoundFilesAreTheProgramsOwnByTheEndsOfTheirNamesAlone() throws Exception {
        Predicate<String> ending = pattern -> pattern.matches("\\*[^*?\\[]+");
        assertEquals(Optional.of(PACK), type(pack(), ending));
        assertEquals(Optional.of(ROUND), type("ostermere-2026-10-01" + RoundFile.ENDING, ending));
    }

    @Test
    void receiptsAndPacksOfEarlierVersionsAreTheProgramsOwnByTheirWholeNames() throws Exception {
        Receipt receipt = Receipt.of(UUID.randomUUID(), OffsetDateTime.now(Offices.NOW),
                new Receipt.Office(UUID.randomUUID(), ""), UUID.randomUUID(), "0".repeat(64), List.of());
        assertEquals(Optional.of(RECEIPT), type(ReceiptWriter.fileName(receipt), pattern -> true));
        assertEquals(Optional.of(PACK), type(pack().replace(".pack.zip", ".zip"), pattern -> true));
    }

    @Test
    void otherArchivesAndDocumentsAreLeftAlone() throws Exception {
        for (String name : List.of("holiday.zip", "bedmark.zip", "bedmark-photos-2026.zip", "invoice.receipt.json",
                "round.json", "package.json")) {
            assertEquals(Optional.empty(), type(name, pattern -> true), name);
        }
    }

    @Test
    void patternsWeighMoreThanThatOfAnyArchive() throws Exception {
        types().values().forEach(globs -> globs.forEach(glob ->
                assertTrue(Integer.parseInt(glob.getAttribute("weight")) > 50, "50 is what a pattern weighs unsaid")));
    }

    @Test
    void desktopEntryTakesAFileOfEveryType() throws Exception {
        List<String> entry = Files.readAllLines(PACKAGE.resolve("deb/bedmark.desktop"));
        assertTrue(entry.contains("MimeType=" + String.join(";", types().keySet()) + ";"), entry.toString());
        assertTrue(entry.contains("Exec=APPLICATION_LAUNCHER %f"), entry.toString());
    }
}
