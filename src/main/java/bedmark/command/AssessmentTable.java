package bedmark.command;

import bedmark.command.AssessCommand.Judged;
import bedmark.engine.Assessment;
import bedmark.engine.Result;
import bedmark.engine.verdict.Level;
import bedmark.quantity.Dimension;
import bedmark.quantity.Unit;
import bedmark.quantity.UnitSystem;
import bedmark.survey.Assessor.Assessed;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import bedmark.wording.Telling;
import bedmark.wording.Wording;
import java.io.PrintWriter;
import java.util.ArrayList;
import java.util.List;

/**
 * Assessments as CSV (RFC 4180): a row a survey, plain numbers with a decimal point, the UCUM unit in the column's
 * head. A text that a spreadsheet would take for a formula is given an apostrophe.
 */
final class AssessmentTable {

    /** A column of results: what, and in which unit. */
    private record Column(Result result, Unit unit, String head) {
    }

    private final List<Column> columns;

    AssessmentTable(Wording wording) {
        UnitSystem units = wording.units();
        columns = List.of(
                new Column(Result.MATERIAL_DRAG, units.unit(Dimension.FORCE), "materialDrag"),
                new Column(Result.SEAL_DRAG, units.unit(Dimension.FORCE), "sealDrag"),
                new Column(Result.SKIRT_DRAG, units.unit(Dimension.FORCE), "skirtDrag"),
                new Column(Result.LOADING_FORCE, units.unit(Dimension.FORCE), "loadingForce"),
                new Column(Result.SKIRT_POWER, units.unit(Dimension.POWER), "skirtPower"),
                new Column(Result.DRIVE_POWER, units.unit(Dimension.POWER), "drivePower"),
                new Column(Result.DRIVE_SHARE, Unit.PERCENT, "driveShare"),
                new Column(Result.IMPLIED_THROUGHPUT, units.unit(Dimension.MASS_FLOW), "impliedThroughput"),
                new Column(Result.FILL, Unit.PERCENT, "fill"),
                new Column(Result.BED_SPEED_RATIO, Unit.PERCENT, "bedSpeedRatio"),
                new Column(Result.DESIGN_DEPTH, units.smallLength(), "designDepth"),
                new Column(Result.REFERENCE_DEPTH, units.smallLength(), "referenceDepth"));
    }

    void print(List<Judged> judged, String notice, PrintWriter out) {
        List<String> head = new ArrayList<>(List.of("plant", "round", "transfer", "tag", "survey", "revision",
                "completedAt", "inspectionStatus", "level", "levelAtDesignFeed", "leadingFinding"));
        columns.forEach(column -> {
            head.add(column.head() + " [" + column.unit().code() + "]");
            head.add(column.head() + " u [" + column.unit().code() + "]");
        });
        head.add("energy [Wh/a]");
        head.add("notice");
        row(head, out);
        for (Judged one : judged) {
            Register register = one.bundle().register();
            one.surveys().forEach(assessed -> row(cells(assessed, register, notice), out));
        }
    }

    private List<String> cells(Assessed assessed, Register register, String notice) {
        Survey survey = assessed.survey();
        Assessment assessment = assessed.assessment();
        List<String> cells = new ArrayList<>(List.of(register.name(), survey.round().orElse(""), survey.transfer(),
                register.transfer(survey.transfer()).map(Register.Transfer::tag).orElse(""), survey.id().toString(),
                Integer.toString(survey.revision()), survey.completedAt().map(Object::toString).orElse(""),
                survey.inspectionStatus().code(), assessment.level().code(),
                assessment.levelAtDesignFeed().map(Level::code).orElse(""),
                Telling.leading(assessment).map(finding -> finding.code()).orElse("")));
        for (Column column : columns) {
            cells.add(assessment.get(column.result())
                    .map(found -> Double.toString(column.unit().fromSi(found.value()))).orElse(""));
            cells.add(assessment.get(column.result())
                    .map(found -> Double.toString(column.unit().fromSi(found.standardUncertainty()))).orElse(""));
        }
        cells.add(assessment.get(Result.ENERGY).map(found -> Double.toString(found.value())).orElse(""));
        cells.add(notice);
        return cells;
    }

    private static void row(List<String> cells, PrintWriter out) {
        out.print(String.join(",", cells.stream().map(AssessmentTable::cell).toList()) + "\r\n");
    }

    private static String cell(String text) {
        boolean number = text.matches("-?[0-9.]+(E-?[0-9]+)?");
        String safe = !number && text.matches("(?s)[=+@\\-\\t\\r].*") ? "'" + text : text;
        return safe.matches("(?s).*[\",\\r\\n].*") ? "\"" + safe.replace("\"", "\"\"") + "\"" : safe;
    }
}
