package bedmark.sample;

import java.awt.Color;
import java.awt.Shape;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.awt.image.BufferedImage;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.Map;
import java.util.TreeMap;
import java.util.function.Supplier;
import javax.imageio.IIOImage;
import javax.imageio.ImageIO;
import javax.imageio.ImageWriteParam;
import javax.imageio.ImageWriter;
import javax.imageio.stream.ImageOutputStream;

/** The invented photos of the demo plant, drawn: boards, beds, seals and spillage as seen by a hand lamp. */
final class SamplePicture {
    private static final float QUALITY = 0.78f;
    private static final int WIDTH = 800;
    private static final int HEIGHT = 600;
    private static final Color STEEL = new Color(0x7D8284);
    private static final Color STEEL_LOW = new Color(0x4E5254);
    private static final Color RUST = new Color(0x8A4B22);
    private static final Color RUBBER = new Color(0x5C5A55);
    private static final Color RUBBER_LOW = new Color(0x363431);
    private static final Color BELT = new Color(0x4A4946);
    private static final Color BELT_LOW = new Color(0x2E2D2B);
    private static final Color GRAVEL = new Color(0xA68C68);
    private static final Color LIMESTONE = new Color(0xB9B3A4);
    private static final Color GYPSUM = new Color(0xE4DED2);

    /** All pictures by their file names. */
    static final Map<String, Supplier<BufferedImage>> ALL = new TreeMap<>(Map.of(
            "tp-03-spillage.jpg", SamplePicture::spillage,
            "tp-08-bed-at-board.jpg", SamplePicture::bedAtBoard,
            "tp-08-worn-seal.jpg", () -> seal(WIDTH, HEIGHT, 82, false, 3.5),
            "tp-10-torn-seal.png", () -> seal(480, 360, 101, true, 0),
            "tp-21-caked-liner.jpg", SamplePicture::cakedLiner));

    private SamplePicture() {
    }

    private static Shape box(double x, double y, double width, double height) {
        return new Rectangle2D.Double(x, y, width, height);
    }

    /** A closed outline through points given as x, y, x, y. */
    private static Path2D through(double... points) {
        Path2D outline = new Path2D.Double();
        outline.moveTo(points[0], points[1]);
        for (int i = 2; i < points.length; i += 2) {
            outline.lineTo(points[i], points[i + 1]);
        }
        outline.closePath();
        return outline;
    }

    /** What lies under a soft line through points given as x, y, x, y, down to a level. */
    private static Path2D under(double floor, double... points) {
        Path2D outline = new Path2D.Double();
        int last = points.length - 2;
        outline.moveTo(points[0], floor);
        outline.lineTo(points[0], points[1]);
        for (int i = 2; i < last; i += 2) {
            outline.quadTo(points[i], points[i + 1], (points[i] + points[i + 2]) / 2,
                    (points[i + 1] + points[i + 3]) / 2);
        }
        outline.lineTo(points[last], points[last + 1]);
        outline.lineTo(points[last], floor);
        outline.closePath();
        return outline;
    }

    private static BufferedImage bedAtBoard() {
        SampleBrush brush = new SampleBrush(WIDTH, HEIGHT, 81);
        brush.shade(box(0, 0, WIDTH, 90), new Color(0x15181A), new Color(0x26292B));
        Shape board = through(0, 70, WIDTH, 40, WIDTH, 340, 0, 420);
        brush.shade(board, STEEL, STEEL_LOW);
        brush.streaks(board, 900, 120, 34);
        brush.blotches(board, 26, 34, RUST, 14);
        brush.shade(through(0, 62, WIDTH, 32, WIDTH, 48, 0, 80), new Color(0xA7ABAC), STEEL);
        brush.bolts(70, 122, 165, 5, 13);
        Shape bed = under(HEIGHT, 0, 190, 150, 172, 330, 150, 520, 136, 680, 146, WIDTH, 158);
        brush.shade(bed, new Color(0x6E5C43), new Color(0x40352A));
        brush.stones(bed, 34, 34, GRAVEL);
        brush.blotches(box(0, 150, WIDTH, 90), 40, 26, new Color(0x5A4630), 12);
        return brush.finish(4.5);
    }

    /** A strip of rubber under its clamp, its lower edge ragged by wear or opened by a tear, over the belt. */
    private static BufferedImage seal(int width, int height, long seed, boolean torn, double grain) {
        SampleBrush brush = new SampleBrush(width, height, seed);
        double u = width / 800.0;
        Shape board = box(0, 0, width, 210 * u);
        brush.shade(board, STEEL_LOW, STEEL);
        brush.streaks(board, 500, 90 * u, 30);
        brush.blotches(board, 14, 40 * u, RUST, 16);
        Shape gap = box(0, 200 * u, width, 260 * u);
        brush.shade(gap, new Color(0x080807), new Color(0x121110));
        Shape belt = box(0, 420 * u, width, height - 420 * u);
        brush.shade(belt, BELT, BELT_LOW);
        brush.streaks(belt, 420, 200 * u, 26);
        Shape strip = strip(u, torn);
        brush.shade(strip, RUBBER, RUBBER_LOW);
        brush.streaks(strip, 260, 60 * u, 30);
        brush.shade(box(0, 150 * u, width, 56 * u), new Color(0x97A0A3), new Color(0x59605F));
        brush.streaks(box(0, 150 * u, width, 56 * u), 120, 80 * u, 40);
        brush.bolts(90 * u, 178 * u, 200 * u, 4, 17 * u);
        Shape fines = through(0, 440 * u, 260 * u, 446 * u, 520 * u, 436 * u, width, 450 * u, width, 500 * u,
                430 * u, 478 * u, 0, 492 * u);
        brush.stones(fines, 7, 13 * u, torn ? LIMESTONE : GRAVEL);
        return brush.finish(grain);
    }

