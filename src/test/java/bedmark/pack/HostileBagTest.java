package bedmark.pack;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;

import bedmark.json.JsonWriter;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.HexFormat;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.function.Consumer;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Sound archives with bags that are not. Most are properly signed, since anyone can sign with a key of his own. */
class HostileBagTest {
    private static final String PHOTO = "data/photos/a.png";

    @TempDir
    static Path store;
    @TempDir
    static Path otherStore;
    private static DeviceKey key;

    @TempDir
    Path folder;
    private BagForge bag;

    @BeforeAll
    static void makeKey() {
        key = DeviceKey.of(store);
    }

    @BeforeEach
    void makeBag() {
        bag = new BagForge(key);
    }

    private void refused(String code, Map<String, byte[]> files) throws IOException {
        Packs.assertRefused(code, folder, ZipForge.of(files).build());
    }

    /** The finished files are tampered with. */
    private void refusedAfter(String code, Consumer<Map<String, byte[]>> lie) throws IOException {
        Map<String, byte[]> files = bag.files();
        lie.accept(files);
        refused(code, files);
    }

    private void accepted(Map<String, byte[]> files) throws IOException {
        ReadPack pack = Packs.open(folder, ZipForge.of(files).build());
        assertEquals(List.of(new PackedPhoto("a.png", Sha256.hex(BagForge.PHOTO), BagForge.PHOTO.length)),
                pack.photos());
    }

    /** What the bag's manifest says of the payload when something is put into it. */
    private Map<String, byte[]> withManifest(String lines) {
        bag.tags.put("manifest-sha256.txt", BagForge.text(lines));
        return bag.files();
    }

    private String lines() {
        return new String(BagForge.manifest(bag.payload), StandardCharsets.UTF_8);
    }

    @Test
    void unlistedFilesAreRefused() throws IOException {
        refusedAfter("bag-file-unlisted", files -> files.put("data/photos/b.png", BagForge.PHOTO));
        refusedAfter("bag-file-unlisted", files -> files.put("notes.txt", BagForge.text("hello")));
        refusedAfter("bag-file-unlisted", files -> files.put("tagmanifest-sha512.txt", BagForge.text("")));
        refusedAfter("bag-file-unlisted", files -> files.put("data/photos/evil.sh", BagForge.text("#!/bin/sh")));
        ZipForge forge = ZipForge.of(bag.files());
        ForgedEntry empty = ForgedEntry.stored("elsewhere/", new byte[0]);
        empty.attributes = 0x41ED_0010;
        Packs.assertRefused("bag-file-unlisted", folder, forge.and(empty).build());
    }

    @ParameterizedTest
    @ValueSource(strings = {"bagit.txt", "bag-info.txt", "manifest-sha256.txt", "tagmanifest-sha256.txt",
        "data/bundle.json", PHOTO})
    void missingFilesAreRefused(String name) throws IOException {
        refusedAfter("bag-file-missing", files -> files.remove(name));
    }

    @ParameterizedTest
    @ValueSource(strings = {"signature-ed25519.txt", "device-key.txt"})
    void unsignedPacksAreRefused(String name) throws IOException {
        refusedAfter("pack-unsigned", files -> files.remove(name));
    }

    @ParameterizedTest
    @ValueSource(strings = {"bagit.txt", "bag-info.txt", "manifest-sha256.txt", "data/bundle.json", PHOTO})
    void changedFilesAreRefused(String name) throws IOException {
        refusedAfter("bag-digest-wrong", files -> {
            byte[] changed = files.get(name).clone();
            changed[changed.length - 1] ^= 1;
            files.put(name, changed);
        });
    }

    @Test
    void weakDigestsAloneAreRefused() throws IOException {
        for (String weak : List.of("manifest-md5.txt", "manifest-sha1.txt")) {
            refusedAfter("bag-digest-weak", files -> {
                files.remove("manifest-sha256.txt");
                files.put(weak, BagForge.text(""));
            });
        }
        refusedAfter("bag-digest-unknown", files -> files.put("manifest-crc32.txt", BagForge.text("")));
        refusedAfter("bag-file-missing", files -> {
            files.remove("manifest-sha256.txt");
            files.put("manifest-sha512.txt", BagForge.text(""));
        });
    }

