package bedmark.pack;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;

/**
 * A target for coverage-guided fuzzing behind the signature, which no fuzzer guesses: the bytes are files of a bag, each
 * up to a line {@code ----}, and the bag is signed as it stands.
 */
public final class BagFuzz {
    private static final byte[] BETWEEN = "\n----\n".getBytes(StandardCharsets.US_ASCII);
    private static final List<String> TAGS = List.of("bagit.txt", "bag-info.txt", "manifest-sha256.txt",
            "manifest-md5.txt", "notes.txt");

    private BagFuzz() {
    }

    /** Made when the first input comes. */
    private static final class Signer {
        private static final DeviceKey KEY = key();

        private static DeviceKey key() {
            try {
                Path folder = Files.createTempDirectory("fuzz-key");
                folder.toFile().deleteOnExit();
                folder.resolve(DeviceKey.FILE).toFile().deleteOnExit();
                return DeviceKey.of(folder);
            } catch (IOException e) {
                throw new IllegalStateException(e);
            }
        }
    }

    /** Loads what the first input needs, which is no part of its time. */
    public static void fuzzerInitialize() {
        fuzzerTestOneInput(new byte[0]);
    }

    /** The name and form that fuzzers look for. */
    public static void fuzzerTestOneInput(byte[] data) {
        PackFuzz.fuzzerTestOneInput(pack(data));
    }

    /** Bundle, photo and tag files, in this order; what is left out or empty is as in a sound bag. */
    static byte[] pack(byte[] data) {
        BagForge bag = new BagForge(Signer.KEY);
        List<byte[]> parts = parts(data);
        replace(bag.payload, "data/bundle.json", parts, 0);
        replace(bag.payload, "data/photos/a.png", parts, 1);
        for (int i = 0; i < TAGS.size(); i++) {
            replace(bag.tags, TAGS.get(i), parts, i + 2);
        }
        return ZipForge.of(bag.files()).build();
    }

    private static void replace(Map<String, byte[]> files, String name, List<byte[]> parts, int index) {
        if (index < parts.size() && parts.get(index).length > 0) {
            files.put(name, parts.get(index));
        }
    }

    private static List<byte[]> parts(byte[] data) {
        List<byte[]> parts = new ArrayList<>();
        int from = 0;
        for (int at = 0; at + BETWEEN.length <= data.length; at++) {
            if (Arrays.equals(data, at, at + BETWEEN.length, BETWEEN, 0, BETWEEN.length)) {
                parts.add(Arrays.copyOfRange(data, from, at));
                from = at + BETWEEN.length;
                at = from - 1;
            }
        }
        parts.add(Arrays.copyOfRange(data, from, data.length));
        return parts;
    }
}
