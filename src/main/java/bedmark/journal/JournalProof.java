package bedmark.journal;

import bedmark.document.Defect;
import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/**
 * Proves a whole journal without changing a byte of it, also while it is written on.
 *
 * @param segments how many segments there are
 * @param entries  how many entries are sound
 * @param last     sequence number of the last entry
 * @param intact   whether every hash chained and no sequence was missing
 * @param tail     the bytes at the end that are no entry, if any
 * @param torn     the cut-off tails that are kept, by file name
 */
public record JournalProof(int segments, long entries, long last, boolean intact, Optional<Defect> tail,
                           List<String> torn) {

    /** As the other one, over a journal whose payloads lie as they are. */
    public static JournalProof of(Path folder, FileLayer files, Optional<Journal.Extent> upTo, JournalVisitor visitor)
            throws IOException {
        return of(folder, files, Cover.PLAIN, upTo, visitor);
    }

    /**
     * Walks over a journal from its first byte.
     *
     * @param cover   how payloads lie in it
     * @param upTo    how much of it is looked at; nothing for all
     * @param visitor takes every sound entry and every flaw
     */
    public static JournalProof of(Path folder, FileLayer files, Cover cover, Optional<Journal.Extent> upTo,
                                  JournalVisitor visitor) throws IOException {
        List<SegmentFile> segments = SegmentFile.list(files, folder).stream()
                .filter(segment -> upTo.isEmpty() || segment.number() <= upTo.get().segment())
                .map(segment -> upTo.filter(extent -> extent.segment() == segment.number())
                        .map(extent -> segment.upTo(extent.length())).orElse(segment))
                .toList();
        JournalWalk.End end = new JournalWalk(files, segments, cover, visitor).walk(Optional.empty());
        Optional<Defect> tail = end.tail().map(bad -> Defect.in(segments.get(segments.size() - 1).name(),
                "journal-tail-unread", Long.toString(bad.offset()), Long.toString(bad.length())));
        List<String> torn = files.list(folder).stream().map(file -> file.getFileName().toString())
                .filter(name -> name.endsWith(Journal.TORN)).toList();
        return new JournalProof(segments.size(), end.entries(), end.sequence(), end.intact(), tail, torn);
    }
}
