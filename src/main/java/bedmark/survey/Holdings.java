package bedmark.survey;

import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * Things of one kind by their id, each with every variant of it that was told. Two holdings together hold what either
 * holds, so that order and repetition do not matter.
 *
 * @param things by id and by the variant's identity
 */
public record Holdings(SortedMap<String, SortedMap<String, Variant>> things) {

    /** Nothing was told yet. */
    public static final Holdings NONE = new Holdings(new TreeMap<>());

    public Holdings {
        SortedMap<String, SortedMap<String, Variant>> copy = new TreeMap<>();
        things.forEach((id, variants) -> copy.put(id, Collections.unmodifiableSortedMap(new TreeMap<>(variants))));
        things = Collections.unmodifiableSortedMap(copy);
    }

    Holdings with(Holdings other) {
        SortedMap<String, SortedMap<String, Variant>> both = new TreeMap<>(things);
        other.things.forEach((id, variants) -> both.merge(id, variants, Holdings::together));
        return new Holdings(both);
    }

    private static SortedMap<String, Variant> together(SortedMap<String, Variant> one,
                                                       SortedMap<String, Variant> other) {
        SortedMap<String, Variant> both = new TreeMap<>(one);
        other.forEach((identity, variant) -> both.merge(identity, variant, Variant::with));
        return both;
    }

    /** What was told of one thing, in an order that is the same for everybody. */
    public List<Variant> variants(String id) {
        return List.copyOf(things.getOrDefault(id, new TreeMap<>()).values());
    }

    /** What was told of one thing, where everybody says the same. */
    public Optional<Variant> agreed(String id) {
        List<Variant> variants = variants(id);
        return variants.size() == 1 ? Optional.of(variants.get(0)) : Optional.empty();
    }

    /** What was told last of one thing, for things that are meant to change. */
    public Optional<Variant> newest(String id) {
        return variants(id).stream().reduce((one, other) ->
                one.newest().compareTo(other.newest()) >= 0 ? one : other);
    }

    /** The ids of which different things are told. */
    public List<String> disputed() {
        return things.entrySet().stream().filter(thing -> thing.getValue().size() > 1).map(Map.Entry::getKey)
                .toList();
    }
}
