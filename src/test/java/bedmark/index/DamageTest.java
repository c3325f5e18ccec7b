package bedmark.index;

import static bedmark.index.StoreScript.NOON;
import static bedmark.index.StoreScript.PERSON;
import static bedmark.index.StoreScript.id;
import static bedmark.index.StoreScript.options;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.journal.Progress;
import bedmark.journal.QuickLayer;
import bedmark.pack.DeviceKey;
import bedmark.pack.PackLimits;
import bedmark.pack.PackReader;
import bedmark.pack.PackWriter;
import bedmark.pack.PhotoSource;
import bedmark.pack.ReadPack;
import bedmark.survey.Bundle;
import java.awt.image.BufferedImage;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.TreeMap;
import java.util.stream.Stream;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * Bits flip and files are cut short, in journal, index, photos and packs: each time somebody is told, or nothing that
 * is read differs. Both numbers are set: {@code -Dbedmark.flips=10000 -Dbedmark.cuts=1000}.
 */
class DamageTest {
    private static final int FLIPS = Integer.getInteger("bedmark.flips", 180);
    private static final int CUTS = Integer.getInteger("bedmark.cuts", 20);

    @TempDir
    Path folder;
    private Path home;
    private Path pack;
    private Asked asked;
    private String packed;
    private final Map<Path, byte[]> sound = new TreeMap<>();
    private final Map<Kind, Integer> told = new EnumMap<>(Kind.class);

    /** What is damaged. */
    private enum Kind {
        JOURNAL, INDEX, PHOTO, PACK
    }

    private static StoreOptions quick() {
        return options().withFiles(new QuickLayer()).withSegmentBytes(2048);
    }

    @BeforeEach
    void walkAndExport() throws IOException {
        home = folder.resolve("store");
        try (Store store = Store.open(home, quick())) {
            StoreScript.walk(store);
            for (int i = 0; i < 4; i++) {
                store.append(PERSON, StoreScript.opened(id(20 + i), "T1"));
                store.attachPhoto(picture(i), id(20 + i), PERSON, NOON, "photo " + i);
            }
            asked = Asked.of(store);
            pack = export(store);
        }
        packed = read(PackReader.open(pack, PackLimits.STANDARD));
        try (Stream<Path> files = Files.walk(home)) {
            for (Path file : files.filter(Files::isRegularFile).toList()) {
                sound.put(file, Files.readAllBytes(file));
            }
        }
        sound.put(pack, Files.readAllBytes(pack));
    }

    private static byte[] picture(int shade) throws IOException {
        BufferedImage picture = new BufferedImage(8, 8, BufferedImage.TYPE_INT_RGB);
        picture.setRGB(shade, shade, 0xFF0000 + 40 * shade);
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        assertTrue(ImageIO.write(picture, "png", bytes));
        return bytes.toByteArray();
    }

    private Path export(Store store) {
        List<Branch> surveys = Stream.of(id(20), id(21), id(22), id(23)).map(survey ->
                store.history(survey).orElseThrow().survey().document()).toList();
        Branch register = Branch.EMPTY.with("plant", Branch.EMPTY.with("id", "p")
                .with("conveyors", Node.Series.of(Branch.EMPTY.with("id", "c")))
                .with("transfers", Node.Series.of(Branch.EMPTY.with("id", "T1").with("conveyor", "c"))));
        return PackWriter.write(Bundle.of(id(500), NOON, Branch.EMPTY, register, "caution", surveys),
                PhotoSource.folder(home.resolve("photos")), DeviceKey.of(folder.resolve("key")),
                folder.resolve("round.zip"), Progress.NONE).file();
    }

    private static String read(ReadPack read) throws IOException {
        StringBuilder text = new StringBuilder(read.bundle().toString()).append(read.fingerprint());
        for (var photo : read.photos()) {
            ByteArrayOutputStream bytes = new ByteArrayOutputStream();
            read.copy(photo, bytes);
            text.append(photo).append(Arrays.toString(bytes.toByteArray()));
        }
        return text.toString();
    }

    @Test
    void noFlippedBitIsSilent() throws IOException {
        damage(FLIPS, new Random(13), (bytes, random) -> {
            byte[] flipped = bytes.clone();
            flipped[random.nextInt(bytes.length)] ^= (byte) (1 << random.nextInt(8));
            return flipped;
        });
    }

    @Test
    void noFileThatIsCutShortIsSilent() throws IOException {
        damage(CUTS, new Random(17), (bytes, random) -> Arrays.copyOf(bytes, random.nextInt(bytes.length)));
    }

    /** Makes a damaged file of a sound one. */
    @FunctionalInterface
    private interface Damage {
        byte[] of(byte[] bytes, Random random);
    }

    private void damage(int times, Random random, Damage damage) throws IOException {
        for (int i = 0; i < times; i++) {
            Kind kind = Kind.values()[i % Kind.values().length];
            List<Path> files = files(kind);
            Path file = files.get(random.nextInt(files.size()));
            byte[] damaged = damage.of(sound.get(file), random);
            Files.write(file, damaged);
            String where = "damage " + i + " of " + file.getFileName() + " at "
                    + Arrays.mismatch(sound.get(file), damaged);
            told.merge(kind, judge(kind, where) ? 1 : 0, Integer::sum);
            restore();
        }
        int each = times / Kind.values().length;
        assertEquals(each, told.get(Kind.JOURNAL), "every damage of the journal is told");
        assertEquals(each, told.get(Kind.PHOTO), "every damage of a photo is told");
        assertTrue(told.get(Kind.PACK) > each * 8 / 10 && told.get(Kind.INDEX) > 0, told::toString);
    }

    private List<Path> files(Kind kind) {
        return switch (kind) {
            case JOURNAL -> below("journal");
            case INDEX -> below("index");
            case PHOTO -> below("photos");
            case PACK -> List.of(pack);
        };
    }

    private List<Path> below(String room) {
        return sound.keySet().stream().filter(file -> file.startsWith(home.resolve(room))).toList();
    }

    /** Whether the damage was told; where it was not, nothing that is read may differ. */
    private boolean judge(Kind kind, String where) throws IOException {
        if (kind == Kind.PACK) {
            try {
                assertEquals(packed, read(PackReader.open(pack, PackLimits.STANDARD)), where);
                return false;
            } catch (Refused e) {
                return true;
            }
        }
        boolean checked = Store.check(home, new QuickLayer(), Progress.NONE).sound();
        if (kind == Kind.PHOTO) {
            return !checked;
        }
        try (Store store = Store.open(home, quick())) {
            boolean proved = store.check(Progress.NONE).sound();
            Asked answers = Asked.of(store);
            boolean found = !store.opening().found().isEmpty();
            assertTrue(answers.equals(asked) || !checked && (found || !proved), () -> where + ": sound before "
                    + checked + ", after " + proved + ", " + store.opening() + "\n" + asked + "\n" + answers);
            assertFalse(kind == Kind.INDEX && proved && !answers.equals(asked), where);
            return !checked;
        }
    }

    private void restore() throws IOException {
        try (Stream<Path> files = Files.walk(home)) {
            for (Path file : files.filter(Files::isRegularFile).toList()) {
                if (!sound.containsKey(file)) {
                    Files.delete(file);
                }
            }
        }
        for (Map.Entry<Path, byte[]> file : sound.entrySet()) {
            Files.write(file.getKey(), file.getValue());
        }
    }
}
