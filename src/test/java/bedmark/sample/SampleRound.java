package bedmark.sample;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.json.AssessmentWriter;
import bedmark.json.JsonReader;
import bedmark.survey.Assessor;
import bedmark.survey.Bundle;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import bedmark.words.Words;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.function.Function;
import java.util.stream.Collectors;

/**
 * One round of the demo plant as a whole bundle.
 *
 * @param table     the part of the tables' names that tells the round
 * @param id        of the round
 * @param name      of the round
 * @param dueBy     the last day on which it is to be walked
 * @param createdAt when the bundle was made
 */
record SampleRound(String table, String id, String name, String dueBy, OffsetDateTime createdAt) {

    /** All rounds, oldest first. */
    static final List<SampleRound> ALL = List.of(
            new SampleRound("2025-09", "2025-09", "September 2025", "2025-09-30",
                    OffsetDateTime.parse("2025-09-17T14:05:31+02:00")),
            new SampleRound("2026-03", "2026-03", "March 2026", "2026-03-31",
                    OffsetDateTime.parse("2026-03-18T13:10:12+01:00")),
            new SampleRound("under-way", "2026-09", "September 2026", "2026-09-30",
                    OffsetDateTime.parse("2026-09-22T15:08:47+02:00")));

    private static final Path FORM = Path.of("field-forms", "loading-zone.json");

    /** The file's name in {@code sample-surveys/}. */
    String file() {
        return "round-" + table + ".json";
    }

    Bundle bundle(SamplePhotos photos) {
        Register register = new Register(SamplePlant.document());
        List<Branch> surveys = new ArrayList<>();
        for (SampleVisit visit : SampleVisit.of(id, table)) {
            surveys.addAll(new SampleSurveys(visit, register, photos).all());
        }
        Branch known = Branch.EMPTY.with("plant", register.document())
                .with("forms", Node.Series.of(form()))
                .with("rounds", Node.Series.of(document(register, surveys)));
        Branch device = Branch.EMPTY.with("id", SampleSurveys.identity("tablet", "3").toString())
                .with("name", "Tablet 3");
        return Bundle.of(SampleSurveys.identity("bundle", id), createdAt, device, known,
                new Words(Locale.ENGLISH).text("command.notice"), assessed(surveys, register));
    }

    private static Branch form() {
        try {
            return JsonReader.read(Files.readAllBytes(FORM)).root();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static List<Branch> assessed(List<Branch> surveys, Register register) {
        return new Assessor(register).assess(surveys.stream().map(Survey::new).toList()).stream()
                .map(one -> one.survey().document().with("assessment", AssessmentWriter.write(one.assessment())))
                .toList();
    }

    private Branch document(Register register, List<Branch> surveys) {
        Map<String, Survey> byTransfer = surveys.stream().map(Survey::new)
                .filter(survey -> survey.completedAt().isPresent())
                .collect(Collectors.toMap(Survey::transfer, Function.identity(), (first, second) -> second));
        List<Node> points = new ArrayList<>();
        for (String transfer : register.transfers().keySet()) {
            Branch point = due(Branch.EMPTY.with("transfer", transfer));
            Survey survey = byTransfer.get(transfer);
            if (survey == null) {
                points.add(point.with("status", "not-inspected"));
                continue;
            }
            Branch told = point.with("status", survey.inspectionStatus().code());
            points.add(survey.document().text("statusReason").map(reason -> told.with("reason", reason)).orElse(told));
        }
        return Branch.EMPTY.with("id", id).with("name", name).with("dueBy", dueBy).with("points", new Node.Series(points));
    }

    /** One point of the round under way has an earlier day than the round, and it has passed. */
    private Branch due(Branch point) {
        return id.equals("2026-09") && point.text("transfer").orElse("").equals("TP-18")
                ? point.with("dueBy", "2026-09-18") : point;
    }
}
