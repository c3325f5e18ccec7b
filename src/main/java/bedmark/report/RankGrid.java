package bedmark.report;

import bedmark.office.Place;
import bedmark.picture.Ink;
import bedmark.report.paper.Flow;
import bedmark.report.paper.Grid;
import java.util.List;
import java.util.OptionalDouble;

/** A list of zones: where each stands and why, its share of the drive, what could be saved. */
final class RankGrid {
    private RankGrid() {
    }

    static void set(Flow flow, ReportWords words, List<ReportZone> zones) {
        boolean severalPlants = zones.stream().map(zone -> zone.ranked().names().plant()).distinct().count() > 1;
        new Grid(flow, List.of(Grid.Column.text(words.text("report.column.zone"), 24),
                Grid.Column.text(words.text("report.column.verdict"), 20),
                Grid.Column.text(words.text("report.column.why"), 42),
                Grid.Column.number(words.text("report.column.share"), 9),
                Grid.Column.number(words.text("report.column.saving"), 13)), 8.8)
                .set(zones.stream().map(zone -> row(words, zone, severalPlants)).toList());
    }

    private static List<Grid.Cell> row(ReportWords words, ReportZone zone, boolean severalPlants) {
        Place place = zone.ranked().place();
        OptionalDouble share = zone.ranked().driveShare();
        boolean seen = place != Place.NOT_INSPECTED;
        String at = severalPlants ? zone.ranked().names().plant() : "";
        return List.of(Grid.Cell.of(zone.tag()).bold().then(at.isEmpty() ? zone.way() : zone.way() + " · " + at),
                Grid.Cell.of(words.place(place)).in(place == Place.OVERLOADED ? Ink.OVER : Ink.INK)
                        .with(new LevelSign(place, 10)),
                Grid.Cell.of(words.why(zone)), Grid.Cell.of(seen ? words.share(share) : "–"),
                Grid.Cell.of(zone.ranked().saving().filter(saving -> seen).map(saving -> words.energy(saving.wh())).orElse("–")));
    }
}
