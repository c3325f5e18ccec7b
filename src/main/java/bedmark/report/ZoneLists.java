package bedmark.report;

import bedmark.office.Place;
import bedmark.report.paper.Flow;
import bedmark.report.paper.Grid;
import bedmark.report.paper.Lettering;
import java.util.List;

/** What was not inspected, or too long ago, with the reason; then every zone. */
final class ZoneLists {
    private final ReportContent content;
    private final ReportWords words;
    private final Flow flow;

    ZoneLists(ReportContent content, ReportWords words, Flow flow) {
        this.content = content;
        this.words = words;
        this.flow = flow;
    }

    void set() {
        unseen();
        if (!content.zones().isEmpty()) {
            head("report.all-zones");
            RankGrid.set(flow, words, content.zones());
        }
    }

    private void head(String key) {
        flow.down(12);
        if (flow.room() < flow.page() / 3) {
            flow.nextLeaf();
        }
        flow.booklet().entry(words.text(key), flow.leaf(), false);
        flow.paragraph("H2", words.text(key), Lettering.plain(15).bold());
        flow.down(2);
    }

    private void unseen() {
        List<ReportZone> unseen = content.at(Place.NOT_INSPECTED, Place.STALE);
        head("report.not-inspected");
        if (unseen.isEmpty()) {
            flow.paragraph("P", words.text("report.all-inspected"), Lettering.plain(10));
            return;
        }
        flow.paragraph("P", words.text("report.not-healthy"), Lettering.plain(9.5));
        flow.down(6);
        new Grid(flow, List.of(Grid.Column.text(words.text("report.column.zone"), 26),
                Grid.Column.text(words.text("report.column.area"), 22),
                Grid.Column.text(words.text("report.column.verdict"), 22),
                Grid.Column.text(words.text("report.column.reason"), 32),
                Grid.Column.text(words.text("report.column.last"), 17)), 8.8)
                .set(unseen.stream().map(this::row).toList());
    }

    private List<Grid.Cell> row(ReportZone zone) {
        Place place = zone.ranked().place();
        String reason = place == Place.STALE ? zone.ranked().age()
                .map(age -> words.text("report.stale", Long.toString(age.toDays())))
                .orElseGet(() -> words.text("report.ahead"))
                : zone.visit().map(words::status).orElseGet(() -> words.text("report.never"));
        return List.of(Grid.Cell.of(zone.tag()).bold().then(zone.way()), Grid.Cell.of(zone.ranked().names().area()),
                Grid.Cell.of(words.place(place)).with(new LevelSign(place, 10)), Grid.Cell.of(reason),
                Grid.Cell.of(words.examined(zone)));
    }
}
