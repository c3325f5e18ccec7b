package bedmark.journal;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.UUID;

/** Opens what a journal's folder holds: mends its end, replays what is new, and says what was found. */
final class Recovery {
    private final FileLayer files;
    private final Path folder;
    private final Cover cover;
    private final Optional<Mark> mark;
    private final Progress progress;
    private final List<Defect> found = new ArrayList<>();
    private List<SegmentFile> segments = List.of();
    private Optional<SegmentWriter> writer = Optional.empty();
    private UUID journal = UUID.randomUUID();
    private JournalWalk.End end;

    Recovery(FileLayer files, Path folder, Cover cover, Optional<Mark> mark, Progress progress) {
        this.files = files;
        this.folder = folder;
        this.cover = cover;
        this.mark = mark;
        this.progress = progress;
    }

    Recovery run(Replay replay) throws IOException {
        files.createFolder(folder);
        requireKey();
        dropParts();
        try {
            Optional<Mark> sound = mend();
            replay.begin(journal, sound.isPresent());
            end = new JournalWalk(files, segments, cover, new Forward(replay)).walk(sound);
            return this;
        } catch (IOException | RuntimeException e) {
            if (writer.isPresent()) {
                writer.get().close();
            }
            throw e;
        }
    }

    /** Before anything is mended: a sealed journal is left as it is where there is no key to read it. */
    private void requireKey() throws IOException {
        boolean sealed = SegmentFile.list(files, folder).stream().flatMap(segment -> segment.header().stream())
                .anyMatch(header -> header.form() == Frame.Form.SEALED);
        if (sealed && cover.form() == Frame.Form.PLAIN) {
            throw new Refused(Defect.in(folder.toString(), "journal-sealed"));
        }
    }

    private void dropParts() throws IOException {
        for (Path file : files.list(folder)) {
            if (file.getFileName().toString().endsWith(Journal.PART)) {
                files.delete(file);
            }
        }
    }

    private void list() throws IOException {
        segments = SegmentFile.list(files, folder);
        journal = SegmentFile.reference(segments).map(SegmentHeader::journal)
                .orElse(segments.isEmpty() ? journal : mark.map(Mark::journal).orElse(journal));
    }

    /** Makes the end of the journal fit to be written on; the mark, where the entry under it is sound. */
    private Optional<Mark> mend() throws IOException {
        list();
        boolean dropped = dropUnbegun();
        Optional<Mark> sound = Optional.empty();
        if (!SegmentFile.ours(segments).isEmpty()) {
            Optional<Mark> known = mark.filter(one -> one.journal().equals(journal));
            sound = known.isPresent() && verifies(known.get()) ? known : Optional.empty();
            mend(known, sound, !dropped);
        }
        if (SegmentFile.ours(segments).isEmpty()) {
            mark.ifPresent(lost -> found.add(Defect.in(folder.getFileName().toString(), "journal-missing",
                    Long.toString(lost.sequence()))));
            writer = Optional.of(SegmentWriter.create(files, folder, new SegmentHeader(cover.form(),
                    SegmentHeader.Follows.NOTHING, journal, nextNumber(), 1, Digest.NOTHING)));
            list();
        }
        return sound;
    }

    private void mend(Optional<Mark> known, Optional<Mark> sound, boolean newest) throws IOException {
        List<SegmentFile> ours = SegmentFile.ours(segments);
        Mend mend = new Mend(files, folder, ours.get(ours.size() - 1), sound, found).look();
        Optional<Mark> lost = known.filter(one -> sound.isEmpty() && one.sequence() > mend.sequence());
        if (lost.isPresent()) {
            // Saved entries are gone or damaged: their numbers are not given again, and the bytes stay for whoever
            // wants to look at them.
            writer = beginAfter(lost.get());
        } else {
            mend.cutTail();
            writer = mend.writer(nextNumber(), newest);
        }
        list();
    }

    /** Puts segments aside that were begun and never came to hold anything. */
    private boolean dropUnbegun() throws IOException {
        boolean dropped = false;
        List<SegmentFile> ours = SegmentFile.ours(segments);
        for (int i = ours.size() - 1; i >= 0 && ours.get(i).unbegun(); i--) {
            if (ours.get(i).size() == 0) {
                files.delete(ours.get(i).path());
            } else {
                new Mend(files, folder, ours.get(i), Optional.empty(), found).putAside();
            }
            dropped = true;
        }
        list();
        return dropped;
    }

    private Optional<SegmentWriter> beginAfter(Mark lost) {
        try {
            return Optional.of(SegmentWriter.create(files, folder, new SegmentHeader(cover.form(),
                    SegmentHeader.Follows.ABANDONED, journal, nextNumber(), lost.sequence() + 1, lost.place().hash())));
        } catch (IOException e) {
            found.add(Defect.in(folder.getFileName().toString(), "journal-missing", Long.toString(lost.sequence())));
            return Optional.empty();
        }
    }

    /** Whether the entry under a mark is there as it was. */
    private boolean verifies(Mark one) throws IOException {
        Place place = one.place();
        List<SegmentFile> ours = SegmentFile.ours(segments);
        Optional<SegmentFile> holder =
                ours.stream().filter(segment -> segment.number() == place.segment()).findFirst();
        boolean overtaken = ours.stream().filter(segment -> segment.number() > place.segment())
                .anyMatch(segment -> segment.first().filter(first -> first <= one.sequence()).isPresent());
        if (holder.isEmpty() || overtaken || place.end() > holder.get().size() || place.length() < Frame.HEAD) {
            return false;
        }
        try (FileLayer.Input input = files.read(holder.get().path())) {
            ByteBuffer bytes = ByteBuffer.allocate(place.length());
            input.read(place.offset(), bytes);
            bytes.flip();
            return Digest.of(bytes).equals(place.hash())
                    && Frame.decode(bytes).filter(frame -> frame.sequence() == one.sequence()).isPresent();
        }
    }

    int nextNumber() {
        return segments.stream().mapToInt(SegmentFile::number).max().orElse(0) + 1;
    }

    UUID journal() {
        return journal;
    }

    Optional<SegmentWriter> writer() {
        return writer;
    }

    JournalWalk.End end() {
        return end;
    }

    List<Defect> found() {
        return found;
    }

    private final class Forward implements JournalVisitor {
        private final Replay replay;

        Forward(Replay replay) {
            this.replay = replay;
        }

        @Override
        public void entry(long sequence, Place place, byte[] payload) {
            replay.entry(sequence, place, payload);
        }

        @Override
        public void flaw(Defect flaw) {
            found.add(flaw);
        }

        @Override
        public void walked(long done, long total) {
            progress.at(done, total);
        }
    }
}
