package bedmark.pack;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import java.util.stream.Stream;

/** Where the photos lie that a bundle names. Their digests are proved while they are copied. */
@FunctionalInterface
public interface PhotoSource {

    /** One photo, wherever and however it lies. */
    interface Photo {

        /** Its size in bytes. */
        long size() throws IOException;

        /** The photo from its beginning. */
        InputStream open() throws IOException;
    }

    /**
     * A photo.
     *
     * @param name   the photo's name in the bundle without a leading {@code photos/}; safe, relative, with slashes
     * @param sha256 the digest that the bundle claims, 64 lower-case hexadecimal digits
     * @return nothing where there is no such photo
     */
    Optional<Photo> find(String name, String sha256);

    /** The photos of one folder, by their names; or of the folder {@code photos} in it. */
    static PhotoSource folder(Path folder) {
        return (name, sha256) -> Stream.of(folder.resolve(name), folder.resolve("photos").resolve(name))
                .filter(Files::isRegularFile).findFirst().map(PhotoSource::file);
    }

    /** A photo that is a file. */
    static Photo file(Path file) {
        return new Photo() {
            @Override
            public long size() throws IOException {
                return Files.size(file);
            }

            @Override
            public InputStream open() throws IOException {
                return Files.newInputStream(file);
            }
        };
    }
}