    @Test
    void aSecondManifestMustBeTrueToo() throws IOException {
        StringBuilder lines = new StringBuilder();
        bag.payload.forEach((name, content) -> lines.append(Sha256.hex(Sha256.begin("MD5"), content))
                .append("  ").append(name).append('\n'));
        bag.tags.put("manifest-md5.txt", BagForge.text(lines.toString()));
        accepted(bag.files());
        lines.setCharAt(0, lines.charAt(0) == '0' ? '1' : '0');
        bag.tags.put("manifest-md5.txt", BagForge.text(lines.toString()));
        refused("bag-digest-wrong", bag.files());
    }

    @ParameterizedTest
    @ValueSource(strings = {"data/../bagit.txt", "../outside.txt", "/etc/passwd", "bagit.txt", "C:/x", "data\\x",
        "data/a%0Ab", "*data/bundle.json", "./data/bundle.json"})
    void pathsOutOfThePayloadAreRefused(String path) throws IOException {
        refused("bag-path-outside", withManifest(lines() + "0".repeat(64) + "  " + path + "\n"));
    }

    @Test
    void aTagManifestListsNoPayload() throws IOException {
        Map<String, byte[]> files = bag.files();
        Map<String, byte[]> listed = new LinkedHashMap<>(bag.tags);
        listed.put("manifest-sha256.txt", files.get("manifest-sha256.txt"));
        listed.put("bag-info.txt", files.get("bag-info.txt"));
        listed.put(PHOTO, BagForge.PHOTO);
        files.put("tagmanifest-sha256.txt", BagForge.manifest(listed));
        files.put("signature-ed25519.txt", bag.signature(files.get("tagmanifest-sha256.txt")));
        refused("bag-path-outside", files);
    }

    @Test
    void brokenManifestsAreRefused() throws IOException {
        refused("bag-manifest-line", withManifest(lines() + "nonsense\n"));
        refused("bag-manifest-line", withManifest(lines() + "\n"));
        refused("bag-manifest-line", withManifest(lines().replaceFirst("^..", "")));
        refused("bag-manifest-twice", withManifest(lines() + lines()));
        refused("bag-file-missing", withManifest(lines() + "0".repeat(64) + "  data/photos/b.png\n"));
        refused("bag-file-unlisted", withManifest(lines().lines().findFirst().orElseThrow()));
        bag.tags.put("manifest-sha256.txt", new byte[] {(byte) 0xC3, '\n'});
        refused("name-not-utf8", bag.files());
    }

    @Test
    void whatIsMerelyWrittenOtherwiseIsRead() throws IOException {
        accepted(withManifest(lines().replace("\n", "\r\n").toUpperCase(Locale.ROOT)
                .replace("DATA/BUNDLE.JSON", "data/bundle.json").replace("DATA/PHOTOS/A.PNG", PHOTO)));
    }

    @Test
    void filesToBeFetchedAreRefused() throws IOException {
        bag.tags.put("fetch.txt", BagForge.text("https://example.org/a.png 70 data/photos/a.png\n"));
        refused("bag-fetch", bag.files());
    }

    @Test
    void badSignaturesAreRefused() throws IOException {
        refusedAfter("pack-signature-wrong", files -> files.put("signature-ed25519.txt",
                bag.signature(BagForge.text("something else"))));
        for (String text : List.of("", "\n", "AAAA\n", "no base64!\n", "A".repeat(86) + "==\n")) {
            refusedAfter("pack-signature-wrong", files -> files.put("signature-ed25519.txt", BagForge.text(text)));
        }
        refusedAfter("pack-signature-wrong", files -> files.put("signature-ed25519.txt",
                BagForge.text(" " + new String(files.get("signature-ed25519.txt"), StandardCharsets.US_ASCII))));
        refusedAfter("pack-signature-wrong", files -> files.put("device-key.txt",
                DeviceKey.of(otherStore).publicText()));
    }

