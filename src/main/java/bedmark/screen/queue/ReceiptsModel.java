package bedmark.screen.queue;

import bedmark.dispatch.ReceiptBook;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.pack.Fingerprint;
import bedmark.pack.ReceiptReader;
import bedmark.pack.SignedReceipt;
import bedmark.screen.Errand;
import bedmark.screen.Workplace;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;

/** Receipts from the office: those of a stick are read at once; an office that is not known is asked about once. */
public final class ReceiptsModel {
    private final Workplace workplace;
    private final ReceiptBook book;
    private final Errand errand;
    private final Set<Fingerprint> vouched = new HashSet<>();
    private final ReadOnlyObjectWrapper<Optional<Result>> result = new ReadOnlyObjectWrapper<>(Optional.empty());
    private Optional<Path> last = Optional.empty();

    /**
     * What the receipts of a folder came to.
     *
     * @param outcomes of those that were noted
     * @param unknown  a receipt of each office that is not known
     * @param refused  those that were refused
     */
    public record Result(List<ReceiptBook.Outcome> outcomes, List<SignedReceipt> unknown, List<Wrong> refused) {
        public Result {
            outcomes = List.copyOf(outcomes);
            unknown = List.copyOf(unknown);
            refused = List.copyOf(refused);
        }
    }

    /** A file that is no sound receipt for this tablet. */
    public record Wrong(String file, Defect defect) {
    }

    ReceiptsModel(Workplace workplace, Errand errand) {
        this.workplace = workplace;
        this.book = new ReceiptBook(workplace.store());
        this.errand = errand;
    }

    public ReadOnlyObjectProperty<Optional<Result>> resultProperty() {
        return result.getReadOnlyProperty();
    }

    /** Forgets what was read, when something else is told. */
    void clear() {
        result.set(Optional.empty());
    }

    /** Reads the receipts of a folder, or one. */
    public void read(Path given, Runnable then) {
        last = Optional.of(given);
        Set<Fingerprint> trusted = Set.copyOf(vouched);
        String person = workplace.preferences().person();
        errand.run(progress -> readAll(given, person, trusted), read -> {
            result.set(Optional.of(read));
            then.run();
        });
    }

    /** The person compared an office's key and accepts it; its receipts are read once more. */
    public void accept(Fingerprint office, Runnable then) {
        vouched.add(office);
        last.ifPresent(given -> read(given, then));
    }

    private Result readAll(Path given, String person, Set<Fingerprint> trusted) {
        List<ReceiptBook.Outcome> outcomes = new ArrayList<>();
        List<SignedReceipt> unknown = new ArrayList<>();
        List<Wrong> refused = new ArrayList<>();
        for (Path file : ReceiptBook.find(given)) {
            try {
                SignedReceipt signed = ReceiptReader.read(file);
                if (trusted.contains(signed.fingerprint()) || book.trusts(signed)) {
                    outcomes.add(book.note(signed, person));
                } else if (unknown.stream().noneMatch(one -> one.fingerprint().equals(signed.fingerprint()))) {
                    unknown.add(signed);
                }
            } catch (Refused e) {
                refused.add(new Wrong(file.getFileName().toString(), e.defect()));
            }
        }
        return new Result(outcomes, unknown, refused);
    }
}
