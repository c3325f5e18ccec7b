package bedmark.journal;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.json.EntryCodec;
import bedmark.survey.Entry;
import java.io.Closeable;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Reads single entries of a journal by their place, and proves each. Used by one thread. */
public final class EntryReader implements AutoCloseable {
    private static final int OPEN_AT_MOST = 16;

    private final Path folder;
    private final FileLayer files;
    private final Cover cover;
    private final Map<Integer, FileLayer.Input> inputs = new LinkedHashMap<>();

    public EntryReader(Path folder, FileLayer files, Cover cover) {
        this.folder = folder;
        this.files = files;
        this.cover = cover;
    }

    /**
     * Reads an entry.
     *
     * @throws Refused {@code journal-entry-damaged} where the bytes there are not that entry, {@code journal-…} where
     *                 they can't be read, and the codes of {@link EntryCodec#read}
     */
    public Entry read(long sequence, Place place) {
        try {
            ByteBuffer bytes = bytes(place);
            Optional<byte[]> payload = Frame.decode(bytes).filter(one -> one.sequence() == sequence)
                    .filter(one -> Digest.of(bytes).equals(place.hash())).flatMap(cover::payload);
            if (payload.isPresent()) {
                return EntryCodec.read(payload.get());
            }
        } catch (IOException e) {
            throw new Refused(Fault.defect("journal", e, files, folder), e);
        }
        throw new Refused(Defect.in(SegmentFile.path(folder, place.segment()).getFileName().toString(),
                "journal-entry-damaged", Long.toString(place.offset()), Long.toString(sequence)));
    }

    private ByteBuffer bytes(Place place) throws IOException {
        ByteBuffer bytes = ByteBuffer.allocate(Math.min(place.length(), Frame.HEAD + Frame.LONGEST_PAYLOAD));
        if (files.exists(SegmentFile.path(folder, place.segment())) || !files.exists(folder)) {
            input(place.segment()).read(place.offset(), bytes);
        }
        return bytes.flip();
    }

    private FileLayer.Input input(int segment) throws IOException {
        FileLayer.Input known = inputs.get(segment);
        if (known == null) {
            if (inputs.size() >= OPEN_AT_MOST) {
                close(inputs.remove(inputs.keySet().iterator().next()));
            }
            known = files.read(SegmentFile.path(folder, segment));
            inputs.put(segment, known);
        }
        return known;
    }

    @Override
    public void close() {
        List.copyOf(inputs.values()).forEach(EntryReader::close);
        inputs.clear();
    }

    /** Closes a file of which nothing is lost by it: it was only read, or what counts was forced before. */
    static void close(Closeable file) {
        try {
            file.close();
        } catch (IOException e) {
            return;
        }
    }
}
