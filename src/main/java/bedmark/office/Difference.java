package bedmark.office;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.survey.Survey;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;

/**
 * Something that surveys say differently.
 *
 * @param place  within the survey, such as {@code /readings/bedDepths/0/depth}
 * @param values what each survey says there, in their order; nothing where it says nothing
 */
public record Difference(Pointer place, List<Optional<Node>> values) {
    /** What tells contents apart without being something that a person recorded, or is computed from it. */
    private static final Set<String> NOT_TOLD = Set.of("id", "revision", "supersedes", "assessment", "inspector",
            "completedAt", "startedAt");

    /** Told by what they show, not by their bytes. */
    private static final String PHOTOS = "photos";
    private static final List<String> OF_QUANTITY = List.of("value", "unit", "entered");

    public Difference {
        Objects.requireNonNull(place);
        values = List.copyOf(values);
    }

    /** What some surveys say differently, readings before everything else. */
    public static List<Difference> among(List<Survey> surveys) {
        List<Map<Pointer, Node>> told = surveys.stream().map(Difference::told).toList();
        Set<Pointer> places = new LinkedHashSet<>();
        told.forEach(one -> one.keySet().stream().filter(Survey.READINGS::holds).forEach(places::add));
        told.forEach(one -> places.addAll(one.keySet()));
        List<Difference> differences = new ArrayList<>();
        for (Pointer place : places) {
            List<Optional<Node>> values = told.stream().map(one -> Optional.ofNullable(one.get(place))).toList();
            if (values.stream().distinct().count() > 1) {
                differences.add(new Difference(place, values));
            }
        }
        return differences;
    }

    private static Map<Pointer, Node> told(Survey survey) {
        Map<Pointer, Node> told = new LinkedHashMap<>();
        survey.document().members().forEach((key, node) -> {
            if (!NOT_TOLD.contains(key) && !key.equals(PHOTOS)) {
                gather(Pointer.of(key), node, told);
            }
        });
        if (!survey.photos().isEmpty()) {
            told.put(Pointer.of(PHOTOS), Node.text(survey.photos().stream().map(photo -> photo.text("caption")
                    .filter(caption -> !caption.isBlank()).orElse("–") + " (" + photo.text("file").orElse("–")
                    + ")")
                    .collect(Collectors.joining(", "))));
        }
        return told;
    }

    private static void gather(Pointer place, Node node, Map<Pointer, Node> told) {
        if (node instanceof Branch branch) {
            boolean quantity = branch.has("value") && branch.has("unit");
            Branch number = Branch.EMPTY;
            for (String key : OF_QUANTITY) {
                number = branch.has(key) ? number.with(key, branch.get(key).orElseThrow()) : number;
            }
            if (quantity) {
                told.put(place, number);
            }
            branch.members().forEach((key, inner) -> {
                if (!quantity || !OF_QUANTITY.contains(key)) {
                    gather(place.child(key), inner, told);
                }
            });
        } else if (node instanceof Node.Series series) {
            for (int i = 0; i < series.items().size(); i++) {
                gather(place.child(i), series.items().get(i), told);
            }
        } else {
            told.put(place, node);
        }
    }
}
