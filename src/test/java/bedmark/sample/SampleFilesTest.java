package bedmark.sample;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assertions.fail;

import bedmark.document.Branch;
import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;

/**
 * The committed files of the demo plant belong to its tables. After a change of either, or of what the engine says,
 * {@code mvn test -Dtest=SampleFilesTest -Dbedmark.samples.write=true} makes them anew.
 */
class SampleFilesTest {
    private static final Path TARGET = Path.of("target", "sample-surveys");
    private static final long LARGEST_PHOTO = 150_000;
    /** What an encoder may change of a colour, on average, in 255 steps. */
    private static final double ENCODED = 6;

    @BeforeAll
    static void makeAnewWhereAsked() throws IOException {
        if (Boolean.getBoolean("bedmark.samples.write")) {
            SampleFiles.write();
        }
    }

    @Test
    void committedSampleFilesAreWhatTheGeneratorMakes() throws IOException {
        List<String> different = new ArrayList<>();
        for (Map.Entry<String, byte[]> file : SampleFiles.made().entrySet()) {
            Path committed = SampleFiles.FOLDER.resolve(file.getKey());
            if (!Files.exists(committed) || !Arrays.equals(Files.readAllBytes(committed), file.getValue())) {
                Files.createDirectories(TARGET);
                Files.write(TARGET.resolve(file.getKey()), file.getValue());
                different.add(file.getKey());
            }
        }
        if (!different.isEmpty()) {
            fail("not what the tables and the engine make now: " + different + "; look at the difference to "
                    + TARGET + ", and if it is right, run again with -Dbedmark.samples.write=true");
        }
    }

    @Test
    void nothingElseLiesBesideThem() throws IOException {
        Set<String> expected = new TreeSet<>();
        SamplePicture.ALL.keySet().forEach(name -> expected.add("photos/" + name));
        SampleRound.ALL.forEach(round -> expected.add(round.file()));
        try (Stream<Path> files = Files.walk(SampleFiles.FOLDER)) {
            assertEquals(expected, files.filter(Files::isRegularFile).map(file -> SampleFiles.FOLDER.relativize(file)
                    .toString().replace('\\', '/')).collect(Collectors.toCollection(TreeSet::new)));
        }
    }

    @Test
    void photosAreThoseThatTheSurveysName() throws IOException {
        Set<String> named = new TreeSet<>();
        for (SampleRound round : SampleRound.ALL) {
            for (Branch photo : SampleFiles.committed(round).surveys().stream()
                    .flatMap(survey -> survey.photos().stream()).toList()) {
                String file = photo.text("file").orElseThrow();
                byte[] bytes = Files.readAllBytes(SampleFiles.FOLDER.resolve(file));
                assertEquals(SamplePhotos.sha256(bytes), photo.text("sha256").orElseThrow(), file);
                assertEquals(bytes.length, photo.number("bytes").orElseThrow().intValueExact(), file);
                assertTrue(bytes.length <= LARGEST_PHOTO, file + " has " + bytes.length + " bytes");
                assertTrue(named.add(file.substring("photos/".length())), file + " is named twice");
            }
        }
        assertEquals(SamplePicture.ALL.keySet(), named);
    }

    @Test
    void photosShowWhatIsDrawn() throws IOException {
        for (String name : SamplePicture.ALL.keySet()) {
            BufferedImage committed = ImageIO.read(new ByteArrayInputStream(SampleFiles.PHOTOS.bytes(name)));
            BufferedImage drawn = SamplePicture.ALL.get(name).get();
            assertEquals(drawn.getWidth(), committed.getWidth(), name);
            assertEquals(drawn.getHeight(), committed.getHeight(), name);
            double difference = difference(committed, drawn);
            assertTrue(difference < ENCODED, name + " differs by " + difference + "; delete it and write it anew");
        }
    }

    private static double difference(BufferedImage one, BufferedImage other) {
        double sum = 0;
        for (int y = 0; y < one.getHeight(); y++) {
            for (int x = 0; x < one.getWidth(); x++) {
                int a = one.getRGB(x, y);
                int b = other.getRGB(x, y);
                for (int shift = 0; shift <= 16; shift += 8) {
                    sum += Math.abs((a >> shift & 255) - (b >> shift & 255));
                }
            }
        }
        return sum / (3.0 * one.getWidth() * one.getHeight());
    }
}
