package bedmark.survey.merge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.survey.InspectionStatus;
import java.util.ArrayList;
import java.util.Collections;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Random;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.UUID;
import org.junit.jupiter.api.Test;

/**
 * Random sets of packs from tablets that saw the same zones: overlapping surveys, corrections, two contents of one
 * revision, wrong clocks. The number of sets is set with {@code -Dbedmark.merges=100000}.
 */
class MergeTest {
    private static final int SETS = Integer.getInteger("bedmark.merges", 10_000);
    private static final int IDS = 5;

    private int sameRevisions;
    private int twoCorrections;
    private int superseded;

    /** What can be told of the zones: contents with their digests, some of one survey. */
    private static List<Copy> contents(Random random) {
        List<Copy> contents = new ArrayList<>();
        for (int i = 0; i < 10; i++) {
            int id = random.nextInt(IDS);
            int revision = random.nextInt(3) == 0 ? 2 + random.nextInt(2) : 1;
            OptionalLong begun = random.nextInt(4) == 0 ? OptionalLong.empty() : day(random, 50);
            OptionalLong finished = random.nextInt(5) == 0 ? OptionalLong.empty() : day(random, 60);
            contents.add(new Copy("digest" + (i * 7919 % 1000), id(id), revision, revision == 1 ? Optional.empty()
                    : Optional.of(id(random.nextInt(IDS))), new ZoneId("p", "t" + id % 2), "r" + random.nextInt(2),
                    InspectionStatus.values()[random.nextInt(InspectionStatus.values().length)], begun, finished,
                    new Origin(0, "", ""), OptionalLong.empty()));
        }
        return contents;
    }

    /** The office believes a date that is ahead by up to a day. */
    private static OptionalLong day(Random random, int days) {
        return OptionalLong.of(random.nextInt(days) * Copy.SLACK.toMillis());
    }

    private static UUID id(int number) {
        return new UUID(0x4000L, 0x8000000000000000L + number);
    }

    /** Some of the contents, as one bundle tells them. */
    private static SortedMap<String, Copy> pack(List<Copy> contents, Random random) {
        Origin origin = new Origin(day(random, 60).getAsLong(), "register" + random.nextInt(2), "c" + random.nextInt(2));
        List<Copy> told = new ArrayList<>();
        for (Copy copy : contents) {
            if (random.nextInt(3) == 0) {
                told.add(new Copy(copy.digest(), copy.id(), copy.revision(), copy.supersedes(), copy.zone(),
                        copy.round(), copy.status(), copy.begun(), copy.finished(), origin,
                        OptionalLong.empty()).receivedAt(day(random, 60).getAsLong()));
            }
        }
        Collections.shuffle(told, random);
        return Merge.of(told);
    }

    private static SortedMap<String, Copy> folded(List<SortedMap<String, Copy>> packs) {
        SortedMap<String, Copy> all = new TreeMap<>();
        for (SortedMap<String, Copy> pack : packs) {
            all = Merge.union(all, pack);
        }
        return all;
    }

    @Test
    void orderRepetitionAndGroupingDoNotMatter() {
        for (long seed = 0; seed < SETS; seed++) {
            Random random = new Random(seed);
            String where = "set " + seed;
            List<Copy> contents = contents(random);
            List<SortedMap<String, Copy>> packs = new ArrayList<>();
            int count = 3 + random.nextInt(4);
            for (int i = 0; i < count; i++) {
                packs.add(pack(contents, random));
            }
            assertLaws(packs, where);
            SortedMap<String, Copy> all = folded(packs);
            List<SortedMap<String, Copy>> mixed = new ArrayList<>(packs);
            mixed.add(packs.get(random.nextInt(count)));
            Collections.shuffle(mixed, random);
            assertEquals(all, folded(mixed), where);
            Set<String> setAside = random.nextInt(3) > 0 || all.isEmpty() ? Set.of() : Set.of(all.firstKey());
            List<Copy> anyOrder = new ArrayList<>();
            mixed.forEach(pack -> anyOrder.addAll(pack.values()));
            Collections.shuffle(anyOrder, random);
            SortedMap<ZoneId, MergedZone> zones = Merge.zones(all.values(), setAside);
            assertEquals(zones, Merge.zones(anyOrder, setAside), where);
            assertNothingIsOverwritten(packs, all, zones, setAside, where);
        }
        assertTrue(Math.min(Math.min(sameRevisions, twoCorrections), superseded) > SETS / 20,
                () -> "the sets are various: " + sameRevisions + " " + twoCorrections + " " + superseded);
    }

    private static void assertLaws(List<SortedMap<String, Copy>> packs, String where) {
        SortedMap<String, Copy> a = packs.get(0);
        SortedMap<String, Copy> b = packs.get(1);
        SortedMap<String, Copy> c = packs.get(2);
        SortedMap<String, Copy> ab = Merge.union(a, b);
        assertEquals(a, Merge.union(a, a), where);
        assertEquals(ab, Merge.union(ab, a), where);
        assertEquals(ab, Merge.union(b, a), where);
        assertEquals(Merge.union(ab, c), Merge.union(a, Merge.union(b, c)), where);
    }

    /** Every content is still there, and counts unless it was corrected or set aside; two of one revision clash. */
    private void assertNothingIsOverwritten(List<SortedMap<String, Copy>> packs, SortedMap<String, Copy> all,
                                            SortedMap<ZoneId, MergedZone> zones, Set<String> setAside, String where) {
        Set<String> told = new HashSet<>();
        packs.forEach(pack -> told.addAll(pack.keySet()));
        assertEquals(told, all.keySet(), where);
        Set<String> counting = new HashSet<>();
        zones.values().forEach(zone -> zone.visits().forEach(visit -> counting.add(visit.digest())));
        Map<String, List<Copy>> revisions = new TreeMap<>();
        for (Copy copy : all.values()) {
            boolean corrected = all.values().stream().anyMatch(other -> other.revision() > copy.revision()
                    && (other.id().equals(copy.id()) || other.supersedes().equals(Optional.of(copy.id()))
                            && other.zone().equals(copy.zone())));
            assertTrue(counting.contains(copy.digest()) || corrected || setAside.contains(copy.digest()), where);
            superseded += counting.contains(copy.digest()) ? 0 : 1;
            if (counting.contains(copy.digest())) {
                revisions.computeIfAbsent(copy.id() + " " + copy.revision(), key -> new ArrayList<>()).add(copy);
            }
        }
        Set<Set<Copy>> expected = new HashSet<>();
        revisions.values().stream().filter(sides -> sides.size() > 1).forEach(sides -> expected.add(Set.copyOf(sides)));
        Set<Set<Copy>> shown = new HashSet<>();
        zones.values().forEach(zone -> zone.clashes().forEach(clash -> {
            if (clash.kind() == Clash.Kind.SAME_REVISION) {
                shown.add(Set.copyOf(clash.sides()));
            } else {
                twoCorrections++;
            }
        }));
        assertEquals(expected, shown, where);
        sameRevisions += shown.size();
    }
}
