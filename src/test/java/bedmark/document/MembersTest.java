package bedmark.document;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.NoSuchElementException;
import java.util.Random;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;

/** What an object holds behaves as the platform's own map that keeps the order in which things were put in. */
class MembersTest {
    private static final int MAPS = 500;
    private static final int CHANGES = 60;
    /** Two keys of the same hash. */
    private static final List<String> ALIKE = List.of("Aa", "BB");

    private final Random random = new Random(11);

    private String key() {
        return random.nextInt(10) == 0 ? ALIKE.get(random.nextInt(2)) : "key" + random.nextInt(40);
    }

    private static void same(Map<String, Node> expected, Members members) {
        assertEquals(expected, members);
        assertEquals(members, expected);
        assertEquals(expected.hashCode(), members.hashCode());
        assertEquals(expected.size(), members.size());
        assertEquals(new ArrayList<>(expected.keySet()), new ArrayList<>(members.keySet()));
        assertEquals(new ArrayList<>(expected.values()), new ArrayList<>(members.values()));
        int place = 0;
        for (Map.Entry<String, Node> member : expected.entrySet()) {
            assertEquals(member.getKey(), members.key(place));
            assertSame(member.getValue(), members.value(place++));
            assertSame(member.getValue(), members.get(member.getKey()));
        }
        assertNull(members.get("none"));
        assertFalse(members.containsKey("none"));
    }

    @Test
    void afterAnyChangesItHoldsWhatAMapOfTheSameChangesHolds() {
        for (int i = 0; i < MAPS; i++) {
            Map<String, Node> expected = new LinkedHashMap<>();
            Members members = Members.of(Map.of());
            for (int change = random.nextInt(CHANGES); change > 0; change--) {
                String key = key();
                if (random.nextInt(4) == 0) {
                    expected.remove(key);
                    members = members.without(key);
                } else {
                    Node value = Node.number(change);
                    expected.put(key, value);
                    members = members.with(key, value);
                }
            }
            same(expected, members);
            same(expected, Members.of(expected));
            assertEquals(new ArrayList<>(new TreeMap<>(expected).entrySet()),
                    new ArrayList<>(members.sorted().entrySet()));
        }
    }

    @Test
    void aChangeLeavesTheOneItWasMadeFromAsItWas() {
        Members few = Members.of(Map.of("a", Node.text("1")));
        few.with("a", Node.text("2"));
        few.with("b", Node.text("2"));
        few.without("a");
        assertEquals(Map.of("a", Node.text("1")), few);
    }

    @Test
    void aKeyIsGatheredOnceHoweverManyThereAre() {
        Members.Gathering gathering = new Members.Gathering();
        Map<String, Node> expected = new LinkedHashMap<>();
        for (int i = 0; i < 1000; i++) {
            String key = i % 3 == 0 ? key() : "more" + random.nextInt(500);
            boolean fresh = !expected.containsKey(key);
            assertEquals(fresh, gathering.key(key), key);
            if (fresh) {
                Node value = Node.number(i);
                expected.put(key, value);
                gathering.value(value);
            }
        }
        same(expected, gathering.members());
    }

    @Test
    void whatIsSortedAlreadyIsNotCopied() {
        Members sorted = Members.of(new TreeMap<>(Map.of("a", Node.text("1"), "b", Node.text("2"))));
        assertSame(sorted, sorted.sorted());
    }

    @Test
    void itCannotBeChangedNorHoldNothing() {
        Members members = Members.of(Map.of("a", Node.text("1")));
        assertThrows(UnsupportedOperationException.class, () -> members.put("b", Node.text("2")));
        assertThrows(UnsupportedOperationException.class, () -> members.remove("a"));
        assertThrows(UnsupportedOperationException.class, members::clear);
        assertThrows(UnsupportedOperationException.class, () ->
                members.entrySet().iterator().next().setValue(Node.text("2")));
        assertThrows(NullPointerException.class, () -> members.with("b", (Node) null));
        assertTrue(members.containsKey("a"));
    }

    @Test
    void afterTheLastMemberThereIsNoOther() {
        var each = Members.of(Map.of("a", Node.text("1"))).entrySet().iterator();
        each.next();
        assertThrows(NoSuchElementException.class, each::next);
    }
}
