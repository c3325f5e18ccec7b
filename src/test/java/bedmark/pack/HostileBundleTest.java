package bedmark.pack;

import static org.junit.jupiter.api.Assertions.assertEquals;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.journal.Progress;
import bedmark.json.JsonWriter;
import bedmark.survey.Bundle;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.math.BigDecimal;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import java.util.zip.CRC32;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.junit.jupiter.api.io.TempDir;

/** Sound, signed bags whose bundle or photos are not. */
class HostileBundleTest {
    @TempDir
    static Path store;
    private static DeviceKey key;

    @TempDir
    Path folder;
    private BagForge bag;

    @BeforeAll
    static void makeKey() {
        key = DeviceKey.of(store);
    }

    @BeforeEach
    void makeBag() {
        bag = new BagForge(key);
    }

    private void refused(String code, byte[] bundle) throws IOException {
        bag.payload.put("data/bundle.json", bundle);
        Packs.assertRefused(code, folder, ZipForge.of(bag.files()).build());
    }

    private void refused(String code, Branch bundle) throws IOException {
        refused(code, JsonWriter.indented(bundle));
    }

    /** Only the photo is another; the bundle names it rightly. */
    private void refusedPhoto(String code, byte[] photo) throws IOException {
        bag.payload.put("data/photos/a.png", photo);
        refused(code, Samples.bundle(Map.of("a.png", photo)).document());
    }

    @TestFactory
    Stream<DynamicTest> whatIsNoStrictJsonIsRefused() {
        String sound = new String(bag.payload.get("data/bundle.json"), StandardCharsets.UTF_8);
        Map<String, String> texts = new LinkedHashMap<>();
        texts.put("key twice", sound.replaceFirst("\\{", "{\"version\": 1,"));
        texts.put("depth", sound.replaceFirst("\\{", "{\"x\": " + "[".repeat(5000) + "]".repeat(5000) + ","));
        texts.put("huge exponent", sound.replaceFirst("\"version\": 1", "\"version\": 1e999999999"));
        texts.put("exponent beyond a decimal", sound.replaceFirst("\"version\": 1", "\"version\": 1e99999999999"));
        texts.put("not a number", sound.replaceFirst("\"version\": 1", "\"version\": NaN"));
        texts.put("lone surrogate", sound.replaceFirst("\"t1\"", "\"\\\\ud800\""));
        texts.put("trailing text", sound + "{}");
        texts.put("cut off", sound.substring(0, sound.length() - 3));
        return texts.entrySet().stream().map(text -> DynamicTest.dynamicTest(text.getKey(),
                () -> refused("json-unreadable", text.getValue().getBytes(StandardCharsets.UTF_8))));
    }

    @Test
    void badUtf8IsRefused() throws IOException {
        byte[] text = bag.payload.get("data/bundle.json").clone();
        text[text.length - 4] = (byte) 0xC3;
        refused("json-not-utf8", text);
    }

    @Test
    void otherVersionsAndUnknownTransfersAreRefused() throws IOException {
        Branch sound = Samples.bundle(Map.of("a.png", BagForge.PHOTO)).document();
        refused("version-unknown", sound.with("version", Node.number(2)));
        refused("version-unknown", sound.with("version", Node.number(0x1_0000_0001L)));
        refused("format-unknown", sound.with("format", "bedmark.other"));
        refused("transfer-unknown", sound.with("surveys", Node.Series.of(
                sound.branches("surveys").get(0).with("transfer", "t2"))));
    }

    /** Whatever reads bundles later refuses through the same door. */
    @Test
    void theBundleIsReadInOnePlaceThatCanBeExchanged() throws IOException {
        Path file = Files.write(folder.resolve("sound.zip"), ZipForge.of(bag.files()).build());
        Bundle other = Samples.bundle(Map.of("a.png", BagForge.PHOTO));
        assertEquals(other, new PackReader(PackLimits.STANDARD, bytes -> other).open(file, Progress.NONE).bundle());
    }

