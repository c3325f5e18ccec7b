package bedmark.pack;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Random;
import java.util.function.Consumer;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.junit.jupiter.api.io.TempDir;

/** Every archive of the list of hostile packs, built byte by byte. */
class HostileZipTest {
    private static final String PHOTO = "data/photos/a.png";
    private static final byte[] JUNK = "#!/bin/sh\nexit 0\n".getBytes(StandardCharsets.UTF_8);

    @TempDir
    static Path store;
    private static DeviceKey key;

    @TempDir
    Path folder;

    @BeforeAll
    static void makeKey() {
        key = DeviceKey.of(store);
    }

    private static ZipForge forge() {
        return ZipForge.of(new BagForge(key).files());
    }

    private void refused(String code, ZipForge forge) throws IOException {
        Packs.assertRefused(code, folder, forge.build());
    }

    private void refused(String code, Consumer<ZipForge> lie) throws IOException {
        ZipForge forge = forge();
        lie.accept(forge);
        refused(code, forge);
    }

    @Test
    void theForgedPackItselfIsSound() throws IOException {
        assertEquals(key.fingerprint(), Packs.open(folder, forge().build()).fingerprint());
    }

    @TestFactory
    Stream<DynamicTest> namesThatLeadElsewhereAreRefused() {
        Map<String, String> names = new LinkedHashMap<>();
        names.put("../evil.png", "name-parent");
        names.put("data/photos/../../../evil", "name-parent");
        names.put("/etc/evil", "name-absolute");
        names.put("C:/evil.png", "name-drive");
        names.put("c:evil.png", "name-drive");
        names.put("\\\\server\\share\\evil", "name-drive");
        names.put("//server/share/evil", "name-drive");
        names.put("data\\photos\\evil.png", "name-backslash");
        names.put("data/photos/..\\evil.png", "name-backslash");
        names.put("data/photos/evil.png\0.txt", "name-control");
        names.put("data/photos/\u001b[2Jevil.png", "name-control");
        names.put("data/photos/\u202egnp.exe", "name-control");
        names.put("data/photos/CON", "name-reserved");
        names.put("data/photos/nul.png", "name-reserved");
        names.put("data/com1.photos/x.png", "name-reserved");
        names.put("data/photos/lpt\u00b9.png", "name-reserved");
        names.put("data/photos/a.png:stream", "name-unsafe");
        names.put("data/photos/evil.", "name-unsafe");
        names.put("data/photos/evil ", "name-unsafe");
        names.put("data/photos//evil.png", "name-unsafe");
        names.put("data/photos/./evil.png", "name-unsafe");
        names.put("data/photos/" + "e".repeat(256), "name-unsafe");
        names.put("/", "name-absolute");
        return names.entrySet().stream().map(name -> DynamicTest.dynamicTest(EntryName.shown(name.getKey()), () ->
                refused(name.getValue(), forge().and(ForgedEntry.stored(name.getKey(), JUNK)))));
    }

    @Test
    void namesInNoKnownWritingAreRefused() throws IOException {
        ForgedEntry latin = ForgedEntry.stored("data/photos/x.png", JUNK);
        latin.centralName = "data/photos/\u00e9.png".getBytes(StandardCharsets.ISO_8859_1);
        latin.localName = latin.centralName;
        refused("name-not-utf8", forge().and(latin));
        ForgedEntry unflagged = ForgedEntry.stored("data/photos/\u00e9.png", JUNK);
        unflagged.flags = 0;
        unflagged.localFlags = 0;
        refused("name-not-utf8", forge().and(unflagged));
    }

    @Test
    void linksAndDevicesAreRefused() throws IOException {
        refused("zip-link", forge -> forge.entry(PHOTO).attributes = 0xA1FF_0000);
        refused("zip-kind-wrong", forge -> forge.entry(PHOTO).attributes = 0x61B4_0000);
        refused("zip-kind-wrong", forge -> forge.entry(PHOTO).attributes = 0x0000_0010);
        refused("zip-kind-wrong", forge().and(ForgedEntry.stored("data/photos/", JUNK)));
    }

