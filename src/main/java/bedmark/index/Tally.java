package bedmark.index;

import bedmark.survey.Entry;
import java.util.Collections;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.Collectors;

/**
 * What an index must hold, so that a row that is not found is never taken for one that is not there.
 *
 * @param entries how many entries
 * @param kinds   the landmarks by the kind of their acts
 */
record Tally(long entries, SortedMap<String, Kind> kinds) {
    static final Tally NOTHING = new Tally(0, new TreeMap<>());

    /** How many entries of a kind there are, and the sequence of the last one. */
    record Kind(long count, long last) {
        private static final Kind NONE = new Kind(0, 0);
    }

    Tally {
        kinds = Collections.unmodifiableSortedMap(new TreeMap<>(kinds));
    }

    Kind kind(String act) {
        return kinds.getOrDefault(act, Kind.NONE);
    }

    Tally withEntry() {
        return new Tally(entries + 1, kinds);
    }

    Tally withLandmark(Entry entry) {
        SortedMap<String, Kind> more = new TreeMap<>(kinds);
        more.put(entry.act().code(), new Kind(kind(entry.act().code()).count() + 1, entry.sequence()));
        return new Tally(entries, more);
    }

    /** The kinds in one line. */
    String text() {
        return kinds.entrySet().stream().map(kind -> kind.getKey() + ":" + kind.getValue().count() + ":"
                + kind.getValue().last()).collect(Collectors.joining(","));
    }

    /** @throws IndexBroken where the text is not as it was written */
    static Tally read(long entries, String text) {
        SortedMap<String, Kind> kinds = new TreeMap<>();
        try {
            for (String kind : text.isEmpty() ? new String[0] : text.split(",")) {
                String[] words = kind.split(":");
                kinds.put(words[0], new Kind(Long.parseLong(words[1]), Long.parseLong(words[2])));
            }
        } catch (NumberFormatException | ArrayIndexOutOfBoundsException e) {
            throw new IndexBroken(e);
        }
        return new Tally(entries, kinds);
    }
}
