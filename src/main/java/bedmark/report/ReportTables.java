package bedmark.report;

import bedmark.engine.Assessment;
import bedmark.engine.Result;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Remedy;
import bedmark.office.JudgedZone;
import bedmark.office.Place;
import bedmark.office.RankedZone;
import bedmark.quantity.Dimension;
import bedmark.quantity.Unit;
import bedmark.quantity.UnitSystem;
import bedmark.report.table.Cell;
import bedmark.report.table.Column;
import bedmark.report.table.Table;
import bedmark.survey.InspectionStatus;
import bedmark.survey.Survey;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/** The report's numbers as tables: a row a zone, a finding, a remedy, a conveyor, a zone that was not inspected. */
public final class ReportTables {
    private static final String KILOWATT_HOURS = "kW.h/a";
    private static final double KILO = 1000;

    private final ReportContent content;
    private final ReportWords words;
    private final UnitSystem units;

    public ReportTables(ReportContent content, ReportOptions options) {
        this.content = content;
        words = new ReportWords(options.wording());
        units = options.wording().units();
    }

    /** All of them. */
    public List<Table<?>> all() {
        return List.of(zones(), findings(), remedies(), energy(), notInspected());
    }

    /** A zone and where it stands in the list, from 1. */
    record RankedRow(int rank, ReportZone zone) {
    }

    /** A row a zone, worst first. */
    public Table<?> zones() {
        Columns<RankedRow> columns = new Columns<>();
        columns.number("rank", "", row -> Cell.number(row.rank()));
        names(columns, RankedRow::zone);
        columns.code("place", row -> Cell.text(ranked(row).place().code()));
        columns.code("level", row -> Cell.text(assessment(row.zone()).map(one -> one.level().code())));
        columns.code("levelAtDesignFeed", row -> Cell.text(assessment(row.zone())
                .flatMap(Assessment::levelAtDesignFeed).map(Level::code)));
        columns.code("levelByToday", row -> Cell.text(today(row.zone()).map(one -> one.level().code())));
        columns.code("levelAtDesignFeedByToday", row -> Cell.text(today(row.zone())
                .flatMap(Assessment::levelAtDesignFeed).map(Level::code)));
        columns.text("because", row -> Cell.text(words.why(row.zone())));
        columns.add("surveyedAt", "time", "", row -> Cell.moment(row.zone().examined().flatMap(Examined::at)));
        columns.number("ageDays", "d", row -> ranked(row).age().map(age -> Cell.number(age.toDays()))
                .orElse(Cell.EMPTY));
        columns.text("inspector", row -> Cell.text(survey(row.zone()).flatMap(Survey::inspector)));
        columns.text("round", row -> Cell.text(survey(row.zone()).flatMap(Survey::round)));
        columns.number("revision", "", row -> survey(row.zone()).map(one -> Cell.number(one.revision()))
                .orElse(Cell.EMPTY));
        result(columns, "beltSpeed", Result.BELT_SPEED, units.unit(Dimension.SPEED));
        result(columns, "meanDepth", Result.MEAN_DEPTH, units.smallLength());
        result(columns, "deepestDepth", Result.DEEPEST_DEPTH, units.smallLength());
        result(columns, "referenceDepth", Result.REFERENCE_DEPTH, units.smallLength());
        result(columns, "materialDrag", Result.MATERIAL_DRAG, units.unit(Dimension.FORCE));
        result(columns, "sealDrag", Result.SEAL_DRAG, units.unit(Dimension.FORCE));
        result(columns, "skirtDrag", Result.SKIRT_DRAG, units.unit(Dimension.FORCE));
        result(columns, "loadingForce", Result.LOADING_FORCE, units.unit(Dimension.FORCE));
        result(columns, "skirtPower", Result.SKIRT_POWER, units.unit(Dimension.POWER));
        result(columns, "drivePower", Result.DRIVE_POWER, units.unit(Dimension.POWER));
        result(columns, "driveShare", Result.DRIVE_SHARE, Unit.PERCENT);
        result(columns, "impliedThroughput", Result.IMPLIED_THROUGHPUT, units.unit(Dimension.MASS_FLOW));
        result(columns, "fill", Result.FILL, Unit.PERCENT);
        result(columns, "bedSpeedRatio", Result.BED_SPEED_RATIO, Unit.PERCENT);
        columns.number("energy", KILOWATT_HOURS, row -> thousandth(ranked(row).energyWh()));
        columns.code("energyIs", row -> Cell.text(ranked(row).energyKind()));
        columns.number("cost", "", row -> Cell.number(ranked(row).cost()));
        columns.code("currency", row -> Cell.text(ranked(row).currency()));
        columns.number("co2", "kg/a", row -> Cell.number(ranked(row).co2()));
        columns.code("remedy", row -> Cell.text(ranked(row).saving().map(saving -> saving.remedy())));
        columns.number("saving", KILOWATT_HOURS, row -> ranked(row).saving()
                .map(saving -> thousandth(OptionalDouble.of(saving.wh()))).orElse(Cell.EMPTY));
        columns.number("clashes", "", row -> Cell.number(ranked(row).clashes()));
        columns.flag("clockWrong", row -> new Cell.Flag(ranked(row).clockWrong()));
        return columns.table("zones", IntStream.range(0, content.zones().size())
                .mapToObj(i -> new RankedRow(i + 1, content.zones().get(i))).toList());
    }

