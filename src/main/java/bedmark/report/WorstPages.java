package bedmark.report;

import bedmark.document.Branch;
import bedmark.office.Place;
import bedmark.picture.Ink;
import bedmark.picture.Sheet;
import bedmark.picture.ZonePicture;
import bedmark.picture.ZoneSketch;
import bedmark.report.paper.DrawingPainter;
import bedmark.report.paper.Flow;
import bedmark.report.paper.Lettering;
import bedmark.report.paper.Photograph;
import bedmark.wording.Telling;
import bedmark.wording.Told;
import bedmark.wording.ZoneSketcher;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** The worst zones, two to a page: the verdict, the zone picture, a photo, the numbers that count, what helps. */
final class WorstPages {
    /** So many zones that call for something are shown. */
    private static final int SHOWN = 6;
    private static final double POINTS_PER_MM = 72 / 25.4;
    /** Letters of the picture stand at the size of the page's, not at that of a tablet at arm's length. */
    private static final double PICTURE_SCALE = 0.95;
    private static final double HEADING = 30;
    /** What a card takes beside its picture. */
    private static final double TEXTS = 158;
    private static final double BESIDE = 12;
    /** Of the room beside the picture; the photo has the rest. */
    private static final double CAPTION_AT_MOST = 0.35;
    private static final String ELLIPSIS = "…";

    private final ReportContent content;
    private final ReportWords words;
    private final ReportOptions options;
    private final Flow flow;
    private final PhotoPrint print;
    /** Height of a card, and of the picture in it. */
    private final double card;
    private final double high;

    WorstPages(ReportContent content, ReportWords words, ReportOptions options, Flow flow) {
        this.content = content;
        this.words = words;
        this.options = options;
        this.flow = flow;
        print = new PhotoPrint(flow.booklet());
        card = (flow.page() - HEADING) / 2;
        high = card - TEXTS;
    }

    /** The zones that are shown. */
    List<ReportZone> shown() {
        return content.at(Place.OVERLOADED, Place.UNDECIDED, Place.NEAR).stream()
                .filter(zone -> zone.examined().isPresent()).limit(SHOWN).toList();
    }

    void set() {
        List<ReportZone> shown = shown();
        if (shown.isEmpty()) {
            return;
        }
        flow.nextLeaf();
        flow.booklet().entry(words.text("report.worst-zones"), flow.leaf(), false);
        flow.paragraph("H2", words.text("report.worst-zones"), Lettering.plain(15).bold());
        flow.down(6);
        for (int i = 0; i < shown.size(); i++) {
            flow.need(card);
            ReportZone zone = shown.get(i);
            flow.booklet().entry(zone.tag(), flow.leaf(), true);
            card(i + 1, zone, zone.examined().orElseThrow());
        }
    }

    private void card(int number, ReportZone zone, Examined examined) {
        flow.leaf().rule(Ink.INK, 1, flow.left(), flow.y(), flow.width());
        flow.down(6);
        head(number, zone, examined);
        Telling telling = new Telling(words.wording(), examined.form());
        Told told = telling.tell(examined.assessment());
        boolean atDesign = told.atDesign().isPresent() && examined.assessment().levelAtDesignFeed()
                .filter(level -> level.compareTo(examined.assessment().level()) > 0).isPresent();
        verdict(zone, atDesign ? words.text("report.verdict", words.place(zone.ranked().place()), words.why(zone))
                : told.sentence());
        flow.down(6);
        picture(zone, examined);
        flow.down(8);
        figures(told);
        told.action().ifPresent(action -> flow.paragraph("P", action, Lettering.plain(9.5).bold()));
        String sure = told.sure().map(text -> " (" + text + ")").orElse("");
        String now = atDesign ? words.text("report.today", told.sentence() + sure)
                : Stream.of(told.sure(), told.atDesign()).flatMap(Optional::stream).collect(Collectors.joining(" · "));
        Stream.of(now, told.repeat().orElse("")).filter(text -> !text.isEmpty())
                .forEach(text -> flow.paragraph("P", text, Lettering.plain(9).soft()));
        flow.down(14);
    }

    private void head(int number, ReportZone zone, Examined examined) {
        Lettering tag = Lettering.plain(14).bold();
        Lettering soft = Lettering.plain(9.5).soft();
        String who = words.examined(zone) + examined.survey().inspector().map(name -> " · " + name).orElse("");
        double baseline = flow.y() + tag.rise();
        String by = flow.fitting(who, soft, flow.width() / 3);
        double room = flow.width() - flow.measured(by, soft) - 12;
        String name = flow.fitting(number + " · " + zone.tag(), tag, room);
        String way = flow.fitting(zone.way() + examined.assessor().material(examined.survey())
                .map(material -> " · " + material.name()).orElse(""), soft, room - flow.measured(name, tag) - 8);
        flow.booklet().tags().within("H3", () -> {
            flow.leaf().write(name, tag, flow.left(), baseline);
            flow.leaf().write(" " + way, soft, flow.left() + flow.measured(name, tag) + 4, baseline);
        });
        flow.booklet().tags().within("P", () -> flow.leaf().write(by, soft,
                flow.left() + flow.width() - flow.measured(by, soft), baseline));
        flow.down(tag.leading() + 3);
    }

