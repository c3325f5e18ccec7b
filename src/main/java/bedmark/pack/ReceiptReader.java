package bedmark.pack;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Fault;
import bedmark.json.ReceiptText;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashSet;
import java.util.Set;
import java.util.UUID;

/** Reads receipts that come from anywhere: sound in every respect, or refused with one reason. */
public final class ReceiptReader {

    /** Room for the surveys of the largest pack (bytes). */
    public static final int LONGEST = 4 << 20;

    private ReceiptReader() {
    }

    /**
     * Reads a receipt's file.
     *
     * @throws Refused {@code receipt-absent}, {@code receipt-too-large}, {@code receipt-unreadable}, and the codes of
     *                 {@link #read(byte[])}
     */
    public static SignedReceipt read(Path file) {
        if (!Files.isRegularFile(file)) {
            throw new Refused(Defect.in(file.toString(), "receipt-absent"));
        }
        byte[] bytes;
        try (InputStream in = Files.newInputStream(file)) {
            bytes = in.readNBytes(LONGEST + 1);
        } catch (IOException e) {
            throw new Refused(Defect.in(file.toString(), "receipt-unreadable", Fault.reason(e)), e);
        }
        if (bytes.length > LONGEST) {
            throw new Refused(Defect.in(file.toString(), "receipt-too-large", Integer.toString(LONGEST)));
        }
        return read(bytes);
    }

    /**
     * Proves a receipt. Only the spelling that {@link ReceiptWriter} writes is let in, so that one receipt is one
     * file.
     *
     * @throws Refused the codes of {@link ReceiptText#read}, {@code signed-key-wrong},
     *                 {@code signed-signature-wrong}, {@code receipt-survey-twice}
     */
    public static SignedReceipt read(byte[] bytes) {
        Branch document = ReceiptText.read(bytes);
        Receipt receipt = new Receipt(document.without(SignedJson.KEY).without(SignedJson.SIGNATURE));
        Fingerprint office = SignedJson.prove(bytes, document);
        Set<UUID> seen = new HashSet<>();
        receipt.items().stream().filter(item -> !seen.add(item.survey())).findFirst().ifPresent(item -> {
            throw new Refused(Defect.in("/surveys", "receipt-survey-twice", item.survey().toString()));
        });
        return new SignedReceipt(receipt, office, document);
    }
}
