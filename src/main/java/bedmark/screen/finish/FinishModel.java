package bedmark.screen.finish;

import bedmark.document.Branch;
import bedmark.document.Refused;
import bedmark.engine.Assessment;
import bedmark.engine.Result;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Level;
import bedmark.index.SurveyLine;
import bedmark.index.Walk;
import bedmark.screen.Site;
import bedmark.screen.Workplace;
import bedmark.screen.round.RoundModel;
import bedmark.screen.round.RoundRow;
import bedmark.survey.Act;
import bedmark.survey.InspectionStatus;
import bedmark.survey.QueueState;
import bedmark.survey.Survey;
import bedmark.survey.SurveyHistory;
import bedmark.wording.Telling;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;
import javafx.beans.property.BooleanProperty;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleBooleanProperty;

/** The end of a walk: the whole round judged together, worst first; what is missing; the sign-off. */
public final class FinishModel {
    private final Workplace workplace;
    private final RoundModel round;
    private final ReadOnlyObjectWrapper<Optional<Summary>> summary = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final BooleanProperty signed = new SimpleBooleanProperty();

    /** A stop with its assessment. */
    public record Judged(RoundRow row, Assessment assessment) {
        /** The likelihood that the zone is overloaded, as far as its leading rule tells. */
        double likelihood() {
            return Telling.leading(assessment).map(Finding::probabilityOverloaded)
                    .filter(chance -> chance.isPresent()).map(chance -> chance.getAsDouble()).orElse(0.0);
        }
    }

    /**
     * What the walk came to.
     *
     * @param ranked overloaded and undecided zones, worst first, then those near their limit
     * @param gaps   the stops that are not done, in walking order
     */
    public record Summary(List<Judged> ranked, List<RoundRow> gaps, WalkTotal total) {
        public Summary {
            ranked = List.copyOf(ranked);
            gaps = List.copyOf(gaps);
        }
    }

    /** Judges the round beside the screen; {@link #summaryProperty()} tells when it is done. */
    public FinishModel(Workplace workplace, RoundModel round) {
        this.workplace = workplace;
        this.round = round;
        Site site = workplace.site();
        List<RoundRow> rows = round.rowsProperty().get();
        workplace.scribe().afterwards(() -> workplace.longWork().execute(() -> {
            Summary made = summarise(site, rows);
            workplace.screen().execute(() -> summary.set(Optional.of(made)));
        }));
    }

    public RoundModel round() {
        return round;
    }

    /** What the walk came to; nothing until it is judged. */
    public ReadOnlyObjectProperty<Optional<Summary>> summaryProperty() {
        return summary.getReadOnlyProperty();
    }

    /** Whether the person answers for the readings. */
    public BooleanProperty signedProperty() {
        return signed;
    }

    /** The walk as the journal has it. */
    public Optional<Walk> walk() {
        return workplace.store().walk(round.round().id());
    }

    public boolean finished() {
        return walk().filter(walk -> !walk.underWay()).isPresent();
    }

    private Summary summarise(Site site, List<RoundRow> rows) {
        List<Survey> surveys = new ArrayList<>();
        Map<UUID, RoundRow> rowOf = new HashMap<>();
        for (RoundRow row : rows) {
            row.survey().filter(line -> line.inspectionStatus() == InspectionStatus.INSPECTED)
                    .flatMap(line -> workplace.store().history(line.id())).map(SurveyHistory::survey)
                    .filter(survey -> judgeable(site, survey)).ifPresent(survey -> {
                        surveys.add(survey);
                        rowOf.put(survey.id(), row);
                    });
        }
        List<Judged> judged = site.assessor().assess(surveys).stream()
                .map(one -> new Judged(rowOf.get(one.survey().id()), one.assessment())).toList();
        List<RoundRow> gaps = rows.stream().filter(row -> row.progress() == RoundRow.Progress.TO_DO
                || row.progress() == RoundRow.Progress.BEGUN).toList();
        return new Summary(ranked(judged), gaps, WalkTotal.of(judged.stream().map(Judged::assessment).toList()));
    }

    /** A survey that cannot be is a gap that its own screen tells of; it must not hide the others. */
    private static boolean judgeable(Site site, Survey survey) {
        try {
            site.assessor().zone(survey);
            return true;
        } catch (Refused e) {
            return false;
        }
    }

    /** The worst level first, then the surest, then what takes most power. */
    private static List<Judged> ranked(List<Judged> judged) {
        List<Level> worth = List.of(Level.OVERLOADED, Level.UNDECIDED, Level.NEAR);
        return judged.stream().filter(one -> worth.contains(one.assessment().level()))
                .sorted(Comparator.comparing((Judged one) -> worth.indexOf(one.assessment().level()))
                        .thenComparing(Comparator.comparingDouble(Judged::likelihood).reversed())
                        .thenComparing(Comparator.comparingDouble((Judged one) -> one.assessment()
                                .get(Result.SKIRT_POWER).map(power -> power.value()).orElse(0.0)).reversed()))
                .toList();
    }

    /** The form that a zone is told by. */
    public Telling telling(Judged judged) {
        Optional<String> form = judged.row().survey().flatMap(line -> workplace.store().history(line.id()))
                .flatMap(history -> history.survey().document().branch("form")).flatMap(named -> named.text("id"));
        return new Telling(workplace.wording(), workplace.site().form(form));
    }

    /**
     * Finishes the walk and puts its completed surveys into the queue; what is not done stays open.
     *
     * @param then runs once it is saved
     */
    public void finish(Runnable then) {
        String person = workplace.preferences().person();
        workplace.scribe().save(person, new Act.WalkFinished(round.round().id()), entry -> {
            workplace.walkMemory().end();
            round.reload();
            List<UUID> completed = round.rowsProperty().get().stream().flatMap(row -> row.survey().stream())
                    .filter(line -> line.state() == QueueState.COMPLETED).map(SurveyLine::id).toList();
            if (completed.isEmpty()) {
                then.run();
            } else {
                workplace.scribe().save(person, new Act.SurveysQueued(completed), queued -> then.run());
            }
        });
    }

    /** Transfer points that were proposed on this round. */
    public List<Branch> proposals() {
        return round.proposals();
    }
}
