package bedmark.pack;

import bedmark.journal.FileLayer;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.file.DirectoryIteratorException;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.UUID;

/** Writes a file so that its name stands for the whole of it or does not stand there at all. */
public final class SafeFile {
    private final FileLayer disk;
    private final Path target;
    private final boolean ownerOnly;

    /**
     * A file to be.
     *
     * @param target    in a folder that is there
     * @param ownerOnly whether nobody else may read it, where the system knows such rights
     */
    public SafeFile(FileLayer disk, Path target, boolean ownerOnly) {
        this.disk = disk;
        this.target = target.toAbsolutePath();
        this.ownerOnly = ownerOnly;
    }

    /** What fills the file. */
    @FunctionalInterface
    public interface Content {
        void writeTo(OutputStream out) throws IOException;
    }

    /**
     * Writes beside the target, forces, moves, forces the folder. After a failure before the move nothing is left;
     * after a failure of the last step the whole new file stands there, though a power cut might still take it.
     */
    public void write(Content content) throws IOException {
        Path folder = target.getParent();
        clearLeftovers(folder);
        Path part = folder.resolve(partPrefix() + UUID.randomUUID().toString().substring(0, 8) + ".part");
        try {
            try (FileLayer.Output out = ownerOnly ? disk.createPrivate(part) : disk.create(part)) {
                content.writeTo(out.stream());
                out.force();
            }
            disk.move(part, target);
        } catch (IOException | RuntimeException e) {
            try {
                disk.delete(part);
            } catch (IOException left) {
                e.addSuppressed(left);
            }
            throw e;
        }
        disk.forceFolder(folder);
    }

    /** An earlier attempt that was killed could clean up nothing. */
    private void clearLeftovers(Path folder) throws IOException {
        try (DirectoryStream<Path> parts = Files.newDirectoryStream(folder, entry ->
                entry.getFileName().toString().startsWith(partPrefix())
                        && entry.getFileName().toString().endsWith(".part"))) {
            for (Path part : parts) {
                disk.delete(part);
            }
        } catch (DirectoryIteratorException e) {
            throw e.getCause();
        }
    }

    private String partPrefix() {
        return "." + target.getFileName() + ".";
    }
}
