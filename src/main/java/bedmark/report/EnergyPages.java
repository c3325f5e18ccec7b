package bedmark.report;

import bedmark.picture.Ink;
import bedmark.picture.Point;
import bedmark.report.paper.Flow;
import bedmark.report.paper.Grid;
import bedmark.report.paper.Lettering;
import java.util.ArrayList;
import java.util.List;

/** What the skirts take in a year, the greatest conveyor first: a bar each, the part that could be saved hatched. */
final class EnergyPages {
    private static final int BARS = 12;
    private static final double ROW = 25;
    private static final double BAR = 12;
    private static final double NAMES = 118;
    private static final double AMOUNTS = 84;
    private static final double HATCH = 4.5;

    private final ReportContent content;
    private final ReportWords words;
    private final Flow flow;

    EnergyPages(ReportContent content, ReportWords words, Flow flow) {
        this.content = content;
        this.words = words;
        this.flow = flow;
    }

    void set() {
        List<ConveyorEnergy> all = ConveyorEnergy.ranked(content.zones()).stream()
                .filter(one -> one.known() > 0).toList();
        if (all.isEmpty()) {
            return;
        }
        flow.nextLeaf();
        flow.booklet().entry(words.text("report.energy"), flow.leaf(), false);
        flow.paragraph("H2", words.text("report.energy"), Lettering.plain(15).bold());
        flow.down(2);
        flow.paragraph("P", words.text("report.energy-how"), Lettering.plain(9.5));
        flow.down(8);
        bars(all.stream().limit(BARS).toList());
        flow.down(10);
        table(all);
    }

    private void bars(List<ConveyorEnergy> shown) {
        double most = shown.get(0).wh();
        double room = flow.width() - NAMES - AMOUNTS;
        double top = flow.y();
        String spoken = String.join("; ", shown.stream().map(one -> words.text("report.bar", name(one),
                words.energy(one.wh()), words.energy(one.savingWh()))).toList());
        flow.booklet().tags().figure(flow.leaf(), spoken, flow.left(), top, flow.width(), shown.size() * ROW, () -> {
            for (int i = 0; i < shown.size(); i++) {
                bar(shown.get(i), top + i * ROW, room / Math.max(most, Double.MIN_NORMAL));
            }
        });
        flow.down(shown.size() * ROW);
        legend();
    }

    private static String name(ConveyorEnergy one) {
        return one.conveyor().isEmpty() ? "–" : one.conveyor();
    }

    private void bar(ConveyorEnergy one, double top, double perWh) {
        Lettering name = Lettering.plain(10).bold();
        Lettering area = Lettering.plain(7.6).soft();
        flow.leaf().mutter(flow.fitting(name(one), name, NAMES - 6), name, flow.left(), top + 11);
        flow.leaf().mutter(flow.fitting(one.area(), area, NAMES - 6), area, flow.left(), top + 21);
        double x = flow.left() + NAMES;
        double wide = one.wh() * perWh;
        double saved = Math.min(wide, one.savingWh() * perWh);
        flow.leaf().fill(Ink.BED, x, top + 3, wide, BAR);
        flow.leaf().fill(Ink.PAPER, x + wide - saved, top + 3, saved, BAR);
        hatch(x + wide - saved, top + 3, saved);
        flow.leaf().frame(Ink.INK, 0.8, x, top + 3, wide, BAR);
        flow.leaf().mutter(words.energy(one.wh()), Lettering.plain(9.5), x + wide + 6, top + 13);
    }

    private void hatch(double x, double top, double wide) {
        for (double at = -BAR; at < wide; at += HATCH) {
            double from = Math.max(0, at);
            double to = Math.min(wide, at + BAR);
            if (to > from) {
                flow.leaf().line(Ink.ACCENT, 0.9, List.of(new Point(x + from, top + BAR - (from - at)),
                        new Point(x + to, top + BAR - (to - at))));
            }
        }
    }

    private void legend() {
        double x = flow.left() + NAMES;
        double y = flow.y() + 4;
        Lettering small = Lettering.plain(8.5).soft();
        hatch(x, y, 22);
        flow.leaf().frame(Ink.INK, 0.8, x, y, 22, BAR);
        flow.booklet().tags().within("P", () ->
                flow.leaf().write(words.text("report.bar-saving"), small, x + 28, y + 9.5));
        flow.down(BAR + 10);
    }

    private void table(List<ConveyorEnergy> all) {
        List<List<Grid.Cell>> rows = new ArrayList<>();
        all.forEach(one -> rows.add(row(name(one), one)));
        rows.add(row(words.text("report.whole"), ConveyorEnergy.whole(content.zones())).stream()
                .map(Grid.Cell::bold).toList());
        new Grid(flow, List.of(Grid.Column.text(words.text("report.column.conveyor"), 18),
                Grid.Column.text(words.text("report.column.area"), 24),
                Grid.Column.number(words.text("report.column.zones"), 13),
                Grid.Column.number(words.text("report.column.energy"), 15),
                Grid.Column.number(words.text("report.column.cost"), 13),
                Grid.Column.number(words.text("report.column.co2"), 12),
                Grid.Column.number(words.text("report.column.saving"), 17)), 8.4).set(rows);
        if (all.stream().anyMatch(ConveyorEnergy::shaft)) {
            flow.paragraph("P", words.text("report.shaft"), Lettering.plain(8.5).soft());
        }
    }

    private List<Grid.Cell> row(String name, ConveyorEnergy one) {
        return List.of(Grid.Cell.of(name).bold(), Grid.Cell.of(one.area()),
                Grid.Cell.of(words.text("report.of", one.known(), one.zones())),
                Grid.Cell.of(words.energy(one.wh()) + (one.shaft() ? "*" : "")),
                Grid.Cell.of(one.currency().map(currency -> words.money(one.cost().orElseThrow(), currency))
                        .orElse("–")),
                Grid.Cell.of(one.co2().isPresent() ? words.tonnes(one.co2().getAsDouble()) : "–"),
                Grid.Cell.of(words.energy(one.savingWh())));
    }
}
