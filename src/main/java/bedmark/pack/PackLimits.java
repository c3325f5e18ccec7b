package bedmark.pack;

/**
 * How large a pack may be. The writer makes none that the reader's standard limits would refuse.
 *
 * @param packBytes    of the file; below 4 GiB, since packs don't use ZIP64
 * @param entries      in the archive, folders counted
 * @param entryBytes   of one entry, unpacked
 * @param totalBytes   of all entries together, unpacked
 * @param tagFileBytes of one tag file, unpacked
 * @param bundleBytes  of the bundle's JSON text
 * @param bundleValues upper bound of the JSON values in it; a value costs far more memory than its text
 * @param ratio        unpacked to packed bytes, of an entry and of the whole, judged above {@link #RATIO_FLOOR}
 * @param photoSide    width or height of a photo (pixels)
 * @param photoPixels  width times height of a photo
 */
public record PackLimits(long packBytes, int entries, long entryBytes, long totalBytes, long tagFileBytes,
                         long bundleBytes, int bundleValues, int ratio, long photoSide, long photoPixels) {

    /** What unpacks to less than this harms nobody, however well it was packed (bytes). */
    public static final long RATIO_FLOOR = 1 << 20;

    /** Room for 500 surveys with photos, several shifts, and within a heap of 256 MB. */
    public static final PackLimits STANDARD = new PackLimits(0xFFFF_FFFEL, 10_000, 128L << 20, 0xFFFF_FFFEL,
            4L << 20, 16L << 20, 250_000, 100, 30_000, 128_000_000);
}
