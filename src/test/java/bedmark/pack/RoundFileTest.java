package bedmark.pack;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.json.JsonReader;
import java.io.IOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A round file is written whole or not at all, and an earlier one stays until then. */
class RoundFileTest {
    @TempDir
    Path folder;

    private static Branch document(String id) throws IOException {
        Branch bundle = JsonReader.read(Files.readAllBytes(Path.of("sample-surveys/round-2026-03.json"))).root();
        return Branch.EMPTY.with("format", "bedmark.round").with("version", Node.number(1)).with("id", id)
                .with("createdAt", "2026-03-12T09:00:00Z")
                .with("office", Branch.EMPTY.with("id", "0d5c2a4e-6c1e-4c43-9a8f-6f1d5f7f1a11").with("name", "Office"))
                .with("plant", bundle.get("plant").orElseThrow()).with("forms", bundle.get("forms").orElseThrow())
                .with("rounds", bundle.get("rounds").orElseThrow())
                .with("lastResults", new Node.Series(List.of())).with("notes", new Node.Series(List.of()));
    }

    private void refused(String code, Branch document, DeviceKey key, Path out, FailingDisk disk) {
        assertEquals(code, assertThrows(Refused.class, () ->
                RoundFile.write(document, key, out, disk)).defect().code());
    }

    @Test
    void aFullOrFailingPlaceLeavesTheEarlierFileWholeAndNothingBesideIt() throws IOException {
        DeviceKey key = DeviceKey.of(folder.resolve("office"));
        Path out = Files.createDirectory(folder.resolve("stick")).resolve("next.round.json");
        byte[] earlier = RoundFile.write(document("7ac4ccb7-333d-43d9-af13-0d5e1a3a2d34"), key, out);
        Branch later = document("8ca62747-333d-43d9-af13-0d5e1a3a2d34");
        FailingDisk counting = new FailingDisk(0, false, IOException::new);
        Path other = folder.resolve("other.round.json");
        RoundFile.write(later, key, other, counting);
        assertTrue(counting.steps.contains("move"), "it takes its place in one step");
        int moved = counting.steps.indexOf("move") + 1;
        for (int step = 1; step <= moved; step++) {
            refused("round-file-disk-full", later, key, out, new FailingDisk(step, step % 2 == 0,
                    () -> new IOException("No space left on device")));
            refused("round-file-read-only", later, key, out, new FailingDisk(step, false,
                    () -> new AccessDeniedException(out.toString())));
            assertArrayEquals(earlier, Files.readAllBytes(out));
            assertEquals(List.of("next.round.json"), Packs.names(out.getParent()));
        }
    }
}
