package bedmark.index;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Path;

/** A photo of a store, sealed on disk or not. */
public final class StoredPhoto {
    private final PhotoShelf shelf;
    private final Path file;

    StoredPhoto(PhotoShelf shelf, Path file) {
        this.shelf = shelf;
        this.file = file;
    }

    /** The photo's size (bytes); negative where its sealed file is damaged. */
    public long size() throws IOException {
        return shelf.size(file);
    }

    /**
     * The photo from its beginning.
     *
     * @throws IOException where the file can't be read, or is sealed and damaged
     */
    public InputStream open() throws IOException {
        return shelf.read(file);
    }
}
