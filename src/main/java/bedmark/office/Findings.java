package bedmark.office;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.engine.verdict.Rule;
import bedmark.survey.OfficeDeed;
import bedmark.survey.merge.Clash;
import bedmark.survey.merge.Copy;
import bedmark.survey.merge.MergedZone;
import bedmark.survey.merge.ZoneId;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;

/** What the office decides about findings and conflicts, as deeds that are possible as things stand. */
public final class Findings {
    private final OfficeStore store;

    public Findings(OfficeStore store) {
        this.store = store;
    }

    /**
     * Accepts or shelves a finding.
     *
     * @param reason why; not blank
     * @param person who; not blank
     * @param until  the last day on which it stays away; must lie ahead, and be there where it is shelved
     * @throws Refused {@code finding-absent}, {@code reason-absent}, {@code person-absent}, {@code day-absent},
     *                 {@code day-past}
     */
    public void answer(ZoneId zone, Rule rule, OfficeDeed.Answer answer, String reason, String person,
                       Optional<LocalDate> until, LocalDate today) {
        require(!reason.isBlank(), zone, "reason-absent");
        require(!person.isBlank(), zone, "person-absent");
        require(answer == OfficeDeed.Answer.ACCEPTED || until.isPresent(), zone, "day-absent");
        require(until.filter(today::isAfter).isEmpty(), zone, "day-past", until.map(Object::toString).orElse(""));
        RankedZone ranked = store.ranked(zone).orElseThrow(() ->
                new Refused(Defect.in(zone.transfer(), "zone-unknown")));
        FindingLine line = ranked.findings().stream().filter(one -> one.rule() == rule).findFirst().orElseThrow(() ->
                new Refused(Defect.in(zone.transfer(), "finding-absent", rule.code())));
        store.act(person, new OfficeDeed.FindingAnswered(zone, rule.code(), answer, reason.strip(), until,
                ranked.survey().orElseThrow(), line.document()));
    }

    /**
     * Takes an answer back.
     *
     * @throws Refused {@code reason-absent}, {@code person-absent}, {@code answer-absent}
     */
    public void reopen(ZoneId zone, Rule rule, String reason, String person) {
        require(!reason.isBlank(), zone, "reason-absent");
        require(!person.isBlank(), zone, "person-absent");
        require(store.ask(tables -> store.minutes(tables).answers(zone)).stream().anyMatch(one -> one.rule() == rule),
                zone, "answer-absent", rule.code());
        store.act(person, new OfficeDeed.FindingReopened(zone, rule.code(), reason.strip()));
    }

    /**
     * Decides for one side of the conflicts that it is part of; the other sides are kept and no longer count.
     *
     * @param kept digest of that side, or the start of it that no other side has
     * @throws Refused {@code clash-side-unknown}, {@code reason-absent}, {@code person-absent}
     */
    public void settle(ZoneId zone, String kept, String reason, String person) {
        require(!reason.isBlank(), zone, "reason-absent");
        require(!person.isBlank(), zone, "person-absent");
        MergedZone merged = store.merged(zone);
        List<Copy> found = merged.clashes().stream().flatMap(clash -> clash.sides().stream()).distinct()
                .filter(side -> side.digest().startsWith(kept)).toList();
        require(found.size() == 1 && !kept.isBlank(), zone, "clash-side-unknown", kept);
        List<String> aside = merged.clashes().stream().filter(clash -> clash.has(found.get(0)))
                .map(Clash::sides).flatMap(List::stream).map(Copy::digest)
                .filter(digest -> !digest.equals(found.get(0).digest())).distinct().sorted().toList();
        store.act(person, new OfficeDeed.ClashSettled(zone, aside, reason.strip()));
    }

    private static void require(boolean met, ZoneId zone, String code, String... details) {
        if (!met) {
            throw new Refused(Defect.in(zone.transfer(), code, details));
        }
    }
}
