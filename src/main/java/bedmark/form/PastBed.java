package bedmark.form;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.quantity.Dimension;
import bedmark.quantity.Quantity;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Comparator;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * The bed of the survey before, as something to compare a depth with: straight between its stations, level before the
 * first and behind the last. A station rarely stands where it stood the last time.
 */
final class PastBed {
    private static final String METHOD = "depthMethod";
    private static final String USUAL = "at-board";
    private static final MathContext SHOWN = new MathContext(3);

    private final List<Station> stations;

    private record Station(double position, Quantity depth, Node answer, String method) {
    }

    PastBed(Branch survey) {
        stations = survey.at(Group.READINGS.where(StationsField.KEY)).filter(Node.Series.class::isInstance)
                .map(node -> ((Node.Series) node).items()).orElse(List.of()).stream()
                .filter(Branch.class::isInstance).map(Branch.class::cast).flatMap(row -> station(row, survey))
                .sorted(Comparator.comparingDouble(Station::position)).toList();
    }

    private static Stream<Station> station(Branch row, Branch survey) {
        Optional<Quantity> position = length(row.get("position"));
        Optional<Quantity> depth = length(row.get("depth"));
        return position.isPresent() && depth.isPresent()
                ? Stream.of(new Station(position.get().si(), depth.get(), row.get("depth").orElseThrow(),
                        method(row, survey)))
                : Stream.empty();
    }

    private static Optional<Quantity> length(Optional<Node> node) {
        return node.flatMap(Measure::read).filter(read -> read.unit().dimension() == Dimension.LENGTH);
    }

    /** How the depth of a station is read. */
    static String method(Branch station, Branch survey) {
        return station.get(METHOD).or(() -> survey.at(StationsField.METHOD))
                .filter(Node.Text.class::isInstance).map(node -> ((Node.Text) node).value()).orElse(USUAL);
    }

    /** The depth at a place, where the bed was read in the same way. */
    Optional<Node> depthAt(Quantity place, String method) {
        List<Station> same = stations.stream().filter(station -> station.method().equals(method)).toList();
        if (same.isEmpty()) {
            return Optional.empty();
        }
        double at = place.si();
        Optional<Station> before = same.stream().filter(station -> station.position() <= at)
                .reduce((first, second) -> second);
        Optional<Station> behind = same.stream().filter(station -> station.position() >= at).findFirst();
        if (before.isEmpty() || behind.isEmpty() || Objects.equals(before.get(), behind.get())) {
            return before.or(() -> behind).map(Station::answer);
        }
        return Optional.of(between(before.get(), behind.get(), at));
    }

    private static Node between(Station before, Station behind, double at) {
        double apart = behind.position() - before.position();
        double share = apart > 0 ? (at - before.position()) / apart : 0;
        double depth = before.depth().si() + share * (behind.depth().si() - before.depth().si());
        return Branch.write(Quantity.of(new BigDecimal(before.depth().unit().fromSi(depth)).round(SHOWN),
                before.depth().unit()));
    }
}
