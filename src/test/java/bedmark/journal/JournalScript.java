package bedmark.journal;

import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.json.EntryCodec;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import java.io.IOException;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.UUID;

/** Acts, and what is read back, for the tests of the journal. */
final class JournalScript {
    static final UUID DEVICE = new UUID(0x4000L, 0x8000000000000007L);
    static final UUID SURVEY = new UUID(0x4000L, 0x8000000000000001L);
    static final OffsetDateTime NOON = OffsetDateTime.parse("2026-03-01T12:00:00Z");
    static final long SMALL = 2048;

    private JournalScript() {
    }

    static Act act(int number) {
        return new Act.AnswerSet(SURVEY, Pointer.parse("/notes"), Optional.of(Node.text("note " + number
                + " ß".repeat(number % 7))));
    }

    static Journal.Saved append(Journal journal, int number) {
        return journal.append(NOON.plusSeconds(number), "R. Okafor", DEVICE, act(number));
    }

    /** Everything that a journal hands out while it is opened, or that a proof meets. */
    static final class Read implements Replay, JournalVisitor {
        final List<Entry> entries = new ArrayList<>();
        final List<Mark> marks = new ArrayList<>();
        final List<Defect> flaws = new ArrayList<>();
        boolean resumed;
        private UUID journal = new UUID(0, 0);

        @Override
        public void begin(UUID identity, boolean goesOn) {
            journal = identity;
            resumed = goesOn;
        }

        @Override
        public void entry(long sequence, Place place, byte[] payload) {
            entries.add(EntryCodec.read(payload));
            marks.add(new Mark(journal, sequence, place));
        }

        @Override
        public void flaw(Defect flaw) {
            flaws.add(flaw);
        }

        @Override
        public void walked(long done, long total) {
            if (done > total) {
                throw new IllegalStateException(done + " of " + total);
            }
        }

        List<Long> sequences() {
            return entries.stream().map(Entry::sequence).toList();
        }

        List<String> codes() {
            return flaws.stream().map(Defect::code).toList();
        }
    }

    static Journal open(Path folder, FileLayer files, Optional<Mark> mark, Read read) throws IOException {
        return Journal.open(folder, files, SMALL, mark, Progress.NONE, read);
    }

    static Journal open(Path folder, Read read) throws IOException {
        return open(folder, FileLayer.disk(), Optional.empty(), read);
    }

    /** Writes entries 1 to {@code count} with one journal. */
    static List<Journal.Saved> write(Path folder, int count) throws IOException {
        List<Journal.Saved> saved = new ArrayList<>();
        try (Journal journal = open(folder, new Read())) {
            for (int i = 1; i <= count; i++) {
                saved.add(append(journal, i));
            }
        }
        return saved;
    }

    static Read read(Path folder) throws IOException {
        Read read = new Read();
        prove(folder, read);
        return read;
    }

    /** What a proof says, with the flaws and the entries that it met. */
    static JournalProof prove(Path folder, Read read) throws IOException {
        SegmentFile.reference(SegmentFile.list(FileLayer.disk(), folder)).ifPresent(header ->
                read.begin(header.journal(), false));
        return JournalProof.of(folder, FileLayer.disk(), Optional.empty(), read);
    }
}