    /** A finding of a zone, today or at design feed. */
    record FindingRow(ReportZone zone, Finding finding, boolean atDesign) {
        /** The same rule at the same feed, by the register that holds today. */
        Optional<Finding> byToday() {
            return today(zone).flatMap(one -> (atDesign ? one.findingsAtDesign() : one.findings()).stream()
                    .filter(other -> other.rule() == finding.rule()).findFirst());
        }
    }

    private Table<?> findings() {
        Columns<FindingRow> columns = new Columns<>();
        names(columns, FindingRow::zone);
        columns.flag("atDesignFeed", row -> new Cell.Flag(row.atDesign()));
        columns.code("rule", row -> Cell.text(row.finding().code()));
        columns.text("ruleName", row -> Cell.text(words.text("rule." + row.finding().code())));
        columns.code("level", row -> Cell.text(row.finding().level().code()));
        columns.code("levelByToday", row -> Cell.text(row.byToday().map(one -> one.level().code())));
        columns.number("observed", "", row -> Cell.number(OptionalDouble.of(row.finding().observed())));
        columns.number("observedU", "", row ->
                Cell.number(OptionalDouble.of(row.finding().standardUncertainty())));
        columns.code("unit", row -> Cell.text(row.finding().unit()));
        columns.number("near", "", row -> Cell.number(row.finding().near()));
        columns.number("overloaded", "", row -> Cell.number(row.finding().overloaded()));
        columns.number("probabilityNear", "1", row -> Cell.number(row.finding().probabilityNear()));
        columns.number("probabilityOverloaded", "1", row -> Cell.number(row.finding().probabilityOverloaded()));
        columns.code("source", row -> Cell.text(row.finding().source()));
        columns.flag("assumption", row -> new Cell.Flag(row.finding().assumption()));
        columns.text("action", row -> Cell.text(row.finding().level() == Level.WITHIN ? ""
                : words.text("action." + row.finding().action())));
        columns.code("answer", row -> Cell.text(row.zone().ranked().answers().stream()
                .filter(one -> one.rule() == row.finding().rule()).map(one -> one.answer().code()).findFirst()));
        return columns.table("findings", content.examined().stream().flatMap(zone -> {
            Assessment assessment = assessment(zone).orElseThrow();
            return Stream.concat(assessment.findings().stream().map(one -> new FindingRow(zone, one, false)),
                    assessment.findingsAtDesign().stream().map(one -> new FindingRow(zone, one, true)));
        }).toList());
    }

    /** A remedy of a zone. */
    record RemedyRow(ReportZone zone, Remedy remedy) {
    }

    private Table<?> remedies() {
        Columns<RemedyRow> columns = new Columns<>();
        Unit power = units.unit(Dimension.POWER);
        names(columns, RemedyRow::zone);
        columns.code("remedy", row -> Cell.text(row.remedy().code()));
        columns.number("change", "", row -> Cell.number(row.remedy().change()));
        columns.code("unit", row -> Cell.text(row.remedy().unit()));
        columns.number("meanDepth", units.smallLength().code(), row -> in(units.smallLength(),
                OptionalDouble.of(row.remedy().meanDepth())));
        columns.number("skirtPower", power.code(), row -> in(power, OptionalDouble.of(row.remedy().skirtPower())));
        columns.number("drivePower", power.code(), row -> in(power, row.remedy().drivePower()));
        columns.number("saving", KILOWATT_HOURS, row -> thousandth(row.remedy().savedWh()));
        columns.number("savedCost", "", row -> Cell.number(row.remedy().savedCost()));
        columns.number("savedCo2", "kg/a", row -> Cell.number(row.remedy().savedCo2()));
        columns.flag("ranked", row -> new Cell.Flag(row.remedy().ranked()));
        columns.code("refusedBecause", row -> Cell.text(row.remedy().refusedBecause().map(rule -> rule.code())));
        return columns.table("remedies", content.examined().stream().flatMap(zone -> assessment(zone).orElseThrow()
                .remedies().stream().map(one -> new RemedyRow(zone, one))).toList());
    }

    private Table<?> energy() {
        Columns<ConveyorEnergy> columns = new Columns<>();
        columns.text("plant", row -> Cell.text(row.plant()));
        columns.text("area", row -> Cell.text(row.area()));
        columns.text("conveyor", row -> Cell.text(row.conveyor()));
        columns.number("zonesCounted", "", row -> Cell.number(row.known()));
        columns.number("zones", "", row -> Cell.number(row.zones()));
        columns.number("energy", KILOWATT_HOURS, row -> row.known() == 0 ? Cell.EMPTY
                : thousandth(OptionalDouble.of(row.wh())));
        columns.flag("partlyAtShaft", row -> new Cell.Flag(row.shaft()));
        columns.number("cost", "", row -> Cell.number(row.cost()));
        columns.code("currency", row -> Cell.text(row.currency()));
        columns.number("co2", "kg/a", row -> Cell.number(row.co2()));
        columns.number("saving", KILOWATT_HOURS, row -> row.known() == 0 ? Cell.EMPTY
                : thousandth(OptionalDouble.of(row.savingWh())));
        return columns.table("energy", ConveyorEnergy.ranked(content.zones()));
    }

