package bedmark.screen;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.form.FieldForm;
import bedmark.json.FormReader;
import bedmark.survey.Assessor;
import bedmark.survey.Register;
import bedmark.survey.Round;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The plant as the store holds it: register, forms, rounds, and the assessor that judges by them.
 *
 * @param document {@code plant}, {@code forms}, {@code rounds}
 */
public record Site(Branch document, Register register, Map<String, FieldForm> forms, List<Round> rounds,
                   Assessor assessor) {

    /** The form that a tablet asks with unless a survey names another one. */
    public static final String USUAL_FORM = "loading-zone";

    /**
     * Reads what a store holds.
     *
     * @throws Refused where a register, form or round can't be read
     */
    public static Site of(Branch document) {
        Register register = new Register(document.branch("plant").orElse(Branch.EMPTY));
        Map<String, FieldForm> forms = new LinkedHashMap<>();
        for (Branch form : document.branches("forms")) {
            FieldForm read = FormReader.read(form);
            forms.put(read.id(), read);
        }
        return new Site(document, register, forms, document.branches("rounds").stream().map(Round::new).toList(),
                new Assessor(register));
    }

    public Optional<Round> round(String id) {
        return rounds.stream().filter(round -> round.id().equals(id)).findFirst();
    }

    /** The form of that id, else the usual one. */
    public FieldForm form(Optional<String> id) {
        return id.map(forms::get).or(() -> Optional.ofNullable(forms.get(USUAL_FORM)))
                .or(() -> forms.values().stream().findFirst())
                .orElseThrow(() -> new Refused(Defect.in("/forms", "form-absent")));
    }
}
