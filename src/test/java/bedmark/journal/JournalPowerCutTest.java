package bedmark.journal;

import static bedmark.journal.JournalScript.append;
import static bedmark.journal.JournalScript.open;
import static bedmark.journal.JournalScript.prove;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.journal.JournalScript.Read;
import bedmark.journal.PowerCutDisk.Fate;
import bedmark.survey.Entry;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.TreeMap;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.function.Supplier;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The power is cut at every point of a script; what was not forced is lost, kept, torn or zero. */
class JournalPowerCutTest {
    private static final int SHUFFLES = Integer.getInteger("bedmark.powercut.shuffles", 3);

    @TempDir
    Path folder;

    /** An entry that was reported saved after so many operations. */
    private record Acknowledged(int after, Entry entry, Mark mark) {
    }

    private int images;

    private static void session(Path home, PowerCutDisk disk, Optional<Mark> known, int from, int to,
                                List<Acknowledged> told) throws IOException {
        try (Journal journal = open(home, disk, known, new Read())) {
            for (int i = from; i <= to; i++) {
                Journal.Saved saved = append(journal, i);
                told.add(new Acknowledged(disk.operations(), saved.entry(),
                        new Mark(journal.identity(), saved.entry().sequence(), saved.place())));
            }
        }
    }

    @Test
    void nothingThatWasReportedSavedIsLost() throws IOException {
        Path home = Files.createDirectories(folder.resolve("live"));
        PowerCutDisk disk = new PowerCutDisk(home);
        List<Acknowledged> told = new ArrayList<>();
        session(home, disk, Optional.empty(), 1, 12, told);
        session(home, disk, Optional.of(told.get(9).mark()), 13, 20, told);
        Random random = new Random(4);
        for (int cut = 0; cut <= disk.operations(); cut++) {
            check(disk, cut, Fate.LOST, told, random);
            check(disk, cut, Fate.KEPT, told, random);
            for (int i = 0; i < SHUFFLES; i++) {
                check(disk, cut, Fate.MIXED, told, random);
            }
        }
        assertTrue(images > 200, "the script is long enough: " + images);
    }

    @Test
    void aSecondPowerCutWhileOpeningLosesNothingEither() throws IOException {
        Path home = folder.resolve("live");
        List<Acknowledged> told = new ArrayList<>();
        try (Journal journal = open(home, new Read())) {
            for (int i = 1; i <= 5; i++) {
                Journal.Saved saved = append(journal, i);
                told.add(new Acknowledged(0, saved.entry(),
                        new Mark(journal.identity(), saved.entry().sequence(), saved.place())));
            }
        }
        List<SegmentFile> segments = SegmentFile.list(FileLayer.disk(), home);
        Files.write(segments.get(segments.size() - 1).path(), new byte[100], StandardOpenOption.APPEND);
        PowerCutDisk disk = new PowerCutDisk(home);
        open(home, disk, Optional.of(told.get(2).mark()), new Read()).close();
        Random random = new Random(5);
        for (int cut = 0; cut <= disk.operations(); cut++) {
            for (Fate fate : List.of(Fate.LOST, Fate.KEPT, Fate.MIXED, Fate.MIXED, Fate.MIXED)) {
                check(disk, cut, fate, told, random);
            }
        }
    }

    @Test
    void aFileWhoseForceFailedIsNeverTrustedAgain() throws IOException {
        for (int failing = 2; failing < 12; failing++) {
            for (int last : new int[] {failing, 1000}) {
                int from = failing;
                Path home = Files.createDirectories(folder.resolve("live" + failing + "-" + last));
                AtomicBoolean mended = new AtomicBoolean();
                PowerCutDisk disk = new PowerCutDisk(home, n -> n >= from && n <= last && !mended.get());
                Map<Long, Entry> saved = new TreeMap<>();
                Optional<Mark> known = Optional.empty();
                try (Journal journal = open(home, disk, Optional.empty(), new Read())) {
                    for (int i = 1; i <= 8; i++) {
                        known = appended(journal, i, saved).or(kept(known));
                    }
                }
                mended.set(true);
                Read shown = new Read();
                try (Journal journal = open(home, disk, known, shown)) {
                    appended(journal, 99, saved);
                }
                shown.entries.forEach(entry -> saved.put(entry.sequence(), entry));
                Path image = folder.resolve("image" + images++);
                disk.layOut(disk.operations(), Fate.LOST, new Random(1), image);
                Read read = new Read();
                prove(image, read);
                Map<Long, Entry> there = new TreeMap<>();
                read.entries.forEach(entry -> there.put(entry.sequence(), entry));
                assertEquals(saved, there, "force " + failing + " to " + last);
            }
        }
    }

    private static Supplier<Optional<Mark>> kept(Optional<Mark> mark) {
        return () -> mark;
    }

    private static Optional<Mark> appended(Journal journal, int number, Map<Long, Entry> saved) {
        try {
            Journal.Saved done = append(journal, number);
            saved.put(done.entry().sequence(), done.entry());
            return Optional.of(new Mark(journal.identity(), done.entry().sequence(), done.place()));
        } catch (NotSaved e) {
            return Optional.empty();
        }
    }

    private void check(PowerCutDisk disk, int cut, Fate fate, List<Acknowledged> told, Random random)
            throws IOException {
        Path image = folder.resolve("image" + images++);
        disk.layOut(cut, fate, random, image);
        List<Acknowledged> saved = told.stream().filter(one -> one.after() <= cut).toList();
        Optional<Mark> known = saved.isEmpty() || random.nextInt(4) == 0 ? Optional.empty()
                : Optional.of(saved.get(random.nextInt(saved.size())).mark());
        String where = "after operation " + cut + ", " + fate + ", image " + image.getFileName();
        Map<Long, Entry> there = new TreeMap<>();
        try (Journal journal = open(image, new QuickLayer(), known, new Read())) {
            Journal.Saved more = append(journal, 99);
            there.put(more.entry().sequence(), more.entry());
        }
        Read read = new Read();
        JournalProof proof = prove(image, read);
        read.entries.forEach(entry -> there.merge(entry.sequence(), entry, (appended, same) -> {
            assertEquals(appended, same, where);
            return same;
        }));
        for (Acknowledged one : saved) {
            assertEquals(one.entry(), there.get(one.entry().sequence()), where);
        }
        assertTrue(proof.intact(), () -> where + read.flaws);
        assertEquals(List.of(), read.flaws, where);
    }
}
