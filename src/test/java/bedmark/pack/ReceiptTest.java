package bedmark.pack;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.json.JsonReader;
import bedmark.json.JsonWriter;
import bedmark.survey.Survey;
import java.io.IOException;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.UUID;
import java.util.function.UnaryOperator;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A receipt says what the office has, and nobody but the office can say it. */
class ReceiptTest {
    private static final UUID PACK = UUID.fromString("11111111-1111-4111-8111-111111111111");

    @TempDir
    Path folder;
    private DeviceKey key;
    private Receipt receipt;

    @BeforeEach
    void prepare() {
        key = DeviceKey.of(folder.resolve("office"));
        List<Receipt.Item> items = Samples.bundle(Map.of("a.png", BagForge.PHOTO)).surveys().stream()
                .map(Receipt.Item::of).toList();
        receipt = Receipt.of(UUID.fromString("22222222-2222-4222-8222-222222222222"),
                OffsetDateTime.parse("2026-03-02T10:15:00+01:00"),
                new Receipt.Office(UUID.fromString("33333333-3333-4333-8333-333333333333"), "Oficina de la planta ñ"),
                PACK, "ab".repeat(32), items);
    }

    private String refusal(byte[] bytes) {
        return assertThrows(Refused.class, () -> ReceiptReader.read(bytes)).defect().code();
    }

    private byte[] signedAs(UnaryOperator<Branch> change) {
        return ReceiptWriter.text(new Receipt(change.apply(receipt.document())), key);
    }

    @Test
    void whatTheOfficeWroteIsReadBackWhole() {
        Path file = ReceiptWriter.write(receipt, key, folder.resolve(ReceiptWriter.fileName(receipt)));
        SignedReceipt read = ReceiptReader.read(file);
        assertEquals(receipt, read.receipt());
        assertEquals(key.fingerprint(), read.fingerprint());
        assertEquals(PACK, read.receipt().pack());
        assertEquals("Oficina de la planta ñ", read.receipt().office().name());
        assertEquals(OffsetDateTime.parse("2026-03-02T10:15:00+01:00"), read.receipt().receivedAt());
        assertEquals(1, read.receipt().items().get(0).revision());
    }

    @Test
    void sameReceiptIsAlwaysTheSameFile() {
        assertArrayEquals(ReceiptWriter.text(receipt, key), ReceiptWriter.text(receipt, key));
    }

    @Test
    void unknownKeysAreKeptAndSigned() {
        SignedReceipt read = ReceiptReader.read(signedAs(document -> document.with("ledger", Node.number(7))));
        assertEquals(BigDecimal.valueOf(7), read.receipt().document().number("ledger").orElseThrow());
    }

    @Test
    void everyFlippedBitIsNoticed() {
        byte[] text = ReceiptWriter.text(receipt, key);
        for (int i = 0; i < text.length; i++) {
            byte[] flipped = text.clone();
            flipped[i] ^= (byte) (1 << i % 8);
            assertThrows(Refused.class, () -> ReceiptReader.read(flipped), "byte " + i);
        }
        for (int length = 0; length < text.length; length++) {
            byte[] cut = Arrays.copyOf(text, length);
            assertThrows(Refused.class, () -> ReceiptReader.read(cut), "cut at " + length);
        }
    }

    @Test
    void anotherSpellingOrAnotherKeyIsRefused() {
        byte[] text = ReceiptWriter.text(receipt, key);
        assertEquals("signed-signature-wrong", refusal(JsonWriter.compact(JsonReader.read(text).root())));
        byte[] other = ReceiptWriter.text(receipt, DeviceKey.of(folder.resolve("other")));
        Branch mixed = JsonReader.read(text).root()
                .with("key", JsonReader.read(other).root().text("key").orElseThrow());
        assertEquals("signed-signature-wrong", refusal(JsonWriter.indented(mixed)));
        assertEquals("signed-key-wrong", refusal(JsonWriter.indented(mixed.with("key", "none"))));
        assertEquals("signed-signature-wrong", refusal(JsonWriter.indented(mixed.with("signature", "?"))));
    }

    @Test
    void whatIsNoReceiptOfThisVersionIsRefused() {
        assertEquals("format-unknown", refusal(signedAs(document -> document.with("format", "bedmark.bundle"))));
        assertEquals("version-unknown", refusal(signedAs(document -> document.with("version", Node.number(2)))));
        assertEquals("value-empty", refusal(signedAs(document -> document.with("surveys", Node.Series.of()))));
        Node item = receipt.document().series("surveys").get(0);
        assertEquals("receipt-survey-twice", refusal(signedAs(document ->
                document.with("surveys", Node.Series.of(item, item)))));
        assertEquals("text-wrong", refusal(signedAs(document ->
                document.with(Pointer.of("pack", "sha256"), Node.text("ab")))));
        assertEquals("key-absent", refusal(JsonWriter.indented(receipt.document())));
    }

    @Test
    void fileThatIsAbsentOrTooLargeIsNamed() throws IOException {
        Path file = folder.resolve("none.json");
        assertEquals("receipt-absent",
                assertThrows(Refused.class, () -> ReceiptReader.read(file)).defect().code());
        Files.writeString(file, " ".repeat(ReceiptReader.LONGEST + 1), StandardCharsets.UTF_8);
        assertEquals("receipt-too-large",
                assertThrows(Refused.class, () -> ReceiptReader.read(file)).defect().code());
        Path gone = folder.resolve("gone/receipt.json");
        assertEquals("receipt-vanished",
                assertThrows(Refused.class, () -> ReceiptWriter.write(receipt, key, gone)).defect().code());
    }

    @Test
    void contentIsWhatWasEnteredAndNotWhereItStandsOrHowItWasJudged() {
        Branch survey = Samples.bundle(Map.of("a.png", BagForge.PHOTO)).surveys().get(0).document()
                .with("readings", JsonReader.read("{\"b\":9.50,\"a\":{\"d\":1,\"c\":2}}".getBytes(
                        StandardCharsets.UTF_8)).root());
        String digest = SurveyContent.sha256(new Survey(survey));
        assertEquals(digest, SurveyContent.sha256(new Survey(survey.with("assessment", Branch.EMPTY)
                .with("readings", JsonReader.read("{\"a\":{\"c\":2,\"d\":1},\"b\":9.50}".getBytes(
                        StandardCharsets.UTF_8)).root()))));
        assertNotEquals(digest, SurveyContent.sha256(new Survey(survey
                .with(Pointer.of("readings", "b"), Node.number(new BigDecimal("9.5"))))));
        assertNotEquals(digest, SurveyContent.sha256(new Survey(survey.with("notes", ""))));
    }
}
