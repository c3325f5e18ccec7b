package bedmark.pack;

import bedmark.document.Refused;
import bedmark.journal.Progress;
import bedmark.json.BundleReader;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;

/**
 * A target for coverage-guided fuzzing: any bytes are a sound pack or are refused, and nothing else ever happens.
 */
public final class PackFuzz {
    private static final PackLimits LIMITS = new PackLimits(1 << 20, 200, 1 << 20, 2 << 20, 1 << 16, 1 << 18, 20_000,
            100, 30_000, 128_000_000);

    private PackFuzz() {
    }

    /** Loads what the first input needs, which is no part of its time. */
    public static void fuzzerInitialize() {
        fuzzerTestOneInput(BagFuzz.pack(new byte[0]));
    }

    /** The name and form that fuzzers look for. */
    public static void fuzzerTestOneInput(byte[] data) {
        try {
            Path file = Files.createTempFile("fuzz", ".zip");
            try {
                Files.write(file, data);
                read(file);
            } finally {
                Files.delete(file);
            }
        } catch (IOException e) {
            throw new IllegalStateException("the disk, not the pack", e);
        }
    }

    private static void read(Path file) throws IOException {
        try {
            ReadPack pack = new PackReader(LIMITS, BundleReader::read).open(file, Progress.NONE);
            for (PackedPhoto photo : pack.photos()) {
                pack.copy(photo, OutputStream.nullOutputStream());
            }
        } catch (Refused e) {
            requireWorded(e);
        }
    }

    /** A refusal is a code that has a sentence, on one line. */
    static void requireWorded(Refused refused) {
        if (!refused.defect().code().matches("[a-z0-9]+(-[a-z0-9]+)*")) {
            throw new IllegalStateException("no code: " + refused.defect(), refused);
        }
    }
}
