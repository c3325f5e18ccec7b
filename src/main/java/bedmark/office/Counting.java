package bedmark.office;

import bedmark.index.office.OfficeTables;
import bedmark.survey.merge.Clash;
import bedmark.survey.merge.Copy;
import bedmark.survey.merge.Merge;
import bedmark.survey.merge.ZoneId;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.UUID;
import java.util.stream.Collectors;

/**
 * Counts what was new in packs that were received in one call, and finds what clashes in each one's zones without what
 * only came with packs after it. Once for all of them: each for itself would read the same zones again and again.
 */
final class Counting {
    private final Map<String, Pack> packs = new HashMap<>();

    /** A pack that was taken in, the first of its call at 0. */
    private static final class Pack {
        private final int place;
        private final Set<ZoneId> zones;
        private int news;
        private final Map<ZoneId, List<Clash>> clashes = new TreeMap<>();

        Pack(int place, Set<ZoneId> zones) {
            this.place = place;
            this.zones = zones;
        }
    }

    /** A pack that was just taken in. */
    void add(String sha256, Set<ZoneId> zones) {
        packs.put(sha256, new Pack(packs.size(), zones));
    }

    /** What came, with those that were taken in counted. */
    List<Received> counted(List<Received> received, OfficeTables tables, Set<String> aside) {
        List<ZoneId> zones = packs.values().stream().flatMap(pack -> pack.zones.stream()).distinct().toList();
        for (int from = 0; from < zones.size(); from += Effects.TOGETHER) {
            count(tables.packsOf(zones.subList(from, Math.min(from + Effects.TOGETHER, zones.size()))), aside);
        }
        return received.stream().map(one -> one instanceof Received.Taken taken ? counted(taken) : one).toList();
    }

    private Received counted(Received.Taken taken) {
        Pack pack = packs.get(taken.pack());
        return taken.counted(pack.news, pack.clashes.values().stream().flatMap(List::stream).toList());
    }

    private void count(Map<Copy, String> copies, Set<String> aside) {
        Map<ZoneId, List<Copy>> zones = new HashMap<>();
        copies.forEach((copy, sha256) -> {
            zones.computeIfAbsent(copy.zone(), key -> new ArrayList<>()).add(copy);
            Pack pack = packs.get(sha256);
            if (pack != null) {
                pack.news++;
            }
        });
        zones.values().removeIf(Counting::isPlain);
        if (!zones.isEmpty()) {
            packs.values().forEach(pack -> pack.zones.stream().filter(zones::containsKey).forEach(zone ->
                    pack.clashes.put(zone, Merge.zone(zone, zones.get(zone).stream().filter(copy ->
                            isHere(copies.get(copy), pack)).toList(), aside).clashes())));
        }
    }

    /** Nothing clashes where each is a survey of its own that corrects none, as in nearly all zones. */
    private static boolean isPlain(List<Copy> copies) {
        Set<UUID> ids = new HashSet<>();
        return copies.stream().allMatch(copy -> copy.supersedes().isEmpty() && ids.add(copy.id()));
    }

    /** Whether what came in a pack was here once another one was in. */
    private boolean isHere(String sha256, Pack other) {
        Pack pack = packs.get(sha256);
        return pack == null || pack.place <= other.place;
    }
}
