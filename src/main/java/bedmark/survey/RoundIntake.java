package bedmark.survey;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Refused;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.UUID;
import java.util.function.Predicate;

/**
 * Takes an office's round file into a tablet's store, as the acts that do so. What is under way there goes on: a survey
 * is the fold of its own acts, and the zone, conveyor, material, form and round that it needs stay where the office no
 * longer names them.
 */
public final class RoundIntake {

    /** Where a transfer point of a tablet's register keeps what the office wants the person there to know. */
    public static final String NOTES = "officeNotes";
    /** Where it keeps what the office knows to be open there. */
    public static final String ACTIONS = "openActions";
    private static final String FILE = "roundFile";

    private RoundIntake() {
    }

    /**
     * The acts.
     *
     * @param file     the round file's document
     * @param office   fingerprint of the key that signed it, which is trusted from now on
     * @param current  the tablet's {@code plant}, {@code forms} and {@code rounds}; nothing on an empty tablet
     * @param underWay surveys that have not left the tablet
     * @param known    tells whether the tablet has a survey
     * @throws Refused {@code round-of-other-plant} where surveys of another plant are still here,
     *                 {@code round-file-older} where a newer one was taken in before
     */
    public static List<Act> acts(Branch file, String office, Optional<Branch> current,
                                 Collection<Survey> underWay, Predicate<UUID> known) {
        Branch plant = file.branch("plant").orElseThrow();
        Branch before = current.orElse(Branch.EMPTY);
        Branch oldPlant = before.branch("plant").orElse(Branch.EMPTY);
        if (!underWay.isEmpty() && !oldPlant.text("id").equals(plant.text("id"))) {
            throw new Refused(Defect.in(plant.text("id").orElse(""), "round-of-other-plant",
                    oldPlant.text("name").orElse(""), Integer.toString(underWay.size())));
        }
        requireNewer(file, before);
        Branch head = Branch.EMPTY
                .with("plant", noted(kept(plant, oldPlant, underWay), file.branches("notes")))
                .with("forms", with(file.branches("forms"), before.branches("forms"), form ->
                        underWay.stream().anyMatch(survey -> madeWith(survey, form))))
                .with("rounds", with(file.branches("rounds"), before.branches("rounds"), round ->
                        underWay.stream().anyMatch(survey -> survey.round().equals(round.text("id")))))
                .with(FILE, Branch.EMPTY.with("id", file.text("id").orElseThrow())
                        .with("createdAt", file.text("createdAt").orElseThrow())
                        .with("office", office));
        List<Act> acts = new ArrayList<>(List.of(new Act.RegisterTaken(head)));
        for (Branch result : file.branches("lastResults")) {
            Survey survey = new Survey(result);
            if (!known.test(survey.id())) {
                acts.add(new Act.SurveyTaken(survey.id(), result));
            }
        }
        return acts;
    }

    /** Whether a tablet has taken in a round file of that office before. */
    public static boolean trusts(Optional<Branch> current, String office) {
        return current.flatMap(head -> head.branch(FILE)).flatMap(one -> one.text("office"))
                .equals(Optional.of(office));
    }

    /** A plant without what an office noted at its points: that is no part of the register. */
    public static Branch unnoted(Branch plant) {
        return !plant.has("transfers") ? plant : plant.with("transfers", new Node.Series(plant.branches("transfers")
                .stream().map(transfer -> (Node) transfer.without(NOTES).without(ACTIONS)).toList()));
    }

    private static Branch noted(Branch plant, List<Branch> notes) {
        List<Node> transfers = new ArrayList<>();
        for (Branch transfer : unnoted(plant).branches("transfers")) {
            List<Node> words = new ArrayList<>();
            List<Node> actions = new ArrayList<>();
            notes.stream().filter(note -> note.text("transfer").equals(transfer.text("id"))).forEach(note -> {
                if (note.text("kind").equals(Optional.of("action"))) {
                    actions.add(PlannedAction.NONE.with("what", note.text("text").orElse(""))
                            .with("who", note.text("owner").orElse("")).with("by", note.text("due").orElse(""))
                            .with("workOrder", note.text("workOrder").orElse(""))
                            .with("assetId", transfer.text("assetId").orElse("")).document());
                } else {
                    words.add(note.without("transfer"));
                }
            });
            Branch with = words.isEmpty() ? transfer : transfer.with(NOTES, new Node.Series(words));
            transfers.add(actions.isEmpty() ? with : with.with(ACTIONS, new Node.Series(actions)));
        }
        return plant.with("transfers", new Node.Series(transfers));
    }

    private static void requireNewer(Branch file, Branch before) {
        Optional<OffsetDateTime> last = before.branch(FILE).flatMap(one -> one.time("createdAt"));
        OffsetDateTime now = file.time("createdAt").orElseThrow();
        if (last.filter(now::isBefore).isPresent()) {
            throw new Refused(Defect.in(now.toString(), "round-file-older", last.get().toString()));
        }
    }

    private static boolean madeWith(Survey survey, Branch form) {
        return survey.document().branch("form").filter(one -> one.get("id").equals(form.get("id"))
                && one.get("version").equals(form.get("version"))).isPresent();
    }

    /** The office's plant, with what surveys under way need and it no longer names. */
    private static Branch kept(Branch plant, Branch old, Collection<Survey> underWay) {
        Set<String> transfers = Set.copyOf(underWay.stream().map(Survey::transfer).distinct().toList());
        Branch made = keep(plant, old, "transfers", row -> transfers.contains(row.text("id").orElse("")));
        Branch zones = made;
        for (String list : List.of("conveyors", "materials", "areas")) {
            String key = list.substring(0, list.length() - 1);
            made = keep(made, old, list, row -> zones.branches("transfers").stream().anyMatch(zone ->
                    zone.text(key).equals(row.text("id"))) || list.equals("materials") && underWay.stream().anyMatch(
                            survey -> survey.readings().text("materialRunning").equals(row.text("id"))));
        }
        return made;
    }

    private static Branch keep(Branch plant, Branch old, String list, Predicate<Branch> needed) {
        return !plant.has(list) && !old.has(list) ? plant
                : plant.with(list, with(plant.branches(list), old.branches(list), needed));
    }

    /** Rows of the office, and those of the tablet that are needed and whose ids the office does not name. */
    private static Node with(List<Branch> fresh, List<Branch> old, Predicate<Branch> needed) {
        List<Node> rows = new ArrayList<>(fresh);
        old.stream().filter(row -> needed.test(row) && fresh.stream().noneMatch(one -> one.get("id")
                .equals(row.get("id")) && one.get("version").equals(row.get("version")))).forEach(rows::add);
        return new Node.Series(rows);
    }
}