    @Test
    void badKeysAreRefused() throws IOException {
        for (String text : List.of("", "-----BEGIN PUBLIC KEY-----\n\n-----END PUBLIC KEY-----\n",
                "-----BEGIN PUBLIC KEY-----\nAAAA\n-----END PUBLIC KEY-----\n")) {
            refusedAfter("pack-key-wrong", files -> files.put("device-key.txt", BagForge.text(text)));
        }
        refusedAfter("pack-key-wrong", files -> files.put("device-key.txt",
                BagForge.text(new String(files.get("device-key.txt"), StandardCharsets.US_ASCII) + "\n")));
    }

    /** Whoever changes a pack can make both manifests anew, but not the signature of the device. */
    @Test
    void manifestsMadeAnewUnderAnOldSignatureAreRefused() throws IOException {
        byte[] oldSignature = bag.files().get("signature-ed25519.txt");
        byte[] other = Samples.png(3, 3);
        bag.payload.put("data/bundle.json",
                JsonWriter.indented(Samples.bundle(Map.of("a.png", other)).document()));
        bag.payload.put(PHOTO, other);
        Map<String, byte[]> files = bag.files();
        assertEquals(1, Packs.open(folder, ZipForge.of(files).build()).photos().size());
        files.put("signature-ed25519.txt", oldSignature);
        refused("pack-signature-wrong", files);
    }

    @Test
    void aPackSignedAnewByAnotherDeviceShowsIt() throws IOException {
        DeviceKey other = DeviceKey.of(otherStore);
        ReadPack pack = Packs.open(folder, ZipForge.of(new BagForge(other).files()).build());
        assertEquals(other.fingerprint(), pack.fingerprint());
        assertNotEquals(key.fingerprint(), pack.fingerprint());
    }

    @Test
    void otherBagVersionsAreRefused() throws IOException {
        bag.tags.put("bagit.txt", BagForge.text("BagIt-Version: 2.0\nTag-File-Character-Encoding: UTF-8\n"));
        refused("bag-declaration-wrong", bag.files());
        bag.tags.put("bagit.txt", BagForge.text("BagIt-Version: 1.0\nTag-File-Character-Encoding: UTF-16\n"));
        refused("bag-declaration-wrong", bag.files());
    }

    @Test
    void aPayloadOtherThanAnnouncedIsRefused() throws IOException {
        bag.tags.put("bag-info.txt", BagForge.text("Payload-Oxum: 1.1\n"));
        refused("bag-oxum-wrong", bag.files());
    }

    @Test
    void foreignAndNestedContentIsRefused() throws IOException {
        bag.payload.put("data/notes.txt", BagForge.text("hello"));
        refused("bag-file-foreign", bag.files());
        bag.payload.remove("data/notes.txt");
        byte[] archive = ZipForge.of(Map.of("x", new byte[10])).build();
        bag.payload.put("data/inner.zip", archive);
        refused("zip-nested-archive", bag.files());
        bag.payload.remove("data/inner.zip");
        bag.payload.put("data/photos/inner.png", archive);
        refused("zip-nested-archive", bag.files());
        bag.payload.remove("data/photos/inner.png");
        bag.tags.put("inner.gz", HexFormat.of().parseHex("1f8b0800000000000003"));
        refused("zip-nested-archive", bag.files());
    }

    @Test
    void otherListedTagFilesAreLetIn() throws IOException {
        bag.tags.put("notes.txt", BagForge.text("hello"));
        accepted(bag.files());
    }

    @Test
    void aBagInOneFolderIsRead() throws IOException {
        Map<String, byte[]> inFolder = new LinkedHashMap<>();
        bag.files().forEach((name, content) -> inFolder.put("north round/" + name, content));
        accepted(inFolder);
        inFolder.put("beside.txt", BagForge.text("hello"));
        refused("bag-file-missing", inFolder);
    }
}
