package bedmark.office;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.index.office.CopyRow;
import bedmark.index.office.PlantRow;
import bedmark.index.office.ZoneNames;
import bedmark.journal.Digest;
import bedmark.json.Canonical;
import bedmark.survey.Bundle;
import bedmark.survey.InspectionStatus;
import bedmark.survey.Register;
import bedmark.survey.RoundIntake;
import bedmark.survey.Survey;
import bedmark.survey.merge.Copy;
import bedmark.survey.merge.Origin;
import bedmark.survey.merge.ZoneId;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;
import java.util.stream.Collectors;

/**
 * What a bundle brings, ready to be taken in.
 *
 * @param plant    the register, forms and rounds that the tablet had
 * @param register the plant's register alone
 * @param copies   its surveys
 */
record Intake(PlantRow plant, byte[] register, List<CopyRow> copies) {
    /** What the embedded database holds in one column. */
    private static final int LONGEST = 1_000_000;

    /**
     * Reads a bundle.
     *
     * @param pack the digest of the pack that holds it
     * @throws Refused {@code survey-too-large}
     */
    static Intake of(Bundle bundle, String pack) {
        Register register = bundle.register();
        byte[] registerText = registerText(register);
        byte[] headText = Canonical.bytes(head(bundle.document()));
        String registerDigest = Digest.of(registerText).hex();
        long createdAt = bundle.document().time("createdAt").map(Intake::millis)
                .orElseGet(() -> bundle.surveys().stream().flatMap(survey -> survey.completedAt().stream())
                        .mapToLong(Intake::millis).max().orElse(0));
        List<CopyRow> copies = new ArrayList<>();
        for (Survey survey : bundle.surveys()) {
            copies.add(copy(survey, register, registerDigest, createdAt, pack));
        }
        return new Intake(new PlantRow(plantId(register), createdAt, false, Digest.of(headText).hex(), registerDigest,
                headText), registerText, copies);
    }

    /** How much it holds in memory, as far as that grows with its surveys. */
    long bytes() {
        return register.length + copies.stream().mapToLong(row -> row.content().length).sum();
    }

    Set<String> digests() {
        return copies.stream().map(row -> row.copy().digest()).collect(Collectors.toSet());
    }

    Set<ZoneId> zones() {
        return copies.stream().map(row -> row.copy().zone()).collect(Collectors.toSet());
    }

    /** The part of a bundle that holds register, forms and rounds. */
    private static Branch head(Branch bundle) {
        Branch head = Branch.EMPTY.with("plant", RoundIntake.unnoted(bundle.branch("plant").orElse(Branch.EMPTY)));
        for (String key : List.of("forms", "rounds")) {
            Optional<Node> part = bundle.get(key);
            head = part.isPresent() ? head.with(key, part.get()) : head;
        }
        return head;
    }

    /** A plant's row. */
    static PlantRow plant(Branch head, long made, boolean own) {
        Branch plant = RoundIntake.unnoted(head.branch("plant").orElse(Branch.EMPTY));
        byte[] text = Canonical.bytes(head.with("plant", plant));
        return new PlantRow(plant.text("id").orElse(""), made, own, Digest.of(text).hex(),
                Digest.of(Canonical.bytes(plant)).hex(), text);
    }

    private static CopyRow copy(Survey survey, Register register, String registerDigest, long createdAt,
                                String pack) {
        // The assessment is computed anew here; a later version of the program may find another.
        byte[] text = Canonical.bytes(survey.document().without("assessment"));
        if (text.length > LONGEST) {
            throw new Refused(Defect.in(survey.id().toString(), "survey-too-large", Integer.toString(text.length),
                    Integer.toString(LONGEST)));
        }
        String conveyor = register.transfer(survey.transfer()).map(Register.Transfer::conveyor).orElse("");
        OptionalLong completed = moment(survey.completedAt());
        InspectionStatus status = survey.inspectionStatus();
        boolean underWay = completed.isEmpty() && status == InspectionStatus.INSPECTED;
        Copy copy = new Copy(Digest.of(text).hex(), survey.id(), survey.revision(), survey.supersedes(),
                new ZoneId(plantId(register), survey.transfer()), survey.round().orElse(""),
                underWay ? InspectionStatus.NOT_INSPECTED : status, moment(survey.startedAt()), completed,
                new Origin(createdAt, registerDigest, conveyor), OptionalLong.empty());
        return new CopyRow(copy, pack, text);
    }

    static byte[] registerText(Register register) {
        return Canonical.bytes(RoundIntake.unnoted(register.document()));
    }

    static String plantId(Register register) {
        return register.document().text("id").orElse("");
    }

    private static OptionalLong moment(Optional<OffsetDateTime> at) {
        return at.isPresent() ? OptionalLong.of(millis(at.get())) : OptionalLong.empty();
    }

    static long millis(OffsetDateTime at) {
        return at.toInstant().toEpochMilli();
    }

    /** How people know the zones of a register. */
    static List<ZoneNames> names(Register register) {
        String plant = plantId(register);
        Map<String, String> areas = register.areaNames();
        return register.transfers().values().stream().map(transfer -> new ZoneNames(new ZoneId(plant, transfer.id()),
                register.name(), transfer.area().map(id -> areas.getOrDefault(id, id)).orElse(""),
                transfer.conveyor(), register.conveyorOf(transfer).tag(), transfer.tag(),
                transfer.document().text("assetId").orElse(""),
                transfer.material().map(id -> register.materials().get(id).name()).orElse(""), true)).toList();
    }
}
