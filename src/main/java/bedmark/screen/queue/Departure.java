package bedmark.screen.queue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.index.Store;
import bedmark.index.SurveyLine;
import bedmark.index.SurveyQuery;
import bedmark.json.AssessmentWriter;
import bedmark.screen.Site;
import bedmark.survey.Assessor;
import bedmark.survey.Bundle;
import bedmark.survey.InspectionStatus;
import bedmark.survey.Survey;
import bedmark.survey.SurveyHistory;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.UUID;

/** Makes the bundle that leaves the tablet: the surveys as they stand, judged once more, and how far each round is. */
final class Departure {
    private final Store store;
    private final Site site;

    Departure(Store store, Site site) {
        this.store = store;
        this.site = site;
    }

    /**
     * The bundle of some surveys.
     *
     * @param notice the caution in one sentence
     */
    Bundle bundle(List<UUID> ids, UUID id, OffsetDateTime createdAt, String notice) {
        List<Survey> surveys = ids.stream().flatMap(one -> store.history(one).stream())
                .map(SurveyHistory::survey).toList();
        Map<UUID, Assessor.Assessed> judged = new HashMap<>();
        site.assessor().assess(ofTheirRounds(surveys)).forEach(one -> judged.put(one.survey().id(), one));
        List<Branch> documents = new ArrayList<>();
        for (Survey survey : surveys) {
            documents.add(survey.document().with("assessment",
                    AssessmentWriter.write(judged.get(survey.id()).assessment())));
        }
        Branch plant = site.document().with("rounds", rounds());
        List<Branch> proposals = store.proposals();
        return Bundle.of(id, createdAt, store.device().document(), proposals.isEmpty() ? plant
                : plant.with("proposals", new Node.Series(List.copyOf(proposals))), notice, documents);
    }

    /** The surveys with those that share a drive with them, so that the drive is judged as on the screen. */
    private List<Survey> ofTheirRounds(List<Survey> surveys) {
        Map<UUID, Survey> all = new HashMap<>();
        surveys.stream().flatMap(survey -> survey.round().stream()).distinct().forEach(round ->
                store.surveys(SurveyQuery.ALL.ofRound(round).current()).forEach(line ->
                        store.history(line.id()).ifPresent(history -> all.put(line.id(), history.survey()))));
        surveys.forEach(survey -> all.put(survey.id(), survey));
        return List.copyOf(all.values());
    }

    private Node rounds() {
        List<Node> rounds = new ArrayList<>();
        for (Branch round : site.document().branches("rounds")) {
            Map<String, SurveyLine> lines = new HashMap<>();
            store.surveys(SurveyQuery.ALL.ofRound(round.text("id").orElse("")).current())
                    .forEach(line -> lines.put(line.transfer(), line));
            rounds.add(round.with("points", new Node.Series(round.branches("points").stream()
                    .map(point -> (Node) point(point, lines)).toList())));
        }
        return new Node.Series(rounds);
    }

    private Branch point(Branch point, Map<String, SurveyLine> lines) {
        SurveyLine line = lines.get(point.text("transfer").orElse(""));
        InspectionStatus status = line == null || line.completedAt().isEmpty() ? InspectionStatus.NOT_INSPECTED
                : line.inspectionStatus();
        Branch told = point.with("status", status.code());
        return line == null || status == InspectionStatus.INSPECTED ? told
                : store.history(line.id()).flatMap(history -> history.survey().document().text("statusReason"))
                        .map(reason -> told.with("reason", reason)).orElse(told);
    }
}
