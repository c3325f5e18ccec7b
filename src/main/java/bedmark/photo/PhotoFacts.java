package bedmark.photo;

import bedmark.document.Defect;
import bedmark.pack.PackLimits;
import bedmark.pack.PhotoHeader;
import java.io.BufferedInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.DateTimeException;
import java.time.LocalDateTime;
import java.time.OffsetDateTime;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.util.Optional;

/**
 * What a photo says of itself. Only its first part is read, no pixel is decoded, and whatever is missing, damaged or
 * a lie is as good as not said: a photo is never refused for its Exif.
 *
 * @param taken  by the camera's own clock
 * @param offset of that clock, where the camera knows it
 */
public record PhotoFacts(Orientation orientation, Optional<LocalDateTime> taken, Optional<ZoneOffset> offset) {

    /** A photo that says nothing. */
    public static final PhotoFacts NONE = new PhotoFacts(Orientation.UPRIGHT, Optional.empty(), Optional.empty());

    /** The Exif of a JPEG is one segment of at most 64 KiB near its start; nothing behind this is looked at (bytes). */
    private static final int FIRST_PART = 1 << 20;

    /** Reads a file; one that can't be read says nothing. */
    public static PhotoFacts of(Path file) {
        try (InputStream in = Files.newInputStream(file)) {
            return of(in);
        } catch (IOException e) {
            return NONE;
        }
    }

    /** Reads the first part of a photo; the stream stays open. */
    public static PhotoFacts of(InputStream photo) throws IOException {
        return of(photo.readNBytes(FIRST_PART));
    }

    /** Reads the first bytes of a photo. */
    public static PhotoFacts of(byte[] start) {
        return ExifPlace.in(start).map(Exif::read).orElse(NONE);
    }

    /**
     * What speaks against showing a file: it is no JPEG or PNG, is damaged, or would become too large in memory.
     *
     * @throws IOException where it can't be read
     */
    public static Optional<Defect> doubt(Path file) throws IOException {
        try (InputStream in = Files.newInputStream(file)) {
            return doubt(file.getFileName().toString(), in);
        }
    }

    /**
     * As {@link #doubt(Path)}, for a photo that is read from elsewhere.
     *
     * @param name what it is called in the sentence
     */
    public static Optional<Defect> doubt(String name, InputStream photo) throws IOException {
        return PhotoHeader.doubt(name, new BufferedInputStream(photo), PackLimits.STANDARD);
    }

    /**
     * When the photo was taken: by its Exif, unless that lies outside what a photo of this survey can be (before 1990,
     * or more than a day ahead of {@code now}); else {@code otherwise}, usually the file's own time.
     *
     * @param zone where the camera's clock is taken to be, if it does not say
     */
    public OffsetDateTime takenAt(ZoneId zone, OffsetDateTime otherwise, OffsetDateTime now) {
        return taken.map(time -> time.atOffset(offset.orElseGet(() -> zone.getRules().getOffset(time))))
                .filter(time -> time.getYear() >= 1990 && time.isBefore(now.plusDays(1))).orElse(otherwise);
    }

    static Optional<LocalDateTime> time(String text) {
        try {
            return text.matches("\\d{4}:\\d\\d:\\d\\d \\d\\d:\\d\\d:\\d\\d")
                    ? Optional.of(LocalDateTime.parse(text.substring(0, 10).replace(':', '-') + "T"
                            + text.substring(11))) : Optional.empty();
        } catch (DateTimeException e) {
            return Optional.empty();
        }
    }

    static Optional<ZoneOffset> zone(String text) {
        try {
            return text.matches("[+-]\\d\\d:\\d\\d") ? Optional.of(ZoneOffset.of(text)) : Optional.empty();
        } catch (DateTimeException e) {
            return Optional.empty();
        }
    }
}
