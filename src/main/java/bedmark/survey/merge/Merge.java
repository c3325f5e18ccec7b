package bedmark.survey.merge;

import java.util.ArrayList;
import java.util.Collection;
import java.util.Collections;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.UUID;

/**
 * Makes one of what came from many tablets. Contents are only ever added to each other, so that taking in is
 * commutative, associative and idempotent; which of them counts follows from all that are there and from nothing else,
 * but for one that was dated ahead: which of the results it may hide depends on when it came.
 *
 * <p>A survey that another one of a higher revision supersedes no longer counts, whatever the two tablets' clocks say.
 * Among those that count the last one completed leads. The same revision with another content, and two corrections of
 * one survey, are clashes, and all sides count until a person sets some aside.
 */
public final class Merge {
    private Merge() {
    }

    /** All contents of both, each once. */
    public static SortedMap<String, Copy> union(Map<String, Copy> some, Map<String, Copy> others) {
        SortedMap<String, Copy> all = new TreeMap<>(some);
        others.forEach((digest, copy) -> all.merge(digest, copy, Copy::or));
        return Collections.unmodifiableSortedMap(all);
    }

    /** Contents by their digests, each once. */
    public static SortedMap<String, Copy> of(Collection<Copy> copies) {
        SortedMap<String, Copy> all = new TreeMap<>();
        copies.forEach(copy -> all.merge(copy.digest(), copy, Copy::or));
        return Collections.unmodifiableSortedMap(all);
    }

    /** Every zone that the contents are about, in the order of the zones. */
    public static SortedMap<ZoneId, MergedZone> zones(Collection<Copy> copies, Set<String> setAside) {
        Map<ZoneId, List<Copy>> byZone = new HashMap<>();
        copies.forEach(copy -> byZone.computeIfAbsent(copy.zone(), key -> new ArrayList<>()).add(copy));
        SortedMap<ZoneId, MergedZone> zones = new TreeMap<>();
        byZone.forEach((zone, held) -> zones.put(zone, zone(zone, held, setAside)));
        return zones;
    }

    /**
     * One zone.
     *
     * @param copies   everything that came about it, in any order, any of it more than once
     * @param setAside digests of contents that a person decided against
     */
    public static MergedZone zone(ZoneId zone, Collection<Copy> copies, Set<String> setAside) {
        Map<String, Copy> byDigest = new HashMap<>();
        copies.stream().filter(copy -> copy.zone().equals(zone))
                .forEach(copy -> byDigest.merge(copy.digest(), copy, Copy::or));
        Collection<Copy> held = byDigest.values();
        Map<UUID, Integer> newest = new HashMap<>();
        held.forEach(copy -> newest.merge(copy.id(), copy.revision(), Math::max));
        Set<UUID> superseded = superseded(held, newest, setAside);
        List<Copy> visits = held.stream().filter(copy -> !superseded.contains(copy.id())
                        && copy.revision() == newest.get(copy.id()) && !setAside.contains(copy.digest()))
                .sorted(Copy.IN_TIME).toList();
        return new MergedZone(zone, visits, clashes(visits, held));
    }

    /** A correction that a person set aside corrects nothing. */
    private static Set<UUID> superseded(Collection<Copy> held, Map<UUID, Integer> newest, Set<String> setAside) {
        Set<UUID> superseded = new HashSet<>();
        for (Copy copy : held) {
            if (!setAside.contains(copy.digest())) {
                // Only ever a higher revision: a ring, which no tablet makes, would leave nothing that counts.
                copy.supersedes().filter(older -> newest.getOrDefault(older, Integer.MAX_VALUE) < copy.revision())
                        .ifPresent(superseded::add);
            }
        }
        return superseded;
    }

    private static List<Clash> clashes(List<Copy> visits, Collection<Copy> held) {
        Set<UUID> ids = new HashSet<>();
        if (visits.stream().allMatch(copy -> ids.add(copy.id()) && copy.supersedes().isEmpty())) {
            // Each is a survey of its own, as nearly all are.
            return List.of();
        }
        List<Clash> clashes = new ArrayList<>();
        Map<UUID, List<Copy>> revisions = new TreeMap<>();
        Map<UUID, List<Copy>> corrections = new TreeMap<>();
        Map<UUID, Copy> byId = new HashMap<>();
        of(held).values().forEach(copy -> byId.put(copy.id(), copy));
        for (Copy copy : visits) {
            revisions.computeIfAbsent(copy.id(), key -> new ArrayList<>()).add(copy);
            corrections.computeIfAbsent(first(copy, byId), key -> new ArrayList<>()).add(copy);
        }
        revisions.values().stream().filter(sides -> sides.size() > 1)
                .forEach(sides -> clashes.add(new Clash(Clash.Kind.SAME_REVISION, sides)));
        corrections.values().stream().filter(sides -> sides.stream().map(Copy::id).distinct().count() > 1)
                .forEach(sides -> clashes.add(new Clash(Clash.Kind.TWO_CORRECTIONS, sides)));
        return clashes;
    }

    /** The survey that a line of corrections began with, as far back as it is known. */
    private static UUID first(Copy copy, Map<UUID, Copy> byId) {
        Copy here = copy;
        while (here.supersedes().isPresent()) {
            UUID older = here.supersedes().get();
            Copy before = byId.get(older);
            if (before == null) {
                return older;
            }
            if (before.revision() >= here.revision()) {
                return here.id();
            }
            here = before;
        }
        return here.id();
    }
}
