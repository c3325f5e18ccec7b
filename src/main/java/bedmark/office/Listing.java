package bedmark.office;

import bedmark.index.office.OfficeTables;
import bedmark.index.office.PackedZone;
import bedmark.index.office.Verdict;
import bedmark.journal.Progress;
import bedmark.survey.merge.ZoneId;
import java.lang.ref.SoftReference;
import java.time.Clock;
import java.time.ZonedDateTime;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** A store's zones in their order, each judged once since it changed. */
final class Listing {
    private static final int JUDGED_AT_ONCE = 500;

    private final OfficeStore store;
    private final Results results;
    private final Clock clock;
    private final boolean shared;
    private SoftReference<List<PackedZone>> rows = new SoftReference<>(null);

    /** @param shared whether other desks change the same tables */
    Listing(OfficeStore store, Results results, Clock clock, boolean shared) {
        this.store = store;
        this.results = results;
        this.clock = clock;
        this.shared = shared;
    }

    /** Something changes; called on the store's thread. */
    void changing() {
        rows.clear();
    }

    List<RankedZone> rank(RankQuery query, Progress progress) {
        judgeWaiting(progress);
        ZonedDateTime now = ZonedDateTime.now(clock);
        return store.ask(tables -> {
            Minutes known = store.minutes(tables);
            return new Ranking(now, query, known::answers).rank(zones(tables));
        });
    }

    List<RankedZone> worst(RankQuery query, int atMost, Progress progress) {
        judgeWaiting(progress);
        ZonedDateTime now = ZonedDateTime.now(clock);
        Optional<List<RankedZone>> head = store.ask(tables -> {
            Minutes known = store.minutes(tables);
            return new Ranking(now, query, known::answers).head(tables, atMost);
        });
        return head.orElseGet(() -> rank(query, progress).stream().limit(atMost).toList());
    }

    /** Every zone's row; kept until something changes, where nobody else can change it. */
    private List<PackedZone> zones(OfficeTables tables) {
        List<PackedZone> kept = rows.get();
        if (kept == null || shared) {
            kept = tables.zones();
            rows = new SoftReference<>(kept);
        }
        return kept;
    }

    Optional<RankedZone> ranked(ZoneId zone) {
        judgeWaiting(Progress.NONE);
        ZonedDateTime now = ZonedDateTime.now(clock);
        return store.ask(tables -> {
            Minutes known = store.minutes(tables);
            return tables.zone(zone).map(new Ranking(now, RankQuery.ALL, known::answers)::ranked);
        });
    }

    void judgeWaiting(Progress progress) {
        long total = store.ask(OfficeTables::countWaiting);
        long done = 0;
        while (done < total && !progress.cancelled()) {
            progress.at(done, total);
            int judged = store.ask(tables -> {
                // What is judged must not change before it is written down.
                tables.alone();
                List<ZoneId> zones = tables.waiting(JUDGED_AT_ONCE);
                // An earlier program let them stand by the clock of the tablet.
                Effects.stand(tables, tables.datedAhead(zones), store.minutes(tables));
                Map<ZoneId, Optional<Verdict>> verdicts = new LinkedHashMap<>();
                results.latest(tables, zones).forEach((zone, sides) -> verdicts.put(zone,
                        sides.stream().min(Judge.WORST_FIRST).map(worst -> Judge.verdict(worst.assessment()))));
                tables.judge(verdicts);
                rows.clear();
                return zones.size();
            });
            if (judged == 0) {
                return;
            }
            done += judged;
        }
    }
}
