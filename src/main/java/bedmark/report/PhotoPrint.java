package bedmark.report;

import bedmark.report.paper.Booklet;
import bedmark.report.paper.Photograph;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.util.Iterator;
import java.util.Optional;
import javax.imageio.ImageIO;
import javax.imageio.ImageReadParam;
import javax.imageio.ImageReader;
import javax.imageio.stream.ImageInputStream;

/**
 * Photos at the size of a print: only the pixels are kept, turned as they were taken, and none of what a camera writes
 * beside them, such as where it stood.
 */
final class PhotoPrint {
    /** Longer side (px): about 300 to the inch at the width that a photo has. */
    private static final int LONGEST = 900;
    /** A photo of more pixels is no photo. */
    private static final long MOST_PIXELS = 200_000_000L;

    private final Booklet booklet;

    PhotoPrint(Booklet booklet) {
        this.booklet = booklet;
    }

    /** The print; nothing where the bytes are no photo that can be read. */
    Optional<Photograph> of(byte[] bytes) {
        try (ImageInputStream stream = ImageIO.createImageInputStream(new ByteArrayInputStream(bytes))) {
            Iterator<ImageReader> readers = ImageIO.getImageReaders(stream);
            if (!readers.hasNext()) {
                return Optional.empty();
            }
            ImageReader reader = readers.next();
            try {
                reader.setInput(stream, true, true);
                return read(reader).map(image -> booklet.photograph(scaled(image, Turning.of(bytes))));
            } finally {
                reader.dispose();
            }
        } catch (IOException | RuntimeException e) {
            return Optional.empty();
        }
    }

    private static Optional<BufferedImage> read(ImageReader reader) throws IOException {
        long width = reader.getWidth(0);
        long height = reader.getHeight(0);
        if (width * height > MOST_PIXELS) {
            return Optional.empty();
        }
        ImageReadParam sparse = reader.getDefaultReadParam();
        int step = (int) Math.max(1, Math.max(width, height) / (2L * LONGEST));
        sparse.setSourceSubsampling(step, step, 0, 0);
        return Optional.of(reader.read(0, sparse));
    }

    private static BufferedImage scaled(BufferedImage image, Turning turning) {
        double scale = Math.min(1, LONGEST / (double) Math.max(image.getWidth(), image.getHeight()));
        int width = Math.max(1, (int) Math.round(image.getWidth() * scale));
        int height = Math.max(1, (int) Math.round(image.getHeight() * scale));
        boolean lying = turning.swapsSides();
        BufferedImage print = new BufferedImage(lying ? height : width, lying ? width : height,
                BufferedImage.TYPE_INT_RGB);
        Graphics2D graphics = print.createGraphics();
        graphics.setRenderingHint(RenderingHints.KEY_INTERPOLATION, RenderingHints.VALUE_INTERPOLATION_BILINEAR);
        graphics.transform(turning.upright(width, height));
        graphics.drawImage(image, 0, 0, width, height, null);
        graphics.dispose();
        return print;
    }
}
