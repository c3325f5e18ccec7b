package bedmark.index.office;

/**
 * What holds today of a plant.
 *
 * @param made     when it was made (ms since 1970)
 * @param own      whether the office itself made it
 * @param digest   of the content
 * @param register digest of the plant's register in it
 * @param content  {@code plant}, {@code forms} and {@code rounds}
 */
public record PlantRow(String id, long made, boolean own, String digest, String register, byte[] content) {
}
