package bedmark.pack;

import static org.junit.jupiter.api.Assertions.assertEquals;

import bedmark.document.Defect;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.util.Arrays;
import java.util.HexFormat;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class PhotoHeaderTest {
    private static String doubt(byte[] photo) throws IOException {
        return PhotoHeader.doubt("photo", new ByteArrayInputStream(photo), PackLimits.STANDARD)
                .map(Defect::code).orElse("");
    }

    @Test
    void photosOfBothKindsAreTaken() throws IOException {
        assertEquals("", doubt(Samples.png(40, 30)));
        assertEquals("", doubt(Samples.jpeg(40, 30)));
    }

    /** Cameras put previews, colour profiles and places before the frame, and sometimes a film behind the photo. */
    @Test
    void longNotesAndFillersBeforeTheFrameAreSkipped() throws IOException {
        byte[] jpeg = Samples.jpeg(40, 30);
        ByteArrayOutputStream camera = new ByteArrayOutputStream();
        camera.write(jpeg, 0, 2);
        for (int i = 0; i < 5; i++) {
            camera.writeBytes(HexFormat.of().parseHex("ffffffe1"));
            camera.writeBytes(ByteBuffer.allocate(2).putShort((short) 0xFFFF).array());
            camera.writeBytes(new byte[0xFFFD]);
        }
        camera.write(jpeg, 2, jpeg.length - 2);
        camera.writeBytes(new byte[1000]);
        assertEquals("", doubt(camera.toByteArray()));
    }

    @ParameterizedTest
    @CsvSource({"00000000, pack-photo-kind", "47494638, pack-photo-kind", "424d0000, pack-photo-kind",
        "89504e46, pack-photo-kind", "ffd8ffda, pack-photo-damaged", "ffd8ffd9, pack-photo-damaged",
        "ffd8ff00, pack-photo-damaged", "ffd80000, pack-photo-damaged", "ffd8ffe00000, pack-photo-damaged",
        "ffd8ffe00001, pack-photo-damaged", "ffd8ffc0000b0800000010, pack-photo-damaged",
        "504b0304, zip-nested-archive", "1f8b0800, zip-nested-archive", "377abcaf, zip-nested-archive",
        "52617221, zip-nested-archive", "425a6839, zip-nested-archive", "fd377a58, zip-nested-archive"})
    void otherBeginningsAreRefused(String beginning, String code) throws IOException {
        byte[] photo = HexFormat.of().parseHex(beginning);
        assertEquals(code, doubt(Arrays.copyOf(photo, photo.length + 20)));
    }

    @Test
    void everyCutThroughTheHeaderIsRefused() throws IOException {
        byte[] png = Samples.png(4, 4);
        for (int length = 0; length < 33; length++) {
            assertEquals("pack-photo-damaged", doubt(Arrays.copyOf(png, length)), "PNG cut to " + length);
        }
        byte[] jpeg = Samples.jpeg(4, 4);
        int frame = 2;
        while (jpeg[frame + 1] != (byte) 0xC0) {
            frame += 2 + Short.toUnsignedInt(ByteBuffer.wrap(jpeg).getShort(frame + 2));
        }
        for (int length = 0; length < frame + 9; length++) {
            assertEquals("pack-photo-damaged", doubt(Arrays.copyOf(jpeg, length)), "JPEG cut to " + length);
        }
        assertEquals("", doubt(Arrays.copyOf(jpeg, frame + 9)));
    }
}