    private void verdict(ReportZone zone, String sentence) {
        boolean over = zone.ranked().place() == Place.OVERLOADED;
        LevelSign sign = new LevelSign(zone.ranked().place(), 18);
        sign.draw(flow.leaf(), flow.left(), flow.y());
        double left = flow.left() + sign.width() + 4;
        flow.paragraph("P", sentence, Lettering.plain(11.5).bold().in(over ? Ink.OVER : Ink.INK), left,
                flow.width() - sign.width() - 4);
    }

    private void picture(ReportZone zone, Examined examined) {
        Optional<Photo> photo = photo(examined);
        double width = photo.map(one -> flow.width() * 0.68).orElse(flow.width());
        double top = flow.y();
        ZoneSketch sketch = new ZoneSketcher(examined.assessor(), words.wording()).sketch(examined.survey().document(),
                Optional.of(examined.assessment()), Optional.empty());
        flow.leaf().fill(Ink.GROUND, flow.left(), top, width, high);
        double pad = 8;
        Sheet sheet = new Sheet(width - 2 * pad, high - 2 * pad, POINTS_PER_MM * PICTURE_SCALE);
        ZonePicture picture = ZonePicture.still(sketch, sheet, flow.booklet().faces());
        flow.booklet().tags().figure(flow.leaf(), spoken(zone, examined, sketch), flow.left(), top, width, high,
                () -> new DrawingPainter(flow.leaf(), flow.left() + pad, top + pad).paint(picture.drawing()));
        photo.ifPresent(one -> photo(one, flow.left() + width + BESIDE, top, flow.width() - width - BESIDE));
        flow.down(high);
    }

    /** The picture for who does not see it. */
    private String spoken(ReportZone zone, Examined examined, ZoneSketch sketch) {
        String depths = String.join("; ", sketch.stations().stream().filter(station -> station.depth().isPresent())
                .map(station -> words.text("report.picture-depth", station.depthLabel(), station.positionLabel()))
                .toList());
        String allowed = sketch.limit().isPresent() ? sketch.captions().limit() : "–";
        return words.text("report.picture", zone.tag(), depths, allowed,
                words.wording().symbol(words.wording().units().smallLength()), sketch.captions().sectionNote());
    }

    /**
     * A photo that is shown.
     *
     * @param caption in the person's words; empty where there is none
     */
    private record Photo(Photograph photograph, String caption) {
    }

    private Optional<Photo> photo(Examined examined) {
        for (Branch row : examined.photos()) {
            Optional<Photograph> found = row.text("sha256")
                    .flatMap(sha256 -> options.photos().bytes(examined.judged(), sha256)).flatMap(print::of);
            if (found.isPresent()) {
                return Optional.of(new Photo(found.get(), row.text("caption").orElse("")));
            }
        }
        return Optional.empty();
    }

    private void photo(Photo photo, double x, double top, double width) {
        Lettering small = Lettering.plain(8).soft();
        List<String> caption = photo.caption().isEmpty() ? List.of() : caption(photo.caption(), small, width);
        double room = high - caption.size() * small.leading() - 3;
        double aspect = photo.photograph().aspect();
        double wide = Math.min(width, room * aspect);
        double tall = wide / aspect;
        flow.booklet().tags().figure(flow.leaf(), words.text("report.photo", photo.caption()), x, top, wide, tall,
                () -> flow.leaf().image(photo.photograph(), x, top, wide, tall));
        flow.booklet().tags().within("Caption", () -> {
            for (int i = 0; i < caption.size(); i++) {
                flow.leaf().write(caption.get(i), small, x, top + tall + 3 + i * small.leading() + small.rise());
            }
        });
    }

    /** As many lines as leave the photo most of the room. */
    private List<String> caption(String text, Lettering small, double width) {
        List<String> lines = flow.broken(text, small, width);
        int most = (int) (high * CAPTION_AT_MOST / small.leading());
        if (lines.size() <= most) {
            return lines;
        }
        List<String> some = new ArrayList<>(lines.subList(0, most));
        String last = some.get(most - 1);
        while (flow.measured(last + ELLIPSIS, small) > width) {
            last = last.substring(0, last.offsetByCodePoints(last.length(), -1));
        }
        some.set(most - 1, last.stripTrailing() + ELLIPSIS);
        return some;
    }

    private void figures(Told told) {
        Lettering label = Lettering.plain(8.5).soft();
        Lettering number = Lettering.plain(15);
        Lettering rest = Lettering.plain(9).soft();
        double wide = flow.width() / Math.max(4, told.figures().size());
        double top = flow.y();
        for (int i = 0; i < told.figures().size(); i++) {
            Told.Figure figure = told.figures().get(i);
            double x = flow.left() + i * wide;
            flow.booklet().tags().within("P", () -> {
                flow.leaf().write(figure.label(), label, x, top + label.rise());
                flow.leaf().write(figure.number(), number, x, top + 28);
                flow.leaf().write(figure.rest(), rest, x + flow.measured(figure.number(), number) + 4, top + 28);
            });
        }
        flow.down(38);
    }
}
