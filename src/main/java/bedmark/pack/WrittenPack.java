package bedmark.pack;

import java.nio.file.Path;

/**
 * A pack that is whole and forced to its medium.
 *
 * @param sha256 digest of the file, hexadecimal
 * @param bytes  size of the file
 * @param photos how many photos it carries
 */
public record WrittenPack(Path file, String sha256, long bytes, int photos, Fingerprint fingerprint) {
}
