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

/**
 * The seals: a table of segments, each on one side, of one type and condition, with its length. The segments of each
 * side add up to the zone; where nothing touches the belt there is a segment of type {@code none}.
 *
 * @param sides      left and right, in words
 * @param types      the seal types, in words
 * @param conditions the seal conditions, in words
 * @param length     of a segment
 */
public record SealsField(Head head, List<Choice> sides, List<Choice> types, List<Choice> conditions, Measure length)
        implements Field {

    /** The key of a field of this kind. */
    public static final String KEY = "seals";
    /** The codes of the sides, seen in the direction of travel. */
    public static final List<String> SIDES = List.of("left", "right");
    /** The codes of the types. */
    public static final List<String> TYPES =
            List.of("vertical", "perpendicular", "oblique", "parallel", "contactless", "none");
    /** The codes of the conditions. */
    public static final List<String> CONDITIONS =
            List.of("sound", "worn", "hardened", "torn", "over-tightened", "missing");

    private static final Pointer ZONE_LENGTH = Group.READINGS.where("loadingZoneLength");
    /** The share of the zone's length that the segments of a side may miss or exceed. */
    private static final double TOLERANCE = 0.01;

    public SealsField {
        sides = List.copyOf(sides);
        types = List.copyOf(types);
        conditions = List.copyOf(conditions);
    }

    @Override
    public List<Pointer> judgedBy() {
        return List.of(where(), ZONE_LENGTH);
    }

    /** Answered with a segment on each side. */
    @Override
    public boolean answered(Branch survey) {
        return SIDES.stream().allMatch(side -> !lengths(survey, side).isEmpty());
    }

    @Override
    public List<Judgement> judge(Branch survey, Branch last) {
        List<Judgement> judgements = new ArrayList<>();
        answer(survey).filter(answer -> !(answer instanceof Node.Series)).ifPresent(answer ->
                judgements.add(Judgement.refusal(where(), "answer-of-wrong-kind")));
        List<Node> segments = segments(survey);
        for (int i = 0; i < segments.size(); i++) {
            Pointer where = where().child(i);
            if (segments.get(i) instanceof Branch segment) {
                judgeWord(segment, where, "side", sides).ifPresent(judgements::add);
                judgeWord(segment, where, "type", types).ifPresent(judgements::add);
                judgeWord(segment, where, "condition", conditions).ifPresent(judgements::add);
                segment.get("length").map(answer -> length.judge(where.child("length"), answer, Optional.empty()))
                        .ifPresent(judgements::addAll);
            } else {
                judgements.add(Judgement.refusal(where, "answer-of-wrong-kind"));
            }
        }
        if (judgements.isEmpty()) {
            survey.at(ZONE_LENGTH).flatMap(Measure::read).filter(SealsField::isLength).ifPresent(zone ->
                    SIDES.forEach(side -> judgeSum(survey, side, zone).ifPresent(judgements::add)));
        }
        return judgements;
    }

    private static Optional<Judgement> judgeWord(Branch segment, Pointer where, String key, List<Choice> choices) {
        return Field.saying(segment.get(key)).filter(word -> !(word instanceof Node.Text text
                && Choice.has(choices, text.value())))
                .map(word -> Judgement.refusal(where.child(key), "choice-unknown", word));
    }

    private Optional<Judgement> judgeSum(Branch survey, String side, Quantity zone) {
        List<Quantity> lengths = lengths(survey, side);
        double sum = lengths.stream().mapToDouble(Quantity::si).sum();
        if (lengths.isEmpty() || Math.abs(sum - zone.si()) <= TOLERANCE * zone.si()) {
            return Optional.empty();
        }
        Unit unit = zone.unit();
        BigDecimal shown = new BigDecimal(unit.fromSi(sum), new MathContext(4));
        return Optional.of(Judgement.doubt(where(), "seals-" + side + "-beside-zone-length",
                Branch.write(Quantity.of(shown, unit)), Branch.write(Quantity.of(zone.value(), unit))));
    }

    private List<Quantity> lengths(Branch survey, String side) {
        return segments(survey).stream().filter(Branch.class::isInstance).map(Branch.class::cast)
                .filter(segment -> segment.get("side").filter(Node.text(side)::equals).isPresent())
                .flatMap(segment -> segment.get("length").flatMap(Measure::read).filter(SealsField::isLength)
                        .stream()).toList();
    }

    private List<Node> segments(Branch survey) {
        return answer(survey).filter(Node.Series.class::isInstance).map(answer -> ((Node.Series) answer).items())
                .orElse(List.of());
    }

    private static boolean isLength(Quantity quantity) {
        return quantity.unit().dimension() == Dimension.LENGTH;
    }
}
