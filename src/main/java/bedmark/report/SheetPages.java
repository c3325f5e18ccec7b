package bedmark.report;

import bedmark.engine.verdict.Level;
import bedmark.office.Rejudged;
import bedmark.picture.Ink;
import bedmark.report.paper.Flow;
import bedmark.report.paper.Lettering;
import bedmark.wording.SheetPart;
import java.time.format.DateTimeFormatter;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** The working of each zone, a page each: the letters are as large as lets it fit. */
final class SheetPages {
    private static final DateTimeFormatter MINUTE = DateTimeFormatter.ofPattern("yyyy-MM-dd HH:mm xxx");
    private static final double LARGEST = 8.8;
    private static final double SMALLEST = 6;
    private static final double STEP = 0.2;
    private static final double SIDE = 40;
    private static final double TOP = 36;
    private static final double NAMES = 0.25;
    /** Between a name and the text beside it. */
    private static final double WHITE = 8;
    private static final double HEAD_ROOM = 4;
    /** From one baseline to the next, as a share of the size: closer than in running text. */
    private static final double CLOSE = 1.21;

    private final ReportWords words;
    private final Flow flow;

    SheetPages(ReportWords words, Flow flow) {
        this.words = words;
        this.flow = flow;
    }

    /** A part in its lines: a name at the left, a text beside it; no name where the text takes the whole width. */
    private record Block(List<String> names, List<String> texts, boolean heading, double indent) {
        int lines() {
            return Math.max(names.size(), texts.size());
        }
    }

    /** @param first whether it is the first of them */
    void set(ReportZone zone, Examined examined, boolean first) {
        flow.nextLeaf(SIDE, TOP);
        if (first) {
            flow.booklet().entry(words.text("report.workings"), flow.leaf(), false);
        }
        flow.booklet().entry(zone.tag(), flow.leaf(), true);
        head(zone, examined);
        List<SheetPart> parts = examined.sheet(words.wording());
        Lettering lettering = largest(parts);
        blocks(parts, lettering).forEach(block -> set(block, lettering));
    }

    /** The largest letters that let the parts fit into the room, the smallest ones where none do. */
    private Lettering largest(List<SheetPart> parts) {
        int fitting = 0;
        int tooLarge = (int) Math.round((LARGEST - SMALLEST) / STEP) + 1;
        while (tooLarge - fitting > 1) {
            int tried = (fitting + tooLarge) / 2;
            Lettering lettering = Lettering.plain(SMALLEST + tried * STEP);
            if (height(blocks(parts, lettering), lettering) > flow.room()) {
                tooLarge = tried;
            } else {
                fitting = tried;
            }
        }
        return Lettering.plain(SMALLEST + fitting * STEP);
    }

    private void head(ReportZone zone, Examined examined) {
        flow.paragraph("H2", words.text("report.working", zone.tag(), zone.way()), Lettering.plain(13).bold());
        String who = Stream.of(Optional.of(zone.ranked().names().plant()),
                        examined.survey().round().map(round -> words.text("working.round", round)),
                        examined.at().map(MINUTE::format),
                        examined.survey().inspector().map(name -> words.text("working.inspector", name)),
                        examined.assessor().material(examined.survey()).map(material ->
                                words.text("working.material", material.name())),
                        examined.survey().revision() > 1 ? Optional.of(words.text("working.revision",
                                Integer.toString(examined.survey().revision()))) : Optional.<String>empty())
                .flatMap(Optional::stream).collect(Collectors.joining(" · "));
        flow.paragraph("P", who, Lettering.plain(8.8).soft());
        examined.rejudged().ifPresent(both -> flow.paragraph("P", today(both), Lettering.plain(8.8)));
        flow.down(3);
        flow.leaf().rule(Ink.INK, 1.2, flow.left(), flow.y(), flow.width());
        flow.down(3);
    }

    /** How the register that holds today judges the same survey. */
    private String today(Rejudged both) {
        return Stream.concat(Stream.of(words.text("office.trend.judged", level(both.own().assessment().level()),
                        level(both.today().assessment().level()))), both.turns().stream().map(turn -> words.text(
                        "report.rejudged", words.text("rule." + turn.rule().code()), level(turn.own()),
                        level(turn.today())))).collect(Collectors.joining(" "));
    }

    private String level(Level level) {
        return words.text("verdict.level." + level.code());
    }

    private List<Block> blocks(List<SheetPart> parts, Lettering lettering) {
        return parts.stream().map(part -> block(part, lettering)).toList();
    }

    private Block block(SheetPart part, Lettering lettering) {
        if (part instanceof SheetPart.Heading heading) {
            return whole(heading.text(), lettering.bold(), true, 0);
        } else if (part instanceof SheetPart.Flow items) {
            return whole(String.join("; ", items.items()), lettering, false, 0);
        } else if (part instanceof SheetPart.Item item) {
            return whole(item.text(), lettering, false, 8);
        } else if (part instanceof SheetPart.Sentence sentence) {
            return whole(sentence.text(), lettering, false, 0);
        }
        SheetPart.Row row = (SheetPart.Row) part;
        String name = row.lead().isEmpty() ? row.name() : row.lead() + ": " + row.name();
        double names = Math.max(flow.width() * NAMES, flow.measured(name, lettering) + WHITE);
        return new Block(List.of(name), flow.broken(row.text(), lettering, flow.width() - names), false, names);
    }

    private Block whole(String text, Lettering lettering, boolean heading, double indent) {
        return new Block(List.of(), flow.broken(text, lettering, flow.width() - indent), heading, indent);
    }

    private static double height(List<Block> blocks, Lettering lettering) {
        return blocks.stream().mapToDouble(block -> block.lines() * close(lettering)
                + (block.heading() ? 2 * HEAD_ROOM : 0)).sum();
    }

    private void set(Block block, Lettering lettering) {
        if (block.heading()) {
            flow.down(HEAD_ROOM);
            flow.need(3 * close(lettering));
            flow.leaf().rule(Ink.LINE, 0.6, flow.left(), flow.y() - 0.5, flow.width());
        }
        flow.need(block.lines() * close(lettering));
        double top = flow.y();
        Lettering style = block.heading() ? lettering.bold() : lettering;
        flow.booklet().tags().within(block.heading() ? "H3" : "P", () -> {
            lines(block.names(), lettering.soft(), flow.left(), top);
            lines(block.texts(), style, flow.left() + block.indent(), top);
        });
        flow.down(block.lines() * close(lettering) + (block.heading() ? HEAD_ROOM / 2 : 0));
    }

    private static double close(Lettering lettering) {
        return CLOSE * lettering.size();
    }

    private void lines(List<String> lines, Lettering lettering, double x, double top) {
        for (int i = 0; i < lines.size(); i++) {
            flow.leaf().write(lines.get(i), lettering, x, top + i * close(lettering) + lettering.rise());
        }
    }
}
