package bedmark.sample;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

/**
 * The photos as they lie in {@code sample-surveys/photos/}. Encoders differ from one machine to the next, so that the
 * committed bytes are the ones that count; that they show what {@link SamplePicture} draws is tested apart.
 */
record SamplePhotos(Path folder) {
    byte[] bytes(String name) {
        try {
            return Files.readAllBytes(folder.resolve(name));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** The digest of a file, hexadecimal. */
    static String sha256(byte[] bytes) {
        try {
            return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(bytes));
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException(e);
        }
    }
}
