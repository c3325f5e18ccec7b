package bedmark.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Refused;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.UUID;
import org.junit.jupiter.api.Test;

/** The number of random sets of packs is set with {@code -Dbedmark.merges=100000}. */
class MergeTest {
    private static final int SETS = Integer.getInteger("bedmark.merges", 10_000);

    private int conflicts;
    private int forks;
    private int repeated;

    /** A merge with everything in it, the order of keys too, which plain equality does not see. */
    private static String whole(Merge merge) {
        return merge.toString();
    }

    private static Merge folded(List<Merge> merges) {
        return merges.stream().reduce(Merge.NOTHING, Merge::with);
    }

    @Test
    void orderRepetitionAndGroupingDoNotMatter() {
        for (long seed = 0; seed < SETS; seed++) {
            RandomPacks packs = new RandomPacks(seed);
            List<Bundle> bundles = new ArrayList<>();
            List<Merge> merges = packs.merges(6, bundles);
            String where = "set " + seed;
            Merge a = merges.get(0);
            Merge b = merges.get(1);
            Merge c = merges.get(2);
            Merge ab = a.with(b);
            assertEquals(whole(ab), whole(ab.with(a)), where);
            assertEquals(whole(ab), whole(b.with(a)), where);
            assertEquals(whole(ab.with(c)), whole(a.with(b.with(c))), where);
            Merge all = folded(merges);
            List<Merge> mixed = new ArrayList<>(merges);
            mixed.add(merges.get(packs.random().nextInt(merges.size())));
            Collections.shuffle(mixed, packs.random());
            assertEquals(whole(all), whole(folded(mixed)), where);
            assertSays(all, bundles, where);
        }
        assertTrue(conflicts > SETS / 10 && forks > SETS / 10 && repeated > SETS / 10,
                () -> "the sets are various: " + conflicts + " " + forks + " " + repeated);
    }

    /** The merge says what a simple look at all bundles says. */
    private void assertSays(Merge all, List<Bundle> bundles, String where) {
        Map<UUID, List<Branch>> told = RandomPacks.told(bundles);
        Set<UUID> disputed = new TreeSet<>();
        Set<UUID> standing = new TreeSet<>();
        told.forEach((id, documents) -> {
            assertEquals(Set.copyOf(documents), Set.copyOf(all.surveys().variants(id.toString()).stream()
                    .map(Variant::document).toList()), where);
            boolean corrected = told.values().stream().flatMap(List::stream).anyMatch(document ->
                    new Survey(document).supersedes().filter(id::equals).isPresent());
            if (documents.size() > 1) {
                disputed.add(id);
            } else if (!corrected) {
                standing.add(id);
            }
        });
        assertEquals(List.copyOf(disputed), all.conflicts(), where);
        assertEquals(List.copyOf(standing), all.standing().stream().map(Survey::id).toList(), where);
        assertEquals(told.size(), all.surveys().things().size(), where);
        conflicts += disputed.isEmpty() ? 0 : 1;
        forks += all.forks().isEmpty() ? 0 : 1;
        repeated += bundles.stream().mapToInt(bundle -> bundle.surveys().size()).sum() > told.size() ? 1 : 0;
    }

    @Test
    void whatArrivesIsFreshKnownOrInConflict() {
        for (long seed = 0; seed < 500; seed++) {
            List<Bundle> bundles = new ArrayList<>();
            List<Merge> merges = new RandomPacks(seed).merges(4, bundles);
            Merge here = merges.get(0);
            Merge.Arrival arrival = here.arrival(merges.get(1));
            Set<String> before = here.surveys().things().keySet();
            assertEquals(bundles.get(1).surveys().size(),
                    arrival.fresh().size() + arrival.known().size() + arrival.conflicting().size());
            assertTrue(arrival.fresh().stream().noneMatch(id -> before.contains(id.toString())));
            assertEquals(arrival.conflicting(), here.with(merges.get(1)).conflicts());
            assertEquals(List.of(), here.with(merges.get(1)).arrival(merges.get(1)).fresh());
            assertEquals(List.of(), here.with(merges.get(1)).arrival(merges.get(1)).conflicting());
        }
    }

    @Test
    void aNumberThatWasReadWithAnotherPrecisionIsAnotherReading() {
        Branch one = Branch.EMPTY.with("a", Node.number(new BigDecimal("9.50"))).with("b", Node.flag(true));
        Branch reordered = Branch.EMPTY.with("b", Node.flag(true)).with("a", Node.number(new BigDecimal("9.50")));
        assertEquals(Identity.of(one), Identity.of(reordered));
        assertNotEquals(Identity.of(one), Identity.of(one.with("a", Node.number(new BigDecimal("9.5")))));
        assertNotEquals(Identity.of(one), Identity.of(one.with("a", "9.50")));
        assertNotEquals(Identity.of(Node.Series.of(Node.text("ab"), Node.text("c"))),
                Identity.of(Node.Series.of(Node.text("a"), Node.text("bc"))));
        assertNotEquals(Identity.of(Node.Series.of(Node.Series.of(), new Node.Blank())),
                Identity.of(Node.Series.of(Node.Series.of(new Node.Blank()))));
    }

    @Test
    void theNewestRegisterStandsWhateverCameFirst() {
        List<Bundle> bundles = new ArrayList<>();
        List<Merge> merges = new RandomPacks(3).merges(6, bundles);
        Merge all = folded(merges);
        for (String plant : all.plants().things().keySet()) {
            Origin newest = all.plants().newest(plant).orElseThrow().newest();
            all.plants().variants(plant).forEach(variant ->
                    assertTrue(variant.newest().compareTo(newest) <= 0));
        }
        assertEquals(List.of(), all.plants().variants("unheard of"));
        assertTrue(all.plants().newest("unheard of").isEmpty());
    }

    @Test
    void aBundleWithoutIdOrTimeIsNotMerged() {
        List<Bundle> bundles = new ArrayList<>();
        new RandomPacks(1).merges(3, bundles);
        for (String key : List.of("id", "createdAt")) {
            Bundle without = new Bundle(bundles.get(0).document().without(key));
            assertEquals("key-absent", assertThrows(Refused.class, () -> Merge.of(without, "")).defect().code());
        }
    }
}
