package bedmark.pack;

import bedmark.json.JsonWriter;
import java.nio.charset.StandardCharsets;
import java.util.Base64;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.TreeMap;

/** Builds the files of a bag on its own, without the writer; sound unless a test says otherwise. */
final class BagForge {
    static final byte[] PHOTO = Samples.png(2, 2);

    private final DeviceKey key;
    final Map<String, byte[]> payload = new LinkedHashMap<>();
    /** Tag files that the tag manifest lists, but for the manifest itself. */
    final Map<String, byte[]> tags = new LinkedHashMap<>();

    BagForge(DeviceKey key) {
        this.key = key;
        payload.put("data/bundle.json", JsonWriter.indented(Samples.bundle(Map.of("a.png", PHOTO)).document()));
        payload.put("data/photos/a.png", PHOTO);
        tags.put("bagit.txt", text("BagIt-Version: 1.0\nTag-File-Character-Encoding: UTF-8\n"));
    }

    /** All files, with manifests and signature made for what is there now. */
    Map<String, byte[]> files() {
        Map<String, byte[]> files = new LinkedHashMap<>(tags);
        long bytes = payload.values().stream().mapToLong(content -> content.length).sum();
        files.putIfAbsent("bag-info.txt", text("Payload-Oxum: " + bytes + "." + payload.size() + "\n"));
        files.putIfAbsent("manifest-sha256.txt", manifest(payload));
        return signed(files);
    }

    /** The files with a tag manifest over all tag files that are there, signed. */
    Map<String, byte[]> signed(Map<String, byte[]> tagFiles) {
        Map<String, byte[]> files = new LinkedHashMap<>(tagFiles);
        files.put("tagmanifest-sha256.txt", manifest(tagFiles));
        files.put("signature-ed25519.txt", signature(files.get("tagmanifest-sha256.txt")));
        files.put("device-key.txt", key.publicText());
        files.putAll(payload);
        return files;
    }

    byte[] signature(byte[] tagManifest) {
        return text(Base64.getEncoder().encodeToString(key.sign(tagManifest)) + "\n");
    }

    static byte[] manifest(Map<String, byte[]> files) {
        StringBuilder lines = new StringBuilder();
        new TreeMap<>(files).forEach((name, content) ->
                lines.append(Sha256.hex(content)).append("  ").append(name).append('\n'));
        return text(lines.toString());
    }

    static byte[] text(String text) {
        return text.getBytes(StandardCharsets.UTF_8);
    }
}
