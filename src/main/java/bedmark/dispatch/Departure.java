package bedmark.dispatch;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.index.Store;
import bedmark.index.SurveyLine;
import bedmark.index.SurveyQuery;
import bedmark.journal.Digest;
import bedmark.json.AssessmentWriter;
import bedmark.json.JsonWriter;
import bedmark.survey.Assessor;
import bedmark.survey.Bundle;
import bedmark.survey.Entry;
import bedmark.survey.InspectionStatus;
import bedmark.survey.QueueState;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import bedmark.survey.SurveyHistory;
import java.nio.ByteBuffer;
import java.time.OffsetDateTime;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.UUID;

/**
 * Makes the bundle that leaves the tablet: surveys as they were completed, judged once more, and how far each round was
 * then. Everything is told as of the entry that made the last of them ready to leave, whatever was saved since; so the
 * same surveys give the same bundle, byte for byte, however often and wherever they are exported. The bundle's id comes
 * from its content.
 */
public final class Departure {
    private final Store store;

    public Departure(Store store) {
        this.store = store;
    }

    /**
     * The bundle of some surveys.
     *
     * @param ids    completed surveys
     * @param notice the caution in one sentence
     * @throws Refused {@code survey-unknown}; {@code act-unfit} where one is still open; {@code register-absent}
     */
    public Bundle bundle(List<UUID> ids, String notice) {
        Entry ready = store.chronicle().readySince(ids).orElseThrow(() ->
                new Refused(Defect.in("", "act-without-survey", "pack-exported")));
        long asOf = ready.sequence();
        Branch site = store.chronicle().register(asOf).orElseThrow(() -> new Refused(Defect.in("", "register-absent")));
        List<Survey> surveys = ids.stream().map(id -> finished(id, asOf)).toList();
        Map<String, List<Survey>> rounds = new LinkedHashMap<>();
        site.branches("rounds").stream().flatMap(round -> round.text("id").stream())
                .forEach(round -> rounds.put(round, current(round, asOf)));
        Map<UUID, Assessor.Assessed> judged = new HashMap<>();
        new Assessor(new Register(site.branch("plant").orElse(Branch.EMPTY)))
                .assess(withCompanions(surveys, rounds)).forEach(one -> judged.put(one.survey().id(), one));
        List<Branch> documents = new ArrayList<>();
        for (Survey survey : surveys) {
            documents.add(survey.document().with("assessment",
                    AssessmentWriter.write(judged.get(survey.id()).assessment())));
        }
        OffsetDateTime at = ready.at().truncatedTo(ChronoUnit.SECONDS);
        return named(at, store.device().document(), plant(site.with("rounds", rounds(site, rounds)), asOf), notice,
                documents);
    }

    private Branch plant(Branch register, long asOf) {
        List<Branch> proposals = store.proposals(asOf);
        return proposals.isEmpty() ? register : register.with("proposals", new Node.Series(List.copyOf(proposals)));
    }

    private Survey finished(UUID id, long asOf) {
        SurveyHistory history = store.chronicle().history(id, asOf).orElseThrow(() ->
                new Refused(Defect.in(id.toString(), "survey-unknown")));
        if (history.state() == QueueState.OPEN) {
            throw new Refused(Defect.in(id.toString(), "act-unfit", "pack-exported", "open"));
        }
        return history.survey();
    }

    /** The surveys of a round that no other one corrected, as of an entry. */
    private List<Survey> current(String round, long asOf) {
        List<Survey> all = new ArrayList<>();
        for (SurveyLine line : store.surveys(SurveyQuery.ALL.ofRound(round))) {
            if (line.first() <= asOf) {
                store.chronicle().history(line.id(), asOf).ifPresent(history -> all.add(history.survey()));
            }
        }
        Set<UUID> superseded = Survey.superseded(all);
        return all.stream().filter(survey -> !superseded.contains(survey.id())).toList();
    }

    /** The surveys with those that share a drive with them, so that the drive is judged as on the screen. */
    private static List<Survey> withCompanions(List<Survey> surveys, Map<String, List<Survey>> rounds) {
        Map<UUID, Survey> all = new LinkedHashMap<>();
        surveys.stream().flatMap(survey -> survey.round().stream()).distinct().forEach(round ->
                rounds.getOrDefault(round, List.of()).forEach(survey -> all.put(survey.id(), survey)));
        surveys.forEach(survey -> all.put(survey.id(), survey));
        return List.copyOf(all.values());
    }

    private static Node rounds(Branch site, Map<String, List<Survey>> surveys) {
        List<Node> rounds = new ArrayList<>();
        for (Branch round : site.branches("rounds")) {
            Map<String, Survey> here = new HashMap<>();
            surveys.getOrDefault(round.text("id").orElse(""), List.of())
                    .forEach(survey -> here.put(survey.transfer(), survey));
            rounds.add(round.with("points", new Node.Series(round.branches("points").stream()
                    .map(point -> (Node) point(point, Optional.ofNullable(here.get(point.text("transfer").orElse("")))))
                    .toList())));
        }
        return new Node.Series(rounds);
    }

    private static Branch point(Branch point, Optional<Survey> survey) {
        InspectionStatus status = survey.filter(one -> one.completedAt().isPresent()).map(Survey::inspectionStatus)
                .orElse(InspectionStatus.NOT_INSPECTED);
        Branch told = point.with("status", status.code());
        return status == InspectionStatus.INSPECTED ? told
                : survey.flatMap(one -> one.document().text("statusReason"))
                        .map(reason -> told.with("reason", reason)).orElse(told);
    }

    /** The bundle under an id of its content (RFC 9562, version 8, from SHA-256). */
    private static Bundle named(OffsetDateTime at, Branch device, Branch register, String notice,
                                List<Branch> surveys) {
        Bundle nameless = Bundle.of(new UUID(0, 0), at, device, register, notice, surveys);
        ByteBuffer digest = ByteBuffer.wrap(Digest.of(JsonWriter.compact(nameless.document())).bytes());
        UUID id = new UUID(digest.getLong() & 0xFFFF_FFFF_FFFF_0FFFL | 0x8000L,
                digest.getLong() & 0x3FFF_FFFF_FFFF_FFFFL | 0x8000_0000_0000_0000L);
        return Bundle.of(id, at, device, register, notice, surveys);
    }
}
