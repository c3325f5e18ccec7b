package bedmark.office;

import bedmark.engine.Result;
import bedmark.engine.verdict.Level;
import bedmark.survey.InspectionStatus;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import bedmark.survey.merge.Copy;
import java.math.BigDecimal;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.Collectors;

/**
 * A column of the flat table: one row a content of a survey.
 *
 * @param type {@code text}, {@code number}, {@code integer}, {@code flag} or {@code time} (UTC, RFC 3339)
 * @param unit UCUM code; {@code 1} for a share; empty where there is none
 * @param says what it says, in English
 */
record FlatColumn(String name, String type, String unit, String says, Function<FlatRow, String> cell) {

    /** What a row is made of; a survey that can't be judged has no judgement. */
    record FlatRow(Copy copy, boolean counts, Survey survey, Register register,
                   Optional<JudgedZone> judged) {
        Optional<Register.Transfer> transfer() {
            return register.transfer(copy.zone().transfer());
        }
    }

    static final List<FlatColumn> ALL = all();

    private static List<FlatColumn> all() {
        List<FlatColumn> columns = new ArrayList<>(List.of(
                text("plant", "plant's id", row -> row.copy().zone().plant()),
                text("transfer", "transfer point's id", row -> row.copy().zone().transfer()),
                text("tag", "transfer point's tag in the register that the survey was made with", row ->
                        row.transfer().map(Register.Transfer::tag).orElse("")),
                text("asset_id", "its number in the site's maintenance system", row ->
                        row.transfer().flatMap(one -> one.document().text("assetId")).orElse("")),
                text("area", "area's id", row -> row.transfer().flatMap(Register.Transfer::area).orElse("")),
                text("conveyor", "receiving conveyor's id", row -> row.copy().origin().conveyor()),
                text("material", "material's id that the register expects", row ->
                        row.transfer().flatMap(Register.Transfer::material).orElse("")),
                text("material_running", "material's id that was running, where the survey names another", row ->
                        row.survey().readings().text("materialRunning").orElse("")),
                text("round", "round's id", row -> row.copy().round()),
                text("survey", "survey's id", row -> row.copy().id().toString()),
                new FlatColumn("revision", "integer", "", "1 for a survey, counting its corrections from there", row ->
                        Integer.toString(row.copy().revision())),
                text("supersedes", "id of the survey that this one corrects", row ->
                        row.copy().supersedes().map(Object::toString).orElse("")),
                text("content", "SHA-256 of the survey's content", row -> row.copy().digest()),
                flag("counts", "whether it counts: nothing supersedes it and nobody set it aside", FlatRow::counts),
                text("register", "SHA-256 of the register that it was made with and is judged by", row ->
                        row.copy().origin().register()),
                text("inspector", "who surveyed", row -> row.survey().inspector().orElse("")),
                new FlatColumn("completed_at", "time", "", "when it was completed, by the tablet's clock", row ->
                        row.copy().finished().isPresent()
                                ? Instant.ofEpochMilli(row.copy().finished().getAsLong()).toString() : ""),
                flag("clock_wrong", "whether the tablet's clock can't have been right", row ->
                        row.copy().clockWrong()),
                text("inspection_status", "inspected, not-inspected, not-accessible or not-applicable", row ->
                        row.survey().inspectionStatus().code()),
                text("status_reason", "why it was not inspected", row ->
                        row.survey().document().text("statusReason").orElse("")),
                text("level", "verdict: within, near, incomplete, undecided or overloaded", row ->
                        judged(row).map(one -> one.assessment().level().code()).orElse("")),
                text("level_at_design_feed", "the same at design throughput", row -> judged(row).flatMap(one ->
                        one.assessment().levelAtDesignFeed()).map(Level::code).orElse("")),
                text("findings", "rules that are not within their limits, each with its level", row ->
                        judged(row).map(one -> FindingLine.of(one.assessment()).stream().map(line ->
                                line.rule().code() + ":" + line.level().code())
                                .collect(Collectors.joining(" "))).orElse("")),
                text("method", "method of the material drag in use", row -> judged(row).flatMap(one ->
                        one.assessment().method()).map(method -> method.code()).orElse(""))));
        for (Result result : Result.values()) {
            columns.add(new FlatColumn(result.key(), "number", unit(result), "see the assessment", row ->
                    number(row, result, false)));
            columns.add(new FlatColumn(result.key() + "_u", "number", unit(result),
                    "standard uncertainty of " + result.key(), row -> number(row, result, true)));
        }
        return List.copyOf(columns);
    }

    private static FlatColumn text(String name, String says, Function<FlatRow, String> cell) {
        return new FlatColumn(name, "text", "", says, cell);
    }

    private static FlatColumn flag(String name, String says, Function<FlatRow, Boolean> cell) {
        return new FlatColumn(name, "flag", "", says, row -> Boolean.toString(cell.apply(row)));
    }

    /** What an inspection comes to; nothing where there was none, or it can't be judged. */
    static Optional<JudgedZone> judged(FlatRow row) {
        return row.judged().filter(one -> row.survey().inspectionStatus() == InspectionStatus.INSPECTED);
    }

    private static String number(FlatRow row, Result result, boolean uncertainty) {
        return judged(row).flatMap(one -> one.assessment().get(result)).map(found ->
                BigDecimal.valueOf(uncertainty ? found.standardUncertainty() : found.value()).toPlainString())
                .orElse("");
    }

    private static String unit(Result result) {
        return switch (result) {
            case BELT_SPEED -> "m/s";
            case MEAN_SQUARE_DEPTH, BED_AREA -> "m2";
            case MEAN_DEPTH, DEEPEST_DEPTH, DESIGN_DEPTH, REFERENCE_DEPTH, ACCELERATION_LENGTH -> "m";
            case MATERIAL_DRAG, SEAL_DRAG, SKIRT_DRAG, LOADING_FORCE -> "N";
            case SKIRT_POWER, DRIVE_POWER -> "W";
            case IMPLIED_THROUGHPUT -> "kg/s";
            case ENERGY -> "W.h/a";
            case CO2 -> "kg/a";
            case COST -> "";
            case SQUARE_OF_MEAN_SHARE, DRIVE_SHARE, RUNNING_SHARE, FILL, BED_SPEED_RATIO -> "1";
        };
    }
}
