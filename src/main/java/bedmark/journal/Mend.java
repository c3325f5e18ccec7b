package bedmark.journal;

import bedmark.document.Defect;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/**
 * Brings the last segment of a journal into a state in which it can be written on: cuts a torn tail off and keeps it,
 * leaves damage alone, and copies the last entry into a segment of its own where nobody knows it to be saved. Its force
 * may have failed; what is read back of it then comes from memory, and a second force would succeed without writing it.
 * Every earlier entry was followed by another one in the same file, so its force succeeded.
 */
final class Mend {
    private final FileLayer files;
    private final Path folder;
    private final SegmentFile last;
    private final Optional<Mark> resumed;
    private final List<Defect> found;
    private Optional<Frame> unproven = Optional.empty();
    private long sequence;
    private boolean sealed;
    private boolean damaged;
    private Optional<Found.Bad> tail = Optional.empty();

    /**
     * @param last    the last segment
     * @param resumed the mark, where the entry under it is sound
     * @param found   takes what a person should know
     */
    Mend(FileLayer files, Path folder, SegmentFile last, Optional<Mark> resumed, List<Defect> found) {
        this.files = files;
        this.folder = folder;
        this.last = last;
        this.resumed = resumed;
        this.found = found;
    }

    /** Looks at the segment without changing it. */
    Mend look() throws IOException {
        Optional<Mark> inside = resumed.filter(mark -> mark.place().segment() == last.number());
        long from = inside.map(mark -> mark.place().end()).orElse(last.start());
        sequence = inside.map(Mark::sequence).orElse(last.first().orElse(1L) - 1);
        try (SegmentReader reader = new SegmentReader(files, last.path(), from, last.size())) {
            for (Optional<Found> next = reader.next(); next.isPresent(); next = reader.next()) {
                damaged |= tail.isPresent();
                tail = Optional.empty();
                if (next.get() instanceof Found.Bad bad) {
                    tail = Optional.of(bad);
                } else if (next.get() instanceof Found.Good good && good.frame().kind() == Frame.Kind.ENTRY) {
                    sequence = Math.max(sequence, good.frame().sequence());
                    unproven = Optional.of(good.frame());
                } else {
                    sealed = true;
                }
            }
        }
        return this;
    }

    /** The last sequence that the segment holds, or that stands before it. */
    long sequence() {
        return sequence;
    }

    /** Cuts off what was not written to its end; without room for keeping it, it stays where it is. */
    void cutTail() {
        if (tail.isEmpty()) {
            return;
        }
        Found.Bad torn = tail.get();
        try {
            Path kept = keptAs(torn.offset());
            copy(torn, kept);
            files.truncate(last.path(), torn.offset());
            name(torn, kept);
        } catch (IOException e) {
            damaged = true;
            name(torn, last.path());
        }
    }

    /** Puts the whole file aside. */
    void putAside() throws IOException {
        Path kept = keptAs(0);
        files.move(last.path(), kept);
        files.forceFolder(folder);
        name(new Found.Bad(0, last.size()), kept);
    }

    /**
     * Opens the segment for writing, or a new one in its place.
     *
     * @param number the number of a new segment
     * @param newest whether no later segment was ever begun; otherwise this one is not written on
     * @return nothing where the next entry begins a new segment
     */
    Optional<SegmentWriter> writer(int number, boolean newest) {
        Optional<SegmentHeader> header = last.header();
        if (sealed || damaged || header.isEmpty()) {
            return Optional.empty();
        }
        try {
            if (unproven.isEmpty()) {
                return !newest ? Optional.empty()
                        : Optional.of(SegmentWriter.goOn(files, SegmentFile.look(files, last.path(), last.number())));
            }
            Frame copied = unproven.get();
            return Optional.of(SegmentWriter.create(files, folder, new SegmentHeader(header.get().form(),
                    SegmentHeader.Follows.ABANDONED, header.get().journal(), number, copied.sequence(),
                    copied.previous()), copied));
        } catch (IOException e) {
            // What is read stays readable; the next entry begins a segment of its own, and says so if it can't.
            return Optional.empty();
        }
    }

    private void name(Found.Bad torn, Path kept) {
        found.add(Defect.in(last.name(), "journal-tail-torn", Long.toString(torn.offset()),
                Long.toString(torn.length()), kept.getFileName().toString()));
    }

    private Path keptAs(long offset) {
        String stem = last.name().replace(".journal", "") + "-" + offset;
        Path kept = folder.resolve(stem + Journal.TORN);
        for (int i = 2; files.exists(kept); i++) {
            kept = folder.resolve(stem + "-" + i + Journal.TORN);
        }
        return kept;
    }

    private void copy(Found.Bad torn, Path kept) throws IOException {
        try (FileLayer.Input input = files.read(last.path()); FileLayer.Output output = files.createPrivate(kept)) {
            long at = torn.offset();
            long end = torn.offset() + torn.length();
            while (at < end) {
                ByteBuffer bytes = ByteBuffer.allocate((int) Math.min(1 << 20, end - at));
                int count = input.read(at, bytes);
                if (count == 0) {
                    throw new IOException("the file became shorter while it was read");
                }
                at += count;
                output.write(bytes.flip());
            }
            output.force();
        }
        files.forceFolder(folder);
    }
}
