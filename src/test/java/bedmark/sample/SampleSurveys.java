package bedmark.sample;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.survey.Register;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.UUID;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/** The surveys of one visit: one, or two where a completed one was corrected. */
final class SampleSurveys {
    private final SampleVisit visit;
    private final Register register;
    private final SamplePhotos photos;

    SampleSurveys(SampleVisit visit, Register register, SamplePhotos photos) {
        this.visit = visit;
        this.register = register;
        this.photos = photos;
    }

    /** An identity that is the same at every run. */
    static UUID identity(String... parts) {
        return UUID.nameUUIDFromBytes(("ostermere/" + String.join("/", parts)).getBytes(StandardCharsets.UTF_8));
    }

    /** The surveys without their assessments. */
    List<Branch> all() {
        Branch survey = visit.inspected() ? inspected() : skipped();
        return visit.said("corrected").map(this::fact).map(fact -> List.of(
                survey.with("readings", survey.branch("readings").orElseThrow().with("throughput",
                        SampleReadings.running(SampleQuantity.parse(fact.get(0)), state(), 4))),
                corrected(survey, fact.get(1)))).orElse(List.of(survey));
    }

    private Branch head() {
        return Branch.EMPTY.with("id", identity(visit.round(), visit.transfer(), "1").toString())
                .with("revision", Node.number(1))
                .with("round", visit.round())
                .with("transfer", visit.transfer())
                .with("form", Branch.EMPTY.with("id", "loading-zone").with("version", Node.number(1)))
                .with("inspector", visit.row().text("who"));
    }

    private Branch times(Branch survey, int minutes) {
        Branch started = survey.with("startedAt", visit.time().toString());
        return visit.completed() ? started.with("completedAt", visit.time().plusMinutes(minutes).toString()) : started;
    }

    private Branch skipped() {
        List<String> status = List.of(visit.said("status").orElseThrow().split(": ", 2));
        return times(head().with("signedOffBy", visit.row().text("who")), 1)
                .with("inspectionStatus", status.get(0)).with("statusReason", status.get(1))
                .with("readings", Branch.EMPTY).with("observations", Branch.EMPTY);
    }

    private Branch inspected() {
        Branch survey = visit.completed() ? head().with("signedOffBy", visit.row().text("who")) : head();
        if (visit.isolated()) {
            survey = survey.with("permit", "LO-" + visit.round() + "-" + visit.transfer().substring(3));
        }
        survey = times(survey, visit.isolated() ? 27 : 13).with("inspectionStatus", "inspected")
                .with("readings", SampleReadings.of(state(), zonesOfConveyor()))
                .with("observations", SampleObservations.of(visit));
        survey = listed(survey, "actions", visit.all("action").map(this::action));
        if (visit.said("notes").isPresent()) {
            survey = survey.with("notes", visit.said("notes").get());
        }
        survey = listed(survey, "carriedOver", visit.said("carried").stream()
                .flatMap(keys -> Stream.of(keys.split(", "))).map(Node::text));
        List<String> taken = visit.all("photo").toList();
        return listed(survey, "photos", IntStream.range(0, taken.size()).mapToObj(i -> photo(taken.get(i), 17 * i)));
    }

    private static Branch listed(Branch survey, String key, Stream<? extends Node> nodes) {
        List<Node> items = new ArrayList<>(nodes.toList());
        return items.isEmpty() ? survey : survey.with(key, new Node.Series(items));
    }

    private Branch action(String text) {
        List<String> parts = fact(text);
        return Branch.EMPTY.with("what", parts.get(0)).with("who", parts.get(1)).with("by", parts.get(2))
                .with("workOrder", parts.get(3)).with("assetId",
                        register.transfer(visit.transfer()).flatMap(found -> found.document().text("assetId"))
                                .orElseThrow());
    }

    private Branch photo(String text, int number) {
        List<String> parts = fact(text);
        byte[] bytes = photos.bytes(parts.get(0));
        return Branch.EMPTY.with("id", identity(visit.round(), parts.get(0)).toString())
                .with("file", "photos/" + parts.get(0))
                .with("sha256", SamplePhotos.sha256(bytes))
                .with("bytes", Node.number(bytes.length))
                .with("takenAt", visit.time().plusMinutes(8).plusSeconds(number).toString())
                .with("caption", parts.get(1));
    }

    /** The same survey, put right an hour and a half later. */
    private Branch corrected(Branch survey, String why) {
        Branch second = Branch.EMPTY;
        for (String key : survey.members().keySet()) {
            second = second.with(key, survey.members().get(key));
            if (key.equals("revision")) {
                second = second.with("supersedes", survey.text("id").orElseThrow()).with("revisionReason", why);
            }
        }
        return second.with("id", identity(visit.round(), visit.transfer(), "2").toString())
                .with("revision", Node.number(2))
                .with("completedAt", visit.time().plusMinutes(90).toString());
    }

    private SampleState state() {
        return new SampleState(visit, register);
    }

    private int zonesOfConveyor() {
        return register.transfer(visit.transfer()).map(Register.Transfer::conveyor).map(register::zonesOf)
                .map(List::size).orElseThrow();
    }

    private List<String> fact(String text) {
        return Stream.of(text.split(";")).map(String::strip).toList();
    }
}
