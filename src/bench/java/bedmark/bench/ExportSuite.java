package bedmark.bench;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.journal.Digest;
import bedmark.journal.Progress;
import bedmark.json.BundleReader;
import bedmark.pack.DeviceKey;
import bedmark.pack.PackWriter;
import bedmark.pack.PhotoSource;
import bedmark.survey.Bundle;
import java.awt.image.BufferedImage;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import javax.imageio.ImageIO;

/**
 * The export of 500 surveys with 1 GB of photos against copying the same files, {@code sync} and {@code sha256sum} by
 * the system's own programs, turn by turn on the same disk.
 */
final class ExportSuite implements Suite {
    private static final int SURVEYS = 500;
    private static final int PHOTOS = Integer.getInteger("bench.photos", 2_000);
    private static final int PHOTO_BYTES = 512 << 10;
    private static final int ROUNDS = Integer.getInteger("bench.exports", 5);

    @Override
    public String name() {
        return "export";
    }

    @Override
    public List<Row> run() throws IOException, InterruptedException {
        try (BenchFolder folder = BenchFolder.make("export")) {
            Path photos = Files.createDirectory(folder.path().resolve("photos"));
            Bundle bundle = bundle(photos);
            DeviceKey key = DeviceKey.of(folder.path().resolve("key"));
            List<Double> exports = new ArrayList<>();
            List<Double> copies = new ArrayList<>();
            for (int round = 0; round <= ROUNDS; round++) {
                Path pack = folder.path().resolve("round.zip");
                double export = Timing.once(() -> PackWriter.write(bundle, PhotoSource.folder(photos), key, pack,
                        Progress.NONE).photos(), 1);
                Files.delete(pack);
                double copy = copied(photos, folder.path().resolve("copy"));
                if (round > 0) {
                    exports.add(export);
                    copies.add(copy);
                }
            }
            double export = median(exports);
            double copy = median(copies);
            return List.of(new Row(String.format(Locale.ROOT, "export of %d surveys with %d MB of photos over cp, sync "
                    + "and sha256sum, median (%.1f over %.1f s)", SURVEYS, (long) PHOTOS * PHOTO_BYTES >> 20, export,
                    copy), export / copy, "", 1.5, true));
        }
    }

    private static double median(List<Double> times) {
        return times.stream().sorted().toList().get(times.size() / 2);
    }

    private static double copied(Path from, Path to) throws IOException, InterruptedException {
        long start = System.nanoTime();
        system("cp", "-r", from.toString(), to.toString());
        system("sync");
        system("sh", "-c", "exec sha256sum \"$0\"/*", to.toString());
        double time = (System.nanoTime() - start) / 1e9;
        new BenchFolder(to).close();
        return time;
    }

    private static void system(String... command) throws IOException, InterruptedException {
        int code = new ProcessBuilder(command).redirectOutput(ProcessBuilder.Redirect.DISCARD)
                .redirectError(ProcessBuilder.Redirect.INHERIT).start().waitFor();
        if (code != 0) {
            throw new IOException(Arrays.toString(command) + " ended with " + code);
        }
    }

    private static Bundle bundle(Path folder) throws IOException {
        Bundle plant = BundleReader.read(BenchPlant.bundle(SURVEYS).getBytes(StandardCharsets.UTF_8));
        List<List<Node>> photos = new ArrayList<>();
        for (int i = 0; i < SURVEYS; i++) {
            photos.add(new ArrayList<>());
        }
        byte[] picture = picture();
        Random random = new Random(3);
        for (int i = 0; i < PHOTOS; i++) {
            byte[] bytes = new byte[PHOTO_BYTES];
            random.nextBytes(bytes);
            System.arraycopy(picture, 0, bytes, 0, picture.length);
            String digest = Digest.of(bytes).hex();
            Files.write(folder.resolve(digest + ".png"), bytes);
            photos.get(i % SURVEYS).add(Branch.EMPTY.with("id", "photo" + i).with("file", "photos/" + digest + ".png")
                    .with("sha256", digest).with("bytes", Node.number(PHOTO_BYTES)));
        }
        List<Node> surveys = new ArrayList<>();
        for (Branch survey : plant.document().branches("surveys")) {
            surveys.add(survey.with("photos", new Node.Series(photos.get(surveys.size()))));
        }
        return new Bundle(plant.document().with("id", "11111111-1111-4111-8111-111111111111")
                .with("createdAt", "2026-03-01T08:30:00+01:00").with("surveys", new Node.Series(surveys)));
    }

    private static byte[] picture() throws IOException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        ImageIO.write(new BufferedImage(8, 8, BufferedImage.TYPE_INT_RGB), "png", bytes);
        return bytes.toByteArray();
    }
}
