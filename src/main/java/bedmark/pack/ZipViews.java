package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.io.BufferedInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Enumeration;
import java.util.List;
import java.util.Optional;
import java.util.zip.ZipEntry;
import java.util.zip.ZipException;
import java.util.zip.ZipFile;
import java.util.zip.ZipInputStream;

/**
 * Compares this program's own view of a pack with the two views of the Java library, which read a ZIP file from its
 * end and from its start: the same entries in the same order with the same content, or the pack is refused.
 */
final class ZipViews {
    private static final int PIECE = 1 << 16;

    private final PackContent expected;
    private final Work work;
    private final byte[] piece = new byte[PIECE];

    private ZipViews(PackContent expected, Work work) {
        this.expected = expected;
        this.work = work;
    }

    /**
     * @param expected what our own view gave
     * @throws Refused {@code zip-views-differ}
     */
    static void check(Path file, PackContent expected, Work work) throws IOException {
        ZipViews views = new ZipViews(expected, work);
        try {
            views.fromTheEnd(file);
            views.fromTheStart(file);
        } catch (ZipException | IllegalArgumentException e) {
            throw new Refused(Defect.in("", "zip-views-differ"), e);
        }
    }

    private void fromTheEnd(Path file) throws IOException {
        try (ZipFile zip = new ZipFile(file.toFile())) {
            Enumeration<? extends ZipEntry> entries = zip.entries();
            for (PackEntry own : expected.all()) {
                ZipEntry entry = entries.hasMoreElements() ? entries.nextElement() : null;
                compare(own, Optional.ofNullable(entry));
                try (InputStream content = zip.getInputStream(entry)) {
                    compare(own, content);
                }
            }
            if (entries.hasMoreElements()) {
                throw differ(entries.nextElement().getName());
            }
        }
    }

    private void fromTheStart(Path file) throws IOException {
        try (ZipInputStream zip = new ZipInputStream(new BufferedInputStream(Files.newInputStream(file), 1 << 16))) {
            for (PackEntry own : expected.all()) {
                compare(own, Optional.ofNullable(zip.getNextEntry()));
                compare(own, zip);
            }
            ZipEntry more = zip.getNextEntry();
            if (more != null) {
                throw differ(more.getName());
            }
        }
    }

    private static void compare(PackEntry own, Optional<ZipEntry> theirs) {
        if (theirs.filter(entry -> entry.getName().equals(own.slot().rawName())).isEmpty()) {
            throw differ(own.slot().name());
        }
    }

    /** What our own view kept is compared byte by byte, the rest by its digest. */
    private void compare(PackEntry own, InputStream theirs) throws IOException {
        boolean kept = !own.slot().folder() && expected.kept().containsKey(own.name());
        if (kept ? !same(expected.kept().get(own.name()), theirs) : !digest(theirs).equals(own.sha256())) {
            throw differ(own.slot().name());
        }
    }

    private String digest(InputStream theirs) throws IOException {
        return new DigestStream(theirs, List.of(Sha256.BAG_NAME), work).finish().get(Sha256.BAG_NAME);
    }

    private boolean same(byte[] kept, InputStream theirs) throws IOException {
        int at = 0;
        for (int count = theirs.read(piece); count >= 0; count = theirs.read(piece)) {
            work.add(count);
            if (count > kept.length - at || !Arrays.equals(piece, 0, count, kept, at, at + count)) {
                return false;
            }
            at += count;
        }
        return at == kept.length;
    }

    private static Refused differ(String name) {
        return new Refused(Defect.in(EntryName.shown(name), "zip-views-differ"));
    }
}
