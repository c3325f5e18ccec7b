package bedmark.pack;

/**
 * One entry of a ZIP file, as its central directory tells it and its local header confirms.
 *
 * @param name   with slashes; a folder's without the last one
 * @param folder whether it stands for a folder and holds nothing
 * @param method {@link Zip#STORED} or {@link Zip#DEFLATED}
 * @param crc    CRC-32 of the unpacked bytes
 * @param packed bytes in the file
 * @param size   bytes unpacked
 * @param header where the local header begins
 * @param data   where the packed bytes begin
 * @param end    where the next thing begins
 */
record ZipSlot(String name, boolean folder, int method, long crc, long packed, long size, long header, long data,
               long end) {

    /** The name as the archive holds it. */
    String rawName() {
        return folder ? name + "/" : name;
    }
}
