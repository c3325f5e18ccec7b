package bedmark.pack;

/**
 * A photo of a pack.
 *
 * @param name   within the folder of photos; safe, relative, with slashes
 * @param sha256 64 lower-case hexadecimal digits
 * @param bytes  its size
 */
public record PackedPhoto(String name, String sha256, long bytes) {
}
