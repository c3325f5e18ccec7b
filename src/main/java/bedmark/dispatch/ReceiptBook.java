package bedmark.dispatch;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.index.Export;
import bedmark.index.Store;
import bedmark.pack.Fingerprint;
import bedmark.pack.Receipt;
import bedmark.pack.SignedReceipt;
import bedmark.pack.SurveyContent;
import bedmark.survey.Act;
import bedmark.survey.QueueState;
import bedmark.survey.SurveyHistory;
import java.io.IOException;
import java.nio.file.DirectoryIteratorException;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.UUID;

/**
 * Receipts that come back from the office. A survey counts as received where the office has it with the content that
 * it has here; an office's key is trusted once a receipt of it was noted, and for the first one the person is asked.
 */
public final class ReceiptBook {
    private static final String RECEIPTS = "*.receipt.json";
    private static final int MOST = 1000;

    private final Store store;

    public ReceiptBook(Store store) {
        this.store = store;
    }

    /**
     * What a receipt came to.
     *
     * @param received  surveys that the office has, and that were not known to be there
     * @param known     surveys that were known to be there
     * @param differing surveys that the office has with another content than this tablet; they stay exported
     */
    public record Outcome(Receipt receipt, List<UUID> received, List<UUID> known, List<UUID> differing) {
        public Outcome {
            received = List.copyOf(received);
            known = List.copyOf(known);
            differing = List.copyOf(differing);
        }
    }

    /** Whether a receipt of that office was noted before. */
    public boolean trusts(SignedReceipt receipt) {
        Optional<String> key = receipt.document().text("key");
        return store.chronicle().receipts().stream().anyMatch(noted -> noted.text("key").isPresent()
                && noted.text("key").equals(key));
    }

    /**
     * Refuses a receipt of an office that nobody vouched for.
     *
     * @param vouched fingerprints that the person compared
     * @throws Refused {@code office-unknown}, with the office's name and fingerprint
     */
    public void requireTrusted(SignedReceipt receipt, Set<Fingerprint> vouched) {
        if (!vouched.contains(receipt.fingerprint()) && !trusts(receipt)) {
            throw new Refused(Defect.in("", "office-unknown", receipt.receipt().office().name(),
                    receipt.fingerprint().toString()));
        }
    }

    /**
     * Notes a receipt whose office is trusted. Noting it again changes nothing.
     *
     * @throws Refused {@code office-receipt-foreign} where it is for no pack of this tablet
     */
    public Outcome note(SignedReceipt signed, String person) {
        Receipt receipt = signed.receipt();
        Set<UUID> packed = new HashSet<>();
        store.exports().stream().filter(export -> export.sha256().equals(receipt.packSha256()))
                .map(Export::surveys).forEach(packed::addAll);
        if (packed.isEmpty()) {
            throw new Refused(Defect.in("", "office-receipt-foreign", receipt.pack().toString()));
        }
        List<UUID> received = new ArrayList<>();
        List<UUID> known = new ArrayList<>();
        List<UUID> differing = new ArrayList<>();
        for (Receipt.Item item : receipt.items()) {
            Optional<SurveyHistory> ours = store.history(item.survey()).filter(one -> packed.contains(item.survey()));
            if (ours.isEmpty() || !agrees(item, ours.get())) {
                differing.add(item.survey());
            } else if (ours.get().state() == QueueState.RECEIVED) {
                known.add(item.survey());
            } else {
                received.add(item.survey());
            }
        }
        if (!received.isEmpty()) {
            store.append(person, new Act.ReceiptNoted(received, signed.document()));
        }
        return new Outcome(receipt, received, known, differing);
    }

    private static boolean agrees(Receipt.Item item, SurveyHistory ours) {
        return item.revision() == ours.survey().revision()
                && item.sha256().equals(SurveyContent.sha256(ours.survey()));
    }

    /**
     * The receipts in a folder or on a stick, by name; or the one file that is given.
     *
     * @throws Refused {@code office-receipts-absent} where there are none, {@code file-unreadable}
     */
    public static List<Path> find(Path given) {
        if (!Files.isDirectory(given)) {
            return List.of(given);
        }
        List<Path> found = new ArrayList<>();
        try (DirectoryStream<Path> files = Files.newDirectoryStream(given, RECEIPTS)) {
            for (Path file : files) {
                if (found.size() < MOST) {
                    found.add(file);
                }
            }
        } catch (IOException | DirectoryIteratorException e) {
            throw new Refused(Defect.in(given.toString(), "file-unreadable"), e);
        }
        if (found.isEmpty()) {
            throw new Refused(Defect.in(given.toString(), "office-receipts-absent"));
        }
        return found.stream().sorted().toList();
    }
}
