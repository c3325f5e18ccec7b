package bedmark.index;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.journal.Digest;
import bedmark.survey.InspectionStatus;
import bedmark.survey.PlannedAction;
import bedmark.survey.QueueState;
import bedmark.survey.Survey;
import bedmark.survey.SurveyHistory;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.OffsetDateTime;
import java.util.Arrays;
import java.util.Optional;
import java.util.UUID;

/** A row of the table {@code survey}, sealed when written and proved when read. */
record SurveyRow(SurveyLine line, long finished, Digest hash) {
    static final String COLUMNS = "s.id, s.revision, s.supersedes, s.round, s.transfer, s.state, s.inspection, "
            + "s.started, s.completed, s.finished, s.verdict, s.left_open, s.first_no, s.last_no, s.hash, "
            + "s.seal, "
            + "(select r.id from survey r where r.supersedes = s.id order by r.first_no limit 1) superseded_by";
    static final String WRITE = "merge into survey (id, revision, supersedes, round, transfer, state, inspection, "
            + "started, completed, finished, verdict, left_open, first_no, last_no, hash, seal) key (id) "
            + "values (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?)";

    static SurveyRow of(SurveyHistory history, Folded folded, String level) {
        Survey survey = history.survey();
        SurveyLine line = new SurveyLine(survey.id(), survey.revision(), survey.supersedes(), Optional.empty(),
                survey.round(), survey.transfer(), history.state(), survey.inspectionStatus(), survey.startedAt(),
                survey.completedAt(), level, leftOpen(survey), folded.first(), folded.last());
        long finished = survey.completedAt().or(survey::startedAt).map(at -> at.toInstant().toEpochMilli()).orElse(0L);
        return new SurveyRow(line, finished, folded.hash());
    }

    /** A journal may hold actions that are no list; a survey has none then, and is found all the same. */
    private static int leftOpen(Survey survey) {
        Branch document = survey.document();
        return document.get(PlannedAction.KEY).filter(Node.Series.class::isInstance).isEmpty() ? 0
                : (int) PlannedAction.of(document, PlannedAction.KEY).stream().filter(action -> !action.done()).count();
    }

    /** @throws IndexBroken where the row is not as it was written */
    static SurveyRow read(ResultSet row) throws SQLException {
        try {
            SurveyLine line = new SurveyLine(row.getObject("id", UUID.class), row.getInt("revision"),
                    Optional.ofNullable(row.getObject("supersedes", UUID.class)),
                    Optional.ofNullable(row.getObject("superseded_by", UUID.class)),
                    Optional.ofNullable(row.getString("round")), row.getString("transfer"),
                    QueueState.valueOf(row.getString("state")),
                    InspectionStatus.valueOf(row.getString("inspection")), time(row.getString("started")),
                    time(row.getString("completed")), row.getString("verdict"), row.getInt("left_open"),
                    row.getLong("first_no"), row.getLong("last_no"));
            SurveyRow read = new SurveyRow(line, row.getLong("finished"), Digest.ofBytes(row.getBytes("hash")));
            if (!Arrays.equals(read.seal(), row.getBytes("seal"))) {
                throw new IndexBroken("the row of survey " + line.id() + " is not as it was written");
            }
            return read;
        } catch (RuntimeException e) {
            throw e instanceof IndexBroken ? e : new IndexBroken(e);
        }
    }

    private static Optional<OffsetDateTime> time(String text) {
        return Optional.ofNullable(text).map(OffsetDateTime::parse);
    }

    Object[] values() {
        return new Object[] {line.id(), line.revision(), line.supersedes().orElse(null), line.round().orElse(null),
            line.transfer(), line.state().name(), line.inspectionStatus().name(),
            line.startedAt().map(OffsetDateTime::toString).orElse(null),
            line.completedAt().map(OffsetDateTime::toString).orElse(null), finished, line.level(), line.leftOpen(),
            line.first(), line.last(), hash.bytes(), seal()};
    }

    /** Whether both say the same of the survey alone. */
    boolean sameAs(SurveyRow other) {
        return Arrays.equals(seal(), other.seal());
    }

    private byte[] seal() {
        return RowSeal.of(line.id(), line.revision(), line.supersedes(), line.round(), line.transfer(), line.state(),
                line.inspectionStatus(), line.startedAt(), line.completedAt(), finished, line.level(), line.leftOpen(),
                line.first(), line.last(), hash);
    }
}
