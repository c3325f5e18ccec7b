package bedmark.office;

import bedmark.index.office.OfficeTables;
import bedmark.json.JsonReader;
import bedmark.office.FlatColumn.FlatRow;
import bedmark.office.trend.ZoneTrend;
import bedmark.survey.Survey;
import bedmark.survey.merge.Clash;
import bedmark.survey.merge.Copy;
import bedmark.survey.merge.Merge;
import bedmark.survey.merge.MergedZone;
import bedmark.survey.merge.ZoneId;
import java.util.ArrayList;
import java.util.Collection;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;
import java.util.stream.Collectors;

/** Surveys of the tables, judged beside what loaded the same drives. */
final class Results {
    private final Judge judge;
    private final Function<OfficeTables, Minutes> minutes;

    Results(Judge judge, Function<OfficeTables, Minutes> minutes) {
        this.judge = judge;
        this.minutes = minutes;
    }

    /** Each zone's latest result, and what clashes with it, by the registers that they were made with. */
    Map<ZoneId, List<JudgedZone>> latest(OfficeTables tables, Collection<ZoneId> zones) {
        Map<ZoneId, MergedZone> merged = new LinkedHashMap<>(Merge.zones(tables.copies(zones),
                minutes.apply(tables).setAside()));
        List<Copy> sides = merged.values().stream().flatMap(zone -> zone.latest().stream()).toList();
        Map<ZoneId, List<JudgedZone>> judged = new LinkedHashMap<>();
        zones.forEach(zone -> judged.put(zone, new ArrayList<>()));
        judged(tables, sides, copy -> copy.origin().register()).forEach(one -> judged.get(one.zone()).add(one));
        return judged;
    }

    /**
     * A zone over time. Of contents that clash the worst counts, as it does in the list: they are one survey, and two
     * points of it would be a trend of its own. Those that were dated ahead are no points: nobody knows when they were.
     */
    ZoneTrend trend(OfficeTables tables, ZoneId zone) {
        List<Copy> copies = tables.copies(List.of(zone));
        MergedZone merged = Merge.zone(zone, copies, minutes.apply(tables).setAside());
        List<Copy> results = merged.results();
        Map<Boolean, List<JudgedZone>> counted = judged(tables, results, copy -> copy.origin().register()).stream()
                .collect(Collectors.partitioningBy(one -> one.copy().datedAhead()));
        List<JudgedZone> replaced = judged(tables, copies.stream().filter(copy -> copy.result() && !copy.datedAhead()
                && results.stream().noneMatch(one -> one.digest().equals(copy.digest()))).toList(),
                copy -> copy.origin().register());
        return ZoneTrend.of(zone, oneSide(counted.get(false), merged.clashes()), replaced,
                oneSide(counted.get(true), merged.clashes()), merged.clashes().size());
    }

    private static List<JudgedZone> oneSide(List<JudgedZone> judged, List<Clash> clashes) {
        List<JudgedZone> kept = new ArrayList<>();
        judged.stream().sorted(Judge.WORST_FIRST).forEach(one -> {
            if (kept.stream().noneMatch(worse -> clashes.stream().anyMatch(clash -> clash.has(one.copy())
                    && clash.has(worse.copy())))) {
                kept.add(one);
            }
        });
        return judged.stream().filter(kept::contains).toList();
    }

    /** Contents, judged by the register that is named for each; those that can't be are left out. */
    List<JudgedZone> judged(OfficeTables tables, List<Copy> copies, Function<Copy, String> register) {
        Map<String, List<Copy>> drives = new HashMap<>();
        Merge.zones(tables.companions(copies), minutes.apply(tables).setAside()).values().forEach(zone -> zone.results()
                .forEach(copy -> drives.computeIfAbsent(drive(copy), key -> new ArrayList<>()).add(copy)));
        Set<String> wanted = new HashSet<>();
        copies.forEach(copy -> {
            wanted.add(copy.digest());
            drives.getOrDefault(drive(copy), List.of()).forEach(other -> wanted.add(other.digest()));
        });
        Map<String, Survey> documents = documents(tables, wanted);
        return copies.stream().flatMap(copy -> judge.judge(copy, register.apply(copy),
                drives.getOrDefault(drive(copy), List.of()), documents).stream()).toList();
    }

    /** Contents with what the flat table tells of them, in the order of the digests. */
    List<FlatRow> rows(OfficeTables tables, List<String> digests) {
        Map<String, Copy> copies = tables.copiesOf(digests);
        Map<String, Survey> documents = documents(tables, digests);
        List<Copy> ordered = digests.stream().map(copies::get).toList();
        Set<String> counting = new HashSet<>();
        Merge.zones(tables.copies(ordered.stream().map(Copy::zone).distinct().toList()),
                minutes.apply(tables).setAside()).values().forEach(zone -> zone.visits().forEach(copy ->
                counting.add(copy.digest())));
        Map<String, JudgedZone> judged = new HashMap<>();
        judged(tables, ordered.stream().filter(Copy::result).toList(), copy -> copy.origin().register())
                .forEach(one -> judged.put(one.copy().digest(), one));
        return ordered.stream().map(copy -> new FlatRow(copy, counting.contains(copy.digest()),
                documents.get(copy.digest()), judge.register(copy.origin().register()),
                Optional.ofNullable(judged.get(copy.digest())))).toList();
    }

    private static String drive(Copy copy) {
        return copy.zone().plant() + '\n' + copy.round() + '\n' + copy.origin().conveyor();
    }

    /** The surveys with those digests. */
    static Map<String, Survey> documents(OfficeTables tables, Collection<String> digests) {
        Map<String, Survey> documents = new HashMap<>();
        tables.contents(digests).forEach((digest, text) ->
                documents.put(digest, new Survey(JsonReader.read(text).root())));
        return documents;
    }
}
