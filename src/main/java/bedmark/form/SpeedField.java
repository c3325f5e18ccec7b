package bedmark.form;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.quantity.Dimension;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * The belt speed, read in one of three ways, each under a key of its own: directly, by timing marks on the belt, or
 * from a pulley. One way is answered; choosing another clears the one before.
 */
public record SpeedField(Head head, Direct direct, Timed timed, Pulley pulley) implements Field {

    /** The key of a field of this kind: that of the direct reading. */
    public static final String KEY = "beltSpeed";

    /** A way of reading the speed. */
    public enum Way {
        /** A quantity, from a tachometer. */
        DIRECT(KEY),
        /** {@code {beltLength, revolutions, elapsed}}; without a length the conveyor's holds. */
        TIMED("beltTiming"),
        /** {@code {diameter, rotation}}; ignores slip. */
        PULLEY("pulleySpeed");

        private final String key;

        Way(String key) {
            this.key = key;
        }

        /** The key of the reading. */
        public String key() {
            return key;
        }

        /** The place of the reading in a survey. */
        public Pointer where() {
            return Group.READINGS.where(key);
        }
    }

    /** One number of a way. */
    public record Part(Texts label, Measure measure) {
    }

    /** The speed itself. */
    public record Direct(Texts label, Optional<Texts> help, Measure speed) {
    }

    /** The belt's length times its revolutions over the time that they took. */
    public record Timed(Texts label, Optional<Texts> help, Part beltLength, Texts revolutionsLabel,
                        Count revolutions, Part elapsed) {
    }

    /** The pulley's circumference times its rotation. */
    public record Pulley(Texts label, Optional<Texts> help, Part diameter, Part rotation) {
    }

    @Override
    public List<Pointer> places() {
        return Stream.of(Way.values()).map(Way::where).toList();
    }

    /** The ways that the survey holds something of. */
    public List<Way> ways(Branch survey) {
        return Stream.of(Way.values()).filter(way -> at(survey, way.where()).isPresent()).toList();
    }

    @Override
    public Optional<Node> answer(Branch survey) {
        return ways(survey).stream().findFirst().flatMap(way -> at(survey, way.where()));
    }

    @Override
    public boolean answered(Branch survey) {
        return ways(survey).stream().anyMatch(way -> parts(way).stream()
                .allMatch(key -> at(survey, way.where().child(key)).isPresent()));
    }

    /** What a way can't do without; the length of the belt may be the one that its conveyor is registered with. */
    private static List<String> parts(Way way) {
        return switch (way) {
            case DIRECT -> List.of("value", "unit");
            case TIMED -> List.of("revolutions", "elapsed");
            case PULLEY -> List.of("diameter", "rotation");
        };
    }

    @Override
    public List<Judgement> judge(Branch survey, Branch last) {
        List<Way> ways = ways(survey);
        List<Judgement> judgements = new ArrayList<>();
        for (Way way : ways) {
            List<Judgement> ofWay = way == Way.DIRECT
                    ? at(survey, way.where()).map(answer -> direct.speed.judge(way.where(), answer,
                            speed(last).map(Branch::write))).orElse(List.of())
                    : judgeParts(way, survey);
            judgements.addAll(ofWay);
            if (way != Way.DIRECT && ofWay.isEmpty()) {
                speed(way, survey).map(derived -> direct.speed.judge(way.where(), Branch.write(derived),
                        speed(last).map(Branch::write))).ifPresent(judgements::addAll);
            }
        }
        if (ways.size() > 1) {
            judgements.add(Judgement.doubt(where(), "speed-read-in-several-ways"));
        }
        return judgements;
    }

    private List<Judgement> judgeParts(Way way, Branch survey) {
        if (!at(survey, way.where()).filter(Branch.class::isInstance).isPresent()) {
            return List.of(Judgement.refusal(way.where(), "answer-of-wrong-kind"));
        }
        List<Judgement> judgements = new ArrayList<>();
        if (way == Way.TIMED) {
            judgements.addAll(judge(survey, way.where().child("beltLength"), timed.beltLength.measure));
            Pointer revolutions = way.where().child("revolutions");
            at(survey, revolutions).map(answer -> timed.revolutions.judge(revolutions, answer, Optional.empty()))
                    .ifPresent(judgements::addAll);
            judgements.addAll(judge(survey, way.where().child("elapsed"), timed.elapsed.measure));
        } else {
            judgements.addAll(judge(survey, way.where().child("diameter"), pulley.diameter.measure));
            judgements.addAll(judge(survey, way.where().child("rotation"), pulley.rotation.measure));
        }
        return judgements;
    }

    private static List<Judgement> judge(Branch survey, Pointer where, Measure measure) {
        return at(survey, where).map(answer -> measure.judge(where, answer, Optional.empty())).orElse(List.of());
    }

    /** The speed that a survey's readings give, to four digits: enough to judge it. */
    private static Optional<Quantity> speed(Branch survey) {
        return Stream.of(Way.values()).flatMap(way -> speed(way, survey).stream()).findFirst();
    }

    private static Optional<Quantity> speed(Way way, Branch survey) {
        return switch (way) {
            case DIRECT -> quantity(survey, way.where(), Dimension.SPEED);
            case TIMED -> si(survey, way, "beltLength", Dimension.LENGTH)
                    .flatMap(length -> si(survey, way, "elapsed", Dimension.TIME)
                            .flatMap(time -> at(survey, way.where().child("revolutions"))
                                    .filter(Node.Decimal.class::isInstance)
                                    .map(turns -> ((Node.Decimal) turns).value().doubleValue() * length / time)))
                    .flatMap(SpeedField::metresPerSecond);
            case PULLEY -> si(survey, way, "diameter", Dimension.LENGTH)
                    .flatMap(diameter -> si(survey, way, "rotation", Dimension.FREQUENCY)
                            .map(rotation -> Math.PI * diameter * rotation))
                    .flatMap(SpeedField::metresPerSecond);
        };
    }

    private static Optional<Quantity> metresPerSecond(double speed) {
        return Double.isFinite(speed) ? Optional.of(Quantity.of(new BigDecimal(speed, new MathContext(4)),
                Unit.METRE_PER_SECOND)) : Optional.empty();
    }

    private static Optional<Double> si(Branch survey, Way way, String part, Dimension dimension) {
        return quantity(survey, way.where().child(part), dimension).map(Quantity::si);
    }

    private static Optional<Quantity> quantity(Branch survey, Pointer where, Dimension dimension) {
        return at(survey, where).flatMap(Measure::read).filter(read -> read.unit().dimension() == dimension);
    }

    private static Optional<Node> at(Branch survey, Pointer where) {
        return Field.saying(survey.at(where));
    }
}