    private Table<?> notInspected() {
        Columns<ReportZone> columns = new Columns<>();
        names(columns, Function.identity());
        columns.code("place", zone -> Cell.text(zone.ranked().place().code()));
        columns.code("visitStatus", zone -> Cell.text(zone.ranked().visitStatus().map(InspectionStatus::code)));
        columns.text("because", zone -> Cell.text(words.why(zone)));
        columns.add("surveyedAt", "time", "", zone -> Cell.moment(zone.examined().flatMap(Examined::at)));
        return columns.table("notInspected", content.at(Place.NOT_INSPECTED, Place.STALE));
    }

    private <R> void names(Columns<R> columns, Function<R, ReportZone> zone) {
        columns.text("plant", row -> Cell.text(zone.apply(row).ranked().names().plant()));
        columns.text("area", row -> Cell.text(zone.apply(row).ranked().names().area()));
        columns.text("conveyor", row -> Cell.text(zone.apply(row).ranked().names().conveyorTag()));
        columns.text("transfer", row -> Cell.text(zone.apply(row).ranked().zone().transfer()));
        columns.text("tag", row -> Cell.text(zone.apply(row).tag()));
        columns.text("assetId", row -> Cell.text(zone.apply(row).ranked().names().asset()));
        columns.text("material", row -> Cell.text(zone.apply(row).ranked().names().material()));
    }

    /** A result and its standard uncertainty, with all that makes it uncertain. */
    private void result(Columns<RankedRow> columns, String key, Result result, Unit unit) {
        columns.number(key, unit.code(), row -> in(unit, number(row.zone(), result, Estimate::value)));
        columns.add(key + "U", words.text("report.data.uncertainty", words.text("report.data." + key)), "number",
                unit.code(), row -> in(unit, number(row.zone(), result, Estimate::standardUncertainty)));
    }

    private static OptionalDouble number(ReportZone zone, Result result, Function<Estimate, Double> part) {
        return assessment(zone).flatMap(one -> one.counted(result)).map(part).map(OptionalDouble::of)
                .orElse(OptionalDouble.empty());
    }

    private static Cell in(Unit unit, OptionalDouble si) {
        return si.isPresent() ? Cell.number(OptionalDouble.of(unit.fromSi(si.getAsDouble()))) : Cell.EMPTY;
    }

    private static Cell thousandth(OptionalDouble number) {
        return number.isPresent() ? Cell.number(OptionalDouble.of(number.getAsDouble() / KILO)) : Cell.EMPTY;
    }

    private static RankedZone ranked(RankedRow row) {
        return row.zone().ranked();
    }

    private static Optional<Assessment> assessment(ReportZone zone) {
        return zone.examined().map(Examined::assessment);
    }

    private static Optional<Assessment> today(ReportZone zone) {
        return zone.examined().flatMap(Examined::today).map(JudgedZone::assessment);
    }

    private static Optional<Survey> survey(ReportZone zone) {
        return zone.examined().map(Examined::survey);
    }

    /** What each column of all tables is. */
    public Table<?> dictionary() {
        List<Entry> entries = new ArrayList<>();
        all().forEach(table -> table.columns().forEach(column -> entries.add(new Entry(table.title(), column.key(),
                column.head(), column.kind(), column.unit()))));
        Columns<Entry> columns = new Columns<>();
        columns.text("sheet", entry -> Cell.text(entry.sheet()));
        columns.text("head", entry -> Cell.text(entry.head()));
        columns.code("key", entry -> Cell.text(entry.key()));
        columns.text("kind", entry -> Cell.text(words.text("report.kind." + entry.kind())));
        columns.code("ucum", entry -> Cell.text(entry.unit()));
        return columns.table("dictionary", entries);
    }

    /** A column in the dictionary. */
    record Entry(String sheet, String key, String head, String kind, String unit) {
    }

    /** The columns of a table under way. */
    private final class Columns<R> {
        private final List<Column<R>> columns = new ArrayList<>();

        void text(String key, Function<R, Cell> cell) {
            add(key, "text", "", cell);
        }

        /** A word that is the same in every language. */
        void code(String key, Function<R, Cell> cell) {
            add(key, "code", "", cell);
        }

        void number(String key, String unit, Function<R, Cell> cell) {
            add(key, "number", unit, cell);
        }

        void flag(String key, Function<R, Cell> cell) {
            add(key, "flag", "", cell);
        }

        void add(String key, String kind, String unit, Function<R, Cell> cell) {
            add(key, words.text("report.data." + key), kind, unit, cell);
        }

        void add(String key, String title, String kind, String unit, Function<R, Cell> cell) {
            columns.add(new Column<>(key, title, kind, unit, cell));
        }

        Table<R> table(String code, List<R> rows) {
            return new Table<>(words.text("report.sheet." + code), columns, rows);
        }
    }
}
