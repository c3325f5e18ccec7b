package bedmark.index;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.journal.Digest;
import bedmark.journal.FileLayer;
import bedmark.vault.DataKey;
import bedmark.vault.SealedInput;
import java.io.FileInputStream;
import java.io.FileNotFoundException;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.util.Arrays;
import java.util.Optional;
import java.util.UUID;
import java.util.regex.Pattern;

/**
 * The folder {@code photos/}: each file untouched, under its own digest, and only ever there as a whole. Where the
 * store has a key, each is sealed with it and bears a further ending; the digest is that of the photo itself.
 */
final class PhotoShelf {
    static final String FOLDER = "photos";
    /** What is not yet a photo lies apart, so that opening need not look through the photos of many years. */
    static final String INCOMING = "incoming";
    /** What the names of sealed files end with. */
    static final String SEALED = ".sealed";
    private static final Pattern FILE = Pattern.compile("photos/[0-9a-f]{64}\\.(jpg|png)");
    private static final String PART = ".part";
    private static final int CHUNK = 256 << 10;
    private static final byte[] JPEG = {(byte) 0xFF, (byte) 0xD8, (byte) 0xFF};
    private static final byte[] PNG = {(byte) 0x89, 'P', 'N', 'G', '\r', '\n', 0x1A, '\n'};

    private final Path store;
    private final Path folder;
    private final Path incoming;
    private final FileLayer files;
    private final Optional<DataKey> key;

    PhotoShelf(Path store, FileLayer files, Optional<DataKey> key) {
        this.store = store;
        this.folder = store.resolve(FOLDER);
        this.incoming = store.resolve(INCOMING);
        this.files = files;
        this.key = key;
    }

    Path folder() {
        return folder;
    }

    /** Makes the folders and drops what never came to be a photo. */
    void open() throws IOException {
        files.createFolder(folder);
        files.createFolder(incoming);
        for (Path file : files.list(incoming)) {
            files.delete(file);
        }
    }

    /** Where the file of a photo lies; nothing where its document names none of this shelf. */
    Optional<Path> file(Branch photo) {
        return photo.text("file").filter(name -> FILE.matcher(name).matches()).map(this::onDisk);
    }

    /** Whether a photo's document names a file of a shelf at all; a survey from elsewhere may name others. */
    static boolean isShelved(Branch photo) {
        return photo.text("file").filter(name -> FILE.matcher(name).matches()).isPresent();
    }

    private Path onDisk(String name) {
        return store.resolve(key.isPresent() ? name + SEALED : name);
    }

    /** The photo in a file of this shelf, whether it is sealed or not. */
    InputStream read(Path file) throws IOException {
        return Sealed.read(files, file, key);
    }

    /** The size of the photo in a file of this shelf (bytes); negative where the file is damaged. */
    long size(Path file) throws IOException {
        try (FileLayer.Input input = files.read(file)) {
            return key.isPresent() ? SealedInput.plainLength(input.size()) : input.size();
        }
    }

    /**
     * Copies a photo in.
     *
     * @return {@code file}, {@code sha256} and {@code bytes}
     * @throws IOException where the shelf can't be written
     * @throws Refused     {@code photo-unreadable} where the source can't be read, {@code photo-unfit} where it is
     *                     neither JPEG nor PNG
     */
    Branch keep(Path source) throws IOException {
        try (InputStream input = new FileInputStream(source.toFile())) {
            return keep(input, source.toString());
        } catch (SourceFailed | FileNotFoundException e) {
            throw new Refused(Defect.in(source.toString(), "photo-unreadable"), e);
        }
    }

    /** The reading side of a copy failed. */
    private static final class SourceFailed extends IOException {
        SourceFailed(IOException cause) {
            super(cause);
        }
    }

    Branch keep(InputStream source, String name) throws IOException {
        byte[] chunk = new byte[CHUNK];
        int count = read(source, chunk);
        String ending = ending(chunk, count).orElseThrow(() -> new Refused(Defect.in(name, "photo-unfit")));
        Path part = incoming.resolve(UUID.randomUUID() + PART);
        try {
            return place(part, ending, copy(source, chunk, count, part));
        } catch (IOException e) {
            drop(part, e);
            throw e;
        }
    }

    /** What was copied. */
    private record Copied(Digest digest, long bytes) {
    }

    private Copied copy(InputStream source, byte[] chunk, int first, Path part) throws IOException {
        MessageDigest sha = Digest.sha256();
        long bytes = 0;
        try (Sealed.Writing writing = Sealed.write(files, part, key)) {
            for (int count = first; count > 0; count = read(source, chunk)) {
                sha.update(chunk, 0, count);
                writing.write(chunk, count);
                bytes += count;
            }
            writing.finish();
        }
        return new Copied(Digest.ofBytes(sha.digest()), bytes);
    }

    private Branch place(Path part, String ending, Copied copied) throws IOException {
        String name = FOLDER + "/" + copied.digest().hex() + ending;
        Path file = onDisk(name);
        if (files.exists(file) && digestOf(file).equals(Optional.of(copied.digest()))) {
            files.delete(part);
        } else {
            files.move(part, file);
        }
        files.forceFolder(folder);
        return Branch.EMPTY.with("file", name).with("sha256", copied.digest().hex())
                .with("bytes", Node.number(copied.bytes()));
    }

    private void drop(Path part, IOException failure) {
        try {
            files.delete(part);
        } catch (IOException e) {
            failure.addSuppressed(e);
        }
    }

    /** The digest of the photo in a file of this shelf; nothing where a sealed one is damaged. */
    Optional<Digest> digestOf(Path file) throws IOException {
        return Sealed.digest(files, file, key);
    }

    private static int read(InputStream source, byte[] chunk) throws SourceFailed {
        try {
            return source.readNBytes(chunk, 0, chunk.length);
        } catch (IOException e) {
            throw new SourceFailed(e);
        }
    }

    private static Optional<String> ending(byte[] start, int count) {
        if (begins(start, count, JPEG)) {
            return Optional.of(".jpg");
        }
        return begins(start, count, PNG) ? Optional.of(".png") : Optional.empty();
    }

    private static boolean begins(byte[] start, int count, byte[] with) {
        return count >= with.length
                && Arrays.equals(start, 0, with.length, with, 0, with.length);
    }
}