    @Test
    void doubleNamesAreRefused() throws IOException {
        refused("zip-name-twice", forge().and(ForgedEntry.stored(PHOTO, JUNK)));
    }

    @Test
    void namesThatAreOneOnSomeSystemAreRefused() throws IOException {
        refused("zip-name-clash", forge().and(ForgedEntry.stored("data/photos/A.PNG", JUNK)));
        refused("zip-name-clash", forge().and(ForgedEntry.stored("data/photos/\u00e9.png", JUNK))
                .and(ForgedEntry.stored("data/photos/e\u0301.png", JUNK)));
        refused("zip-name-clash", forge().and(ForgedEntry.stored("data/photos/\ufb01.png", JUNK))
                .and(ForgedEntry.stored("data/photos/fi.png", JUNK)));
        refused("zip-name-clash", forge().and(ForgedEntry.stored(PHOTO + "/inner.png", JUNK)));
    }

    @Test
    void headersThatDisagreeAreRefused() throws IOException {
        refused("zip-headers-differ", forge -> forge.entry(PHOTO).localName =
                "data/photos/b.png".getBytes(StandardCharsets.UTF_8));
        refused("zip-headers-differ", forge -> forge.entry(PHOTO).localMethod = 8);
        refused("zip-headers-differ", forge -> forge.entry(PHOTO).localFlags = 2);
        refused("zip-headers-differ", forge -> forge.entry(PHOTO).localTime = 1);
        refused("zip-headers-differ", forge -> forge.entry(PHOTO).localCrc++);
        refused("zip-headers-differ", forge -> forge.entry(PHOTO).localSize++);
        refused("zip-headers-differ", forge -> forge.entry(PHOTO).localPacked--);
        refused("zip-headers-differ", forge -> forge.entry(PHOTO).shift = 1);
        refused("zip-headers-differ", forge -> forge.directoryReversed = true);
    }

    @Test
    void aDescriptorThatDisagreesIsRefused() throws IOException {
        BagForge bag = new BagForge(key);
        ZipForge forge = ZipForge.of(bag.files());
        forge.entries.remove(forge.entry(PHOTO));
        ForgedEntry entry = ForgedEntry.deflated(PHOTO, BagForge.PHOTO);
        entry.flags = 8;
        entry.localFlags = 8;
        entry.localCrc = 0;
        entry.localSize = 0;
        entry.localPacked = 0;
        forge.and(entry);
        entry.descriptor = ZipForge.buffer(16).putInt(0x08074b50).putInt((int) entry.crc)
                .putInt((int) entry.packed).putInt((int) entry.size).array();
        assertEquals(1, Packs.open(folder, forge.build()).photos().size());
        entry.descriptor[15] = 1;
        refused("zip-headers-differ", forge);
    }

    @Test
    void twoArchivesInOneFileAreRefused() throws IOException {
        byte[] first = forge().build();
        ByteArrayOutputStream both = new ByteArrayOutputStream();
        both.writeBytes(first);
        both.writeBytes(first);
        Packs.assertRefused("zip-two-archives", folder, both.toByteArray());
        ZipForge adjusted = forge();
        adjusted.before = first;
        refused("zip-two-archives", adjusted);
        refused("zip-two-archives", forge -> forge.comment = first);
    }

    @Test
    void whatStandsAroundTheArchiveIsRefused() throws IOException {
        refused("zip-junk-before", forge -> forge.before = JUNK);
        refused("zip-junk-before", forge -> {
            forge.before = JUNK;
            forge.shift = -JUNK.length;
        });
        refused("zip-junk-after", forge -> forge.after = JUNK);
        refused("zip-comment", forge -> forge.comment = JUNK);
        refused("zip-comment", forge -> forge.entry(PHOTO).comment = JUNK);
        refused("zip-gap", forge -> forge.entry(PHOTO).gapBefore = JUNK);
        refused("zip-gap", forge -> forge.beforeDirectory = JUNK);
        refused("zip-gap", forge -> forge.beforeEnd = JUNK);
        ForgedEntry hidden = ForgedEntry.stored("data/photos/hidden.png", JUNK);
        hidden.localOnly = true;
        refused("zip-gap", forge().and(hidden));
    }

