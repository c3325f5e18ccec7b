package bedmark.survey;

import bedmark.document.Branch;
import java.util.List;
import java.util.Map;
import java.util.SortedMap;
import java.util.SortedSet;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.UUID;
import java.util.function.Function;

/**
 * What any number of packs say together. It is the union of what each says and nothing is ever chosen by who came
 * first: the same packs give the same merge in every order, any number of times, and in any grouping. A survey of
 * which two packs say different things keeps both, for a person to decide.
 *
 * @param surveys by id; without their assessments, since those are computed anew from the readings
 * @param plants  registers by the plant's id
 * @param forms   by id and version
 * @param rounds  by id
 */
public record Merge(Holdings surveys, Holdings plants, Holdings forms, Holdings rounds) {

    /** No pack was received. */
    public static final Merge NOTHING = new Merge(Holdings.NONE, Holdings.NONE, Holdings.NONE, Holdings.NONE);

    /**
     * What one bundle says.
     *
     * @param device the fingerprint of the key that signed it; empty where nobody signed
     * @throws bedmark.document.Refused {@code key-absent} where the bundle has no id or time
     */
    public static Merge of(Bundle bundle, String device) {
        Origin origin = Origin.of(bundle, device);
        Function<Branch, String> byId = item -> item.text("id").orElse("");
        return new Merge(
                held(bundle.surveys().stream().map(survey -> survey.document().without("assessment")).toList(),
                        survey -> survey.uuid("id").orElseThrow().toString(), origin),
                held(List.of(bundle.register().document()), byId, origin),
                held(bundle.forms(), form -> byId.apply(form) + "/" + form.number("version")
                        .map(version -> version.stripTrailingZeros().toPlainString()).orElse("0"), origin),
                held(bundle.rounds().stream().map(Round::document).toList(), byId, origin));
    }

    private static Holdings held(List<Branch> items, Function<Branch, String> id, Origin origin) {
        SortedMap<String, SortedMap<String, Variant>> things = new TreeMap<>();
        for (Branch item : items) {
            Variant variant = Variant.of(item, origin);
            things.computeIfAbsent(id.apply(item), unknown -> new TreeMap<>())
                    .merge(variant.identity(), variant, Variant::with);
        }
        return new Holdings(things);
    }

    /** What both say together. */
    public Merge with(Merge other) {
        return new Merge(surveys.with(other.surveys), plants.with(other.plants), forms.with(other.forms),
                rounds.with(other.rounds));
    }

    /** The surveys of which different things are told. */
    public List<UUID> conflicts() {
        return surveys.disputed().stream().map(UUID::fromString).toList();
    }

    /** The surveys that more than one revision claims to correct, each with those revisions. */
    public Map<UUID, List<UUID>> forks() {
        Map<UUID, List<UUID>> forks = new TreeMap<>(successors());
        forks.values().removeIf(successors -> successors.size() < 2);
        return forks;
    }

    private Map<UUID, List<UUID>> successors() {
        Map<UUID, SortedSet<UUID>> successors = new TreeMap<>();
        surveys.things().forEach((id, variants) -> variants.values().forEach(variant ->
                new Survey(variant.document()).supersedes().ifPresent(old ->
                        successors.computeIfAbsent(old, unknown -> new TreeSet<>()).add(UUID.fromString(id)))));
        Map<UUID, List<UUID>> lists = new TreeMap<>();
        successors.forEach((old, fresh) -> lists.put(old, List.copyOf(fresh)));
        return lists;
    }

    /** The surveys that stand: everybody says the same of them and no revision corrects them. */
    public List<Survey> standing() {
        Map<UUID, List<UUID>> successors = successors();
        return surveys.things().keySet().stream().flatMap(id -> surveys.agreed(id).stream())
                .map(variant -> new Survey(variant.document()))
                .filter(survey -> !successors.containsKey(survey.id())).toList();
    }

    /**
     * What a pack brings to those who know this much already.
     *
     * @param fresh       surveys that were not known
     * @param known       surveys that say what is known
     * @param conflicting surveys that say something else
     */
    public record Arrival(List<UUID> fresh, List<UUID> known, List<UUID> conflicting) {
        public Arrival {
            fresh = List.copyOf(fresh);
            known = List.copyOf(known);
            conflicting = List.copyOf(conflicting);
        }
    }

    /** What another merge would bring to this one. */
    public Arrival arrival(Merge coming) {
        SortedSet<UUID> fresh = new TreeSet<>();
        SortedSet<UUID> known = new TreeSet<>();
        SortedSet<UUID> conflicting = new TreeSet<>();
        coming.surveys.things().forEach((id, variants) -> {
            Map<String, Variant> here = surveys.things().getOrDefault(id, new TreeMap<>());
            boolean same = here.keySet().containsAll(variants.keySet());
            (here.isEmpty() ? fresh : same ? known : conflicting).add(UUID.fromString(id));
        });
        return new Arrival(List.copyOf(fresh), List.copyOf(known), List.copyOf(conflicting));
    }
}
