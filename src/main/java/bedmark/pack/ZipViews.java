package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.io.BufferedInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
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
    private ZipViews() {
    }

    /**
     * @param expected the entries of our own view in the file's order
     * @throws Refused {@code zip-views-differ}
     */
    static void check(Path file, List<PackEntry> expected, Work work) throws IOException {
        try {
            fromTheEnd(file, expected, work);
            fromTheStart(file, expected, work);
        } catch (ZipException | IllegalArgumentException e) {
            throw new Refused(Defect.in("", "zip-views-differ"), e);
        }
    }

    private static void fromTheEnd(Path file, List<PackEntry> expected, Work work) throws IOException {
        try (ZipFile zip = new ZipFile(file.toFile())) {
            Enumeration<? extends ZipEntry> entries = zip.entries();
            for (PackEntry own : expected) {
                ZipEntry entry = entries.hasMoreElements() ? entries.nextElement() : null;
                compare(own, Optional.ofNullable(entry));
                try (InputStream content = zip.getInputStream(entry)) {
                    compare(own, content, work);
                }
            }
            if (entries.hasMoreElements()) {
                throw differ(entries.nextElement().getName());
            }
        }
    }

    private static void fromTheStart(Path file, List<PackEntry> expected, Work work) throws IOException {
        try (ZipInputStream zip = new ZipInputStream(new BufferedInputStream(Files.newInputStream(file), 1 << 16))) {
            for (PackEntry own : expected) {
                compare(own, Optional.ofNullable(zip.getNextEntry()));
                compare(own, zip, work);
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

    private static void compare(PackEntry own, InputStream theirs, Work work) throws IOException {
        DigestStream content = new DigestStream(theirs, List.of(Sha256.BAG_NAME), work);
        if (!content.finish().get(Sha256.BAG_NAME).equals(own.sha256())) {
            throw differ(own.slot().name());
        }
    }

    private static Refused differ(String name) {
        return new Refused(Defect.in(EntryName.shown(name), "zip-views-differ"));
    }
}