    @Test
    void overlappingEntriesAreRefused() throws IOException {
        ForgedEntry twin = ForgedEntry.stored(PHOTO, BagForge.PHOTO);
        twin.centralOnly = true;
        refused("zip-overlap", forge().and(twin));
        byte[] inner = ZipForge.of(Map.of("inner.png", BagForge.PHOTO)).build();
        ForgedEntry quoting = ForgedEntry.stored("data/photos/quoting.png", inner);
        ForgedEntry quoted = ForgedEntry.stored("inner.png", BagForge.PHOTO);
        quoted.version = 20;
        quoted.centralOnly = true;
        quoted.shift = 30 + quoting.localName.length;
        refused("zip-overlap", forge().and(quoting).and(quoted));
    }

    @Test
    void ratioBombsAreRefused() throws IOException {
        refused("zip-ratio-too-high", forge().and(ForgedEntry.deflated("data/photos/bomb.png", new byte[4 << 20])));
        ZipForge many = forge();
        for (int i = 0; i < 40; i++) {
            many.and(ForgedEntry.deflated("data/photos/bomb" + i + ".png", new byte[1 << 20]));
        }
        refused("zip-ratio-too-high", many);
    }

    @Test
    void announcedSizesHaveLimits() throws IOException {
        PackLimits small = new PackLimits(1 << 20, 20, 5_000, 6_000, 3_000, 1_000, 1_000, 100, 100, 10_000);
        byte[] noise = new byte[5_001];
        new Random(7).nextBytes(noise);
        Packs.assertRefused("zip-entry-too-large", folder,
                forge().and(ForgedEntry.stored("data/photos/b.png", noise)).build(), small);
        Packs.assertRefused("zip-total-too-large", folder,
                forge().and(ForgedEntry.stored("data/photos/b.png", Arrays.copyOf(noise, 4_900))).build(), small);
        Packs.assertRefused("pack-too-large", folder, new byte[(1 << 20) + 1], small);
        Packs.assertRefused("zip-entry-too-large", folder, forge().build(),
                new PackLimits(1 << 20, 20, 5_000, 6_000, 100, 1_000, 1_000, 100, 100, 10_000));
        Packs.assertRefused("zip-entry-too-large", folder, forge().build(),
                new PackLimits(1 << 20, 20, 5_000, 6_000, 3_000, 100, 1_000, 100, 100, 10_000));
        Packs.assertRefused("pack-bundle-too-full", folder, forge().build(),
                new PackLimits(1 << 20, 20, 5_000, 6_000, 3_000, 1_000, 20, 100, 100, 10_000));
    }

    @Test
    void aHundredThousandEntriesAreRefused() throws IOException {
        ZipForge forge = new ZipForge();
        for (int i = 0; i < 100_000; i++) {
            forge.and(ForgedEntry.stored("data/photos/" + i, new byte[0]));
        }
        refused("zip-entries-too-many", forge);
        forge.countShift = 0xFFFF - 100_000;
        refused("zip-entries-too-many", forge);
        forge.countShift = 100 - 100_000;
        refused("zip-directory-wrong", forge);
    }

    @Test
    void sizesThatLieAreRefused() throws IOException {
        refused("zip-size-wrong", forge -> {
            ForgedEntry entry = forge.entry(PHOTO);
            entry.size++;
            entry.localSize++;
        });
        for (int lie : new int[] {-1, 1}) {
            ForgedEntry entry = ForgedEntry.deflated("data/photos/b.png", new byte[1000]);
            entry.size += lie;
            entry.localSize += lie;
            refused("zip-size-wrong", forge().and(entry));
        }
        ForgedEntry padded = ForgedEntry.deflated("data/photos/b.png", new byte[1000]);
        padded.data = Arrays.copyOf(padded.data, padded.data.length + 5);
        padded.packed += 5;
        padded.localPacked += 5;
        refused("zip-size-wrong", forge().and(padded));
    }

