package bedmark.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.command.Terminal.Result;
import bedmark.index.Store;
import bedmark.index.StoreOptions;
import java.io.IOException;
import java.io.RandomAccessFile;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.zip.ZipEntry;
import java.util.zip.ZipOutputStream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** What a person gets to read who hands a command the wrong thing. */
class BadInputTest {
    private static final String BUNDLE = "src/test/resources/bedmark/json/bundle.json";

    @TempDir
    private Path temp;
    private String text;

    @BeforeEach
    void readTheSoundBundle() throws IOException {
        text = Files.readString(Path.of(BUNDLE));
    }

    private Path file(byte[] content) throws IOException {
        return Files.write(temp.resolve("round.json"), content);
    }

    private static void assertSentence(Result result, String said) {
        assertEquals(ExitCode.UNREADABLE, result.code(), result.err());
        assertEquals(1, result.err().lines().count(), result.err());
        assertTrue(result.err().startsWith("bedmark: "), result.err());
        assertTrue(result.err().stripTrailing().endsWith("."), result.err());
        assertTrue(result.err().contains(said), result.err());
        assertFalse(result.err().contains("Exception"), result.err());
        assertEquals("", result.out());
    }

    private void assertAssessSays(byte[] content, String said) throws IOException {
        Path file = file(content);
        Result result = Terminal.run("assess", file.toString());
        assertSentence(result, said);
        assertTrue(result.err().contains(file + ": "), result.err());
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '~', value = {
        "\"version\": 1, | \"version\": 1,, | Line 3, column 16: this is no JSON",
        "0.1280 | NaN | Line 17, column",
        "0.1280 | 1e999999999 | the number 1e999999999 is too large",
        "\"id\": \"quarry\", | \"id\": \"quarry\", \"id\": \"q\", | the key \"id\" stands twice",
        "Demo quarry | \\ud800 | half of a surrogate pair",
        "\"format\": \"bedmark.bundle\", | ~~ | the key \"format\" is missing",
        "\"version\": 1, | \"version\": 2, | At /version (3:14): version 2 is not known",
        "\"unit\": \"kg/m3\" | \"unit\": \"kg/m2\" | /plant/materials/0/bulkDensity/unit (18:",
        "{\"value\": 20.0, | {\"value\": -20.0, | /surveys/0/readings/loadingZoneLength/value (",
        "\"transfer\": \"t1\",\\n      \"form\" | \"transfer\": \"t9\",\\n      \"form\" | transfer point \"t9\"",
        "\"troughAngle\": {\"value\": 35, | \"troughAngle\": {\"value\": 95, | /plant/conveyors/0/troughAngle (31:",
        "\"troughAngle\": {\"value\": 35, | \"troughAngle\": {\"value\": 95, | 95 deg can't be; enter 0 deg to 89 deg",
        "\"skirtSpacing\": {\"value\": 600, | \"skirtSpacing\": {\"value\": 1200, | wing rolls, which end at 0.79873 m",
        "0.1280 | 1e99 | /plant/materials/0/skirtFrictionFactor (17:",
        "\"near\": 0.8, | \"near\": 1.8, | the near limit 1.8 lies beyond the overloaded one 0.95",
        "\"supersedes\": null | \"supersedes\": \"0b2f6c1e-6f0e-4f6f-9a70-0d0e3f8f1a03\" | revision is not lower",
        "\"worn\", \"length\": {\"value\": 20, | \"worn\", \"length\": {\"value\": 15, | left side add up to 4.572 m",
        "\"position\": {\"value\": 3, | \"position\": {\"value\": 7, | beyond the zone",
        "\"position\": {\"value\": 3, | \"position\": {\"value\": 0.0, | there is a station at"})
    void impossibleBundleNamesPlaceAndRemedy(String was, String becomes, String said) throws IOException {
        String old = was.replace("\\n", "\n");
        assertTrue(text.contains(old), old);
        String changed = text.replace(old, becomes == null ? "" : becomes.replace("\\n", "\n"));
        assertAssessSays(changed.getBytes(StandardCharsets.UTF_8), said);
    }

    @Test
    void whatIsNoTextIsSaidSo() throws IOException {
        assertAssessSays(new byte[0], "an object in braces is expected here");
        assertAssessSays(text.substring(0, 900).getBytes(StandardCharsets.UTF_8), "ends before the object does");
        assertAssessSays((text + "x").getBytes(StandardCharsets.UTF_8), "this is no JSON");
        assertAssessSays((text + "{}").getBytes(StandardCharsets.UTF_8), "something follows");
        assertAssessSays(text.getBytes(StandardCharsets.UTF_16), "not valid UTF-8");
        assertAssessSays(("{\n\"a\": " + "[".repeat(5000)).getBytes(StandardCharsets.UTF_8), "Line 2, column");
    }

    @Test
    void archiveThatIsNoPackIsSaidSo() throws IOException {
        Path zip = temp.resolve("photos.zip");
        try (ZipOutputStream out = new ZipOutputStream(Files.newOutputStream(zip))) {
            out.putNextEntry(new ZipEntry("a.txt"));
        }
        assertSentence(Terminal.run("assess", zip.toString()), zip + ": The pack lacks bagit.txt");
        assertSentence(Terminal.run("pack", "verify", zip.toString()), zip + ": The pack lacks bagit.txt");
    }

