package bedmark.journal;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.json.EntryCodec;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Optional;
import java.util.UUID;

/**
 * The append-only truth: an entry is saved when {@link #append} returns, and never changes. Entries are numbered from
 * 1 without a gap and chained by their hashes over all segments. Appended to by one thread at a time; any thread may
 * ask how far it is.
 */
public final class Journal implements AutoCloseable {

    /** How the names of cut-off tails end. */
    public static final String TORN = ".torn";
    static final String PART = ".part";

    /**
     * A saved entry.
     *
     * @param place where it lies
     */
    public record Saved(Entry entry, Place place) {
    }

    /** How much of a journal is on the medium: all of the earlier segments, and so many bytes of this one. */
    public record Extent(int segment, long length) {
    }

    /**
     * How far a journal reached at one moment.
     *
     * @param last the sequence number of the last entry; 0 where there is none
     */
    public record Reach(long last, Extent extent) {
    }

    private final FileLayer files;
    private final Path folder;
    private final long segmentBytes;
    private final Cover cover;
    private final UUID identity;
    private final List<Defect> found;
    private Optional<SegmentWriter> writer;
    private boolean sealed;
    private int nextNumber;
    private volatile Reach reach;
    private Digest hash;

    private Journal(FileLayer files, Path folder, long segmentBytes, Cover cover, Recovery recovery) {
        this.files = files;
        this.folder = folder;
        this.segmentBytes = segmentBytes;
        this.cover = cover;
        this.identity = recovery.journal();
        this.found = List.copyOf(recovery.found());
        this.writer = recovery.writer();
        this.sealed = recovery.end().sealed();
        this.nextNumber = recovery.nextNumber();
        this.hash = recovery.end().hash();
        this.reach = new Reach(recovery.end().sequence(), writer.map(one -> new Extent(one.number(), one.size()))
                .orElse(new Extent(nextNumber - 1, Long.MAX_VALUE)));
    }

    /**
     * Opens a journal, and makes it where the folder is empty or missing.
     *
     * @param segmentBytes the length at which a segment is sealed
     * @param cover        how payloads lie in it
     * @param mark         the last entry that an index knows; entries up to it are not read again
     * @param replay       takes the entries after the mark, or all of them where the mark does not fit the journal
     * @throws IOException where the folder can't be read, or can't be written though a new journal is to be made
     * @throws Refused     {@code journal-version-unknown}, {@code journal-sealed}
     */
    public static Journal open(Path folder, FileLayer files, long segmentBytes, Cover cover, Optional<Mark> mark,
                               Progress progress, Replay replay) throws IOException {
        return new Journal(files, folder, segmentBytes, cover,
                new Recovery(files, folder, cover, mark, progress).run(replay));
    }

    /** As the other one, with payloads as they are. */
    public static Journal open(Path folder, FileLayer files, long segmentBytes, Optional<Mark> mark,
                               Progress progress, Replay replay) throws IOException {
        return open(folder, files, segmentBytes, Cover.PLAIN, mark, progress, replay);
    }

    /** Tells this journal from every other. */
    public UUID identity() {
        return identity;
    }

    /** What was not as it was written, in the part that opening looked at. */
    public List<Defect> found() {
        return found;
    }

    /** How far it reaches now. */
    public Reach reach() {
        return reach;
    }

    /** The sequence number of the last entry; 0 where there is none. */
    public long last() {
        return reach.last();
    }

    /** How much is on the medium now. */
    public Extent extent() {
        return reach.extent();
    }

    /**
     * Saves an act. When a write or a force fails, its segment is never trusted again and the entry is written to a
     * new one.
     *
     * @throws NotSaved where that fails too
     * @throws Refused  {@code entry-too-large}
     */
    public Saved append(OffsetDateTime at, String person, UUID device, Act act) {
        Entry entry = new Entry(last() + 1, at, person, device, act);
        Frame frame = cover.entry(entry.sequence(), hash, EntryCodec.write(entry));
        if (frame.payload().length > Frame.LONGEST_PAYLOAD) {
            throw new Refused(Defect.in("", "entry-too-large", Integer.toString(frame.payload().length),
                    Integer.toString(Frame.LONGEST_PAYLOAD)));
        }
        ByteBuffer bytes = frame.encode();
        Place place;
        try {
            place = write(bytes);
        } catch (IOException first) {
            release();
            place = again(bytes, first);
        }
        hash = place.hash();
        reach = new Reach(entry.sequence(), new Extent(place.segment(), place.end()));
        return new Saved(entry, place);
    }

    private Place again(ByteBuffer bytes, IOException first) {
        try {
            return write(bytes);
        } catch (IOException e) {
            release();
            e.addSuppressed(first);
            throw new NotSaved(Fault.defect("not-saved", e, files, folder, Long.toString(last())), last(), e);
        }
    }

    private Place write(ByteBuffer frame) throws IOException {
        if (writer.filter(open -> open.size() + frame.remaining() > segmentBytes
                && open.size() > SegmentHeader.LENGTH).isPresent()) {
            writer.get().append(Frame.seal(last(), hash).encode());
            sealed = true;
            release();
        }
        if (writer.isEmpty()) {
            SegmentHeader.Follows follows = sealed ? SegmentHeader.Follows.SEALED : SegmentHeader.Follows.ABANDONED;
            SegmentHeader header = new SegmentHeader(cover.form(), follows, identity, nextNumber++, last() + 1, hash);
            writer = Optional.of(SegmentWriter.create(files, folder, header));
            sealed = false;
        }
        return writer.get().append(frame.duplicate());
    }

    /** Lets the segment go, whether it was filled or failed; the next entry begins a new one. */
    private void release() {
        Optional<SegmentWriter> done = writer;
        writer = Optional.empty();
        done.ifPresent(EntryReader::close);
    }

    /** Gives the files up. All entries are on the medium already. */
    @Override
    public void close() {
        release();
    }
}
