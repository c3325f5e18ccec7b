package bedmark.pack;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;

import bedmark.journal.Progress;
import java.io.File;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Base64;
import java.util.Map;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Proves packs without this program, by processes of their own. */
@Tag("outside-tool")
class OutsideToolTest {
    private static final Map<String, byte[]> PHOTOS = Map.of("a.png", BagForge.PHOTO,
            "north/tail pulley.jpg", Samples.jpeg(40, 30), "bed.png", Samples.png(3, 3));

    @TempDir
    Path folder;
    private Path pack;
    private Path unpacked;

    @BeforeEach
    void writePack() throws IOException {
        pack = PackWriter.write(Samples.bundle(PHOTOS), Samples.folder(folder.resolve("photos"), PHOTOS),
                DeviceKey.of(folder.resolve("store")), folder.resolve("round.zip"), Progress.NONE).file();
        unpacked = Files.createDirectory(folder.resolve("unpacked"));
    }

    private static void needs(String... tools) {
        for (String tool : tools) {
            boolean there = Arrays.stream(System.getenv("PATH").split(File.pathSeparator))
                    .anyMatch(path -> Files.isExecutable(Path.of(path, tool)));
            Assumptions.assumeTrue(there, tool + " is not installed");
        }
    }

    private int run(String... command) throws IOException, InterruptedException {
        ProcessBuilder builder = new ProcessBuilder(command).directory(unpacked.toFile()).redirectErrorStream(true)
                .redirectOutput(folder.resolve("said.txt").toFile());
        builder.environment().put("LC_ALL", "C.UTF-8");
        return builder.start().waitFor();
    }

    private void unzip() throws IOException, InterruptedException {
        assertEquals(0, run("unzip", "-q", pack.toString()), this::said);
    }

    private String said() {
        try {
            return Files.readString(folder.resolve("said.txt"));
        } catch (IOException e) {
            return e.toString();
        }
    }

    @Test
    void sha256sumProvesThePack() throws IOException, InterruptedException {
        needs("unzip", "sha256sum");
        assertEquals(0, run("unzip", "-tq", pack.toString()), this::said);
        unzip();
        assertEquals(0, run("sha256sum", "--strict", "-c", "manifest-sha256.txt"), this::said);
        assertEquals(4, said().lines().filter(line -> line.endsWith(": OK")).count());
        assertEquals(0, run("sha256sum", "--strict", "-c", "tagmanifest-sha256.txt"), this::said);
        Files.write(unpacked.resolve("data/photos/a.png"), new byte[] {1});
        assertNotEquals(0, run("sha256sum", "-c", "manifest-sha256.txt"));
    }

    @Test
    void opensslProvesTheSignature() throws IOException, InterruptedException {
        needs("unzip", "openssl");
        unzip();
        Files.write(unpacked.resolve("signature"), Base64.getDecoder()
                .decode(Files.readString(unpacked.resolve("signature-ed25519.txt")).strip()));
        String[] verify = {"openssl", "pkeyutl", "-verify", "-pubin", "-inkey", "device-key.txt", "-rawin",
            "-in", "tagmanifest-sha256.txt", "-sigfile", "signature"};
        assertEquals(0, run(verify), this::said);
        Files.write(unpacked.resolve("tagmanifest-sha256.txt"), "x\n".getBytes(StandardCharsets.UTF_8));
        assertNotEquals(0, run(verify));
    }

    @Test
    void aPackThatAnotherArchiverMadeAnewIsRead() throws IOException, InterruptedException {
        needs("unzip", "zip");
        unzip();
        Path again = folder.resolve("again.zip");
        assertEquals(0, run("zip", "-qr", again.toString(), "."), this::said);
        ReadPack read = PackReader.open(again, PackLimits.STANDARD);
        assertEquals(PackReader.open(pack, PackLimits.STANDARD).photos(), read.photos());
        assertEquals(3, read.photos().size());
        unpacked = folder;
        Path inFolder = folder.resolve("folder.zip");
        assertEquals(0, run("zip", "-qr", inFolder.toString(), "unpacked"), this::said);
        assertEquals(read.photos(), PackReader.open(inFolder, PackLimits.STANDARD).photos());
        assertEquals(DeviceKey.of(folder.resolve("store")).fingerprint(), read.fingerprint());
    }
}
