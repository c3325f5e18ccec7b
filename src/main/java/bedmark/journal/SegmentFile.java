package bedmark.journal;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A segment on disk.
 *
 * @param size   how much of it is looked at, in bytes
 * @param header nothing where it is damaged
 * @param first  the first sequence that may stand here; nothing where neither the header nor an entry tells it
 */
record SegmentFile(Path path, int number, long size, Optional<SegmentHeader> header, Optional<Long> first) {
    private static final int DIGITS = 8;
    private static final Pattern NAME = Pattern.compile("(\\d{" + DIGITS + "})\\.journal");

    static Path path(Path folder, int number) {
        return folder.resolve("0".repeat(Math.max(0, DIGITS - Integer.toString(number).length())) + number + ".journal");
    }

    String name() {
        return path.getFileName().toString();
    }

    /** The header that names the journal: the first sound one that stands under its own number. */
    static Optional<SegmentHeader> reference(List<SegmentFile> segments) {
        return segments.stream().filter(segment -> segment.header().isPresent() && !segment.moved())
                .flatMap(segment -> segment.header().stream()).findFirst();
    }

    /** The segments that belong to one journal; those with a damaged header are taken for its own. */
    static List<SegmentFile> ours(List<SegmentFile> segments) {
        Optional<SegmentHeader> one = reference(segments);
        return segments.stream().filter(segment -> !segment.moved() && (segment.header().isEmpty()
                || segment.header().get().journal().equals(one.orElseThrow().journal()))).toList();
    }

    /** Whether it stood under another number when it was written. */
    private boolean moved() {
        return header.isPresent() && header.get().number() != number;
    }

    /** All segments of a folder in order. */
    static List<SegmentFile> list(FileLayer files, Path folder) throws IOException {
        List<SegmentFile> segments = new ArrayList<>();
        for (Path path : files.list(folder)) {
            Matcher name = NAME.matcher(path.getFileName().toString());
            if (name.matches()) {
                segments.add(look(files, path, Integer.parseInt(name.group(1))));
            }
        }
        return segments;
    }

    /** Reads what a segment says of itself. */
    static SegmentFile look(FileLayer files, Path path, int number) throws IOException {
        long size;
        Optional<SegmentHeader> header;
        try (FileLayer.Input input = files.read(path)) {
            size = input.size();
            ByteBuffer head = ByteBuffer.allocate(SegmentHeader.LENGTH);
            input.read(0, head);
            header = head.hasRemaining() ? Optional.empty()
                    : SegmentHeader.decode(head.array(), path.getFileName().toString());
        }
        Optional<Long> first = header.map(SegmentHeader::first);
        return new SegmentFile(path, number, size, header, first.isPresent() ? first : firstEntry(files, path, size));
    }

    private static Optional<Long> firstEntry(FileLayer files, Path path, long size) throws IOException {
        try (SegmentReader reader = new SegmentReader(files, path, 0, size)) {
            for (Optional<Found> found = reader.next(); found.isPresent(); found = reader.next()) {
                if (found.get() instanceof Found.Good good && good.frame().kind() == Frame.Kind.ENTRY) {
                    return Optional.of(good.frame().sequence());
                }
            }
        }
        return Optional.empty();
    }

    /** The same segment, looked at only so far. */
    SegmentFile upTo(long length) {
        return new SegmentFile(path, number, Math.min(size, length), header, first);
    }

    /** Whether its making was not finished: neither the header nor any entry is sound. */
    boolean unbegun() {
        return header.isEmpty() && first.isEmpty();
    }

    /** Where its frames begin; with a damaged header that place is read like any other. */
    long start() {
        return header.isPresent() ? SegmentHeader.LENGTH : 0;
    }
}
