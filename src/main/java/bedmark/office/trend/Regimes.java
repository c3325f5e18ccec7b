package bedmark.office.trend;

import bedmark.engine.Datum;
import bedmark.engine.LoadingZone;
import bedmark.engine.Result;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.Reading;
import bedmark.office.JudgedZone;
import bedmark.survey.Assessor;
import bedmark.survey.Register;
import java.time.Instant;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/**
 * Finds what changed in a zone. Each kind of change begins a regime of that kind, and a survey is compared with the
 * first of it, so that many small steps are seen as what they come to. A seal is renewed where less of its length is
 * worn than was in that regime at worst.
 *
 * <p>Two readings of a length or speed are the same where they differ by no more than {@value #COVERAGE} standard
 * uncertainties of their difference, and never by less than a floor. Coverage, floors and step are assumptions [A].
 */
final class Regimes {
    /** Three, since each survey of a long regime is compared and may cut the trend. */
    private static final double COVERAGE = 3;
    /** Speeds that differ by no more are the same (share). */
    private static final double SAME_SPEED = 0.05;
    /** Boards that differ by no more are the same (m). */
    private static final double SAME_BOARDS = 0.005;
    /** Seals of which so much less is not sound were renewed (share of all their length). */
    private static final double RENEWED = 0.10;
    private static final List<List<Datum>> BOARDS = List.of(List.of(Datum.READ_SPACING, Datum.REGISTER_SPACING),
            List.of(Datum.READ_HEIGHT, Datum.REGISTER_HEIGHT));

    private final Map<Register, Assessor> assessors = new IdentityHashMap<>();
    private final Map<Change.Kind, Told> first = new EnumMap<>(Change.Kind.class);

    private Regimes() {
    }

    /** A survey with what the engine sees of it. */
    private record Told(JudgedZone zone, LoadingZone seen) {

        String material() {
            return zone.survey().readings().text("materialRunning").or(() -> zone.register()
                    .transfer(zone.survey().transfer()).flatMap(Register.Transfer::material)).orElse("");
        }

        String materialName() {
            return Optional.ofNullable(zone.register().materials().get(material())).map(Register.Material::name)
                    .orElse(material());
        }

        Optional<Estimate> speed() {
            return zone.assessment().get(Result.BELT_SPEED).filter(speed -> speed.value() > 0);
        }

        Optional<Estimate> board(List<Datum> read) {
            return read.stream().flatMap(datum -> seen.get(datum).stream()).findFirst().map(Reading::estimate);
        }

        String boards() {
            return BOARDS.stream().map(read -> board(read).map(one -> number(one.value())).orElse("-"))
                    .collect(Collectors.joining(" x "));
        }

        Optional<Double> unsound() {
            return Measure.SEALS.of(zone.survey(), zone.assessment()).map(Estimate::value);
        }

        Stream<String> segments(String... keys) {
            return zone.survey().readings().branches("seals").stream().map(seal -> Stream.of(keys)
                    .map(key -> seal.text(key).orElse("")).collect(Collectors.joining(":"))).distinct().sorted();
        }

        List<String> sealTypes() {
            return segments("type").filter(type -> !type.equals("none")).toList();
        }

        String seals() {
            return segments("type", "condition").collect(Collectors.joining(" "))
                    + unsound().map(share -> " " + Math.round(share * 100) + " %").orElse("");
        }
    }

    /**
     * What changed from one survey to the next.
     *
     * @param counted in time order
     */
    static List<Change> changes(List<JudgedZone> counted) {
        Regimes regimes = new Regimes();
        List<Change> changes = new ArrayList<>();
        counted.forEach(zone -> regimes.see(zone, changes));
        return changes;
    }

    private void see(JudgedZone zone, List<Change> changes) {
        Told now = new Told(zone, assessors.computeIfAbsent(zone.register(), Assessor::new).zone(zone.survey()));
        for (Change.Kind kind : Change.Kind.values()) {
            if (!tells(kind, now)) {
                continue;
            }
            Told then = first.putIfAbsent(kind, now);
            if (then != null && differ(kind, then, now)) {
                changes.add(new Change(kind, Instant.ofEpochMilli(zone.copy().moment()), text(kind, then, now),
                        text(kind, now, then)));
                first.put(kind, now);
            } else if (then != null && kind == Change.Kind.SEALS && worn(now) > worn(then)) {
                first.put(kind, now);
            }
        }
    }

    private static boolean tells(Change.Kind kind, Told told) {
        return switch (kind) {
            case MATERIAL -> !told.material().isEmpty();
            case SPEED -> told.speed().isPresent();
            case SEALS -> told.unsound().isPresent();
            case BOARDS -> BOARDS.stream().allMatch(read -> told.board(read).isPresent());
        };
    }

    private static boolean differ(Change.Kind kind, Told then, Told now) {
        return switch (kind) {
            case MATERIAL -> !then.material().equals(now.material());
            case SPEED -> differ(then.speed().orElseThrow(), now.speed().orElseThrow(),
                    SAME_SPEED * then.speed().orElseThrow().value());
            case SEALS -> !then.sealTypes().equals(now.sealTypes()) || worn(then) - worn(now) > RENEWED;
            case BOARDS -> BOARDS.stream().anyMatch(read -> differ(then.board(read).orElseThrow(),
                    now.board(read).orElseThrow(), SAME_BOARDS));
        };
    }

    private static boolean differ(Estimate then, Estimate now, double floor) {
        double uncertainty = COVERAGE * Math.hypot(then.standardUncertainty(), now.standardUncertainty());
        return Math.abs(now.value() - then.value()) > Math.max(floor, uncertainty);
    }

    private static double worn(Told told) {
        return told.unsound().orElseThrow();
    }

    /** Two materials of one name are told apart by their ids. */
    private static String text(Change.Kind kind, Told told, Told other) {
        return switch (kind) {
            case MATERIAL -> told.materialName().equals(other.materialName()) ? told.material() : told.materialName();
            case SPEED -> number(told.speed().orElseThrow().value());
            case SEALS -> told.seals();
            case BOARDS -> told.boards();
        };
    }

    private static String number(double si) {
        return Double.toString(Math.round(si * 1000) / 1000.0);
    }
}
