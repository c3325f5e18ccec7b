package bedmark.office;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Digest;
import bedmark.journal.Fault;
import bedmark.journal.FileLayer;
import bedmark.journal.NamedPath;
import java.io.FileInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.util.List;
import java.util.Optional;
import java.util.UUID;

/** The packs that were taken in, each untouched under its own digest, and only ever there as a whole. */
final class PackShelf {
    private static final String PART = ".part";
    private static final int CHUNK = 256 << 10;

    private final Path folder;
    private final FileLayer files;
    private final boolean passing;

    /** @param passing whether packs only pass through here, since the tables hold them */
    PackShelf(Path folder, FileLayer files, boolean passing) {
        this.passing = passing;
        this.folder = folder;
        this.files = files;
    }

    /** A copy that is not yet taken in. */
    record Laid(Path part, String sha256, long bytes) {
    }

    /** Makes the folder and drops what was never taken in. */
    void open() throws IOException {
        files.createFolder(folder);
        for (Path file : files.list(folder)) {
            if (passing || file.getFileName().toString().endsWith(PART)) {
                files.delete(file);
            }
        }
    }

    Path file(String sha256) {
        return folder.resolve(sha256 + ".zip");
    }

    boolean has(String sha256) {
        return files.exists(file(sha256));
    }

    /**
     * Copies a pack beside the others, forced, under a name of its own.
     *
     * @throws Refused those of {@link NamedPath#requirePlainFile}, {@code pack-unreadable}, {@code store-…}
     */
    Laid lay(Path source) {
        Path part = folder.resolve(UUID.randomUUID() + PART);
        MessageDigest sha = Digest.sha256();
        byte[] chunk = new byte[CHUNK];
        long bytes = 0;
        try (InputStream input = open(source); FileLayer.Output output = files.create(part)) {
            for (int count = read(input, chunk, source); count > 0; count = read(input, chunk, source)) {
                sha.update(chunk, 0, count);
                output.write(ByteBuffer.wrap(chunk, 0, count));
                bytes += count;
            }
            output.force();
        } catch (IOException e) {
            drop(part);
            throw new Refused(Fault.defect("store", e, files, folder), e);
        } catch (RuntimeException e) {
            drop(part);
            throw e;
        }
        return new Laid(part, Digest.ofBytes(sha.digest()).hex(), bytes);
    }

    private static InputStream open(Path source) {
        NamedPath.requirePlainFile(source);
        try {
            return new FileInputStream(source.toFile());
        } catch (IOException e) {
            throw new Refused(Defect.in(source.toString(), "pack-unreadable", Fault.reason(e)), e);
        }
    }

    private static int read(InputStream input, byte[] chunk, Path source) {
        try {
            return input.readNBytes(chunk, 0, chunk.length);
        } catch (IOException e) {
            throw new Refused(Defect.in(source.toString(), "pack-unreadable", Fault.reason(e)), e);
        }
    }

    /** Gives copies their names for good; one that has it already keeps it. */
    void keep(List<Laid> copies) {
        try {
            for (Laid laid : copies) {
                if (files.exists(laid.part()) || !has(laid.sha256())) {
                    files.move(laid.part(), file(laid.sha256()));
                }
            }
            files.forceFolder(folder);
        } catch (IOException e) {
            throw new Refused(Fault.defect("store", e, files, folder), e);
        }
    }

    /** A pack's bytes, where the tables are to hold them because no folder does. */
    Optional<byte[]> forTables(String sha256) {
        try {
            return passing ? Optional.of(Files.readAllBytes(file(sha256))) : Optional.empty();
        } catch (IOException e) {
            throw new Refused(Fault.defect("store", e, files, folder), e);
        }
    }

    /** Lays down a pack that only the tables hold, so that it can be read. */
    void lay(String sha256, byte[] content) {
        try {
            Files.write(file(sha256), content);
        } catch (IOException e) {
            throw new Refused(Fault.defect("store", e, files, folder), e);
        }
    }

    /** Lets a pack go that the tables hold. */
    void passed(String sha256) {
        if (passing) {
            drop(file(sha256));
        }
    }

    /** Lets a copy go that was not taken in; one that can't be deleted goes when the store is opened next. */
    void drop(Path part) {
        try {
            files.delete(part);
        } catch (IOException e) {
            return;
        }
    }
}
