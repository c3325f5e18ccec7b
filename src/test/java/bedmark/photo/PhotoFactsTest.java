package bedmark.photo;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotNull;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDateTime;
import java.time.OffsetDateTime;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.util.Arrays;
import java.util.Optional;
import java.util.Random;
import java.util.zip.CRC32;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class PhotoFactsTest {
    private static final ZoneId BERLIN = ZoneId.of("Europe/Berlin");
    private static final OffsetDateTime NOW = OffsetDateTime.parse("2026-09-22T14:00:00+02:00");
    private static final OffsetDateTime FILE = OffsetDateTime.parse("2026-09-22T13:00:00+02:00");

    @TempDir
    private Path folder;

    /** An Exif block with its three entries, in either byte order. */
    private static byte[] exif(ByteOrder order, int orientation, String time, String offset) {
        ByteBuffer block = ByteBuffer.allocate(200).order(order);
        block.put((order == ByteOrder.LITTLE_ENDIAN ? "II" : "MM").getBytes(StandardCharsets.US_ASCII));
        block.putShort((short) 42).putInt(8);
        block.putShort((short) 2);
        block.putShort((short) 0x0112).putShort((short) 3).putInt(1).putShort((short) orientation).putShort((short) 0);
        block.putShort((short) 0x8769).putShort((short) 4).putInt(1).putInt(38).putInt(0);
        block.putShort((short) 2);
        block.putShort((short) 0x9003).putShort((short) 2).putInt(20).putInt(100);
        block.putShort((short) 0x9011).putShort((short) 2).putInt(7).putInt(130);
        block.position(100);
        block.put(time.getBytes(StandardCharsets.US_ASCII));
        block.position(130);
        block.put(offset.getBytes(StandardCharsets.US_ASCII));
        return block.array();
    }

    private static byte[] jpeg(byte[] exif) {
        ByteBuffer bytes = ByteBuffer.allocate(exif.length + 40);
        bytes.putShort((short) 0xFFD8);
        bytes.putShort((short) 0xFFE0).putShort((short) 16).put(new byte[14]);
        bytes.putShort((short) 0xFFE1).putShort((short) (exif.length + 8));
        bytes.put("Exif\0\0".getBytes(StandardCharsets.US_ASCII)).put(exif);
        bytes.putShort((short) 0xFFDA);
        return bytes.array();
    }

    private static byte[] png(byte[] exif) {
        ByteBuffer bytes = ByteBuffer.allocate(exif.length + 70);
        bytes.putLong(0x8950_4E47_0D0A_1A0AL);
        chunk(bytes, "IHDR", new byte[13]);
        chunk(bytes, "eXIf", exif);
        chunk(bytes, "IEND", new byte[0]);
        return bytes.array();
    }

    private static void chunk(ByteBuffer bytes, String kind, byte[] body) {
        byte[] name = kind.getBytes(StandardCharsets.US_ASCII);
        CRC32 crc = new CRC32();
        crc.update(name);
        crc.update(body);
        bytes.putInt(body.length).put(name).put(body).putInt((int) crc.getValue());
    }

    @Test
    void timeAndOrientationAreReadInBothByteOrdersAndBothKindsOfFile() {
        PhotoFacts expected = new PhotoFacts(Orientation.RIGHT, Optional.of(LocalDateTime.parse("2026-09-22T10:00:06")),
                Optional.of(ZoneOffset.ofHours(2)));
        for (ByteOrder order : new ByteOrder[] {ByteOrder.LITTLE_ENDIAN, ByteOrder.BIG_ENDIAN}) {
            byte[] exif = exif(order, 6, "2026:09:22 10:00:06\0", "+02:00\0");
            assertEquals(expected, PhotoFacts.of(jpeg(exif)));
            assertEquals(expected, PhotoFacts.of(png(exif)));
        }
    }

    @ParameterizedTest
    @EnumSource(Orientation.class)
    void everyOrientationIsKnownByItsNumber(Orientation orientation) {
        assertEquals(orientation, PhotoFacts.of(jpeg(exif(ByteOrder.BIG_ENDIAN, orientation.ordinal() + 1, "", "")))
                .orientation());
    }

    @Test
    void aCameraWithoutAnOffsetIsTakenToBeWhereTheTabletIs() {
        PhotoFacts facts = PhotoFacts.of(jpeg(exif(ByteOrder.BIG_ENDIAN, 1, "2026:01:05 07:30:00\0", "")));
        assertEquals(OffsetDateTime.parse("2026-01-05T07:30:00+01:00"), facts.takenAt(BERLIN, FILE, NOW));
    }

    @Test
    void aTimeThatCannotBeGivesWayToTheFilesOwn() {
        for (String wrong : new String[] {"1970:01:01 00:00:00\0", "2031:01:01 00:00:00\0", "2026:13:01 00:00:00\0",
            "0000:00:00 00:00:00\0", "yesterday afternoon\0"}) {
            PhotoFacts facts = PhotoFacts.of(jpeg(exif(ByteOrder.LITTLE_ENDIAN, 1, wrong, "+99:99\0")));
            assertEquals(FILE, facts.takenAt(BERLIN, FILE, NOW), wrong);
        }
    }

    @Test
    void aFileThatCannotBeReadSaysNothing() {
        assertEquals(PhotoFacts.NONE, PhotoFacts.of(folder.resolve("none.jpg")));
        assertEquals(PhotoFacts.NONE, PhotoFacts.of(new byte[0]));
        assertEquals(PhotoFacts.NONE, PhotoFacts.of("GIF89a nothing else".getBytes(StandardCharsets.US_ASCII)));
    }

    @Test
    void damageIsNeverMoreThanSilence() {
        Random random = new Random(5);
        byte[] jpeg = jpeg(exif(ByteOrder.LITTLE_ENDIAN, 6, "2026:09:22 10:00:06\0", "+02:00\0"));
        byte[] png = png(exif(ByteOrder.BIG_ENDIAN, 6, "2026:09:22 10:00:06\0", "+02:00\0"));
        int silent = 0;
        for (int i = 0; i < 20_000; i++) {
            byte[] damaged = (i % 2 == 0 ? jpeg : png).clone();
            for (int flips = 1 + random.nextInt(4); flips > 0; flips--) {
                damaged[random.nextInt(damaged.length)] = (byte) random.nextInt();
            }
            damaged = Arrays.copyOf(damaged, 1 + random.nextInt(damaged.length));
            PhotoFacts facts = PhotoFacts.of(damaged);
            assertNotNull(facts.takenAt(BERLIN, FILE, NOW));
            silent += facts.equals(PhotoFacts.NONE) ? 1 : 0;
        }
        assertTrue(silent > 1000, "the damage reaches what is read");
    }

    @Test
    void lengthsThatLieAllocateNothing() {
        byte[] huge = png(new byte[0]);
        ByteBuffer.wrap(huge).putInt(8 + 25, Integer.MAX_VALUE);
        assertEquals(PhotoFacts.NONE, PhotoFacts.of(huge));
        byte[] exif = exif(ByteOrder.BIG_ENDIAN, 3, "2026:09:22 10:00:06\0", "");
        ByteBuffer.wrap(exif).putInt(40 + 4, 0x7FFF_FFFF);
        assertEquals(new PhotoFacts(Orientation.HALF_TURN, Optional.empty(), Optional.empty()),
                PhotoFacts.of(jpeg(exif)));
        ByteBuffer.wrap(exif).putInt(4, 0xFFFF_FFF0);
        assertEquals(PhotoFacts.NONE, PhotoFacts.of(jpeg(exif)));
    }

    @Test
    void aBombIsDoubtedBeforeItIsDecoded() throws Exception {
        ByteBuffer header = ByteBuffer.allocate(13).putInt(60_000).putInt(60_000);
        ByteBuffer bytes = ByteBuffer.allocate(60);
        bytes.putLong(0x8950_4E47_0D0A_1A0AL);
        chunk(bytes, "IHDR", header.array());
        Path bomb = Files.write(folder.resolve("bomb.png"), bytes.array());
        assertEquals("pack-photo-too-large", PhotoFacts.doubt(bomb).orElseThrow().code());
        assertEquals(Optional.empty(), PhotoFacts.doubt(Path.of("sample-surveys/photos/tp-10-torn-seal.png")));
    }
}
