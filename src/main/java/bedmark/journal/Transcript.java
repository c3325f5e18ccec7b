package bedmark.journal;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.UUID;

/**
 * Writes a whole journal anew in its own folder under another cover, beside what is there: same numbers, same payloads,
 * a chain and an identity of its own. Its segments wait under names of their own until they are put in place.
 */
public final class Transcript {

    /** How the names of segments end that wait. */
    public static final String WAITING = ".waiting";

    private final FileLayer files;
    private final Path folder;
    private final long segmentBytes;
    private final Progress progress;
    private final Set<String> flawed = new TreeSet<>();

    /**
     * What a transcript holds.
     *
     * @param entries how many there are
     * @param flawed  segments of the old journal where something was not as it was written, by file name
     */
    public record Written(long entries, Set<String> flawed) {
        public Written {
            flawed = Set.copyOf(flawed);
        }
    }

    /**
     * @param segmentBytes the length at which a segment is sealed
     * @param progress     told of bytes, of two walks over the journal
     */
    public Transcript(Path folder, FileLayer files, long segmentBytes, Progress progress) {
        this.folder = folder;
        this.files = files;
        this.segmentBytes = segmentBytes;
        this.progress = progress;
    }

    /**
     * Writes it, forces it, and reads it back entry by entry.
     *
     * @return what was written, and which segments hold damaged bytes that it does not
     * @throws IOException where the folder can't be read or written
     * @throws Refused     {@code journal-transcript-differs} where what is read back is not what was there,
     *                     {@code work-cancelled}
     */
    public Written write(Cover from, Cover to) throws IOException {
        List<SegmentFile> old = SegmentFile.list(files, folder);
        Sum read = new Sum();
        try (Pen pen = new Pen(to, old.stream().mapToInt(SegmentFile::number).max().orElse(0) + 1)) {
            walk(old, from, 0, (sequence, payload) -> {
                read.add(sequence, payload);
                pen.write(sequence, payload);
            });
            pen.end();
        }
        Sum written = new Sum();
        walk(waiting(), to, 1, written::add);
        if (written.count != read.count || !MessageDigest.isEqual(written.sha.digest(), read.sha.digest())) {
            throw new Refused(Defect.in(folder.toString(), "journal-transcript-differs"));
        }
        return new Written(read.count, flawed);
    }

    private List<SegmentFile> waiting() throws IOException {
        List<SegmentFile> segments = new ArrayList<>();
        for (Path file : files.list(folder)) {
            String name = file.getFileName().toString();
            if (name.endsWith(WAITING)) {
                segments.add(SegmentFile.look(files, file, Integer.parseInt(name.substring(0, name.indexOf('.')))));
            }
        }
        return segments;
    }

    /** Puts the segments that wait in their place; doing it again does nothing. */
    public static void putInPlace(Path folder, FileLayer files) throws IOException {
        for (Path file : files.list(folder)) {
            String name = file.getFileName().toString();
            if (name.endsWith(WAITING)) {
                files.move(file, folder.resolve(name.substring(0, name.length() - WAITING.length())));
            }
        }
        files.forceFolder(folder);
    }

    /** Takes an entry's payload. */
    private interface Taker {
        void take(long sequence, byte[] payload) throws IOException;
    }

    private void walk(List<SegmentFile> segments, Cover cover, int round, Taker taker) throws IOException {
        try {
            new JournalWalk(files, segments, cover, new JournalVisitor() {
                @Override
                public void entry(long sequence, Place place, byte[] payload) {
                    try {
                        taker.take(sequence, payload);
                    } catch (IOException e) {
                        throw new Unwritten(e);
                    }
                }

                @Override
                public void flaw(Defect flaw) {
                    // What is damaged stays missing; the numbers around it tell so, as they did before.
                    flawed.add(flaw.where());
                }

                @Override
                public void walked(long done, long total) {
                    progress.at(round * total + done, 2 * total);
                    if (progress.cancelled()) {
                        throw new Refused(Defect.in("", "work-cancelled"));
                    }
                }
            }).walk(Optional.empty());
        } catch (Unwritten e) {
            throw e.failure;
        }
    }

    /** Carries a failure of writing through a visitor. */
    private static final class Unwritten extends RuntimeException {
        private final transient IOException failure;

        Unwritten(IOException failure) {
            super(failure);
            this.failure = failure;
        }
    }

    /** What was met, in one digest. */
    private static final class Sum {
        private final MessageDigest sha = Digest.sha256();
        private long count;

        void add(long sequence, byte[] payload) {
            sha.update(ByteBuffer.allocate(12).putLong(sequence).putInt(payload.length).flip());
            sha.update(payload);
            count++;
        }
    }

    /** Writes segments; each is forced when it is filled, since nothing counts before all of them stand. */
    private final class Pen implements AutoCloseable {
        private final Cover cover;
        private final UUID identity = UUID.randomUUID();
        private Optional<FileLayer.Output> output = Optional.empty();
        private int number;
        private long size;
        private long last;
        private Digest hash = Digest.NOTHING;

        Pen(Cover cover, int number) {
            this.cover = cover;
            this.number = number;
        }

        void write(long sequence, byte[] payload) throws IOException {
            Frame frame = cover.entry(sequence, hash, payload);
            boolean gap = sequence != last + 1;
            if (output.isPresent() && (gap || size + frame.length() > segmentBytes)) {
                if (!gap) {
                    put(Frame.seal(last, hash).encode());
                }
                finish();
                begin(gap ? SegmentHeader.Follows.ABANDONED : SegmentHeader.Follows.SEALED, sequence);
            } else if (output.isEmpty()) {
                begin(SegmentHeader.Follows.NOTHING, sequence);
            }
            ByteBuffer bytes = frame.encode();
            hash = Digest.of(bytes);
            put(bytes);
            last = sequence;
        }

        private void begin(SegmentHeader.Follows follows, long first) throws IOException {
            Path file = folder.resolve(SegmentFile.path(folder, number).getFileName() + WAITING);
            output = Optional.of(files.createPrivate(file));
            size = 0;
            put(new SegmentHeader(cover.form(), follows, identity, number++, first, hash).encode());
        }

        private void put(ByteBuffer bytes) throws IOException {
            size += bytes.remaining();
            output.orElseThrow().write(bytes);
        }

        private void finish() throws IOException {
            try (FileLayer.Output done = output.orElseThrow()) {
                output = Optional.empty();
                done.force();
            }
        }

        /** Ends; an empty journal has one empty segment too, which says that it is sealed. */
        void end() throws IOException {
            if (output.isEmpty()) {
                begin(SegmentHeader.Follows.NOTHING, 1);
            }
            finish();
            files.forceFolder(folder);
        }

        @Override
        public void close() {
            output.ifPresent(EntryReader::close);
        }
    }
}
