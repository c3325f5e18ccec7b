package bedmark.journal;

import bedmark.document.Defect;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Walks over segments in order, hands out each entry that counts, and names everything that is not as it was written:
 * entries that are damaged or missing, hashes that do not chain, headers and seals.
 */
final class JournalWalk {

    /**
     * Where a walk ended.
     *
     * @param sequence the last entry, or the one before the first that the last segment is for
     * @param sealed   whether the last segment ends with its seal
     * @param tail     bytes at the end of the last segment that are no entry
     * @param intact   whether every hash chained and no sequence was missing
     */
    record End(long sequence, Digest hash, long entries, boolean sealed, Optional<Found.Bad> tail, boolean intact) {
    }

    /** Where bytes that are no frame begin. */
    private record Span(SegmentFile segment, long offset) {
    }

    private final FileLayer files;
    private final List<SegmentFile> segments;
    private final Cover cover;
    private final JournalVisitor visitor;
    private final List<Span> pending = new ArrayList<>();
    private long sequence;
    private Digest hash = Digest.NOTHING;
    private long entries;
    private boolean sealed;
    private boolean intact = true;
    private Optional<Found.Bad> tail = Optional.empty();
    private long passed;

    JournalWalk(FileLayer files, List<SegmentFile> segments, Cover cover, JournalVisitor visitor) {
        this.files = files;
        this.segments = segments;
        this.cover = cover;
        this.visitor = visitor;
    }

    /** Walks from the beginning, or from behind a mark that is known to be sound. */
    End walk(Optional<Mark> from) throws IOException {
        from.ifPresent(mark -> {
            sequence = mark.sequence();
            hash = mark.place().hash();
        });
        List<SegmentFile> ours = SegmentFile.ours(segments);
        if (ours.size() < segments.size()) {
            segments.stream().filter(segment -> !ours.contains(segment))
                    .forEach(segment -> flaw(segment, "journal-segment-foreign", "0"));
        }
        int begin = 0;
        while (from.isPresent() && ours.get(begin).number() != from.get().place().segment()) {
            begin++;
        }
        long total = ours.subList(begin, ours.size()).stream().mapToLong(SegmentFile::size).sum();
        for (int i = begin; i < ours.size(); i++) {
            boolean resumed = from.isPresent() && i == begin;
            long start = resumed ? from.get().place().end() : ours.get(i).start();
            if (!resumed) {
                enter(ours.get(i));
            }
            segment(ours, i, start, total);
        }
        return new End(sequence, hash, entries, sealed, tail, intact);
    }

    private void enter(SegmentFile segment) {
        if (segment.header().isEmpty()) {
            boolean torn = segment.first().isEmpty() && segment.equals(segments.get(segments.size() - 1));
            if (!torn && segment.size() > 0) {
                flaw(segment, "journal-header-damaged", "0");
            }
            return;
        }
        SegmentHeader header = segment.header().get();
        chain(segment, 0, header.first(), header.previous());
    }

    private void segment(List<SegmentFile> ours, int index, long start, long total) throws IOException {
        SegmentFile segment = ours.get(index);
        List<SegmentFile> later = ours.subList(index + 1, ours.size());
        long limit = later.stream().flatMap(one -> one.first().stream()).mapToLong(Long::longValue).min()
                .orElse(Long.MAX_VALUE);
        Optional<SegmentHeader.Follows> next =
                later.isEmpty() ? Optional.empty() : later.get(0).header().map(SegmentHeader::follows);
        sealed = false;
        tail = Optional.empty();
        try (SegmentReader reader = new SegmentReader(files, segment.path(), start, segment.size())) {
            for (Optional<Found> found = reader.next(); found.isPresent(); found = reader.next()) {
                Found here = found.get();
                if (here instanceof Found.Good good) {
                    frame(segment, good, limit);
                } else {
                    bad(segment, (Found.Bad) here);
                }
                visitor.walked(passed + here.offset() + here.length(), Math.max(total, 1));
            }
        }
        passed += segment.size();
        if (next.filter(follows -> follows == SegmentHeader.Follows.SEALED).isPresent() && !sealed) {
            flaw(segment, "journal-seal-damaged", Long.toString(segment.size()));
        }
        if (!later.isEmpty()) {
            tail = Optional.empty();
        }
    }

    private void frame(SegmentFile segment, Found.Good good, long limit) {
        Frame frame = good.frame();
        if (sealed) {
            flaw(segment, "journal-bytes-strange", Long.toString(good.offset()));
        }
        tail = Optional.empty();
        if (frame.kind() == Frame.Kind.SEAL) {
            chain(segment, good.offset(), frame.sequence() + 1, frame.previous());
            sealed = true;
        } else if (frame.sequence() < limit) {
            entry(segment, good);
        }
    }

    private void entry(SegmentFile segment, Found.Good good) {
        Frame frame = good.frame();
        if (frame.sequence() <= sequence) {
            broken(segment, good.offset(), frame.sequence());
            return;
        }
        chain(segment, good.offset(), frame.sequence(), frame.previous());
        sequence = frame.sequence();
        hash = good.hash();
        Optional<byte[]> payload = cover.payload(frame);
        if (payload.isEmpty()) {
            intact = false;
            visitor.flaw(Defect.in(segment.name(), "journal-entry-forged", Long.toString(good.offset()),
                    Long.toString(frame.sequence())));
            return;
        }
        entries++;
        visitor.entry(frame.sequence(), new Place(segment.number(), good.offset(), frame.length(), good.hash()),
                payload.get());
    }

    /** Compares what comes before an entry, a seal or a segment with what was met. */
    private void chain(SegmentFile segment, long offset, long next, Digest previous) {
        if (next > sequence + 1) {
            missing(segment, offset, next - 1);
            sequence = next - 1;
            hash = previous;
        } else if (next == sequence + 1 && !previous.equals(hash)) {
            broken(segment, offset, next);
        }
        pending.stream().filter(span -> span.segment() == segment)
                .forEach(span -> flaw(segment, "journal-bytes-strange", Long.toString(span.offset())));
        pending.clear();
    }

    private void bad(SegmentFile segment, Found.Bad bad) {
        long offset = segment.header().isPresent() || bad.offset() > 0 ? bad.offset() : SegmentHeader.LENGTH;
        if (offset < bad.offset() + bad.length()) {
            pending.add(new Span(segment, offset));
        }
        tail = Optional.of(bad);
    }

    /** Names the entries from the last sound one on up to {@code last}: damaged where bytes are, else missing. */
    private void missing(SegmentFile segment, long offset, long last) {
        intact = false;
        String range = sequence + 1 == last ? Long.toString(last) : (sequence + 1) + "-" + last;
        if (pending.isEmpty()) {
            visitor.flaw(Defect.in(segment.name(), "journal-entries-missing", Long.toString(offset), range));
        }
        for (Span span : pending) {
            visitor.flaw(Defect.in(span.segment().name(), "journal-entry-damaged", Long.toString(span.offset()),
                    range));
        }
        pending.clear();
    }

    private void broken(SegmentFile segment, long offset, long at) {
        intact = false;
        visitor.flaw(Defect.in(segment.name(), "journal-chain-broken", Long.toString(offset), Long.toString(at)));
    }

    private void flaw(SegmentFile segment, String code, String offset) {
        visitor.flaw(Defect.in(segment.name(), code, offset));
    }
}
