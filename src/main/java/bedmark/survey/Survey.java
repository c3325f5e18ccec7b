package bedmark.survey;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import java.math.BigDecimal;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.UUID;
import java.util.stream.Collectors;

/**
 * One survey of one transfer point: a typed view over its document (see the data page), which keeps every key that
 * this version does not know.
 */
public record Survey(Branch document) {

    /** Where the readings lie in a survey. */
    public static final Pointer READINGS = Pointer.of("readings");
    /** Where the observations lie in a survey. */
    public static final Pointer OBSERVATIONS = Pointer.of("observations");

    public Survey {
        document.uuid("id").orElseThrow(() -> absent("id"));
        document.text("transfer").orElseThrow(() -> absent("transfer"));
    }

    /** A new, empty survey of a transfer point. */
    public static Survey begin(UUID id, String round, String transfer, String formId, int formVersion,
                               String inspector, OffsetDateTime startedAt) {
        return new Survey(Branch.EMPTY
                .with("id", id.toString())
                .with("revision", Node.number(1))
                .with("round", round)
                .with("transfer", transfer)
                .with("form", Branch.EMPTY.with("id", formId)
                        .with("version", Node.number(formVersion)))
                .with("inspector", inspector)
                .with("startedAt", Node.time(startedAt))
                .with("inspectionStatus", InspectionStatus.INSPECTED.code())
                .with("readings", Branch.EMPTY)
                .with("observations", Branch.EMPTY));
    }

    public UUID id() {
        return document.uuid("id").orElseThrow();
    }

    /** Counts corrections from 1. */
    public int revision() {
        return document.number("revision").map(BigDecimal::intValueExact).orElse(1);
    }

    /** The surveys that later revisions among them replace. */
    public static Set<UUID> superseded(List<Survey> surveys) {
        return surveys.stream().flatMap(survey -> survey.supersedes().stream()).collect(Collectors.toSet());
    }

    /** The survey that this one corrects. */
    public Optional<UUID> supersedes() {
        return document.uuid("supersedes");
    }

    public Optional<String> round() {
        return document.text("round");
    }

    /** The id of the transfer point in the register. */
    public String transfer() {
        return document.text("transfer").orElseThrow();
    }

    public Optional<String> inspector() {
        return document.text("inspector");
    }

    public Optional<OffsetDateTime> startedAt() {
        return document.time("startedAt");
    }

    public Optional<OffsetDateTime> completedAt() {
        return document.time("completedAt");
    }

    /** The inspection status; a survey that names none was inspected. */
    public InspectionStatus inspectionStatus() {
        return document.text("inspectionStatus").map(word -> InspectionStatus.ofCode(word).orElseThrow(() ->
                new Refused(Defect.at(Pointer.of("inspectionStatus"), "word-unknown", word))))
                .orElse(InspectionStatus.INSPECTED);
    }

    public Branch readings() {
        return document.branch("readings").orElse(Branch.EMPTY);
    }

    public Branch observations() {
        return document.branch("observations").orElse(Branch.EMPTY);
    }

    public List<Branch> photos() {
        return document.branches("photos");
    }

    private static Refused absent(String key) {
        return new Refused(Defect.at(Pointer.of(key), "key-absent", key));
    }
}
