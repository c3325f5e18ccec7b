package bedmark.office;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.journal.Digest;
import bedmark.journal.Progress;
import bedmark.json.RoundText;
import bedmark.pack.RoundFile;
import bedmark.survey.OfficeDeed;
import bedmark.survey.Survey;
import java.nio.file.Path;
import java.time.LocalDate;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;

/** Sends the next round out: register, forms, limits, notes and last results in one signed file. */
public final class RoundDesk {
    private final OfficeStore store;

    public RoundDesk(OfficeStore store) {
        this.store = store;
    }

    /**
     * Writes a round file and notes that it was sent.
     *
     * @param plant  its id
     * @param rounds the ids of the rounds that go out; all of the plant where none are named
     * @throws Refused {@code plant-unclear}, {@code round-unknown}, and the codes of {@link RoundFile#write}
     */
    public void send(String plant, List<String> rounds, Path out, OffsetDateTime now, String person) {
        byte[] text = RoundFile.write(document(plant, rounds, now), store.key(), out);
        store.act(person, new OfficeDeed.RoundSent(plant, out.getFileName().toString(), Digest.of(text).hex()));
    }

    private Branch document(String plant, List<String> rounds, OffsetDateTime now) {
        Branch head = store.head(plant).orElseThrow(() -> new Refused(Defect.in("", "plant-unclear",
                String.join(", ", store.registers().keySet()))));
        List<Node> chosen = new ArrayList<>();
        for (Branch round : head.branches("rounds")) {
            if (rounds.isEmpty() || rounds.contains(round.text("id").orElse(""))) {
                chosen.add(fresh(round));
            }
        }
        rounds.stream().filter(id -> head.branches("rounds").stream().noneMatch(round ->
                round.text("id").equals(Optional.of(id)))).findFirst().ifPresent(id -> {
                    throw new Refused(Defect.in(id, "round-unknown"));
                });
        return Branch.EMPTY.with("format", RoundText.FORMAT).with("version", Node.number(RoundText.VERSION))
                .with("id", UUID.randomUUID().toString()).with("createdAt", Node.time(now))
                .with("office", store.device().document())
                .with("plant", head.get("plant").orElseThrow())
                .with("forms", head.get("forms").orElse(new Node.Series(List.of())))
                .with("rounds", new Node.Series(chosen))
                .with("lastResults", new Node.Series(lastResults(plant)))
                .with("notes", new Node.Series(notes(plant)));
    }

    /** What a tablet said of a round's points belongs to the round that it walked. */
    private static Branch fresh(Branch round) {
        return round.with("points", new Node.Series(round.branches("points").stream()
                .map(point -> (Node) point.without("status").without("reason")).toList()));
    }

    private List<Node> lastResults(String plant) {
        List<String> digests = store.rank(RankQuery.ALL.ofPlant(Optional.of(plant)), Progress.NONE)
                .stream().filter(zone -> zone.names().registered()).flatMap(zone -> zone.survey().stream()).sorted()
                .toList();
        Map<String, Survey> surveys = store.surveys(digests);
        return digests.stream().map(digest -> (Node) surveys.get(digest).document().without("photos")).toList();
    }

    private List<Node> notes(String plant) {
        List<Node> notes = new ArrayList<>();
        for (OfficeDeed.ActionSet action : new Actions(store).all()) {
            if (action.zone().plant().equals(plant) && !action.done()) {
                Branch note = note(action.zone().transfer(), "action", action.text(), action.finding(), action.due());
                note = action.owner().isBlank() ? note : note.with("owner", action.owner());
                notes.add(action.workOrder().isBlank() ? note : note.with("workOrder", action.workOrder()));
            }
        }
        for (RankedZone zone : store.rank(RankQuery.ALL.ofPlant(Optional.of(plant)),
                Progress.NONE)) {
            zone.answers().forEach(answer -> notes.add(note(zone.zone().transfer(), answer.answer().code(),
                    answer.reason(), answer.rule().code(), answer.until())));
        }
        return notes.stream().filter(note -> store.registers().get(plant)
                .transfer(((Branch) note).text("transfer").orElseThrow()).isPresent()).toList();
    }

    private static Branch note(String transfer, String kind, String text, String finding, Optional<LocalDate> due) {
        Branch note = Branch.EMPTY.with("transfer", transfer).with("kind", kind).with("text", text);
        note = finding.isBlank() ? note : note.with("finding", finding);
        return due.isPresent() ? note.with("due", due.get().toString()) : note;
    }
}
