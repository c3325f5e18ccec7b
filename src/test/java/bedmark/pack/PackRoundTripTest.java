package bedmark.pack;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Refused;
import bedmark.journal.Progress;
import bedmark.json.JsonWriter;
import bedmark.survey.Bundle;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.zip.ZipEntry;
import java.util.zip.ZipFile;
import java.util.zip.ZipOutputStream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class PackRoundTripTest {
    @TempDir
    Path folder;
    private final Map<String, byte[]> photos = new LinkedHashMap<>();
    private DeviceKey key;
    private Path out;

    @BeforeEach
    void prepare() {
        key = DeviceKey.of(folder.resolve("store"));
        out = folder.resolve("round.zip");
        photos.put("tail pulley.jpg", Samples.jpeg(40, 30));
        photos.put("north/bed-\u00f1.png", Samples.png(300, 200));
    }

    private WrittenPack write(Bundle bundle, Path target) {
        return PackWriter.write(bundle, Samples.folder(folder.resolve("photos"), photos), key, target, Progress.NONE);
    }

    private static byte[] copyOf(ReadPack pack, PackedPhoto photo) throws IOException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        pack.copy(photo, bytes);
        return bytes.toByteArray();
    }

    @Test
    void whatIsPackedIsRead() throws IOException {
        Bundle bundle = Samples.bundle(photos);
        WrittenPack written = write(bundle, out);
        ReadPack pack = PackReader.open(out, PackLimits.STANDARD);
        assertEquals(bundle, pack.bundle());
        assertArrayEquals(JsonWriter.compact(bundle.document()), pack.bundleText());
        assertEquals(key.fingerprint(), pack.fingerprint());
        assertEquals(List.of("north/bed-\u00f1.png", "tail pulley.jpg"),
                pack.photos().stream().map(PackedPhoto::name).toList());
        for (PackedPhoto photo : pack.photos()) {
            assertArrayEquals(photos.get(photo.name()), copyOf(pack, photo));
        }
        assertEquals(new WrittenPack(out, Sha256.hex(Files.readAllBytes(out)), Files.size(out), 2,
                key.fingerprint()), written);
    }

    @Test
    void theEntriesAreThoseOfTheDataPage() throws IOException {
        write(Samples.bundle(photos), out);
        try (ZipFile zip = new ZipFile(out.toFile())) {
            assertEquals(List.of("bagit.txt", "bag-info.txt", "manifest-sha256.txt", "tagmanifest-sha256.txt",
                    "signature-ed25519.txt", "device-key.txt", "data/bundle.json", "data/photos/north/bed-\u00f1.png",
                    "data/photos/tail pulley.jpg"), zip.stream().map(ZipEntry::getName).toList());
            assertEquals("Bag-Software-Agent: Bedmark\nBagging-Date: 2026-03-01\n"
                    + "External-Identifier: 11111111-1111-4111-8111-111111111111\nPayload-Oxum: "
                    + (zip.getEntry("data/bundle.json").getSize()
                    + photos.values().stream().mapToInt(photo -> photo.length).sum()) + ".3\n",
                    text(zip, "bag-info.txt"));
            assertEquals(List.of("bag-info.txt", "bagit.txt", "manifest-sha256.txt"),
                    text(zip, "tagmanifest-sha256.txt").lines().map(line -> line.substring(66)).toList());
        }
    }

    private static String text(ZipFile zip, String name) throws IOException {
        try (InputStream content = zip.getInputStream(zip.getEntry(name))) {
            return new String(content.readAllBytes(), StandardCharsets.UTF_8);
        }
    }

    @Test
    void theSameContentIsTheSameFile() throws IOException {
        WrittenPack first = write(Samples.bundle(photos), out);
        WrittenPack again = write(Samples.bundle(photos), folder.resolve("again.zip"));
        assertEquals(-1, Files.mismatch(first.file(), again.file()));
        assertEquals(first.sha256(), again.sha256());
        DeviceKey other = DeviceKey.of(folder.resolve("other store"));
        WrittenPack byOther = PackWriter.write(Samples.bundle(photos), Samples.folder(folder.resolve("photos"),
                photos), other, folder.resolve("other.zip"), Progress.NONE);
        assertNotEquals(first.sha256(), byOther.sha256());
    }

    @Test
    void anOlderPackOfTheSameNameIsReplacedWhole() throws IOException {
        write(Samples.bundle(Map.of()), out);
        write(Samples.bundle(photos), out);
        assertEquals(2, PackReader.open(out, PackLimits.STANDARD).photos().size());
        assertEquals(List.of("photos", "round.zip", "store"), Packs.names(folder));
    }

    @Test
    void aBundleWithoutPhotosIsPackedToo() {
        write(Samples.bundle(Map.of()), out);
        assertEquals(List.of(), PackReader.open(out, PackLimits.STANDARD).photos());
    }

    @Test
    void photosMayBeNamedWithTheirFolderAndBySeveralSurveys() throws IOException {
        byte[] photo = photos.get("tail pulley.jpg");
        write(Samples.bundle(List.of(Samples.claim("photos/tail pulley.jpg", photo),
                Samples.claim("tail pulley.jpg", photo))), out);
        ReadPack pack = PackReader.open(out, PackLimits.STANDARD);
        assertEquals(List.of(new PackedPhoto("tail pulley.jpg", Sha256.hex(photo), photo.length)), pack.photos());
        assertArrayEquals(photo, copyOf(pack, pack.photos().get(0)));
    }

    @Test
    void progressGrowsToItsTotal() {
        List<Long> done = new ArrayList<>();
        List<Long> totals = new ArrayList<>();
        Progress listening = (now, total) -> {
            done.add(now);
            totals.add(total);
        };
        PackWriter.write(Samples.bundle(photos), Samples.folder(folder.resolve("photos"), photos), key, out, listening);
        assertGrows(done, totals);
        done.clear();
        totals.clear();
        new PackReader(PackLimits.STANDARD, bytes -> Samples.bundle(photos)).open(out, listening);
        assertGrows(done, totals);
    }

    private static void assertGrows(List<Long> done, List<Long> totals) {
        assertEquals(done.stream().sorted().toList(), done);
        assertEquals(0, done.get(0));
        assertEquals(totals.get(0), done.get(done.size() - 1));
        assertEquals(1, totals.stream().distinct().count());
        assertTrue(done.size() > 4);
    }

    @Test
    void readingCanBeCancelled() {
        write(Samples.bundle(photos), out);
        Progress impatient = new Progress() {
            @Override
            public void at(long done, long total) {
            }

            @Override
            public boolean cancelled() {
                return true;
            }
        };
        PackReader reader = new PackReader(PackLimits.STANDARD, bytes -> Samples.bundle(photos));
        assertEquals("pack-cancelled",
                assertThrows(Refused.class, () -> reader.open(out, impatient)).defect().code());
        Thread.currentThread().interrupt();
        assertEquals("pack-cancelled",
                assertThrows(Refused.class, () -> reader.open(out, Progress.NONE)).defect().code());
        assertTrue(Thread.interrupted());
    }

    /** As other archivers do it: deflated, sizes after the data. */
    @Test
    void aPackZippedAnewIsRead() throws IOException {
        write(Samples.bundle(photos), out);
        Path again = folder.resolve("again.zip");
        try (ZipFile zip = new ZipFile(out.toFile());
                ZipOutputStream to = new ZipOutputStream(Files.newOutputStream(again))) {
            for (ZipEntry entry : zip.stream().toList()) {
                to.putNextEntry(new ZipEntry(entry.getName()));
                try (InputStream content = zip.getInputStream(entry)) {
                    content.transferTo(to);
                }
            }
        }
        assertTrue(Files.size(again) < Files.size(out));
        ReadPack pack = PackReader.open(again, PackLimits.STANDARD);
        assertEquals(PackReader.open(out, PackLimits.STANDARD).photos(), pack.photos());
        assertArrayEquals(photos.get("tail pulley.jpg"), copyOf(pack, pack.photos().get(1)));
    }

    @Test
    void aFileChangedAfterItWasJudgedGivesNoPhoto() throws IOException {
        write(Samples.bundle(photos), out);
        ReadPack pack = PackReader.open(out, PackLimits.STANDARD);
        byte[] bytes = Files.readAllBytes(out);
        int inPhoto = bytes.length - 1000;
        bytes[inPhoto] ^= 1;
        Files.write(out, bytes);
        assertEquals("zip-crc-wrong", assertThrows(Refused.class,
                () -> pack.copy(pack.photos().get(1), OutputStream.nullOutputStream())).defect().code());
        assertThrows(IllegalArgumentException.class,
                () -> pack.copy(new PackedPhoto("x", "0".repeat(64), 1), OutputStream.nullOutputStream()));
    }

    @Test
    void whatIsNoFileIsRefused() {
        for (Path absent : List.of(folder.resolve("absent.zip"), folder)) {
            assertEquals("pack-absent", assertThrows(Refused.class,
                    () -> PackReader.open(absent, PackLimits.STANDARD)).defect().code());
        }
    }
}