    @Test
    void encryptedEntriesAreRefused() throws IOException {
        for (int flags : new int[] {0x0001, 0x0041, 0x2000}) {
            refused("zip-encrypted", forge -> {
                forge.entry(PHOTO).flags = flags;
                forge.entry(PHOTO).localFlags = flags;
            });
        }
    }

    @Test
    void damagedContentIsRefused() throws IOException {
        refused("zip-crc-wrong", forge -> {
            ForgedEntry entry = forge.entry(PHOTO);
            entry.data = entry.data.clone();
            entry.data[20] ^= 1;
        });
        ForgedEntry broken = ForgedEntry.deflated("data/photos/b.png", new byte[1000]);
        broken.data[0] = (byte) 0xFF;
        refused("zip-data-damaged", forge().and(broken));
        ForgedEntry cut = ForgedEntry.deflated("data/photos/b.png", BagForge.PHOTO);
        cut.data = Arrays.copyOf(cut.data, cut.data.length - 3);
        cut.packed -= 3;
        cut.localPacked -= 3;
        refused("zip-data-damaged", forge().and(cut));
    }

    @Test
    void featuresThatPacksDoNotUseAreRefused() throws IOException {
        refused("zip-feature-unknown", forge -> {
            forge.entry(PHOTO).method = 12;
            forge.entry(PHOTO).localMethod = 12;
        });
        refused("zip-feature-unknown", forge -> forge.entry(PHOTO).version = 45);
        refused("zip-feature-unknown", forge -> {
            forge.entry(PHOTO).flags = 0x0020;
            forge.entry(PHOTO).localFlags = 0x0020;
        });
        refused("zip-feature-unknown", forge -> {
            forge.entry(PHOTO).flags = 8;
            forge.entry(PHOTO).localFlags = 8;
        });
        refused("zip-feature-unknown", forge -> forge.disk = 1);
        refused("zip-feature-unknown", forge -> forge.entry(PHOTO).disk = 1);
        refused("zip-feature-unknown", forge -> forge.beforeEnd =
                ZipForge.buffer(20).putInt(0x07064b50).array());
        byte[] otherName = ZipForge.buffer(9).putShort((short) 0x7075).putShort((short) 5).array();
        refused("zip-feature-unknown", forge -> forge.entry(PHOTO).centralExtra = otherName);
        refused("zip-feature-unknown", forge -> forge.entry(PHOTO).localExtra = otherName);
        byte[] zip64 = ZipForge.buffer(20).putShort((short) 1).putShort((short) 16).array();
        refused("zip-feature-unknown", forge -> forge.entry(PHOTO).centralExtra = zip64);
        byte[] tooLong = ZipForge.buffer(4).putShort((short) 0x5455).putShort((short) 5).array();
        refused("zip-feature-unknown", forge -> forge.entry(PHOTO).localExtra = tooLong);
        refused("zip-feature-unknown", forge -> forge.entry(PHOTO).localExtra = new byte[3]);
    }

    @Test
    void aDirectoryThatContradictsItselfIsRefused() throws IOException {
        refused("zip-directory-wrong", forge -> forge.countShift = 1);
        refused("zip-directory-wrong", forge -> forge.countShift = -1);
        refused("zip-directory-wrong", forge -> forge.shift = 1);
        refused("zip-truncated", forge -> forge.entry(PHOTO).shift = 1 << 20);
    }

    @Test
    void whatIsNoArchiveIsRefused() throws IOException {
        Packs.assertRefused("pack-not-zip", folder, JUNK);
        Packs.assertRefused("pack-not-zip", folder, new byte[0]);
        Packs.assertRefused("pack-not-zip", folder, new byte[100_000]);
        refused("bag-file-missing", new ZipForge());
    }
}
