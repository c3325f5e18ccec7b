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
 * The plant as the store holds it: register, forms, rounds, and the assessor that judges by them. Up to a stop a round
 * can be walked without forms and assessor.
 */
public final class Site {

    /** The form that a tablet asks with unless a survey names another one. */
    public static final String USUAL_FORM = "loading-zone";

    private final Register register;
    private final List<Round> rounds;
    private final Later<Map<String, FieldForm>> forms;
    private final Later<Assessor> assessor;

    private Site(Branch document) {
        this.register = new Register(document.branch("plant").orElse(Branch.EMPTY));
        this.rounds = document.branches("rounds").stream().map(Round::new).toList();
        List<Branch> written = List.copyOf(document.branches("forms"));
        this.forms = new Later<>(() -> read(written));
        this.assessor = new Later<>(() -> new Assessor(register));
    }

    /**
     * Reads what a store holds.
     *
     * @throws Refused where a register or round can't be read
     */
    public static Site of(Branch document) {
        return new Site(document);
    }

    private static Map<String, FieldForm> read(List<Branch> written) {
        Map<String, FieldForm> forms = new LinkedHashMap<>();
        for (Branch each : written) {
            FieldForm form = FormReader.read(each);
            forms.put(form.id(), form);
        }
        return forms;
    }

    /**
     * Reads and checks what a stop is surveyed with; later it is at hand.
     *
     * @throws Refused where a form or the site's own settings can't be read
     */
    void readWhole() {
        forms.get();
        assessor.get();
    }

    public Register register() {
        return register;
    }

    public List<Round> rounds() {
        return rounds;
    }

    /**
     * Judges by the register.
     *
     * @throws Refused where the site's own settings can't be read
     */
    public Assessor assessor() {
        return assessor.get();
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
        Map<String, FieldForm> known = forms.get();
        return id.map(known::get).or(() -> Optional.ofNullable(known.get(USUAL_FORM)))
                .or(() -> known.values().stream().findFirst())
                .orElseThrow(() -> new Refused(Defect.in("/forms", "form-absent")));
    }
}