    @Test
    void folderWithoutBundlesIsSaidSo() {
        assertSentence(Terminal.run("assess", temp.toString()), "holds no bundle");
    }

    @ParameterizedTest
    @ValueSource(strings = {"\uFEFF%s", "%s\r\n \n"})
    void markAndSpaceAroundTheTextChangeNothing(String around) throws IOException {
        Path file = file(String.format(around, text.replace("\n", "\r\n")).getBytes(StandardCharsets.UTF_8));
        assertEquals(Terminal.run("assess", BUNDLE, "--json"), Terminal.run("assess", file.toString(), "--json"));
    }

    @Test
    void textOfABundleDoesNotCommandTheTerminal() throws IOException {
        Path file = file(text.replace("\"CV-1 tail\"", "\"CV-1\\u001b[2J\\ntail\\u202e\"")
                .getBytes(StandardCharsets.UTF_8));
        String printed = Terminal.run("assess", file.toString()).out();
        assertTrue(printed.contains("CV-1 [2J tail "), printed);
        assertFalse(printed.contains("\u001b"), printed);
    }

    /** A file that announces more than memory holds, and takes no room on the disk. */
    private Path huge(String name) throws IOException {
        Path file = temp.resolve(name);
        try (RandomAccessFile made = new RandomAccessFile(file.toFile(), "rw")) {
            made.setLength(3L << 30);
        }
        return file;
    }

    @Test
    void fileThatIsTooLargeIsSaidSoBeforeMemoryEnds() throws IOException {
        Path file = huge("round.json");
        assertSentence(Terminal.run("assess", file.toString()), file + ": the file is larger than 256 MB");
        Path form = huge("forms.json");
        Result checked = Terminal.run("forms", "check", temp.toString());
        assertEquals(ExitCode.UNREADABLE, checked.code());
        assertTrue(checked.err().contains(form.getFileName() + ": the file is larger than 64 MB"), checked.err());
        assertTrue(Terminal.run("reference", "check", temp.toString()).err().contains("this name is not one"));
        huge("limits.json");
        assertTrue(Terminal.run("reference", "check", temp.toString()).err().contains("larger than 64 MB"));
    }

    @Test
    void shortMemoryIsSaidInOneSentence() {
        assertSentence(Terminal.run(file -> {
            throw new OutOfMemoryError();
        }, BUNDLE), "not enough memory");
    }

    @Test
    void fileInThePlaceOfAFolderIsSaidToBeOne() throws IOException {
        String plain = Files.createFile(temp.resolve("plain")).toString();
        String[][] lines = {{"forms", "check", plain}, {"reference", "check", plain}, {"store", "check", plain},
            {"store", "rebuild", plain}, {"office", "check", plain}, {"support", plain, "--out", plain + "2"},
            {"store", "backup", plain, "--to", temp.toString()}, {"store", "receipt", plain, plain},
            {"store", "restore", plain, "--to", plain + "2"}, {"store", "restore", temp.toString(), "--to", plain}};
        for (String[] line : lines) {
            assertSentence(Terminal.run(line), plain + ": this is a file; name a folder");
        }
    }

    @Test
    void pathIsSaidOnceAndInOneLine() throws IOException {
        Path pack = Files.createFile(temp.resolve("ma\nrch \u00e9.zip"));
        Result read = Terminal.run("pack", "verify", pack.toString());
        assertSentence(read, "ma rch \u00e9.zip: The file is no ZIP file");
        Path receipt = temp.resolve("none.receipt.json");
        String store = temp.resolve("store").toString();
        Store.open(Path.of(store), StoreOptions.of("tablet")).close();
        Result absent = Terminal.run("store", "receipt", store, receipt.toString());
        assertSentence(absent, "There is no receipt file " + receipt);
        assertEquals(absent.err().indexOf(receipt.toString()), absent.err().lastIndexOf(receipt.toString()));
        Path folder = Files.createDirectory(temp.resolve("li\nne"));
        assertEquals(1, Terminal.run("reference", "check", folder.toString()).err().lines().count());
        Result written = Terminal.run("reference", "write", folder.toString());
        assertEquals(10, written.out().lines().count(), written.out());
        Result sound = Terminal.run("reference", "check", folder.toString());
        assertEquals(1, sound.out().lines().count(), sound.out());
    }

    @Test
    void packIsMadeFromFoldersThatAreThere() throws IOException {
        String nowhere = temp.resolve("nowhere").toString();
        String out = temp.resolve("round.zip").toString();
        assertSentence(Terminal.run("pack", "make", BUNDLE, "--photos", nowhere, "--out", out, "--store",
                temp.resolve("store").toString()), nowhere + ": there is no such folder");
        Path plain = Files.createFile(temp.resolve("plain"));
        assertSentence(Terminal.run("pack", "make", BUNDLE, "--photos", temp.toString(), "--out", out, "--store",
                plain.toString()), plain + ": this is a file; name a folder");
    }
}
