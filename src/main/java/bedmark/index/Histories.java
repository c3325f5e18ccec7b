package bedmark.index;

import bedmark.document.Refused;
import bedmark.journal.Digest;
import bedmark.journal.Place;
import bedmark.survey.Entry;
import bedmark.survey.SurveyHistory;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;
import java.util.function.Function;

/** The surveys that were folded last, and the rest on demand from the journal. */
final class Histories {
    private static final int KEPT = 256;

    /** An entry with the place where it lies. */
    record Placed(Entry entry, Place place) {
    }

    private final Map<UUID, Folded> known = new LinkedHashMap<>(16, 0.75f, true);
    private final Function<UUID, Folded> stored;

    /**
     * @param stored folds all entries of a survey, as they are stored
     */
    Histories(Function<UUID, Folded> stored) {
        this.stored = stored;
    }

    Folded of(UUID survey) {
        Folded folded = known.get(survey);
        if (folded == null) {
            folded = stored.apply(survey);
            known.put(survey, folded);
        }
        return folded;
    }

    /** Takes one more entry in; one that does not fit what is there changes nothing. */
    void apply(UUID survey, Entry entry, Place place) {
        known.put(survey, after(of(survey), survey, new Placed(entry, place), new ArrayList<>()));
    }

    /** Whether more is kept than should be. */
    boolean full() {
        return known.size() > KEPT;
    }

    /** Forgets the ones that were not asked for longest. */
    void shrink() {
        List<UUID> ids = List.copyOf(known.keySet());
        ids.subList(0, Math.max(0, ids.size() - KEPT / 2)).forEach(known::remove);
    }

    void clear() {
        known.clear();
    }

    /**
     * Folds the entries of one survey. Where one was lost, later ones may not fit; they are left out.
     *
     * @param unfit takes the sequence numbers of those
     */
    static Folded fold(UUID survey, List<Placed> entries, List<Long> unfit) {
        Folded folded = new Folded(Optional.empty(), 0, 0, Digest.of(new byte[0]));
        for (Placed placed : entries) {
            folded = after(folded, survey, placed, unfit);
        }
        return folded;
    }

    private static Folded after(Folded before, UUID survey, Placed placed, List<Long> unfit) {
        Entry entry = placed.entry();
        try {
            SurveyHistory next = Fold.next(before.history(), entry, survey);
            long first = before.history().isPresent() ? before.first() : entry.sequence();
            return new Folded(Optional.of(next), first, entry.sequence(), placed.place().hash());
        } catch (Refused e) {
            unfit.add(entry.sequence());
            return before;
        }
    }
}
