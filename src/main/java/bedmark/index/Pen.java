package bedmark.index;

import bedmark.journal.Journal;
import bedmark.journal.NotSaved;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.SurveyHistory;
import java.time.OffsetDateTime;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.concurrent.locks.Lock;
import java.util.concurrent.locks.ReentrantLock;
import java.util.function.Function;

/**
 * Saves acts, one at a time, on the thread of whoever has one: the person waits for the medium and for nothing else.
 * The surveys that are being worked on are known here, so that an act is judged without the index, which hears of the
 * entry afterwards on its own thread.
 */
final class Pen {
    private static final int KEPT = 64;
    private static final int MOST_UNTOLD = 1000;
    private static final long MILLIS_LATER = 5;

    private final Lock turn = new ReentrantLock();
    private final Desk desk;
    private final Ledger ledger;
    private final AtomicBoolean called = new AtomicBoolean();
    private final Map<UUID, Optional<SurveyHistory>> known = new LinkedHashMap<>(16, 0.75f, true);
    private boolean closed;

    /** @param desk the thread of the index */
    Pen(Desk desk, Ledger ledger) {
        this.desk = desk;
        this.ledger = ledger;
    }

    /**
     * Saves an act, if it is possible.
     *
     * @throws bedmark.document.Refused where it is not; nothing was written
     * @throws NotSaved                 where it is not on the medium
     * @throws IllegalStateException    where the store is closed
     */
    Entry save(OffsetDateTime at, String person, UUID device, Act act) {
        turn.lock();
        try {
            if (closed) {
                throw new IllegalStateException("the store is closed");
            }
            Entry candidate = new Entry(ledger.last() + 1, at, person, device, act);
            Map<UUID, SurveyHistory> next = ActRules.after(candidate, this::history, survey ->
                    ask(index -> new Queries(index).row(survey).filter(row -> row.line().current()).isPresent()));
            Journal.Saved saved = ledger.save(candidate);
            next.forEach((survey, history) -> known.put(survey, Optional.of(history)));
            forget();
            tell(saved);
            return saved.entry();
        } finally {
            turn.unlock();
        }
    }

    private Optional<SurveyHistory> history(UUID survey) {
        Optional<SurveyHistory> here = known.get(survey);
        return here != null ? here : ask(index -> index.folded(survey).history());
    }

    private <T> T ask(Function<Index, T> question) {
        return desk.call(() -> ledger.ask(question));
    }

    private void forget() {
        if (known.size() > 2 * KEPT) {
            List<UUID> oldestFirst = List.copyOf(known.keySet());
            oldestFirst.subList(0, oldestFirst.size() - KEPT).forEach(known::remove);
        }
    }

    /** The index is not woken at once, since it would then work while the person still waits. */
    private void tell(Journal.Saved saved) {
        int untold = ledger.tell(saved);
        if (!called.getAndSet(true)) {
            desk.begin(() -> {
                called.set(false);
                ledger.catchUp();
            }, MILLIS_LATER);
        }
        if (untold >= MOST_UNTOLD) {
            desk.call(() -> {
                ledger.catchUp();
                return true;
            });
        }
    }

    /** Waits for the act that is being saved; none is taken after that. */
    void close() {
        turn.lock();
        try {
            closed = true;
        } finally {
            turn.unlock();
        }
    }
}