    private static Shape strip(double u, boolean torn) {
        Path2D strip = new Path2D.Double();
        strip.moveTo(0, 190 * u);
        strip.lineTo(800 * u, 190 * u);
        for (int i = 0; i <= 40; i++) {
            double x = 800 - 20.0 * i;
            double worn = 11 * Math.sin(x / 37) + 8 * Math.sin(x / 11) + 26 * Math.sin(x / 210);
            double edge = torn ? 428 + 3 * Math.sin(x / 90) : 376 + worn;
            if (torn && x > 330 && x < 470) {
                edge -= 165 * (1 - Math.abs(x - 400) / 70);
            }
            strip.lineTo(x * u, edge * u);
        }
        strip.closePath();
        return strip;
    }

    private static BufferedImage spillage() {
        SampleBrush brush = new SampleBrush(WIDTH, HEIGHT, 31);
        Shape floor = box(0, 330, WIDTH, 270);
        brush.shade(box(0, 0, WIDTH, 340), new Color(0x3B4144), new Color(0x2A2D2E));
        brush.shade(floor, new Color(0x77746C), new Color(0x57554F));
        brush.streaks(floor, 700, 60, 26);
        Shape board = through(0, 60, WIDTH, 20, WIDTH, 170, 0, 230);
        brush.shade(board, STEEL, STEEL_LOW);
        brush.streaks(board, 500, 110, 30);
        brush.blotches(board, 12, 36, RUST, 14);
        brush.shade(through(0, 222, WIDTH, 160, WIDTH, 196, 0, 262), RUBBER, RUBBER_LOW);
        brush.shade(through(0, 258, WIDTH, 192, WIDTH, 214, 0, 286), BELT, BELT_LOW);
        for (int stand = 0; stand < 3; stand++) {
            double x = 70 + 290 * stand;
            double y = 271 - 24 * stand;
            brush.shade(box(x + 30, y + 10, 20, 210), new Color(0x6B6A4A), new Color(0x44432F));
            brush.shade(box(x + 90, y + 10, 20, 210), new Color(0x6B6A4A), new Color(0x44432F));
            brush.shade(through(x, y, x + 140, y - 11, x + 140, y + 25, x, y + 36), new Color(0xA4A8A6),
                    new Color(0x464948));
        }
        Shape heap = under(HEIGHT, 0, 590, 110, 540, 220, 450, 350, 380, 450, 372, 560, 410, 690, 520, WIDTH, 592);
        brush.shade(heap, new Color(0x8A8578), new Color(0x4F4B43));
        brush.stones(heap, 27, 26, LIMESTONE);
        return brush.finish(4.5);
    }

    private static BufferedImage cakedLiner() {
        SampleBrush brush = new SampleBrush(WIDTH, HEIGHT, 211);
        Shape liner = box(0, 0, WIDTH, 440);
        brush.shade(liner, STEEL_LOW, STEEL);
        brush.streaks(liner, 900, 140, 34);
        brush.blotches(liner, 22, 40, RUST, 14);
        brush.bolts(110, 90, 190, 4, 15);
        brush.bolts(205, 300, 190, 3, 15);
        Shape cake = under(460, 0, 270, 60, 220, 130, 250, 210, 240, 270, 160, 350, 170, 430, 205, 520, 120, 610, 180,
                690, 210, WIDTH, 150);
        brush.shade(cake, GYPSUM, new Color(0xB5AD9E));
        brush.blotches(cake, 120, 26, GYPSUM, 40);
        brush.blotches(cake, 60, 18, new Color(0x8F8676), 18);
        brush.streaks(cake, 300, 26, 36);
        Shape belt = box(0, 440, WIDTH, 160);
        brush.shade(belt, BELT, BELT_LOW);
        brush.streaks(belt, 400, 200, 26);
        brush.stones(through(0, 452, 300, 440, 520, 446, WIDTH, 436, WIDTH, 520, 380, 500, 0, 526), 8, 20, GYPSUM);
        return brush.finish(4.5);
    }

    /** The bytes of a picture in the kind that its name says. */
    static byte[] encoded(String name) {
        BufferedImage picture = ALL.get(name).get();
        ImageWriter writer = ImageIO.getImageWritersBySuffix(name.substring(name.indexOf('.') + 1)).next();
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try (ImageOutputStream out = ImageIO.createImageOutputStream(bytes)) {
            ImageWriteParam settings = writer.getDefaultWriteParam();
            settings.setCompressionMode(ImageWriteParam.MODE_EXPLICIT);
            settings.setCompressionQuality(name.endsWith(".jpg") ? QUALITY : 0);
            writer.setOutput(out);
            writer.write(null, new IIOImage(picture, null, null), settings);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        } finally {
            writer.dispose();
        }
        return bytes.toByteArray();
    }
}
