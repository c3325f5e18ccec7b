package bedmark.index;

import bedmark.document.Branch;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.SurveyHistory;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.UUID;

/** A store as it was at some entry, and what came back to it. */
public final class Chronicle {
    private final IndexProof.Asker asker;

    Chronicle(IndexProof.Asker asker) {
        this.asker = asker;
    }

    /**
     * A survey as it stood when a certain entry had been saved; nothing where it was not opened yet.
     *
     * @param asOf sequence number of that entry
     */
    public Optional<SurveyHistory> history(UUID survey, long asOf) {
        return asker.ask(index -> Histories.fold(survey, index.entriesOf(survey).stream()
                .filter(placed -> placed.entry().sequence() <= asOf).toList(), new ArrayList<>()).history());
    }

    /** The register as it was when a certain entry had been saved. */
    public Optional<Branch> register(long asOf) {
        return asker.ask(index -> index.landmarks("register-taken", Integer.MAX_VALUE).stream()
                .filter(entry -> entry.sequence() <= asOf).findFirst()
                .map(entry -> ((Act.RegisterTaken) entry.act()).register()));
    }

    /**
     * The entry since which some surveys have been ready to leave: the newest that completed or queued one of them. It
     * stays the same however often they are exported.
     */
    public Optional<Entry> readySince(List<UUID> surveys) {
        return asker.ask(index -> surveys.stream().flatMap(survey -> index.entriesOf(survey).stream())
                .map(Histories.Placed::entry).filter(entry -> entry.act() instanceof Act.SurveyCompleted
                        || entry.act() instanceof Act.SurveysQueued || entry.act() instanceof Act.SurveyTaken)
                .max(Comparator.comparingLong(Entry::sequence)));
    }

    /** The receipts that were noted, newest first. */
    public List<Branch> receipts() {
        return asker.ask(index -> index.landmarks("receipt-noted", Integer.MAX_VALUE).stream()
                .map(entry -> ((Act.ReceiptNoted) entry.act()).receipt()).toList());
    }
}
