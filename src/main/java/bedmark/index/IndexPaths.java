package bedmark.index;

import bedmark.survey.QueueState;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.UUID;

/**
 * Whether surveys are found the ways that people look for them. Each way has an order of its own in the database, and
 * where that is damaged a sound row is not found.
 */
final class IndexPaths {
    private final Map<SurveyQuery, Set<UUID>> expected = new HashMap<>();
    private final Map<UUID, UUID> corrections = new HashMap<>();

    IndexPaths() {
        for (QueueState state : QueueState.values()) {
            expected.put(SurveyQuery.ALL.in(state), new HashSet<>());
        }
    }

    /** Takes a row that was found by its id and proved. */
    void add(SurveyLine line) {
        put(SurveyQuery.ALL.in(line.state()), line);
        put(SurveyQuery.ALL.ofTransfer(line.transfer()), line);
        line.round().ifPresent(round -> put(SurveyQuery.ALL.ofRound(round), line));
        line.supersedes().ifPresent(old -> corrections.putIfAbsent(old, line.id()));
    }

    private void put(SurveyQuery query, SurveyLine line) {
        expected.computeIfAbsent(query, unknown -> new HashSet<>()).add(line.id());
    }

    /** The ways on which other surveys are found than there are. */
    List<String> wrong(IndexProof.Asker asker) {
        List<String> wrong = new ArrayList<>();
        expected.forEach((query, ids) -> {
            if (!asker.ask(index -> right(new Queries(index), query, ids))) {
                wrong.add(query.toString());
            }
        });
        corrections.forEach((old, correction) -> asker.ask(index -> new Queries(index).row(old)).filter(row ->
                !row.line().supersededBy().equals(Optional.of(correction))).ifPresent(row -> wrong.add(old.toString())));
        return wrong;
    }

    /** Surveys that changed since they were proved are looked at again by their ids. */
    private static boolean right(Queries queries, SurveyQuery query, Set<UUID> ids) {
        Map<UUID, SurveyLine> found = new HashMap<>();
        queries.surveys(query).forEach(line -> found.put(line.id(), line));
        boolean none = ids.stream().filter(id -> !found.containsKey(id))
                .noneMatch(id -> queries.row(id).filter(row -> fits(query, row.line())).isPresent());
        return none && found.values().stream().filter(line -> !ids.contains(line.id())).allMatch(line ->
                queries.row(line.id()).filter(row -> row.line().equals(line) && fits(query, line)).isPresent());
    }

    private static boolean fits(SurveyQuery query, SurveyLine line) {
        return (query.states().isEmpty() || query.states().contains(line.state()))
                && query.transfer().filter(transfer -> !transfer.equals(line.transfer())).isEmpty()
                && (query.round().isEmpty() || query.round().equals(line.round()));
    }
}
