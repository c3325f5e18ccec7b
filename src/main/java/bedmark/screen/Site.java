package bedmark.screen;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.form.FieldForm;
import bedmark.survey.Assessor;
import bedmark.survey.Register;
import bedmark.survey.Round;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The plant as the store holds it: register, forms, rounds, and the assessor that judges by them.
 *
 * @param document {@code plant}, {@code forms}, {@code rounds}
 * @param shelf    holds the forms, which a round can be walked up to a stop without
 */
public record Site(Branch document, Register register, FormShelf shelf, List<Round> rounds, Assessor assessor) {

    /** The form that a tablet asks with unless a survey names another one. */
    public static final String USUAL_FORM = "loading-zone";

    /**
     * Reads what a store holds.
     *
     * @throws Refused where a register or round can't be read
     */
    public static Site of(Branch document) {
        Register register = new Register(document.branch("plant").orElse(Branch.EMPTY));
        return new Site(document, register, new FormShelf(document.branches("forms")),
                document.branches("rounds").stream().map(Round::new).toList(), new Assessor(register));
    }

    /**
     * Reads and checks the forms; later they are at hand.
     *
     * @throws Refused where one of them can't be read
     */
    void readForms() {
        shelf.forms();
    }

    public Optional<Round> round(String id) {
        return rounds.stream().filter(round -> round.id().equals(id)).findFirst();
    }

    /**
     * The form of that id, else the usual one.
     *
     * @throws Refused where there is none, or one of the forms can't be read
     */
    public FieldForm form(Optional<String> id) {
        Map<String, FieldForm> forms = shelf.forms();
        return id.map(forms::get).or(() -> Optional.ofNullable(forms.get(USUAL_FORM)))
                .or(() -> forms.values().stream().findFirst())
                .orElseThrow(() -> new Refused(Defect.in("/forms", "form-absent")));
    }
}
