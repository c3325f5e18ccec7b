package bedmark.bench;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;

/** A folder under {@code target/bench} that goes again: on the disk of the project, since a memory disk forces nothing. */
record BenchFolder(Path path) implements AutoCloseable {

    static BenchFolder make(String name) throws IOException {
        Path parent = Files.createDirectories(Path.of(System.getProperty("bench.folder", "target/bench")));
        return new BenchFolder(Files.createTempDirectory(parent.toAbsolutePath(), name));
    }

    @Override
    public void close() throws IOException {
        List<Path> deepestFirst;
        try (Stream<Path> files = Files.walk(path)) {
            deepestFirst = files.sorted(Comparator.reverseOrder()).toList();
        }
        for (Path file : deepestFirst) {
            Files.delete(file);
        }
    }
}
