package bedmark.form;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.quantity.Dimension;
import bedmark.quantity.Quantity;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The bed depths: a table of stations along the zone, each with its position from the zone's start and the raw value
 * of the method by which its depth was read.
 *
 * @param methods  the four ways of reading a depth, in words
 * @param position of a station, from the start of the zone
 * @param depth    as the method gives it
 */
public record StationsField(Head head, List<Choice> methods, Measure position, Measure depth) implements Field {

    /** The key of a field of this kind. */
    public static final String KEY = "bedDepths";
    /** The codes of the methods. */
    public static final List<String> METHODS = List.of("at-board", "from-board-top", "at-centre", "wear-line");
    /** Where the method of all stations that name none lies. */
    public static final Pointer METHOD = Group.READINGS.where("depthMethod");

    private static final Pointer ZONE_LENGTH = Group.READINGS.where("loadingZoneLength");

    public StationsField {
        methods = List.copyOf(methods);
    }

    @Override
    public List<Pointer> places() {
        return List.of(where(), METHOD);
    }

    @Override
    public List<Pointer> judgedBy() {
        return List.of(where(), METHOD, ZONE_LENGTH);
    }

    /** Answered with one whole station. */
    @Override
    public boolean answered(Branch survey) {
        return stations(survey).stream().anyMatch(station -> station instanceof Branch branch
                && branch.has("position") && branch.has("depth"));
    }

    @Override
    public List<Judgement> judge(Branch survey, Branch last) {
        List<Judgement> judgements = new ArrayList<>(judgeMethod(METHOD, survey.at(METHOD)));
        answer(survey).filter(answer -> !(answer instanceof Node.Series)).ifPresent(answer ->
                judgements.add(Judgement.refusal(where(), "answer-of-wrong-kind")));
        Optional<Quantity> length = length(survey.at(ZONE_LENGTH));
        PastBed past = new PastBed(last);
        List<Quantity> seen = new ArrayList<>();
        List<Node> stations = stations(survey);
        for (int i = 0; i < stations.size(); i++) {
            Pointer where = where().child(i);
            if (!(stations.get(i) instanceof Branch station)) {
                judgements.add(Judgement.refusal(where, "answer-of-wrong-kind"));
                continue;
            }
            judgements.addAll(judgeMethod(where.child("depthMethod"), station.get("depthMethod")));
            Optional<Quantity> place = length(station.get("position"));
            station.get("position").map(answer -> position.judge(where.child("position"), answer, Optional.empty()))
                    .ifPresent(judgements::addAll);
            place.ifPresent(at -> judgements.addAll(judgePlace(where.child("position"), at, length, seen)));
            place.ifPresent(seen::add);
            station.get("depth").map(answer -> depth.judge(where.child("depth"), answer,
                    place.flatMap(at -> past.depthAt(at, PastBed.method(station, survey)))))
                    .ifPresent(judgements::addAll);
        }
        return judgements;
    }

    private List<Judgement> judgeMethod(Pointer where, Optional<Node> method) {
        return Field.saying(method).filter(code -> !(code instanceof Node.Text text
                        && Choice.has(methods, text.value())))
                .map(code -> List.of(Judgement.refusal(where, "choice-unknown", code))).orElse(List.of());
    }

    private static List<Judgement> judgePlace(Pointer where, Quantity place, Optional<Quantity> length,
                                              List<Quantity> seen) {
        if (seen.stream().anyMatch(other -> Quantity.BY_SIZE.compare(other, place) == 0)) {
            return List.of(Judgement.refusal(where, "station-twice", show(place)));
        }
        return length.filter(end -> Quantity.BY_SIZE.compare(place, end) > 0)
                .map(end -> List.of(Judgement.refusal(where, "station-outside-zone", show(place), show(end))))
                .orElse(List.of());
    }

    private List<Node> stations(Branch survey) {
        return answer(survey).filter(Node.Series.class::isInstance).map(answer -> ((Node.Series) answer).items())
                .orElse(List.of());
    }

    private static Optional<Quantity> length(Optional<Node> node) {
        return node.flatMap(Measure::read).filter(read -> read.unit().dimension() == Dimension.LENGTH);
    }

    private static Node show(Quantity quantity) {
        return Branch.write(Quantity.of(quantity.value(), quantity.unit()));
    }
}
