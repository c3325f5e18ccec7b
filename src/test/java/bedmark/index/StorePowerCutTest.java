package bedmark.index;

import static bedmark.index.StoreScript.NOON;
import static bedmark.index.StoreScript.PERSON;
import static bedmark.index.StoreScript.id;
import static bedmark.index.StoreScript.options;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.journal.PowerCutDisk;
import bedmark.journal.Progress;
import bedmark.journal.QuickLayer;
import bedmark.survey.SurveyHistory;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The power goes while a store is at work; the database is found as of some earlier time, whole or cut. */
class StorePowerCutTest {
    private static final int CUTS = Integer.getInteger("bedmark.powercut.stores", 30);

    @TempDir
    Path folder;

    /** What was reported saved after so many operations, with the database as it then was. */
    private record Acknowledged(int after, int answers, int photos, byte[] database) {
    }

    @ParameterizedTest
    @ValueSource(booleans = {false, true})
    void aStoreOpensWithAllThatWasReportedSaved(boolean sealed) throws IOException {
        Path home = StoreScript.home(Files.createDirectories(folder.resolve("live")), sealed);
        PowerCutDisk disk = new PowerCutDisk(home);
        List<Acknowledged> told = new ArrayList<>();
        try (Store store = Store.open(home, options(sealed).withFiles(disk).withSegmentBytes(2048))) {
            Path database = home.resolve("index").resolve("bedmark.mv.db");
            store.append(PERSON, StoreScript.opened(id(1), "T1"));
            for (int i = 0; i < 12; i++) {
                if (i % 4 == 3) {
                    store.attachPhoto(StoreScript.photo("photo " + i), id(1), PERSON, NOON, "");
                } else {
                    store.append(PERSON, StoreScript.speed(id(1), "2." + i));
                }
                int after = disk.operations();
                SurveyHistory history = store.history(id(1)).orElseThrow();
                told.add(new Acknowledged(after, history.changes().size(), history.survey().photos().size(),
                        Files.readAllBytes(database)));
            }
        }
        Random random = new Random(3);
        for (int i = 0; i < (sealed ? CUTS / 2 : CUTS); i++) {
            check(disk, told, random, folder.resolve("image" + i), sealed);
        }
    }

    private static void check(PowerCutDisk disk, List<Acknowledged> told, Random random, Path image,
                              boolean sealed) throws IOException {
        int cut = random.nextInt(disk.operations() + 1);
        PowerCutDisk.Fate fate = PowerCutDisk.Fate.values()[random.nextInt(3)];
        disk.layOut(cut, fate, random, image);
        List<Acknowledged> saved = told.stream().filter(one -> one.after() <= cut).toList();
        if (!saved.isEmpty() && random.nextInt(4) > 0) {
            byte[] database = saved.get(random.nextInt(saved.size())).database();
            boolean whole = random.nextBoolean();
            Files.write(Files.createDirectories(image.resolve("index")).resolve("bedmark.mv.db"),
                    whole ? database : Arrays.copyOf(database, random.nextInt(database.length)));
        }
        String where = "after operation " + cut + ", " + fate;
        try (Store store = Store.open(image, options(sealed).withFiles(new QuickLayer()))) {
            if (!saved.isEmpty()) {
                Acknowledged last = saved.get(saved.size() - 1);
                SurveyHistory history = store.history(id(1)).orElseThrow();
                assertTrue(history.changes().size() >= last.answers(), where);
                assertTrue(history.survey().photos().size() >= last.photos(), where);
            }
            StoreCheck check = store.check(Progress.NONE);
            assertTrue(check.sound(), () -> where + check.defects());
            store.append(PERSON, StoreScript.opened(id(2), "T2"));
            assertEquals(1, store.surveys(SurveyQuery.ALL.ofTransfer("T2")).size(), where);
        }
    }
}
