package bedmark.office;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.journal.Digest;
import bedmark.journal.Progress;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Packs of three tablets received in many orders, some twice: the exports are the same bytes. */
class AnyOrderTest {
    private static final int ORDERS = Integer.getInteger("bedmark.office.orders", 5);

    @TempDir
    private Path folder;

    @Test
    void packsInAnyOrderGiveByteIdenticalExports() throws IOException {
        Tablets tablets = new Tablets(20260302);
        List<Path> packs = tablets.packs(folder, 4);
        Path[] keys = {tablets.key(folder, 0), tablets.key(folder, 1), tablets.key(folder, 2)};
        Random random = new Random(11);
        Map<String, String> first = Map.of();
        String ranked = "";
        for (int order = 0; order < ORDERS; order++) {
            List<Path> shuffled = new ArrayList<>(packs);
            Collections.shuffle(shuffled, random);
            Path export = folder.resolve("export" + order);
            try (OfficeStore store = Offices.trusting(folder.resolve("office" + order), keys)) {
                for (Path pack : shuffled) {
                    Received received = store.receive(pack, "Ida Marsh");
                    assertInstanceOf(Received.Taken.class, received, received::toString);
                }
                assertInstanceOf(Received.AlreadyHere.class, store.receive(packs.get(order % packs.size()), "Ida Marsh"));
                new OfficeExport(store).write(export, Progress.NONE);
                Map<String, String> files = files(export);
                if (order == 0) {
                    first = files;
                    ranked = Offices.told(store);
                    assertTrue(store.rank().stream().anyMatch(zone -> zone.clashes() > 0), "there are conflicts");
                    assertTrue(store.rank().stream().anyMatch(RankedZone::clockWrong), "there are wrong clocks");
                    assertTrue(first.keySet().stream().filter(name -> name.startsWith("registers")).count() > 1,
                            "the register changes");
                }
                assertEquals(first, files);
                assertEquals(ranked, Offices.told(store));
            }
        }
    }

    private static Map<String, String> files(Path folder) throws IOException {
        Map<String, String> digests = new TreeMap<>();
        try (Stream<Path> files = Files.walk(folder)) {
            for (Path file : files.filter(Files::isRegularFile).toList()) {
                digests.put(folder.relativize(file).toString(), Digest.of(Files.readAllBytes(file)).hex());
            }
        }
        return digests;
    }
}
