package bedmark.journal;

import java.io.Closeable;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;

/** Writes a segment at its end. After any failure it is closed and its file is never written again. */
final class SegmentWriter implements Closeable {
    private final FileLayer files;
    private final Path file;
    private final int number;
    private final FileLayer.Output output;
    private long size;

    private SegmentWriter(FileLayer files, Path file, int number, FileLayer.Output output, long size) {
        this.files = files;
        this.file = file;
        this.number = number;
        this.output = output;
        this.size = size;
    }

    /** Makes a new segment; on failure its file is deleted, as far as that is still possible. */
    static SegmentWriter create(FileLayer files, Path folder, SegmentHeader header) throws IOException {
        Path file = SegmentFile.path(folder, header.number());
        FileLayer.Output output = files.createPrivate(file);
        try {
            output.write(header.encode());
            force(output);
            files.forceFolder(folder);
            return new SegmentWriter(files, file, header.number(), output, SegmentHeader.LENGTH);
        } catch (IOException e) {
            discard(files, output, file, e);
            throw e;
        }
    }

    /** Makes a new segment that appears in one step together with its first entry. */
    static SegmentWriter create(FileLayer files, Path folder, SegmentHeader header, Frame first) throws IOException {
        Path file = SegmentFile.path(folder, header.number());
        Path part = folder.resolve(file.getFileName() + Journal.PART);
        FileLayer.Output output = files.createPrivate(part);
        try {
            output.write(header.encode());
            output.write(first.encode());
            force(output);
            files.move(part, file);
            files.forceFolder(folder);
            return new SegmentWriter(files, file, header.number(), output,
                    SegmentHeader.LENGTH + (long) first.length());
        } catch (IOException e) {
            discard(files, output, part, e);
            throw e;
        }
    }

    /** Goes on at the end of a sound segment, once that much of it is sure to be on the medium. */
    static SegmentWriter goOn(FileLayer files, SegmentFile segment) throws IOException {
        FileLayer.Output output = files.append(segment.path());
        try {
            force(output);
            files.forceFolder(segment.path().getParent());
            return new SegmentWriter(files, segment.path(), segment.number(), output, segment.size());
        } catch (IOException e) {
            close(output, e);
            throw e;
        }
    }

    int number() {
        return number;
    }

    /** How much of the file is on the medium, in bytes. */
    long size() {
        return size;
    }

    /** Writes and forces a frame; when this returns, it is on the medium. */
    Place append(ByteBuffer frame) throws IOException {
        Place place = new Place(number, size, frame.remaining(), Digest.of(frame));
        output.write(frame);
        force(output);
        if (!files.exists(file)) {
            // A deleted file takes writes and forces as before, and loses them when it is closed.
            throw new NoSuchFileException(file.toString());
        }
        size = place.end();
        return place;
    }

    @Override
    public void close() throws IOException {
        output.close();
    }

    private static void force(FileLayer.Output output) throws IOException {
        try {
            output.force();
        } catch (IOException e) {
            throw new Fault.ForceFailed(e);
        }
    }

    private static void discard(FileLayer files, FileLayer.Output output, Path file, IOException failure) {
        close(output, failure);
        try {
            files.delete(file);
        } catch (IOException e) {
            failure.addSuppressed(e);
        }
    }

    private static void close(FileLayer.Output output, IOException failure) {
        try {
            output.close();
        } catch (IOException e) {
            failure.addSuppressed(e);
        }
    }
}
