package bedmark.command;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.engine.verdict.Level;
import bedmark.json.JsonWriter;
import bedmark.office.Csv;
import bedmark.office.FindingLine;
import bedmark.office.RankedZone;
import bedmark.quantity.Dimension;
import bedmark.survey.InspectionStatus;
import bedmark.wording.Wording;
import java.io.PrintWriter;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.stream.Collectors;

/** The worst-first list as text, as JSON lines and as CSV. */
final class RankText {
    private static final List<String> HEAD = List.of("place", "plant", "area", "conveyor", "transfer", "tag", "assetId",
            "material", "level", "surveyedAt", "ageDays", "stale", "visitStatus", "driveShare", "skirtPowerW",
            "energyWhPerYear", "remedy", "savedWhPerYear", "findings", "acceptedOrShelved", "clashes", "clockWrong");

    private final Wording wording;

    RankText(Wording wording) {
        this.wording = wording;
    }

    void print(List<RankedZone> ranked, PrintWriter out) {
        int number = 0;
        for (RankedZone zone : ranked) {
            number++;
            out.println(Wording.plain(wording.text("office.rank.line", number,
                    wording.text("office.place." + zone.place().code()), zone.names().tag(),
                    zone.names().conveyorTag(), zone.names().area(), zone.names().plant())));
            List<String> facts = facts(zone);
            if (!facts.isEmpty()) {
                out.println("     " + Wording.plain(String.join(" · ", facts)));
            }
            zone.open().forEach(line -> out.println("     - " + Wording.plain(finding(line))));
            zone.answers().forEach(answer -> out.println("     - " + Wording.plain(wording.text(
                    "office.rank." + answer.answer().code() + (answer.until().isPresent() ? "" : "-for-good"),
                    wording.text("rule." + answer.rule().code()), answer.person(),
                    answer.until().map(Object::toString).orElse(""), answer.reason()))));
            if (zone.clashes() > 0) {
                out.println("     ! " + wording.text("office.rank.clashes", zone.clashes()));
            }
            if (zone.clockWrong()) {
                out.println("     ! " + wording.text("office.rank.clock"));
            }
        }
        out.println(wording.text("office.rank.count", ranked.size()));
    }

    private List<String> facts(RankedZone zone) {
        List<String> facts = new ArrayList<>();
        zone.driveShare().ifPresent(share -> facts.add(wording.text("office.rank.drive", wording.percent(share))));
        zone.skirtPower().ifPresent(power -> facts.add(wording.text("office.rank.power",
                wording.computed(power, wording.units().unit(Dimension.POWER)))));
        zone.saving().ifPresent(saving -> facts.add(wording.text("office.rank.saving",
                wording.format().computed(saving.wh() / 1e6, 1))));
        zone.age().ifPresent(age -> facts.add(wording.text(zone.stale() ? "office.rank.stale" : "office.rank.age",
                age.toDays())));
        zone.surveyed().filter(at -> zone.age().isEmpty()).ifPresent(at -> facts.add(wording.text("office.rank.ahead",
                at.toString())));
        zone.visitStatus().filter(status -> status != InspectionStatus.INSPECTED).ifPresent(status ->
                facts.add(wording.text("office.rank.visit." + status.code())));
        return facts;
    }

    private String finding(FindingLine line) {
        return wording.text("rule." + line.rule().code()) + ": "
                + wording.text("verdict.level." + line.level().code());
    }

    static String csv(List<RankedZone> ranked) {
        return ranked.stream().map(zone -> Csv.row(cells(zone))).collect(Collectors.joining("", Csv.row(HEAD), ""));
    }

    private static List<String> cells(RankedZone zone) {
        return List.of(zone.place().code(), zone.names().plant(), zone.names().area(), zone.names().conveyorTag(),
                zone.zone().transfer(), zone.names().tag(), zone.names().asset(), zone.names().material(),
                zone.level().map(Level::code).orElse(""), zone.surveyed().map(Object::toString).orElse(""),
                zone.age().map(Duration::toDays).map(days -> Long.toString(days)).orElse(""),
                Boolean.toString(zone.stale()), zone.visitStatus().map(InspectionStatus::code).orElse(""),
                number(zone.driveShare()), number(zone.skirtPower()), number(zone.energyWh()),
                zone.saving().map(saving -> saving.remedy()).orElse(""),
                zone.saving().map(saving -> plain(saving.wh())).orElse(""), codes(zone.open()),
                zone.answers().stream().map(answer -> answer.rule().code()).collect(Collectors.joining(" ")),
                Integer.toString(zone.clashes()), Boolean.toString(zone.clockWrong()));
    }

    private static String codes(List<FindingLine> findings) {
        return findings.stream().map(line -> line.rule().code()).collect(Collectors.joining(" "));
    }

    private static String number(OptionalDouble value) {
        return value.isPresent() ? plain(value.getAsDouble()) : "";
    }

    private static String plain(double value) {
        return BigDecimal.valueOf(value).toPlainString();
    }

    /** One zone as a JSON object in one line; what is not known is absent. */
    static String json(RankedZone zone) {
        Branch branch = Branch.EMPTY;
        List<String> cells = cells(zone);
        for (int i = 0; i < HEAD.size(); i++) {
            branch = put(branch, HEAD.get(i), cells.get(i));
        }
        branch = branch.with("plantId", zone.zone().plant())
                .with("findings", new Node.Series(zone.open().stream().map(RankText::document).toList()))
                .with("acceptedOrShelved", new Node.Series(zone.answers().stream().map(answer ->
                        Node.text(answer.rule().code())).toList()));
        return new String(JsonWriter.compact(branch), StandardCharsets.UTF_8);
    }

    private static Node document(FindingLine line) {
        return Branch.EMPTY.with("code", line.rule().code()).with("level", line.level().code())
                .with("observed", Node.number(BigDecimal.valueOf(line.observed())))
                .with("unit", line.rule().unit());
    }

    private static Branch put(Branch branch, String key, String cell) {
        return switch (key) {
            case "ageDays", "driveShare", "skirtPowerW", "energyWhPerYear", "savedWhPerYear", "clashes" ->
                    cell.isEmpty() ? branch : branch.with(key, Node.number(new BigDecimal(cell)));
            case "stale", "clockWrong" -> branch.with(key, Node.flag(Boolean.parseBoolean(cell)));
            default -> cell.isEmpty() ? branch : branch.with(key, cell);
        };
    }
}
