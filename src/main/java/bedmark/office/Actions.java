package bedmark.office;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.survey.OfficeDeed;
import bedmark.survey.Register;
import bedmark.survey.merge.ZoneId;
import java.time.LocalDate;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;
import java.util.stream.Collectors;

/** What is to be done, for the tablets and for the site's maintenance system. */
public final class Actions {
    private static final List<String> HEAD = List.of("action", "plant", "transfer", "tag", "assetId",
            "conveyorAssetId", "finding", "text", "owner", "due", "workOrder", "done");
    private static final Comparator<OfficeDeed.ActionSet> ORDER = Comparator
            .<OfficeDeed.ActionSet, Boolean>comparing(OfficeDeed.ActionSet::done)
            .thenComparing(action -> action.due().orElse(LocalDate.MAX)).thenComparing(OfficeDeed.ActionSet::zone)
            .thenComparing(OfficeDeed.ActionSet::action);

    private final OfficeStore store;

    public Actions(OfficeStore store) {
        this.store = store;
    }

    /** Every action as it stands: open ones first, the most urgent at the top. */
    public List<OfficeDeed.ActionSet> all() {
        return store.actions().stream().sorted(ORDER).toList();
    }

    /** Those of one zone that are not done. */
    public List<OfficeDeed.ActionSet> open(ZoneId zone) {
        return all().stream().filter(action -> action.zone().equals(zone) && !action.done()).toList();
    }

    /**
     * Writes a new action down.
     *
     * @param finding the rule's code that it is about; may be empty
     * @throws Refused {@code action-text-absent}, {@code person-absent}
     */
    public UUID add(ZoneId zone, String finding, String text, String owner, Optional<LocalDate> due,
                    String workOrder, String person) {
        UUID id = UUID.randomUUID();
        set(new OfficeDeed.ActionSet(id, zone, finding, text.strip(), owner.strip(), due, workOrder.strip(), false),
                person);
        return id;
    }

    /** Changes an action. */
    public void set(OfficeDeed.ActionSet action, String person) {
        if (action.text().isBlank()) {
            throw new Refused(Defect.in(action.zone().transfer(), "action-text-absent"));
        }
        if (person.isBlank()) {
            throw new Refused(Defect.in(action.zone().transfer(), "person-absent"));
        }
        store.act(person, action);
    }

    /**
     * The action with that id, or the start of it that no other one has.
     *
     * @throws Refused {@code action-unknown}
     */
    public OfficeDeed.ActionSet named(String start) {
        List<OfficeDeed.ActionSet> found = store.actions().stream()
                .filter(action -> !start.isBlank() && action.action().toString().startsWith(start)).toList();
        if (found.size() != 1) {
            throw new Refused(Defect.in(start, "action-unknown"));
        }
        return found.get(0);
    }

    /** All actions as CSV for the site's maintenance system. */
    public String csv() {
        Map<String, Register> registers = store.registers();
        return all().stream().map(action -> Csv.row(cells(action, Optional.ofNullable(
                registers.get(action.zone().plant()))))).collect(Collectors.joining("", Csv.row(HEAD), ""));
    }

    private static List<String> cells(OfficeDeed.ActionSet action, Optional<Register> register) {
        Optional<Register.Transfer> transfer = register.flatMap(held -> held.transfer(action.zone().transfer()));
        return List.of(action.action().toString(), action.zone().plant(), action.zone().transfer(),
                transfer.map(Register.Transfer::tag).orElse(""),
                transfer.flatMap(one -> one.document().text("assetId")).orElse(""),
                transfer.flatMap(one -> register.get().conveyorOf(one).document().text("assetId")).orElse(""),
                action.finding(), action.text(), action.owner(), action.due().map(LocalDate::toString).orElse(""),
                action.workOrder(), Boolean.toString(action.done()));
    }
}
