package bedmark.json;

import bedmark.document.Pointer;
import bedmark.quantity.Dimension;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;

/**
 * Where the parts of a field lie that are the same in every kind.
 *
 * @param measures each with what it has to measure; a quantity alone is free
 * @param counts   plain numbers
 * @param choices  lists of choices
 * @param texts    beside those of the choices
 */
record FieldShape(Map<Pointer, List<Dimension>> measures, List<Pointer> counts, List<Pointer> choices,
                  List<Pointer> texts) {

    private static final List<Dimension> ANY = List.of(Dimension.values());
    private static final List<Dimension> LENGTH = List.of(Dimension.LENGTH);

    /** The shape of a kind of field. */
    static FieldShape of(String kind) {
        return switch (kind) {
            case "number" -> shape(Map.of(), List.of(Pointer.of("count")), "");
            case "quantity" -> shape(Map.of(Pointer.of("measure"), ANY), List.of(), "");
            case "choice" -> shape(Map.of(), List.of(), "choices");
            case "stations" -> shape(Map.of(Pointer.of("position"), LENGTH, Pointer.of("depth"), LENGTH), List.of(),
                    "methods");
            case "seals" -> shape(Map.of(Pointer.of("length"), LENGTH), List.of(), "sides types conditions");
            case "speed" -> shape(Map.of(
                            Pointer.of("direct", "measure"), List.of(Dimension.SPEED),
                            Pointer.of("timed", "beltLength", "measure"), LENGTH,
                            Pointer.of("timed", "elapsed", "measure"), List.of(Dimension.TIME),
                            Pointer.of("pulley", "diameter", "measure"), LENGTH,
                            Pointer.of("pulley", "rotation", "measure"), List.of(Dimension.FREQUENCY)),
                    List.of(Pointer.of("timed", "revolutions", "count")), "",
                    "direct/label", "direct/help", "timed/label", "timed/help", "timed/beltLength/label",
                    "timed/revolutions/label", "timed/elapsed/label", "pulley/label", "pulley/help",
                    "pulley/diameter/label", "pulley/rotation/label");
            default -> shape(Map.of(), List.of(), "");
        };
    }

    private static FieldShape shape(Map<Pointer, List<Dimension>> measures, List<Pointer> counts, String choices,
                                    String... texts) {
        return new FieldShape(measures, counts,
                Stream.of(choices.split(" ")).filter(key -> !key.isEmpty()).map(Pointer::of).toList(),
                Stream.concat(Stream.of("label", "help"), Stream.of(texts))
                        .map(text -> Pointer.parse("/" + text)).toList());
    }
}
