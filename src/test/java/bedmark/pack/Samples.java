package bedmark.pack;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.survey.Bundle;
import java.awt.image.BufferedImage;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Random;
import javax.imageio.ImageIO;

/** Small invented bundles and photos. */
final class Samples {
    private Samples() {
    }

    /** A bundle with one survey for each photo, in the order of the map. */
    static Bundle bundle(Map<String, byte[]> photos) {
        return bundle(photos.entrySet().stream().map(photo -> claim(photo.getKey(), photo.getValue())).toList());
    }

    /** A bundle with one survey for each claim. */
    static Bundle bundle(List<Branch> claims) {
        List<Node> surveys = new ArrayList<>();
        for (Branch claim : claims) {
            surveys.add(Branch.EMPTY
                    .with("id", String.format("00000000-0000-4000-8000-%012d", surveys.size()))
                    .with("transfer", "t1").with("photos", Node.Series.of(claim)));
        }
        return new Bundle(Branch.EMPTY.with("format", Bundle.FORMAT).with("version", Node.number(Bundle.VERSION))
                .with("id", "11111111-1111-4111-8111-111111111111")
                .with("createdAt", "2026-03-01T08:30:00+01:00")
                .with("plant", Branch.EMPTY
                        .with("conveyors", Node.Series.of(Branch.EMPTY.with("id", "c1")))
                        .with("transfers", Node.Series.of(Branch.EMPTY.with("id", "t1").with("conveyor", "c1"))))
                .with("surveys", new Node.Series(surveys)));
    }

    static Branch claim(String file, byte[] photo) {
        return Branch.EMPTY.with("id", "p-" + file).with("file", file).with("sha256", Sha256.hex(photo))
                .with("bytes", Node.number(photo.length));
    }

    static byte[] png(int width, int height) {
        return image("png", width, height);
    }

    static byte[] jpeg(int width, int height) {
        return image("jpg", width, height);
    }

    private static byte[] image(String format, int width, int height) {
        BufferedImage image = new BufferedImage(width, height, BufferedImage.TYPE_INT_RGB);
        Random random = new Random(width * 31L + height);
        for (int x = 0; x < width; x++) {
            for (int y = 0; y < height; y++) {
                image.setRGB(x, y, random.nextInt());
            }
        }
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        try {
            ImageIO.write(image, format, out);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return out.toByteArray();
    }

    /** Puts photos into a folder. */
    static PhotoSource folder(Path folder, Map<String, byte[]> photos) {
        photos.forEach((name, bytes) -> {
            try {
                Files.createDirectories(folder.resolve(name).getParent());
                Files.write(folder.resolve(name), bytes);
            } catch (IOException e) {
                throw new UncheckedIOException(e);
            }
        });
        return PhotoSource.folder(folder);
    }
}
