package bedmark.office;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.journal.Digest;
import bedmark.journal.Progress;
import bedmark.json.BundleReader;
import bedmark.json.Canonical;
import bedmark.pack.DeviceKey;
import bedmark.pack.PackWriter;
import bedmark.pack.PhotoSource;
import bedmark.survey.Bundle;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.UUID;
import java.util.stream.Stream;

/** Packs and office stores for tests. */
public final class Offices {
    /** When it is in the office. */
    public static final Clock NOW = Clock.fixed(Instant.parse("2026-10-01T08:00:00Z"), ZoneOffset.UTC);
    private static final Path SAMPLES = Path.of("sample-surveys");

    private Offices() {
    }

    /** A bundle of the demo plant. */
    public static Bundle sample(String name) {
        try {
            return BundleReader.read(Files.readAllBytes(SAMPLES.resolve(name + ".json")));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** A pack of a bundle, signed by the tablet whose key lies in a folder. */
    public static Path pack(Bundle bundle, Path tablet, Path out) {
        try {
            Files.createDirectories(tablet);
            Files.createDirectories(out.getParent());
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        PackWriter.write(bundle, PhotoSource.folder(SAMPLES.resolve("photos")), DeviceKey.of(tablet), out,
                Progress.NONE);
        return out;
    }

    public static String fingerprint(Path tablet) {
        return DeviceKey.of(tablet).fingerprint().text();
    }

    /** An office that trusts a tablet. */
    public static OfficeStore trusting(Path folder, Path... tablets) {
        OfficeStore store = OfficeStore.open(folder, OfficeOptions.of(NOW));
        for (Path tablet : tablets) {
            store.trust(fingerprint(tablet), "", "Ida Marsh");
        }
        return store;
    }

    /** The same bundle with other surveys, another id and another time. */
    public static Bundle with(Bundle bundle, String id, String createdAt, List<Branch> surveys) {
        return new Bundle(bundle.document().with("id", UUID.nameUUIDFromBytes(id.getBytes(StandardCharsets.UTF_8)).toString())
                .with("createdAt", createdAt).with("surveys", new Node.Series(new ArrayList<>(surveys))));
    }

    /** The digests of all files under a folder, by their places in it: two exports are told apart by them. */
    static Map<String, String> files(Path folder) throws IOException {
        Map<String, String> digests = new TreeMap<>();
        try (Stream<Path> files = Files.walk(folder)) {
            for (Path file : files.filter(Files::isRegularFile).toList()) {
                digests.put(folder.relativize(file).toString(), Digest.of(Files.readAllBytes(file)).hex());
            }
        }
        return digests;
    }

    /** Everything that a store says, for comparing two of them. */
    static String told(OfficeStore store) {
        StringBuilder told = new StringBuilder();
        for (RankedZone zone : store.rank()) {
            told.append(zone).append('\n');
            told.append(store.merged(zone.zone())).append('\n');
        }
        store.registers().forEach((id, register) -> told.append(id).append(' ')
                .append(new String(Canonical.bytes(register.document()), StandardCharsets.UTF_8)).append('\n'));
        return told.toString();
    }
}
