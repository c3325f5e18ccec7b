package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Fault;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.DigestOutputStream;
import java.security.MessageDigest;
import java.util.HexFormat;

/** The digest by which tablet and office speak of the same pack. */
public final class PackDigest {
    private PackDigest() {
    }

    /**
     * SHA-256 of a pack's file.
     *
     * @return 64 lower-case hexadecimal digits
     * @throws Refused {@code pack-unreadable}
     */
    public static String sha256(Path file) {
        MessageDigest digest = Sha256.begin();
        try (DigestOutputStream out = new DigestOutputStream(OutputStream.nullOutputStream(), digest)) {
            Files.copy(file, out);
        } catch (IOException e) {
            throw new Refused(Defect.in(file.toString(), "pack-unreadable", Fault.reason(e)), e);
        }
        return HexFormat.of().formatHex(digest.digest());
    }
}
