package bedmark.json;

import bedmark.document.Pointer;
import bedmark.quantity.Dimension;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;

/**
 * Where the parts of a field lie that are the same in every kind.
 *
 * @param measures each with what it has to be
 * @param counts   plain numbers, each with where its possible range has to begin
 * @param choices  lists of choices
 * @param texts    beside those of the choices
 */
record FieldShape(Map<Pointer, Wanted> measures, Map<Pointer, Floor> counts, List<Pointer> choices,
                  List<Pointer> texts) {

    /** Where a possible range has to begin, so that no survey is completed that no reader would take. */
    enum Floor {
        ANYWHERE, AT_ZERO, ABOVE_ZERO
    }

    /** What a measure has to be. */
    record Wanted(List<Dimension> dimensions, Floor floor) {
        /** The measure of a quantity that has no meaning outside the form. */
        static final Wanted ANY = new Wanted(List.of(Dimension.values()), Floor.ANYWHERE);

        static Wanted of(Dimension dimension, Floor floor) {
            return new Wanted(List.of(dimension), floor);
        }
    }

    private static final Wanted PLACE = Wanted.of(Dimension.LENGTH, Floor.AT_ZERO);
    private static final Wanted LENGTH = Wanted.of(Dimension.LENGTH, Floor.ABOVE_ZERO);

    /** The shape of a kind of field. */
    static FieldShape of(String kind) {
        return switch (kind) {
            case "number" -> shape(Map.of(), Map.of(Pointer.of("count"), Floor.ANYWHERE), "");
            case "quantity" -> shape(Map.of(Pointer.of("measure"), Wanted.ANY), Map.of(), "");
            case "choice" -> shape(Map.of(), Map.of(), "choices");
            case "stations" -> shape(Map.of(Pointer.of("position"), PLACE, Pointer.of("depth"), PLACE), Map.of(),
                    "methods");
            case "seals" -> shape(Map.of(Pointer.of("length"), LENGTH), Map.of(), "sides types conditions");
            case "speed" -> shape(Map.of(
                            Pointer.of("direct", "measure"), Wanted.of(Dimension.SPEED, Floor.AT_ZERO),
                            Pointer.of("timed", "beltLength", "measure"), LENGTH,
                            Pointer.of("timed", "elapsed", "measure"), Wanted.of(Dimension.TIME, Floor.ABOVE_ZERO),
                            Pointer.of("pulley", "diameter", "measure"), LENGTH,
                            Pointer.of("pulley", "rotation", "measure"),
                            Wanted.of(Dimension.FREQUENCY, Floor.AT_ZERO)),
                    Map.of(Pointer.of("timed", "revolutions", "count"), Floor.AT_ZERO), "",
                    "direct/label", "direct/help", "timed/label", "timed/help", "timed/beltLength/label",
                    "timed/revolutions/label", "timed/elapsed/label", "pulley/label", "pulley/help",
                    "pulley/diameter/label", "pulley/rotation/label");
            default -> shape(Map.of(), Map.of(), "");
        };
    }

    private static FieldShape shape(Map<Pointer, Wanted> measures, Map<Pointer, Floor> counts, String choices,
                                    String... texts) {
        return new FieldShape(measures, counts,
                Stream.of(choices.split(" ")).filter(key -> !key.isEmpty()).map(Pointer::of).toList(),
                Stream.concat(Stream.of("label", "help"), Stream.of(texts))
                        .map(text -> Pointer.parse("/" + text)).toList());
    }
}
