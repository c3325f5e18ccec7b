package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.engine.Assessment;
import bedmark.form.Field;
import bedmark.form.FieldForm;
import bedmark.form.Judgement;
import bedmark.form.StationsField;
import bedmark.survey.Register;
import java.util.Comparator;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Judges the answers of one transfer point by its form, by what the last survey found there, and, where that holds no
 * such reading, by what the register expects.
 */
final class Judging {
    private static final String SLIP = "ten-times-off-last";
    private static final String SLIP_OF_REGISTER = "ten-times-off-register";
    private static final List<String> REGISTERED = List.of("skirtSpacing", "skirtHeight");

    private final FieldForm form;
    private final Branch last;
    private final Branch expected;
    /** What was found last: each cell of a table asks for its whole field, and a key changes few answers. */
    private final Map<Field, Found> found = new IdentityHashMap<>();

    /** What was found of a field in a document. */
    private record Found(Branch document, List<Judgement> judgements) {
    }

    /** What keeps a survey from being completed, and the place to mend it at. */
    record Obstacle(Pointer where, Note note) {
    }

    Judging(ZoneSetting setting) {
        this.form = setting.form();
        this.last = setting.last().orElse(Branch.EMPTY);
        this.expected = expected(setting.register(), setting.transfer());
    }

    /** The readings that the register lets one expect; a slip is as plain against them as against a past reading. */
    private static Branch expected(Register register, Register.Transfer transfer) {
        Branch known = transfer.document();
        Branch readings = Branch.EMPTY;
        for (String key : REGISTERED) {
            readings = with(readings, key, known.get(key));
        }
        readings = with(readings, "loadingZoneLength", known.get("designZoneLength"));
        readings = with(readings, "throughput", known.get("designThroughput"));
        readings = with(readings, "beltSpeed", register.conveyorOf(transfer).document().get("designSpeed"));
        readings = with(readings, StationsField.KEY, known.get("designBedDepth").map(depth -> new Node.Series(List.of(
                Branch.EMPTY.with("position", known.get("designZoneLength").orElse(depth)).with("depth", depth)))));
        return Branch.EMPTY.with("readings", readings);
    }

    private static Branch with(Branch readings, String key, Optional<? extends Node> value) {
        return value.map(node -> readings.with(key, node)).orElse(readings);
    }

    /** What there is to say about the answer of a cell: an impossibility before a doubt. */
    Optional<Note> first(Branch document, Slot slot) {
        return judgements(document, slot.field()).stream()
                .filter(judgement -> judgement.where().holds(slot.where()) || slot.where().holds(judgement.where()))
                .min(Comparator.comparing(judgement -> judgement instanceof Judgement.Doubt))
                .map(judgement -> new Note.Judged(judgement, slot.field()));
    }

    private List<Judgement> judgements(Branch document, Field field) {
        Found before = found.get(field);
        if (before != null && before.document == document) {
            return before.judgements;
        }
        List<Judgement> judgements = before != null && field.judgesAlike(before.document, document)
                ? before.judgements : judge(document, field);
        found.put(field, new Found(document, judgements));
        return judgements;
    }

    private List<Judgement> judge(Branch document, Field field) {
        List<Judgement> byLast = field.judge(document, last);
        return byLast.isEmpty() && field.answer(last).isEmpty()
                ? field.judge(document, expected).stream().map(Judging::byRegister).toList() : byLast;
    }

    private static Judgement byRegister(Judgement judgement) {
        return judgement.code().equals(SLIP)
                ? new Judgement.Doubt(judgement.where(), SLIP_OF_REGISTER, judgement.details()) : judgement;
    }

    /** What is impossible about the answer of a cell: it stands until it is mended. */
    Optional<Note> impossible(Branch document, Slot slot) {
        return first(document, slot).filter(note -> !note.isDoubt());
    }

    /** The first thing that keeps the survey from being completed. */
    Optional<Obstacle> obstacle(Branch document, Optional<Assessment> assessment) {
        Optional<Obstacle> refused = form.refusals(document).stream().findFirst()
                .flatMap(refusal -> form.fieldAt(refusal.where()).map(field ->
                        new Obstacle(refusal.where(), new Note.Judged(refusal, field))));
        return refused.or(() -> form.gaps(document).stream().findFirst()
                        .map(field -> new Obstacle(field.where(), new Note.Gap(field))))
                .or(() -> engineGap(assessment));
    }

    /** A reading that the verdict waits for; what the register lacks the person here cannot give. */
    private Optional<Obstacle> engineGap(Optional<Assessment> known) {
        return known.stream().flatMap(assessment -> assessment.missingRequired().stream()).map(Pointer::parse)
                .flatMap(where -> form.fieldAt(where).stream()
                        .map(field -> new Obstacle(where, new Note.Gap(field)))).findFirst();
    }
}
