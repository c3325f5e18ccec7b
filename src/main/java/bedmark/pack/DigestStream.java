package bedmark.pack;

import java.io.FilterInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.security.MessageDigest;
import java.util.Collection;
import java.util.HexFormat;
import java.util.LinkedHashMap;
import java.util.Map;

/** Digests what is read through it by several algorithms at once, and counts it as work. */
final class DigestStream extends FilterInputStream {

    /** The algorithms that a bag may use, by their names in a bag and in Java. */
    static final Map<String, String> ALGORITHMS = Map.of("md5", "MD5", "sha1", "SHA-1", "sha224", "SHA-224",
            Sha256.BAG_NAME, "SHA-256", "sha384", "SHA-384", "sha512", "SHA-512");

    private final Map<String, MessageDigest> digests = new LinkedHashMap<>();
    private final Work work;

    /** @param algorithms names as in a bag, each one of {@link #ALGORITHMS} */
    DigestStream(InputStream in, Collection<String> algorithms, Work work) {
        super(in);
        this.work = work;
        algorithms.forEach(name -> digests.put(name, Sha256.begin(ALGORITHMS.get(name))));
    }

    @Override
    public int read() throws IOException {
        byte[] single = new byte[1];
        return read(single, 0, 1) < 0 ? -1 : Byte.toUnsignedInt(single[0]);
    }

    @Override
    public int read(byte[] target, int from, int length) throws IOException {
        int count = super.read(target, from, length);
        if (count > 0) {
            digests.values().forEach(digest -> digest.update(target, from, count));
            work.add(count);
        }
        return count;
    }

    @Override
    public long skip(long count) throws IOException {
        return readNBytes((int) Math.min(count, 1 << 16)).length;
    }

    @Override
    public boolean markSupported() {
        return false;
    }

    /** Reads to the end and gives the digests (hexadecimal) by the algorithms' names. */
    Map<String, String> finish() throws IOException {
        // Most were read to their end before, and need no room for more.
        if (read() >= 0) {
            byte[] piece = new byte[1 << 16];
            while (read(piece, 0, piece.length) >= 0) {
                continue;
            }
        }
        Map<String, String> hex = new LinkedHashMap<>();
        digests.forEach((name, digest) -> hex.put(name, HexFormat.of().formatHex(digest.digest())));
        return hex;
    }
}
