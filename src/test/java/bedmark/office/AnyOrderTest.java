package bedmark.office;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.journal.Progress;
import bedmark.survey.merge.Copy;
import java.io.IOException;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Packs of three tablets received in many orders, some twice: the exports are the same bytes. */
class AnyOrderTest {
    private static final int ORDERS = Integer.getInteger("bedmark.office.orders", 5);

    /** The day after the last pack was made, by a clock that is right. */
    private static final Clock NOW = Clock.fixed(Instant.parse("2026-03-24T08:00:00Z"), ZoneOffset.UTC);

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
            try (OfficeStore store = OfficeStore.open(folder.resolve("office" + order), OfficeOptions.of(NOW))) {
                Stream.of(keys).forEach(key -> store.trust(Offices.fingerprint(key), "", "Ida Marsh"));
                for (Path pack : shuffled) {
                    Received received = store.receive(pack, "Ida Marsh");
                    assertInstanceOf(Received.Taken.class, received, received::toString);
                }
                assertInstanceOf(Received.AlreadyHere.class, store.receive(packs.get(order % packs.size()), "Ida Marsh"));
                new OfficeExport(store).write(export, Progress.NONE);
                Map<String, String> files = Offices.files(export);
                if (order == 0) {
                    first = files;
                    ranked = Offices.told(store);
                    assertTrue(store.rank().stream().anyMatch(zone -> zone.clashes() > 0), "there are conflicts");
                    assertTrue(store.rank().stream().anyMatch(RankedZone::clockWrong), "there are wrong clocks");
                    assertTrue(store.rank().stream().anyMatch(zone -> store.merged(zone.zone()).visits().stream()
                            .anyMatch(Copy::datedAhead)), "some are dated ahead of the office");
                    assertTrue(first.keySet().stream().filter(name -> name.startsWith("registers")).count() > 1,
                            "the register changes");
                }
                for (int most : new int[] {1, 7, 10_000}) {
                    assertEquals(store.rank().stream().limit(most).toList(),
                            store.worst(RankQuery.ALL, most, Progress.NONE));
                }
                assertEquals(first, files);
                assertEquals(ranked, Offices.told(store));
            }
        }
    }
}
