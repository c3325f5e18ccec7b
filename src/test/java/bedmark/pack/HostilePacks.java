package bedmark.pack;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Random;
import java.util.function.Consumer;
import java.util.function.UnaryOperator;
import java.util.zip.CRC32;

/**
 * The list of hostile packs, one of each kind, built byte by byte and otherwise sound: signed by a trusted device, with
 * a bundle that the schema lets in. The other tests of this package try each kind in all its forms.
 */
final class HostilePacks {
    private static final String PHOTO = "data/photos/a.png";
    private static final String BUNDLE = "data/bundle.json";
    private static final byte[] JUNK = "#!/bin/sh\nexit 0\n".getBytes(StandardCharsets.UTF_8);

    /** A pack with the code of the one reason for which it is refused. */
    record Hostile(String code, byte[] bytes) {
    }

    private final DeviceKey key;
    private final DeviceKey stranger;
    private final Map<String, Hostile> all = new LinkedHashMap<>();

    HostilePacks(DeviceKey key, DeviceKey stranger) {
        this.key = key;
        this.stranger = stranger;
        names();
        archives();
        bags();
        json();
    }

    Map<String, Hostile> all() {
        return all;
    }

    String fingerprint() {
        return key.fingerprint().text();
    }

    byte[] sound() {
        return ZipForge.of(bag(key).files()).build();
    }

    byte[] sameIdWithOtherContent() {
        BagForge bag = bag(key);
        bag.payload.put(BUNDLE, text(bundle(BagForge.PHOTO).replace("as seen", "as seen by somebody else")));
        return ZipForge.of(bag.files()).build();
    }

    private static BagForge bag(DeviceKey key) {
        BagForge bag = new BagForge(key);
        bag.payload.put(BUNDLE, text(bundle(BagForge.PHOTO)));
        return bag;
    }

    /** A small bundle that the schema lets in. */
    static String bundle(byte[] photo) {
        return ("{'format':'bedmark.bundle','version':1,'id':'11111111-1111-4111-8111-111111111111',"
                + "'createdAt':'2026-03-01T08:30:00+01:00','device':{'id':'22222222-2222-4222-8222-222222222222',"
                + "'name':'tablet 7'},'plant':{'id':'p','name':'Demo','conveyors':[{'id':'c','beltWidth':{'value':1200,"
                + "'unit':'mm'}}],'transfers':[{'id':'t1','conveyor':'c'}]},'forms':[],'rounds':[],'surveys':[{"
                + "'id':'00000000-0000-4000-8000-000000000001','revision':1,'transfer':'t1','notes':'as seen',"
                + "'completedAt':'2026-03-01T08:00:00+01:00','readings':{'loadingZoneLength':{'value':6,'unit':'m'}},"
                + "'photos':[{'id':'33333333-3333-4333-8333-333333333333','file':'photos/a.png','sha256':'"
                + Sha256.hex(photo) + "','bytes':" + photo.length + ",'takenAt':'2026-03-01T07:50:00+01:00'}]}]}")
                .replace('\'', '"');
    }

    private static byte[] text(String text) {
        return text.getBytes(StandardCharsets.UTF_8);
    }

    private void zip(String what, String code, Consumer<ZipForge> lie) {
        ZipForge forge = ZipForge.of(bag(key).files());
        lie.accept(forge);
        all.put(what, new Hostile(code, forge.build()));
    }

    private void name(String what, String code, String name) {
        zip(what, code, forge -> forge.and(ForgedEntry.stored(name, JUNK)));
    }

    private void names() {
        name("name with ..", "name-parent", "../evil.png");
        name("absolute name", "name-absolute", "/etc/evil");
        name("drive letter", "name-drive", "C:/evil.png");
        name("UNC name", "name-drive", "\\\\server\\share\\evil");
        name("backslash", "name-backslash", "data\\photos\\evil.png");
        name("NUL in a name", "name-control", "data/photos/evil.png\0.txt");
        zip("symbolic link", "zip-link", forge -> forge.entry(PHOTO).attributes = 0xA1FF_0000);
        name("duplicate name", "zip-name-twice", PHOTO);
        name("clash in case only", "zip-name-clash", "data/photos/A.PNG");
        zip("clash in Unicode form only", "zip-name-clash", forge ->
                forge.and(ForgedEntry.stored("data/photos/\u00e9.png", JUNK))
                        .and(ForgedEntry.stored("data/photos/e\u0301.png", JUNK)));
        name("reserved device name", "name-reserved", "data/photos/nul.png");
    }

    private void archives() {
        zip("headers that disagree", "zip-headers-differ", forge -> forge.entry(PHOTO).localSize++);
        byte[] sound = sound();
        byte[] both = Arrays.copyOf(sound, 2 * sound.length);
        System.arraycopy(sound, 0, both, sound.length, sound.length);
        all.put("two archives in one file", new Hostile("zip-two-archives", both));
        zip("junk before", "zip-junk-before", forge -> forge.before = JUNK);
        zip("overlapping entries", "zip-overlap", forge -> {
            ForgedEntry twin = ForgedEntry.stored(PHOTO, BagForge.PHOTO);
            twin.centralOnly = true;
            forge.and(twin);
        });
        zip("ratio bomb", "zip-ratio-too-high", forge ->
                forge.and(ForgedEntry.deflated("data/photos/bomb.png", new byte[4 << 20])));
        zip("100,000 entries", "zip-entries-too-many", forge -> {
            for (int i = 0; i < 100_000; i++) {
                forge.and(ForgedEntry.stored("data/photos/" + i, new byte[0]));
            }
        });
        zip("size that lies", "zip-size-wrong", forge -> {
            forge.entry(PHOTO).size++;
            forge.entry(PHOTO).localSize++;
        });
        zip("encrypted entry", "zip-encrypted", forge -> {
            forge.entry(PHOTO).flags = 1;
            forge.entry(PHOTO).localFlags = 1;
        });
        zip("bad CRC", "zip-crc-wrong", forge -> {
            forge.entry(PHOTO).crc++;
            forge.entry(PHOTO).localCrc++;
        });
        int[] cuts = new Random(5).ints(20, 4, sound.length).distinct().toArray();
        for (int cut : cuts) {
            all.put("cut off at " + cut, new Hostile("zip-truncated", Arrays.copyOf(sound, cut)));
        }
    }