    @Test
    void photosMustBeThoseThatTheBundleNames() throws IOException {
        refused("pack-photo-differs", Samples.bundle(Map.of("a.png", Samples.png(5, 5))).document());
        refused("pack-photo-missing", Samples.bundle(Map.of("b.png", BagForge.PHOTO)).document());
        refused("pack-photo-unclaimed", Samples.bundle(Map.of()).document());
        Branch claim = Samples.claim("a.png", BagForge.PHOTO);
        refused("pack-photo-differs", Samples.bundle(List.of(claim.with("bytes", Node.number(1)))).document());
        refused("pack-photo-claim-wrong", Samples.bundle(List.of(claim.with("sha256", "00"))).document());
        refused("pack-photo-claim-wrong", Samples.bundle(List.of(
                claim.with("bytes", Node.number(new BigDecimal("0.5"))))).document());
        refused("pack-photo-claims-differ", Samples.bundle(List.of(claim,
                claim.with("bytes", Node.number(1)))).document());
        refused("zip-name-clash", Samples.bundle(List.of(claim, claim.with("file", "A.png"))).document());
        refused("name-parent", Samples.bundle(List.of(claim.with("file", "../a.png"))).document());
        for (String key : List.of("file", "sha256", "bytes")) {
            refused("key-absent", Samples.bundle(List.of(claim.without(key))).document());
            refused("kind-wrong", Samples.bundle(List.of(claim.with(key, Node.flag(true)))).document());
        }
    }

    @Test
    void aRefusedClaimSaysWhere() throws IOException {
        bag.payload.put("data/bundle.json", JsonWriter.indented(Samples.bundle(List.of(
                Samples.claim("a.png", BagForge.PHOTO).without("sha256"))).document()));
        assertEquals(Pointer.parse("/surveys/0/photos/0/sha256").toString(),
                Packs.assertRefused("key-absent", folder, ZipForge.of(bag.files()).build()).defect().where());
    }

    @Test
    void whatIsNoPhotoIsRefused() throws IOException {
        refusedPhoto("pack-photo-kind", BagForge.text("<svg xmlns=\"http://www.w3.org/2000/svg\"/>"));
        refusedPhoto("pack-photo-kind", BagForge.text("MZ no picture"));
        refusedPhoto("pack-photo-damaged", new byte[0]);
        refusedPhoto("pack-photo-damaged", Arrays.copyOf(BagForge.PHOTO, 20));
        refusedPhoto("zip-nested-archive", ZipForge.of(Map.of("x", new byte[1])).build());
    }

    @Test
    void decompressionBombsAreRefused() throws IOException {
        refusedPhoto("pack-photo-too-large", pngOf(50_000, 50_000));
        refusedPhoto("pack-photo-too-large", pngOf(1, 0x7FFF_FFFF));
        refusedPhoto("pack-photo-too-large", pngOf(-1, -1));
        refusedPhoto("pack-photo-too-large", jpegOf(65_000, 10));
        refusedPhoto("pack-photo-too-large", jpegOf(29_000, 29_000));
    }

    /** A PNG that is tiny in the file and huge in memory. */
    private static byte[] pngOf(int width, int height) {
        byte[] photo = BagForge.PHOTO.clone();
        ByteBuffer buffer = ByteBuffer.wrap(photo).putInt(16, width).putInt(20, height);
        CRC32 crc = new CRC32();
        crc.update(photo, 12, 17);
        buffer.putInt(29, (int) crc.getValue());
        return photo;
    }

    private static byte[] jpegOf(int width, int height) {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        bytes.writeBytes(new byte[] {(byte) 0xFF, (byte) 0xD8, (byte) 0xFF, (byte) 0xE1, 0, 4, 1, 2,
            (byte) 0xFF, (byte) 0xC2, 0, 11, 8});
        bytes.writeBytes(ByteBuffer.allocate(4).putShort((short) height).putShort((short) width).array());
        bytes.writeBytes(new byte[] {1, 1, 0x11, 0, (byte) 0xFF, (byte) 0xD9});
        return bytes.toByteArray();
    }
}
