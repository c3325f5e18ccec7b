package bedmark.report;

import bedmark.office.Place;
import bedmark.picture.Ink;
import bedmark.report.paper.Flow;
import bedmark.report.paper.Lettering;
import bedmark.wording.Telling;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/** The first page: what is the case in two sentences, how many zones stand where, and the worst of them. */
final class OverviewPages {
    private static final int WORST = 8;
    private static final int ACTIONS = 3;
    private static final Lettering STRONG = Lettering.plain(9.5).bold();
    private static final double TILE = 50;
    private static final double SIGN = 15;

    private final ReportContent content;
    private final ReportWords words;
    private final Flow flow;

    OverviewPages(ReportContent content, ReportWords words, Flow flow) {
        this.content = content;
        this.words = words;
        this.flow = flow;
    }

    void set() {
        head();
        sentences();
        tiles();
        worst();
        first();
        notice();
    }

    private void head() {
        Lettering title = Lettering.plain(21).bold();
        String plants = content.plants().isEmpty() ? words.text("report.no-plant")
                : String.join(", ", content.plants());
        flow.paragraph("H1", plants, title);
        flow.down(1);
        Optional<String> first = days().findFirst();
        Optional<String> last = days().reduce((one, other) -> other);
        String surveyed = first.isEmpty() ? words.text("report.nothing-surveyed")
                : words.text("report.surveyed", first.get(), last.orElseThrow());
        flow.paragraph("P", words.text("report.kind") + " · " + surveyed + " · " + words.text("report.made", words.day(content.madeAt())),
                Lettering.plain(9.5).soft());
        flow.down(5);
        flow.leaf().rule(Ink.INK, 1.4, flow.left(), flow.y(), flow.width());
        flow.down(14);
    }

    private Stream<String> days() {
        return content.examined().stream().flatMap(zone -> zone.examined().flatMap(Examined::at).stream())
                .map(words::day).sorted();
    }

    private void sentences() {
        int over = content.at(Place.OVERLOADED).size();
        flow.paragraph("H2", words.text("report.headline", over, content.zones().size()),
                Lettering.plain(16).bold().in(over > 0 ? Ink.OVER : Ink.INK));
        flow.down(4);
        ConveyorEnergy whole = ConveyorEnergy.whole(content.zones());
        List<String> sentences = new ArrayList<>();
        int unsure = content.at(Place.UNDECIDED, Place.INCOMPLETE).size();
        if (unsure > 0) {
            sentences.add(words.text("report.unsure", unsure));
        }
        int unseen = content.at(Place.NOT_INSPECTED, Place.STALE).size();
        if (unseen > 0) {
            sentences.add(words.text("report.unseen", unseen));
        }
        if (whole.known() > 0) {
            sentences.add(words.text("report.takes", amounts(whole), whole.known()));
        }
        if (whole.savingWh() > 0) {
            sentences.add(words.text("report.saves", words.energy(whole.savingWh())));
        }
        flow.paragraph("P", String.join(" ", sentences), Lettering.plain(10.5));
        flow.down(12);
    }

    /** The energy, and in brackets what comes of it. */
    private String amounts(ConveyorEnergy energy) {
        List<String> amounts = new ArrayList<>();
        energy.currency().ifPresent(currency ->
                amounts.add(words.money(energy.cost().orElseThrow(), currency)));
        if (energy.co2().isPresent()) {
            amounts.add(words.text("report.co2", words.tonnes(energy.co2().getAsDouble())));
        }
        return words.text("report.a-year", words.energy(energy.wh()))
                + (amounts.isEmpty() ? "" : " (" + String.join(", ", amounts) + ")");
    }

    /** One tile a place: its figure, how many, its word. */
    private void tiles() {
        Place[] places = Place.values();
        double between = 6;
        double width = (flow.width() - between * (places.length - 1)) / places.length;
        Lettering number = Lettering.plain(19).bold();
        Lettering word = Lettering.plain(8.2);
        double top = flow.y();
        flow.booklet().tags().within("L", () -> {
            for (int i = 0; i < places.length; i++) {
                double x = flow.left() + i * (width + between);
                Place place = places[i];
                int count = content.at(place).size();
                flow.leaf().fill(Ink.GROUND, x, top, width, TILE);
                flow.leaf().rule(place == Place.OVERLOADED ? Ink.OVER : Ink.INK, 1.2, x, top, width);
                new LevelSign(place, SIGN).draw(flow.leaf(), x + 6, top + 9);
                Ink ink = count == 0 ? Ink.SOFT : place == Place.OVERLOADED ? Ink.OVER : Ink.INK;
                flow.booklet().tags().within("LI", () -> flow.booklet().tags().within("LBody", () -> {
                    String many = Integer.toString(count);
                    flow.leaf().write(many, number.in(ink), x + width - 7 - flow.measured(many, number), top + 24);
                    List<String> lines = flow.broken(words.place(place), word, width - 11);
                    for (int line = 0; line < lines.size(); line++) {
                        flow.leaf().write(lines.get(line), word, x + 6, top + 40 + line * 10.5);
                    }
                }));
            }
        });
        flow.down(TILE + 18);
    }

    private void worst() {
        List<ReportZone> worst = content.zones().stream().limit(WORST).toList();
        flow.paragraph("H2", words.text("report.worst-first"), Lettering.plain(12.5).bold());
        flow.down(1);
        RankGrid.set(flow, words, worst);
        if (content.zones().size() > worst.size()) {
            flow.paragraph("P", words.text("report.all-zones-follow", content.zones().size()),
                    Lettering.plain(8.5).soft());
        }
    }

    /** What helps most at the worst zones, as far as the page has room for it. */
    private void first() {
        Lettering text = Lettering.plain(9.5);
        Lettering head = Lettering.plain(12.5).bold();
        List<String> actions = content.at(Place.OVERLOADED, Place.UNDECIDED).stream().flatMap(zone ->
                zone.examined().flatMap(one -> new Telling(words.wording(), one.form()).tell(one.assessment())
                        .action()).map(action -> words.text("report.do", zone.tag(), action)).stream())
                .limit(ACTIONS).toList();
        List<String> shown = new ArrayList<>();
        double height = head.leading() + 13;
        for (String action : actions) {
            height += flow.broken(action, text, flow.width()).size() * text.leading() + 2;
            if (height + caution() < flow.room()) {
                shown.add(action);
            }
        }
        if (shown.isEmpty()) {
            return;
        }
        flow.down(8);
        flow.paragraph("H2", words.text("report.do-first"), head);
        flow.down(3);
        flow.booklet().tags().within("L", () -> shown.forEach(action -> {
            flow.booklet().tags().within("LI", () -> flow.paragraph("LBody", action, text));
            flow.down(2);
        }));
    }

    private double caution() {
        return flow.broken(words.text("command.notice"), STRONG, flow.width() - 14).size() * STRONG.leading() + 14;
    }

    private void notice() {
        String notice = words.text("command.notice");
        double height = caution() - 14;
        flow.need(height + 14);
        flow.down(Math.max(10, flow.room() - height - 4));
        flow.leaf().fill(Ink.INK, flow.left(), flow.y() - 1, 5, height + 3);
        flow.paragraph("P", notice, STRONG, flow.left() + 14, flow.width() - 14);
    }
}
