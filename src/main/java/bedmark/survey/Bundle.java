package bedmark.survey;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import java.math.BigDecimal;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.UUID;

/** A bundle: register, forms, rounds and surveys in one document, as it leaves a tablet. */
public record Bundle(Branch document) {

    /** The format's name. */
    public static final String FORMAT = "bedmark.bundle";
    /** The version that this program writes. */
    public static final int VERSION = 1;
    private static final List<String> KEYS = List.of("format", "version", "id", "createdAt", "device", "plant",
            "forms", "rounds", "notice", "surveys");

    /** Refuses what is no bundle of a known version, or holds a survey twice or of an unknown transfer point. */
    public Bundle {
        String format = document.text("format").orElse("");
        if (!FORMAT.equals(format)) {
            throw new Refused(Defect.at(Pointer.of("format"), "format-unknown", format, FORMAT));
        }
        BigDecimal version = document.number("version").orElse(BigDecimal.ZERO);
        if (version.compareTo(BigDecimal.valueOf(VERSION)) != 0) {
            throw new Refused(Defect.at(Pointer.of("version"), "version-unknown", version.toPlainString(),
                    Integer.toString(VERSION)));
        }
        Register register = register(document);
        Set<UUID> seen = new HashSet<>();
        List<Branch> surveys = document.branches("surveys");
        for (int i = 0; i < surveys.size(); i++) {
            Pointer place = Pointer.of("surveys").child(i);
            Branch held = surveys.get(i);
            Survey survey = Refused.below(place, () -> new Survey(held));
            if (!seen.add(survey.id())) {
                throw new Refused(Defect.at(place.child("id"), "survey-twice", survey.id().toString()));
            }
            if (register.transfer(survey.transfer()).isEmpty()) {
                throw new Refused(Defect.at(place.child("transfer"), "transfer-unknown", survey.transfer()));
            }
        }
    }

    private static Register register(Branch document) {
        Branch plant = document.branch("plant")
                .orElseThrow(() -> new Refused(Defect.at(Pointer.of("plant"), "key-absent", "plant")));
        return Refused.below(Pointer.of("plant"), () -> new Register(plant));
    }

    /**
     * Makes a bundle.
     *
     * @param register {@code plant}, {@code forms} and {@code rounds} of the store, and what a later version put
     *                 beside them
     * @param notice   the caution in one sentence
     * @param surveys  the surveys with their assessments
     */
    public static Bundle of(UUID id, OffsetDateTime createdAt, Branch device, Branch register, String notice,
                            List<Branch> surveys) {
        List<Node> items = new ArrayList<>(surveys);
        Branch own = Branch.EMPTY
                .with("format", FORMAT)
                .with("version", Node.number(VERSION))
                .with("id", id.toString())
                .with("createdAt", Node.time(createdAt))
                .with("device", device)
                .with("plant", register.branch("plant").orElse(Branch.EMPTY))
                .with("forms", new Node.Series(register.series("forms")))
                .with("rounds", new Node.Series(register.series("rounds")))
                .with("notice", notice)
                .with("surveys", new Node.Series(items));
        return new Bundle(unknown(register).members().entrySet().stream()
                .reduce(own, (made, member) -> made.with(member.getKey(), member.getValue()), (one, other) -> other));
    }

    /** What stands in the bundle beside the keys that this version knows. */
    Branch unknown() {
        return unknown(document);
    }

    private static Branch unknown(Branch document) {
        return KEYS.stream().reduce(document, Branch::without, (one, other) -> other);
    }

    public Register register() {
        return register(document);
    }

    public List<Branch> forms() {
        return document.branches("forms");
    }

    public List<Round> rounds() {
        return document.branches("rounds").stream().map(Round::new).toList();
    }

    /** The surveys in the bundle's order. */
    public List<Survey> surveys() {
        return document.branches("surveys").stream().map(Survey::new).toList();
    }
}
