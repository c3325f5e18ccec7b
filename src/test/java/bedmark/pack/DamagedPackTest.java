package bedmark.pack;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Refused;
import bedmark.journal.Progress;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.Arrays;
import java.util.HashSet;
import java.util.Map;
import java.util.Set;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What a bad stick or cable does to a pack, tried at every single byte. */
class DamagedPackTest {
    private static final Map<String, byte[]> PHOTOS = Map.of("a.png", BagForge.PHOTO);

    @TempDir
    Path folder;
    private Path file;
    private byte[] sound;
    private ReadPack original;

    @BeforeEach
    void writePack() throws IOException {
        file = PackWriter.write(Samples.bundle(PHOTOS), Samples.folder(folder.resolve("photos"), PHOTOS),
                DeviceKey.of(folder.resolve("store")), folder.resolve("round.zip"), Progress.NONE).file();
        sound = Files.readAllBytes(file);
        original = PackReader.open(file, PackLimits.STANDARD);
    }

    @Test
    void aPackCutOffAnywhereIsRefused() throws IOException {
        for (int length = sound.length - 1; length >= 0; length--) {
            try (FileChannel channel = FileChannel.open(file, StandardOpenOption.WRITE)) {
                channel.truncate(length);
            }
            String code = refusal().defect().code();
            assertEquals(length < 4 ? "pack-not-zip" : "zip-truncated", code, "cut to " + length);
        }
    }

    @Test
    void aPackWithAnyByteTooManyOrTooFewIsRefused() throws IOException {
        for (int place = 0; place <= sound.length; place++) {
            Files.write(file, joined(Arrays.copyOf(sound, place), new byte[] {0},
                    Arrays.copyOfRange(sound, place, sound.length)));
            refusal();
            if (place < sound.length) {
                Files.write(file, joined(Arrays.copyOf(sound, place),
                        Arrays.copyOfRange(sound, place + 1, sound.length)));
                refusal();
            }
        }
    }

    /**
     * Every changed bit is refused but for three fields of the central directory: which system made the entry
     * (2 bytes), the internal attributes (2 bytes: text or binary) and the external attributes (4 bytes: rights).
     * They say nothing about names or content and no reader of ours looks at them, but for link, folder and device
     * bits, which are refused; with them changed, everything read is the same.
     */
    @Test
    void aPackWithAnyChangedByteIsRefusedOrReadsTheSame() throws IOException {
        Set<Integer> harmless = harmlessPlaces();
        Set<Integer> accepted = new HashSet<>();
        try (FileChannel channel = FileChannel.open(file, StandardOpenOption.WRITE)) {
            for (int place = 0; place < sound.length; place++) {
                for (int flip : new int[] {0x01, 0x02, 0x04, 0x08, 0x10, 0x20, 0x40, 0x80, 0xFF}) {
                    channel.write(ByteBuffer.wrap(new byte[] {(byte) (sound[place] ^ flip)}), place);
                    if (harmless.contains(place)) {
                        acceptedOrRefused(place, accepted);
                    } else {
                        int here = place;
                        assertThrows(Refused.class, () -> PackReader.open(file, PackLimits.STANDARD),
                                () -> "changed at " + here + " by " + flip);
                    }
                }
                channel.write(ByteBuffer.wrap(new byte[] {sound[place]}), place);
            }
        }
        assertTrue(accepted.size() > 8, "some of the harmless places are indeed not judged");
    }

    private void acceptedOrRefused(int place, Set<Integer> accepted) throws IOException {
        try {
            ReadPack pack = PackReader.open(file, PackLimits.STANDARD);
            assertArrayEquals(original.bundleText(), pack.bundleText());
            assertEquals(original.photos(), pack.photos());
            assertEquals(original.fingerprint(), pack.fingerprint());
            ByteArrayOutputStream photo = new ByteArrayOutputStream();
            pack.copy(pack.photos().get(0), photo);
            assertArrayEquals(BagForge.PHOTO, photo.toByteArray());
            accepted.add(place);
        } catch (Refused e) {
            assertTrue(Set.of("zip-kind-wrong", "zip-link").contains(e.defect().code()), e::getMessage);
        }
    }

    private Set<Integer> harmlessPlaces() {
        ByteBuffer bytes = ByteBuffer.wrap(sound).order(ByteOrder.LITTLE_ENDIAN);
        Set<Integer> places = new HashSet<>();
        int entry = bytes.getInt(sound.length - 6);
        while (bytes.getInt(entry) == 0x02014b50) {
            for (int field : new int[] {4, 5, 36, 37, 38, 39, 40, 41}) {
                places.add(entry + field);
            }
            entry += 46 + bytes.getShort(entry + 28);
        }
        return places;
    }

    private Refused refusal() {
        return assertThrows(Refused.class, () -> PackReader.open(file, PackLimits.STANDARD));
    }

    private static byte[] joined(byte[]... parts) {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        for (byte[] part : parts) {
            out.writeBytes(part);
        }
        return out.toByteArray();
    }
}
