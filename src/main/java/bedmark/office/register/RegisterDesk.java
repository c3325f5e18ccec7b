package bedmark.office.register;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.journal.Digest;
import bedmark.json.Canonical;
import bedmark.office.Ids;
import bedmark.office.OfficeStore;
import bedmark.survey.OfficeDeed;
import bedmark.survey.Register;
import java.util.Collection;
import java.util.List;
import java.util.Optional;

/** Changes a plant's register in an office store, whole or not at all. */
public final class RegisterDesk {
    private final OfficeStore store;

    public RegisterDesk(OfficeStore store) {
        this.store = store;
    }

    /**
     * What holds today of the plant that is meant.
     *
     * @param plant its id; the only one where there is none given
     * @param forms the forms of a plant that is new here
     * @throws Refused {@code plant-unclear} where none is named and there is not exactly one
     */
    public Branch head(Optional<String> plant, List<Branch> forms) {
        List<String> known = List.copyOf(store.registers().keySet());
        if (plant.isEmpty() && known.size() != 1) {
            throw new Refused(unclear(known));
        }
        String id = plant.orElseGet(() -> known.get(0));
        return store.head(id).orElseGet(() -> Branch.EMPTY
                .with("plant", Branch.EMPTY.with("id", id).with("name", id).with("transfers",
                        new Node.Series(List.of())))
                .with("forms", new Node.Series(List.copyOf(forms))).with("rounds", new Node.Series(List.of())));
    }

    /**
     * Takes a draft over.
     *
     * @throws Refused {@code draft-unsound} where it has defects, {@code register-changed-since} where the register is
     *                 no longer what the draft was made from, {@code id-too-long}, {@code id-control-character};
     *                 whatever makes a register impossible
     */
    public void take(Draft draft, String why, String person) {
        if (!draft.sound()) {
            throw new Refused(Defect.in("", "draft-unsound", Integer.toString(draft.defects().size())));
        }
        take(draft.head(), why, person, Optional.of(Digest.of(Canonical.bytes(draft.base())).hex()));
    }

    /** Takes a head over that a person changed; nothing happens where it says what holds already. */
    public void take(Branch head, String why, String person) {
        take(head, why, person, Optional.empty());
    }

    private void take(Branch head, String why, String person, Optional<String> base) {
        if (person.isBlank()) {
            throw new Refused(Defect.in("", "person-absent"));
        }
        Branch plant = head.branch("plant").orElse(Branch.EMPTY);
        Register register = new Register(plant);
        Ids.prove(register, List.of());
        String id = register.document().text("id").orElse("");
        if (!store.head(id).equals(Optional.of(head))) {
            store.act(person, new OfficeDeed.RegisterChanged(id, head, why), base);
        }
    }

    /** What to refuse where the plant must be named, by the ids that the office knows. */
    public static Defect unclear(Collection<String> known) {
        return known.isEmpty() ? Defect.in("", "plant-none")
                : Defect.in("", "plant-unclear", String.join(", ", known));
    }
}
