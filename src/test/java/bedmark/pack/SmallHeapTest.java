package bedmark.pack;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.journal.Progress;
import bedmark.json.JsonWriter;
import bedmark.survey.Bundle;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Packs are written and judged by a process that has no more memory than the smallest tablet. */
class SmallHeapTest {
    @TempDir
    Path folder;

    /** What the small process does: judges packs and says one word for each. */
    public static void main(String... packs) throws IOException {
        List<String> words = new ArrayList<>();
        for (String pack : Arrays.asList(packs).subList(1, packs.length)) {
            try {
                ReadPack read = PackReader.open(Path.of(pack), PackLimits.STANDARD);
                for (PackedPhoto photo : read.photos()) {
                    read.copy(photo, OutputStream.nullOutputStream());
                }
                words.add("sound");
            } catch (Refused e) {
                words.add(e.defect().code());
            }
        }
        Files.write(Path.of(packs[0]), words);
    }

    private List<String> judged(int megabytes, Path... packs) throws IOException, InterruptedException {
        Path java = Path.of(System.getProperty("java.home"), "bin", "java");
        List<String> command = new ArrayList<>(List.of(java.toString(), "-Xmx" + megabytes + "m",
                "-XX:+UseSerialGC", "-XX:TieredStopAtLevel=1", "-cp", System.getProperty("java.class.path"),
                SmallHeapTest.class.getName(), folder.resolve("words.txt").toString()));
        Arrays.stream(packs).map(Path::toString).forEach(command::add);
        Path said = folder.resolve("said.txt");
        int exit = new ProcessBuilder(command).redirectErrorStream(true).redirectOutput(said.toFile()).start()
                .waitFor();
        assertEquals(0, exit, () -> read(said));
        return Files.readAllLines(folder.resolve("words.txt"));
    }

    private static String read(Path file) {
        try {
            return Files.readString(file);
        } catch (IOException e) {
            return e.toString();
        }
    }

    /** Photos many times larger than the heap pass through it. */
    @Test
    void photosAreNeverHeldInMemory() throws IOException, InterruptedException {
        Map<String, byte[]> photos = new LinkedHashMap<>();
        byte[] large = Arrays.copyOf(Samples.png(8, 8), 48 << 20);
        photos.put("a.png", large);
        photos.put("b.png", Arrays.copyOf(large, 40 << 20));
        Path pack = PackWriter.write(Samples.bundle(photos), Samples.folder(folder.resolve("photos"), photos),
                DeviceKey.of(folder.resolve("store")), folder.resolve("large.zip"), Progress.NONE).file();
        assertTrue(Files.size(pack) > 88 << 20);
        assertEquals(List.of("sound"), judged(24, pack));
    }

    /** The fullest bundle that is let in, as deep as JSON may be, and hostile packs of every expensive kind. */
    @Test
    void noPackAsksForMoreThan256Megabytes() throws IOException, InterruptedException {
        DeviceKey key = DeviceKey.of(folder.resolve("store"));
        int most = PackLimits.STANDARD.bundleValues() - 200;
        List<Path> packs = new ArrayList<>();
        packs.add(packed(key, "list.zip", new Node.Series(Collections.nCopies(most, Node.number(1)))));
        Map<String, Node> members = new LinkedHashMap<>();
        for (int i = 0; i < most; i++) {
            members.put("a key of some length " + i, Node.number(1));
        }
        packs.add(packed(key, "keys.zip", new Branch(members)));
        members.clear();
        Branch text = Samples.bundle(Map.of()).document().with("x", "\u00e9".repeat(8_380_000));
        packs.add(PackWriter.write(new Bundle(text), PhotoSource.folder(folder), key, folder.resolve("long.zip"),
                Progress.NONE).file());
        BagForge bag = new BagForge(key);
        bag.payload.put("data/bundle.json", BagForge.text("[" + "1,".repeat(8_000_000) + "1]"));
        packs.add(Files.write(folder.resolve("values.zip"), ZipForge.of(bag.files()).build()));
        BagForge tags = new BagForge(key);
        tags.tags.put("bag-info.txt", BagForge.text("\u20ac".repeat(1_300_000)));
        tags.tags.put("manifest-md5.txt", BagForge.text("\n".repeat(4_000_000)));
        tags.tags.put("manifest-sha512.txt", BagForge.text(("0".repeat(128) + "  data/x\n").repeat(30_000)));
        packs.add(Files.write(folder.resolve("tags.zip"), ZipForge.of(tags.files()).build()));
        ZipForge bombs = ZipForge.of(new BagForge(key).files());
        for (int i = 0; i < 40; i++) {
            bombs.and(ForgedEntry.deflated("data/photos/bomb" + i, new byte[1 << 20]));
        }
        packs.add(Files.write(folder.resolve("bombs.zip"), bombs.build()));
        assertEquals(List.of("sound", "sound", "sound", "pack-bundle-too-full", "bag-manifest-line",
                "zip-ratio-too-high"), judged(256, packs.toArray(Path[]::new)));
    }

    /** The whole list of hostile packs, but for what a reader of bundles or an office judges. */
    @Test
    void noHostilePackAsksForMoreThan256Megabytes() throws IOException, InterruptedException {
        HostilePacks hostile = new HostilePacks(DeviceKey.of(folder.resolve("store")),
                DeviceKey.of(folder.resolve("stranger")));
        List<Path> packs = new ArrayList<>();
        List<String> codes = new ArrayList<>();
        for (HostilePacks.Hostile one : hostile.all().values()) {
            if (!List.of("device-untrusted", "unit-wrong").contains(one.code())) {
                packs.add(Files.write(folder.resolve("hostile" + packs.size() + ".zip"), one.bytes()));
                codes.add(one.code());
            }
        }
        assertTrue(codes.size() > 40, codes::toString);
        assertEquals(codes, judged(256, packs.toArray(Path[]::new)));
    }

    /** A bundle that holds something else far down. */
    private Path packed(DeviceKey key, String name, Node full) throws IOException {
        Node deep = full;
        for (int i = 0; i < 60; i++) {
            deep = Node.Series.of(deep);
        }
        BagForge bag = new BagForge(key);
        bag.payload.clear();
        bag.payload.put("data/bundle.json",
                JsonWriter.compact(Samples.bundle(Map.of()).document().with("x", deep)));
        return Files.write(folder.resolve(name), ZipForge.of(bag.files()).build());
    }
}
