package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Fault;
import bedmark.journal.FileLayer;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.ReadOnlyFileSystemException;

/** Writes a receipt as one {@linkplain SignedJson signed} JSON file. The same receipt and key always give the same. */
public final class ReceiptWriter {
    /** How the usual names of receipts end. */
    public static final String ENDING = ".receipt.json";

    private final FileLayer disk;

    ReceiptWriter(FileLayer disk) {
        this.disk = disk;
    }

    /** The usual name of a receipt, beside a pack or anywhere else. */
    public static String fileName(Receipt receipt) {
        return "bedmark-" + receipt.pack().toString().substring(0, 8) + "-"
                + receipt.id().toString().substring(0, 8) + ENDING;
    }

    /** The file's exact bytes. */
    public static byte[] text(Receipt receipt, DeviceKey office) {
        return SignedJson.text(receipt.document(), office);
    }

    /**
     * Writes a receipt whole or not at all.
     *
     * @param out the file, in a folder that exists; an older one of that name stays until the new one is whole
     * @throws Refused {@code receipt-disk-full}, {@code receipt-read-only}, {@code receipt-vanished},
     *                 {@code receipt-not-saved}
     */
    public static Path write(Receipt receipt, DeviceKey office, Path out) {
        return new ReceiptWriter(FileLayer.disk()).writeReceipt(receipt, office, out);
    }

    Path writeReceipt(Receipt receipt, DeviceKey office, Path out) {
        Path target = out.toAbsolutePath();
        byte[] text = text(receipt, office);
        if (!Files.isDirectory(target.getParent())) {
            throw new Refused(Defect.in(target.getParent().toString(), "receipt-vanished"));
        }
        try {
            new SafeFile(disk, target, false).write(file -> file.write(text));
            return target;
        } catch (IOException | ReadOnlyFileSystemException e) {
            throw new Refused(defect(e, target.getParent()), e);
        }
    }

    private Defect defect(Exception failure, Path folder) {
        Fault fault = failure instanceof IOException known ? Fault.of(known, disk, folder) : Fault.READ_ONLY;
        String where = folder.toString();
        return switch (fault) {
            case VANISHED -> Defect.in(where, "receipt-vanished");
            case DISK_FULL -> Defect.in(where, "receipt-disk-full");
            case READ_ONLY -> Defect.in(where, "receipt-read-only");
            case FORCE_FAILED, FAILED -> Defect.in(where, "receipt-not-saved", Fault.reason(failure));
        };
    }
}