    private void bag(String what, String code, Consumer<BagForge> lie) {
        BagForge bag = bag(key);
        lie.accept(bag);
        all.put(what, new Hostile(code, ZipForge.of(bag.files()).build()));
    }

    private void files(String what, String code, Consumer<Map<String, byte[]>> lie) {
        Map<String, byte[]> files = bag(key).files();
        lie.accept(files);
        all.put(what, new Hostile(code, ZipForge.of(files).build()));
    }

    private void bags() {
        byte[] archive = ZipForge.of(Map.of("x", new byte[10])).build();
        bag("nested archive", "zip-nested-archive", bag -> bag.payload.put("data/photos/inner.png", archive));
        files("unlisted file", "bag-file-unlisted", files -> files.put("data/photos/b.png", Samples.png(3, 3)));
        files("missing file", "bag-file-missing", files -> files.remove(PHOTO));
        files("wrong digest", "bag-digest-wrong", files -> files.put(PHOTO, Samples.png(2, 3)));
        files("weak digest alone", "bag-digest-weak", files -> {
            files.remove("manifest-sha256.txt");
            files.put("manifest-md5.txt", text("0".repeat(32) + "  " + BUNDLE + "\n"));
        });
        bag("path out of data/", "bag-path-outside", bag -> bag.tags.put("manifest-sha256.txt",
                text(new String(BagForge.manifest(bag.payload), StandardCharsets.UTF_8) + "0".repeat(64)
                        + "  data/../bagit.txt\n")));
        bag("fetch.txt", "bag-fetch", bag -> bag.tags.put("fetch.txt",
                text("https://example.org/a.png 70 data/photos/a.png\n")));
        files("bad signature", "pack-signature-wrong", files -> files.put("signature-ed25519.txt",
                text("A".repeat(86) + "==\n")));
        byte[] signature = bag(key).files().get("signature-ed25519.txt");
        BagForge changed = bag(key);
        changed.payload.put(BUNDLE, text(bundle(BagForge.PHOTO).replace("as seen", "as wished")));
        Map<String, byte[]> remade = changed.files();
        remade.put("signature-ed25519.txt", signature);
        all.put("manifest made anew under an old signature",
                new Hostile("pack-signature-wrong", ZipForge.of(remade).build()));
        all.put("device not trusted", new Hostile("device-untrusted", ZipForge.of(bag(stranger).files()).build()));
        text("future version", "version-unknown", bundle -> bundle.replace("\"version\":1", "\"version\":2"));
    }

    private void text(String what, String code, UnaryOperator<String> lie) {
        bag(what, code, bag -> bag.payload.put(BUNDLE, text(lie.apply(bundle(BagForge.PHOTO)))));
    }

    private void photo(String what, String code, byte[] photo) {
        bag(what, code, bag -> {
            bag.payload.put(BUNDLE, text(bundle(photo)));
            bag.payload.put(PHOTO, photo);
        });
    }

    private void json() {
        text("duplicate keys", "json-unreadable", bundle -> bundle.replaceFirst("\\{", "{\"version\":1,"));
        text("depth", "json-unreadable", bundle -> bundle.replaceFirst("\\{",
                "{\"x\":" + "[".repeat(5000) + "]".repeat(5000) + ","));
        text("1e999999999", "json-unreadable", bundle -> bundle.replace("\"value\":6", "\"value\":1e999999999"));
        text("NaN", "json-unreadable", bundle -> bundle.replace("\"value\":6", "\"value\":NaN"));
        bag("bad UTF-8", "json-not-utf8", bag -> {
            byte[] bytes = text(bundle(BagForge.PHOTO));
            bytes[bytes.length - 4] = (byte) 0xC3;
            bag.payload.put(BUNDLE, bytes);
        });
        text("lone surrogate", "json-unreadable", bundle -> bundle.replace("as seen", "\\ud800"));
        text("trailing text", "json-unreadable", bundle -> bundle + "{}");
        text("unknown unit", "unit-wrong", bundle -> bundle.replace("\"unit\":\"m\"", "\"unit\":\"furlong\""));
        text("unknown transfer", "transfer-unknown", bundle -> bundle.replace("\"transfer\":\"t1\"",
                "\"transfer\":\"t2\""));
        photo("photo that is no photo", "pack-photo-kind", text("MZ no picture"));
        byte[] bomb = BagForge.PHOTO.clone();
        ByteBuffer buffer = ByteBuffer.wrap(bomb).putInt(16, 50_000).putInt(20, 50_000);
        CRC32 crc = new CRC32();
        crc.update(bomb, 12, 17);
        buffer.putInt(29, (int) crc.getValue());
        photo("photo that is a decompression bomb", "pack-photo-too-large", bomb);
    }
}
