package bedmark.index;

import static bedmark.index.StoreScript.NOON;
import static bedmark.index.StoreScript.PERSON;
import static bedmark.index.StoreScript.options;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import bedmark.document.Node;
import bedmark.journal.FileLayer;
import bedmark.journal.NotSaved;
import bedmark.journal.Progress;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.UUID;
import java.util.concurrent.TimeUnit;
import java.util.function.LongConsumer;
import java.util.function.Supplier;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The disk fills up in the middle of a walk: each act is saved or said not to be, and work goes on once there is room. */
class FullDiskTest {
    @TempDir
    Path folder;

    private final List<Entry> saved = new ArrayList<>();
    private final List<String> refused = new ArrayList<>();

    private void attempt(Supplier<Entry> act) {
        try {
            saved.add(act.get());
        } catch (NotSaved e) {
            refused.add(e.defect().code());
        }
    }

    /** Surveys with answers and photos, until so many acts in a row were not saved. */
    private void type(Store store, int most) {
        int before = refused.size();
        for (int i = 0; i < most && refused.size() < before + 5; i++) {
            UUID survey = UUID.randomUUID();
            int opened = saved.size();
            attempt(() -> store.append(PERSON, StoreScript.opened(survey, "T1")));
            if (saved.size() > opened) {
                for (int j = 0; j < 6; j++) {
                    String note = "note " + i + "-" + j;
                    attempt(() -> store.append(PERSON, StoreScript.answer(survey, "/notes", Node.text(note))));
                }
                byte[] photo = StoreScript.photo("photo " + i + " " + "x".repeat(2_000));
                attempt(() -> store.attachPhoto(photo, survey, PERSON, NOON, ""));
                attempt(() -> store.append(PERSON, new Act.SurveyCompleted(survey, PERSON)));
            }
        }
    }

    private void fillAndGoOn(Path home, FileLayer files, LongConsumer free) {
        StoreOptions options = options().withFiles(files).withSegmentBytes(16 << 10);
        try (Store store = Store.open(home, options)) {
            type(store, 10_000);
            assertTrue(saved.size() > 50 && !refused.isEmpty(), () -> saved.size() + " " + refused);
            assertEquals(List.of("not-saved-disk-full"), refused.stream().distinct().toList());
            assertEquals(saved.size(), entries(store), "what was saved is readable on the full disk");
            int full = saved.size();
            free.accept(2 << 20);
            refused.clear();
            type(store, 20);
            assertEquals(List.of(), refused, "work goes on in the same program");
            assertEquals(full + 180, saved.size());
        }
        try (Store store = Store.open(home, options)) {
            assertEquals(saved.size(), entries(store));
            StoreCheck check = store.check(Progress.NONE);
            assertTrue(check.sound(), () -> check.defects().toString());
            type(store, 1);
            assertEquals(saved.size(), entries(store));
        }
    }

    /** The number of saved acts that the surveys tell of. */
    private static long entries(Store store) {
        return store.surveys(SurveyQuery.ALL).stream().map(line -> store.history(line.id()).orElseThrow()).mapToLong(
                history -> 1 + history.changes().size() + history.survey().photos().size()
                        + history.survey().completedAt().stream().count()).sum();
    }

    @Test
    void aDiskThatFillsUpLosesNothing() {
        FullDisk disk = new FullDisk(200_000);
        fillAndGoOn(folder.resolve("store"), disk, disk::free);
    }

    /** The real thing: a file system of 2 MB, where this user may mount one. */
    @Test
    @Tag("outside-tool")
    void aFileSystemThatFillsUpLosesNothing() throws IOException, InterruptedException {
        Path mount = Files.createDirectory(folder.resolve("small"));
        assumeTrue(runs("mount", "-t", "tmpfs", "-o", "size=2m", "tmpfs", mount.toString()),
                "no small file system may be mounted here");
        try {
            Path ballast = mount.resolve("ballast");
            Files.write(ballast, new byte[1 << 20]);
            fillAndGoOn(mount.resolve("store"), FileLayer.disk(), bytes -> delete(ballast));
        } finally {
            assertTrue(runs("umount", mount.toString()));
        }
    }

    private static void delete(Path file) {
        assertTrue(file.toFile().delete());
    }

    private static boolean runs(String... command) throws InterruptedException {
        try {
            Process process = new ProcessBuilder(command).redirectErrorStream(true)
                    .redirectOutput(ProcessBuilder.Redirect.DISCARD).start();
            return process.waitFor(20, TimeUnit.SECONDS) && process.exitValue() == 0;
        } catch (IOException e) {
            return false;
        }
    }
}
