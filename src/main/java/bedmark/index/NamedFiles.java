package bedmark.index;

import bedmark.journal.FileLayer;
import java.io.Closeable;
import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Files of a backup under the names that they have in a store; only for reading. */
final class NamedFiles implements FileLayer {
    private final FileLayer below;
    private final Path folder;
    private final Map<String, Path> byName;

    NamedFiles(FileLayer below, Path folder, Map<String, Path> byName) {
        this.below = below;
        this.folder = folder;
        this.byName = byName;
    }

    private Optional<Path> real(Path file) {
        return Optional.ofNullable(byName.get(folder.relativize(file).toString().replace('\\', '/')));
    }

    @Override
    public boolean exists(Path file) {
        return real(file).filter(below::exists).isPresent();
    }

    @Override
    public List<Path> list(Path from) {
        return byName.keySet().stream().map(folder::resolve).filter(file -> file.getParent().equals(from)).sorted()
                .toList();
    }

    @Override
    public Input read(Path file) throws IOException {
        return below.read(real(file).orElse(file));
    }

    @Override
    public long usableSpace(Path from) throws IOException {
        return below.usableSpace(from);
    }

    @Override
    public boolean writable(Path from) {
        return false;
    }

    @Override
    public void createFolder(Path made) {
        throw readOnly();
    }

    @Override
    public Output create(Path file) {
        throw readOnly();
    }

    @Override
    public Output createPrivate(Path file) {
        throw readOnly();
    }

    @Override
    public Output append(Path file) {
        throw readOnly();
    }

    @Override
    public void truncate(Path file, long length) {
        throw readOnly();
    }

    @Override
    public void move(Path from, Path to) {
        throw readOnly();
    }

    @Override
    public void delete(Path file) {
        throw readOnly();
    }

    @Override
    public void forceFolder(Path from) {
        throw readOnly();
    }

    @Override
    public Optional<Closeable> lock(Path file) {
        throw readOnly();
    }

    private static UnsupportedOperationException readOnly() {
        return new UnsupportedOperationException("a backup is only read");
    }
}
