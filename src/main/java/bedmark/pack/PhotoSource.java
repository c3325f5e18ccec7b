package bedmark.pack;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import java.util.stream.Stream;

/** Where the photos lie that a bundle names. Their digests are proved while they are copied. */
@FunctionalInterface
public interface PhotoSource {

    /**
     * The file of a photo.
     *
     * @param name   the photo's name in the bundle without a leading {@code photos/}; safe, relative, with slashes
     * @param sha256 the digest that the bundle claims, 64 lower-case hexadecimal digits
     * @return nothing where there is no such photo
     */
    Optional<Path> find(String name, String sha256);

    /** The photos of one folder, by their names; or of the folder {@code photos} in it. */
    static PhotoSource folder(Path folder) {
        return (name, sha256) -> Stream.of(folder.resolve(name), folder.resolve("photos").resolve(name))
                .filter(Files::isRegularFile).findFirst();
    }
}
