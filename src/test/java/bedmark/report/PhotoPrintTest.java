package bedmark.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.report.paper.Booklet;
import bedmark.report.paper.PaperSize;
import java.awt.image.BufferedImage;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.Arrays;
import java.util.Locale;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.Test;

class PhotoPrintTest {
    private static byte[] jpeg(int width, int height) throws IOException {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        ImageIO.write(new BufferedImage(width, height, BufferedImage.TYPE_INT_RGB), "jpg", out);
        return out.toByteArray();
    }

    /** The same photo with what a camera writes of how it was held. */
    private static byte[] held(byte[] jpeg, int orientation, ByteOrder order) {
        ByteBuffer tiff = ByteBuffer.allocate(26).order(order);
        tiff.put((order == ByteOrder.LITTLE_ENDIAN ? "II" : "MM").getBytes(StandardCharsets.US_ASCII));
        tiff.putShort((short) 42).putInt(8).putShort((short) 1);
        tiff.putShort((short) 0x0112).putShort((short) 3).putInt(1).putShort((short) orientation).putShort((short) 0);
        ByteBuffer all = ByteBuffer.allocate(jpeg.length + 36);
        all.put(jpeg, 0, 2).putShort((short) 0xFFE1).putShort((short) 34);
        all.put("Exif\0\0".getBytes(StandardCharsets.US_ASCII)).put(tiff.array()).put(jpeg, 2, jpeg.length - 2);
        return all.array();
    }

    private static double aspect(byte[] photo) throws IOException {
        try (Booklet booklet = new Booklet(PaperSize.A4, new Booklet.Imprint("t", Locale.ENGLISH, "p",
                OffsetDateTime.parse("2026-04-01T08:00:00Z")))) {
            return new PhotoPrint(booklet).of(photo).orElseThrow().aspect();
        }
    }

    @Test
    void aPhotoStandsAsItWasTaken() throws IOException {
        byte[] photo = jpeg(400, 100);
        assertEquals(Turning.UPRIGHT, Turning.of(photo));
        for (ByteOrder order : new ByteOrder[] {ByteOrder.LITTLE_ENDIAN, ByteOrder.BIG_ENDIAN}) {
            assertEquals(Turning.UPSIDE_DOWN, Turning.of(held(photo, 3, order)));
            assertEquals(Turning.QUARTER_RIGHT, Turning.of(held(photo, 6, order)));
            assertEquals(Turning.QUARTER_LEFT, Turning.of(held(photo, 8, order)));
        }
        assertEquals(4, aspect(photo), 1e-9);
        assertEquals(0.25, aspect(held(photo, 6, ByteOrder.BIG_ENDIAN)), 1e-9);
    }

    @Test
    void aCutOffOrForeignPhotoIsUprightAndNoFailure() throws IOException {
        byte[] photo = held(jpeg(40, 30), 6, ByteOrder.LITTLE_ENDIAN);
        for (int length = 0; length < 60; length++) {
            assertTrue(Turning.of(Arrays.copyOf(photo, length)) == Turning.UPRIGHT || length > 30);
        }
        assertEquals(Turning.UPRIGHT, Turning.of("no photo at all".getBytes(StandardCharsets.US_ASCII)));
    }

    @Test
    void aPrintIsNoLargerThanAPrint() throws IOException {
        byte[] large = jpeg(4000, 3000);
        assertEquals(4.0 / 3, aspect(large), 0.01);
    }

    @Test
    void whatIsNoPhotoIsLeftOut() throws IOException {
        try (Booklet booklet = new Booklet(PaperSize.A4, new Booklet.Imprint("t", Locale.ENGLISH, "p",
                OffsetDateTime.parse("2026-04-01T08:00:00Z")))) {
            PhotoPrint print = new PhotoPrint(booklet);
            assertFalse(print.of(new byte[0]).isPresent());
            assertFalse(print.of("GIF89a".getBytes(StandardCharsets.US_ASCII)).isPresent());
            byte[] cut = Files.readAllBytes(Path.of("sample-surveys/photos/tp-08-worn-seal.jpg"));
            assertTrue(print.of(cut).isPresent());
            assertFalse(print.of(Arrays.copyOf(cut, 200)).isPresent());
        }
    }
}
