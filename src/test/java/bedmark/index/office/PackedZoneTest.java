package bedmark.index.office;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.journal.Digest;
import bedmark.survey.InspectionStatus;
import bedmark.survey.merge.ZoneId;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Zones come out of their blocks as they went in. */
class PackedZoneTest {
    private static final String[] TEXTS = {"", "TP-1", "Förderer 7/2", "a~b/c", "倉庫", "x".repeat(300), "Limestone"};

    private final Random random = new Random(41);

    @Test
    void whateverAZoneHoldsComesBack() {
        for (int i = 0; i < 3000; i++) {
            ZoneRow row = row(new ZoneId(text(), text()));
            PackedZone packed = PackedZone.of(row);
            assertEquals(row, packed.row());
            assertEquals(row.zone(), packed.zone());
            assertEquals(gist(row), packed.gist());
        }
    }

    @Test
    void theSameZonesMakeTheSameBlockHoweverTheyCameIn() {
        List<ZoneRow> rows = new ArrayList<>();
        for (int i = 0; i < 40; i++) {
            rows.add(row(new ZoneId("plant", "TP-" + i)));
        }
        byte[] bytes = block(rows).bytes();
        Collections.shuffle(rows, random);
        assertArrayEquals(bytes, block(rows).bytes());
        assertArrayEquals(bytes, ZoneBlock.of("/plant/0", bytes).bytes());
        PackedZones zones = new PackedZones();
        zones.add(bytes);
        zones.add(bytes);
        assertEquals(2 * rows.size(), zones.size());
        for (ZoneRow row : rows) {
            assertEquals(row, PackedZone.find(bytes, row.zone()).orElseThrow().row());
            assertEquals(2, zones.stream().filter(zone -> zone.row().equals(row)).count());
        }
        assertEquals(Optional.empty(), PackedZone.find(bytes, new ZoneId("plant", "TP-40")));
    }

    @Test
    void aZoneThatStandsOtherwiseIsNoLongerJudged() {
        ZoneRow row = row(new ZoneId("plant", "TP-1"));
        ZoneBlock block = block(List.of(row));
        block.judge(row.zone(), Optional.of(verdict()));
        block.put(row.standing());
        ZoneRow after = PackedZone.find(block.bytes(), row.zone()).orElseThrow().row();
        assertEquals(new ZoneRow(row.names(), row.standing(), Optional.empty()), after);
        assertFalse(ZoneBlock.of("", block.bytes()).changed());
        assertTrue(block.changed());
    }

    @Test
    void everyZoneHasABlockAmongThoseOfItsPlant() {
        for (int i = 0; i < 500; i++) {
            ZoneId zone = new ZoneId(text(), text() + i);
            assertTrue(ZoneBlock.keys(zone.plant()).contains(ZoneBlock.key(zone)));
        }
    }

    @Test
    void bytesThatEndTooEarlyAreABrokenTable() {
        byte[] block = block(List.of(row(new ZoneId("plant", "TP-1")))).bytes();
        for (int length = 0; length < block.length; length++) {
            byte[] cut = Arrays.copyOf(block, length);
            assertThrows(OfficeBroken.class, () -> ZoneBlock.of("", cut), () -> "cut to " + cut.length);
        }
        byte[] values = new PackedWriter(8).text("TP-1").whole(OptionalLong.of(7)).real(OptionalDouble.of(0.5))
                .digest(Optional.of("ab12")).flag(true).bytes();
        for (int length = 0; length < values.length; length++) {
            PackedReader in = new PackedReader(Arrays.copyOf(values, length), 0);
            assertThrows(OfficeBroken.class, () -> List.of(in.text(), in.whole(), in.real(), in.digest(), in.flag()));
        }
    }

    @Test
    void everyFlippedBitOfABlockIsNoticed() {
        byte[] bytes = block(List.of(row(new ZoneId("plant", "TP-1")), row(new ZoneId("plant", "TP-2")))).bytes();
        for (int bit = 0; bit < bytes.length * Byte.SIZE; bit++) {
            byte[] flipped = bytes.clone();
            flipped[bit / Byte.SIZE] ^= (byte) (1 << bit % Byte.SIZE);
            assertThrows(OfficeBroken.class, () -> ZoneBlock.of("", flipped));
            assertThrows(OfficeBroken.class, () -> new PackedZones().add(flipped));
            assertThrows(OfficeBroken.class, () -> PackedZone.find(flipped, new ZoneId("plant", "TP-2")));
        }
    }

    private static ZoneBlock block(List<ZoneRow> rows) {
        ZoneBlock block = new ZoneBlock("/plant/0");
        for (ZoneRow row : rows) {
            block.name(row.names());
            block.put(row.standing());
            block.judge(row.zone(), row.verdict());
        }
        return block;
    }

    private static ZoneGist gist(ZoneRow row) {
        Standing standing = row.standing();
        Verdict verdict = row.verdict().orElse(Verdict.NONE);
        return new ZoneGist(row.names().registered(), standing.visit().isPresent(),
                standing.visitStatus().equals(Optional.of(InspectionStatus.INSPECTED)), standing.latest().isPresent(),
                standing.moment(), verdict.level(), verdict.driveShare(),
                verdict.remedy().isPresent() ? verdict.savingWh() : OptionalDouble.empty(),
                !verdict.findings().isEmpty());
    }

    private ZoneRow row(ZoneId zone) {
        Optional<String> latest = some(digest());
        return new ZoneRow(new ZoneNames(zone, text(), text(), text(), text(), text(), text(), text(),
                random.nextBoolean()), new Standing(zone, random.nextBoolean() ? latest : some(digest()),
                some(InspectionStatus.values()[random.nextInt(InspectionStatus.values().length)]), whole(), latest,
                whole(), random.nextInt(300), random.nextBoolean()), some(verdict()));
    }

    private Verdict verdict() {
        return new Verdict(random.nextInt(5), random.nextBoolean(), real(), real(), real(), real(), real(),
                some(text()), real(), real(), real(), some(text()), some(text()), text());
    }

    /** A survey's, and texts that look like one. */
    private String digest() {
        return switch (random.nextInt(4)) {
            case 0 -> "";
            case 1 -> "ABCDEF";
            case 2 -> "abc";
            default -> Digest.of(text().getBytes(StandardCharsets.UTF_8)).hex();
        };
    }

    private String text() {
        return TEXTS[random.nextInt(TEXTS.length)];
    }

    private OptionalDouble real() {
        return random.nextBoolean() ? OptionalDouble.of(random.nextGaussian()) : OptionalDouble.empty();
    }

    private OptionalLong whole() {
        return random.nextBoolean() ? OptionalLong.of(random.nextLong()) : OptionalLong.empty();
    }

    private <T> Optional<T> some(T value) {
        return random.nextBoolean() ? Optional.of(value) : Optional.empty();
    }
}
