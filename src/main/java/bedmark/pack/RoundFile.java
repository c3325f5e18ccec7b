package bedmark.pack;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Fault;
import bedmark.journal.FileLayer;
import bedmark.journal.NamedPath;
import bedmark.json.RoundText;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;

/**
 * A round file whose signature fits; whether the office is trusted is for the reader to decide.
 *
 * @param document    the file's whole content
 * @param fingerprint of the key that signed it
 */
public record RoundFile(Branch document, Fingerprint fingerprint) {

    /** Room for the register of a large plant and all its last results (bytes). */
    public static final int LONGEST = 64 << 20;
    /** How the usual names of round files end. */
    public static final String ENDING = ".round.json";

    /**
     * Reads a round file that comes from anywhere: sound in every respect, or refused with one reason.
     *
     * @throws Refused {@code round-file-absent}, {@code round-file-too-large}, {@code round-file-unreadable}, the codes
     *                 of {@link RoundText#read}, {@code signed-key-wrong}, {@code signed-signature-wrong}
     */
    public static RoundFile read(Path file) {
        if (!Files.isRegularFile(file)) {
            throw new Refused(Defect.in(file.toString(), "round-file-absent"));
        }
        byte[] bytes;
        try (InputStream in = Files.newInputStream(file)) {
            bytes = in.readNBytes(LONGEST + 1);
        } catch (IOException e) {
            throw new Refused(Defect.in(file.toString(), "round-file-unreadable", Fault.reason(e)), e);
        }
        if (bytes.length > LONGEST) {
            throw new Refused(Defect.in(file.toString(), "round-file-too-large", Integer.toString(LONGEST >> 20)));
        }
        Branch document = RoundText.read(bytes);
        return new RoundFile(document, SignedJson.prove(bytes, document));
    }

    /**
     * Signs and writes a round file whole or not at all.
     *
     * @param document all keys but {@code key} and {@code signature}
     * @param out      the file, in a folder that exists
     * @return the file's exact bytes
     * @throws Refused what {@link RoundText#read} would refuse, {@code file-is-folder}, {@code file-not-plain},
     *                 {@code folder-absent}, {@code round-file-…}; a file that was there is as it was
     */
    public static byte[] write(Branch document, DeviceKey office, Path out) {
        return write(document, office, out, FileLayer.disk());
    }

    static byte[] write(Branch document, DeviceKey office, Path out, FileLayer disk) {
        byte[] text = SignedJson.text(document, office);
        RoundText.read(text);
        Path target = out.toAbsolutePath();
        NamedPath.requireTarget(target);
        try {
            if (!Files.isDirectory(target.getParent())) {
                throw new Refused(Defect.in(target.getParent().toString(), "folder-absent"));
            }
            new SafeFile(disk, target, false).write(file -> file.write(text));
            return text;
        } catch (IOException e) {
            throw new Refused(Fault.defect("round-file", e, disk, target.getParent()), e);
        }
    }
}
