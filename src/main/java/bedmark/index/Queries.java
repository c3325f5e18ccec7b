package bedmark.index;

import bedmark.document.Branch;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.InspectionStatus;
import bedmark.survey.QueueState;
import java.util.ArrayList;
import java.util.Collections;
import java.util.EnumMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.UUID;
import java.util.stream.Collectors;

/** What people ask a store. */
final class Queries {
    private final Index index;
    private final Database database;

    Queries(Index index) {
        this.index = index;
        this.database = index.database();
    }

    List<SurveyLine> surveys(SurveyQuery query) {
        List<String> conditions = new ArrayList<>();
        List<Object> values = new ArrayList<>();
        query.round().ifPresent(round -> {
            conditions.add("s.round = ?");
            values.add(round);
        });
        query.beside().ifPresent(round -> {
            conditions.add("(s.round is null or s.round <> ?)");
            values.add(round);
        });
        query.transfer().ifPresent(transfer -> {
            conditions.add("s.transfer = ?");
            values.add(transfer);
        });
        if (!query.states().isEmpty()) {
            conditions.add(query.states().stream().map(state -> "?")
                    .collect(Collectors.joining(", ", "s.state in (", ")")));
            query.states().forEach(state -> values.add(state.name()));
        }
        if (query.currentOnly()) {
            conditions.add("not exists (select 1 from survey r where r.supersedes = s.id)");
        }
        if (query.inspectedOnly()) {
            conditions.add("s.inspection = ?");
            values.add(InspectionStatus.INSPECTED.name());
        }
        String where = conditions.isEmpty() ? "" : " where " + String.join(" and ", conditions);
        // Named with the transfer point, the newest of one lies at the head of an index, and the others are not read.
        String order = " order by " + (query.newest().isEmpty() ? "s.first_no"
                : (query.transfer().isPresent() ? "s.transfer, " : "") + "s.first_no desc limit ?");
        query.newest().ifPresent(values::add);
        List<SurveyLine> lines = new ArrayList<>(database.rows("select " + SurveyRow.COLUMNS + " from survey s" + where
                + order, SurveyRow::read, values.toArray()).stream().map(SurveyRow::line).toList());
        if (query.newest().isPresent()) {
            Collections.reverse(lines);
        }
        return List.copyOf(lines);
    }

    Optional<SurveyRow> row(UUID id) {
        return database.rows("select " + SurveyRow.COLUMNS + " from survey s where s.id = ?", SurveyRow::read, id)
                .stream().findFirst();
    }

    /** The last finished result of a transfer point, seen from one of its surveys or from now. */
    Optional<UUID> latestFinished(String transfer, Optional<UUID> before) {
        Set<UUID> without = new HashSet<>();
        Optional<SurveyRow> from = before.flatMap(this::row);
        long bound = from.filter(row -> row.line().state() != QueueState.OPEN).map(SurveyRow::finished)
                .orElse(Long.MAX_VALUE);
        for (Optional<SurveyRow> row = from; row.isPresent() && without.add(row.get().line().id());) {
            row = row.get().line().supersedes().flatMap(this::row);
        }
        return database.rows("select " + SurveyRow.COLUMNS + " from survey s where s.transfer = ? and s.state <> ? "
                + "and s.inspection = ? and s.finished <= ? and not exists (select 1 from survey r "
                + "where r.supersedes = s.id and r.state <> ?) order by s.finished desc, s.last_no desc limit ?",
                SurveyRow::read, transfer, QueueState.OPEN.name(), InspectionStatus.INSPECTED.name(), bound,
                QueueState.OPEN.name(), without.size() + 1).stream()
                .map(row -> row.line().id()).filter(id -> !without.contains(id)).findFirst();
    }

    Map<QueueState, Long> counts() {
        Map<QueueState, Long> counts = new EnumMap<>(QueueState.class);
        for (QueueState state : QueueState.values()) {
            counts.put(state, database.rows("select count(*) from survey where state = ?", row -> row.getLong(1),
                    state.name()).get(0));
        }
        return counts;
    }

    Optional<Walk> walk(String round) {
        return walks("where round = ?", round).stream().findFirst();
    }

    List<Walk> walks() {
        return walks("");
    }

    private record Steps(String round, long started, Optional<Long> finished) {
    }

    private List<Walk> walks(String where, Object... values) {
        return database.rows("select round, started, finished from walk " + where + " order by started desc", row ->
                new Steps(row.getString(1), row.getLong(2), Optional.ofNullable(row.getObject(3, Long.class))), values)
                .stream().map(this::walk).toList();
    }

    private Walk walk(Steps steps) {
        Entry started = index.entry(steps.started());
        Optional<Entry> finished = steps.finished().map(index::entry);
        boolean told = started.act() instanceof Act.WalkStarted start && start.round().equals(steps.round())
                && finished.filter(entry -> !(entry.act() instanceof Act.WalkFinished end
                        && end.round().equals(steps.round()))).isEmpty();
        if (!told) {
            throw new IndexBroken("the walk of round " + steps.round() + " is not what the journal tells");
        }
        return new Walk(steps.round(), started.person(), started.at(), finished.map(Entry::at));
    }

    /** The proposals that stood as of an entry, in the order in which they were first made. */
    List<Branch> proposals(long asOf) {
        Map<UUID, Branch> standing = new LinkedHashMap<>();
        List<Entry> made = index.landmarks("point-proposed", Integer.MAX_VALUE);
        for (int i = made.size() - 1; i >= 0; i--) {
            if (made.get(i).sequence() <= asOf) {
                Act.PointProposed act = (Act.PointProposed) made.get(i).act();
                standing.put(act.id(), act.proposal());
            }
        }
        return standing.values().stream().filter(proposal -> !proposal.members().isEmpty()).toList();
    }

    List<Export> exports() {
        List<Export> exports = new ArrayList<>();
        for (Entry entry : index.landmarks("pack-exported", Integer.MAX_VALUE)) {
            Act.PackExported act = (Act.PackExported) entry.act();
            exports.add(new Export(entry.sequence(), act.pack(), act.sha256(), act.folder(), entry.at(),
                    entry.person(), act.surveys()));
        }
        return exports;
    }
}
