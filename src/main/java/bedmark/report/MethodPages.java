package bedmark.report;

import bedmark.engine.verdict.Limit;
import bedmark.engine.verdict.Limits;
import bedmark.engine.verdict.Rule;
import bedmark.engine.verdict.Sense;
import bedmark.form.FieldForm;
import bedmark.form.Texts;
import bedmark.picture.Ink;
import bedmark.report.paper.Flow;
import bedmark.report.paper.Grid;
import bedmark.report.paper.Lettering;
import bedmark.wording.Telling;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.stream.Stream;

/** How the numbers came about, the limits in use with their sources, how sure they are, what to beware of. */
final class MethodPages {
    /** The source of a limit that the site set. */
    private static final String OF_SITE = Limit.ofSite(OptionalDouble.empty(), OptionalDouble.empty()).source();
    private static final int METHODS = 4;
    private static final int CAUTIONS = 4;

    private final ReportContent content;
    private final ReportWords words;
    private final Flow flow;
    private final Lettering text = Lettering.plain(9.3);

    MethodPages(ReportContent content, ReportWords words, Flow flow) {
        this.content = content;
        this.words = words;
        this.flow = flow;
    }

    void set() {
        flow.nextLeaf();
        flow.booklet().entry(words.text("report.method"), flow.leaf(), false);
        head("report.method");
        for (int i = 1; i <= METHODS; i++) {
            flow.paragraph("P", words.text("report.method." + i), text);
            flow.down(4);
        }
        limits();
        head("report.uncertainty");
        flow.paragraph("P", words.text("report.uncertainty.1"), text);
        cautions();
        head("report.sources");
        flow.paragraph("P", words.text("report.marks"), text.sized(8.5));
        flow.down(3);
        flow.paragraph("P", words.text("report.source-list"), text.sized(8.5));
    }

    private void head(String key) {
        flow.down(8);
        flow.need(60);
        flow.paragraph("H2", words.text(key), Lettering.plain(13).bold());
        flow.down(2);
    }

    /** The limits of each plant whose limits differ from those of the plant before it. */
    private void limits() {
        Map<Limits, List<String>> plants = new LinkedHashMap<>();
        content.zones().forEach(zone -> zone.examined().ifPresent(examined -> {
            List<String> names = plants.computeIfAbsent(examined.assessor().settings().limits(),
                    key -> new ArrayList<>());
            String plant = zone.ranked().names().plant();
            if (!names.contains(plant)) {
                names.add(plant);
            }
        }));
        head("report.limits");
        if (plants.isEmpty()) {
            plants.put(Limits.standard(), List.of());
        }
        plants.forEach((limits, names) -> {
            if (plants.size() > 1) {
                flow.paragraph("P", String.join(", ", names), text.bold());
            }
            table(limits);
        });
    }

    private void table(Limits limits) {
        Telling telling = new Telling(words.wording(), new FieldForm("none", 1, Texts.of("", ""), List.of()));
        new Grid(flow, List.of(Grid.Column.text(words.text("report.column.rule"), 36),
                Grid.Column.number(words.text("report.column.near"), 16),
                Grid.Column.number(words.text("report.column.overloaded"), 16),
                Grid.Column.text(words.text("report.column.source"), 34)), 8.2)
                .set(Stream.of(Rule.values()).map(rule -> row(telling, rule, limits.of(rule))).toList());
    }

    private List<Grid.Cell> row(Telling telling, Rule rule, Limit limit) {
        String source = !limit.on() ? words.text("report.off")
                : limit.source().equals(OF_SITE) ? words.text("report.of-site")
                : limit.assumption() ? words.text("report.assumption", limit.source()) : limit.source();
        return List.of(Grid.Cell.of(words.text("rule." + rule.code())), Grid.Cell.of(limit(telling, rule, limit.near())),
                Grid.Cell.of(limit(telling, rule, limit.overloaded())), Grid.Cell.of(source));
    }

    private String limit(Telling telling, Rule rule, OptionalDouble limit) {
        return limit.isEmpty() ? "–" : words.text(rule.sense() == Sense.OVER ? "report.over" : "report.under",
                telling.setLimit(rule, limit.getAsDouble()));
    }

    private void cautions() {
        head("report.cautions");
        flow.booklet().tags().within("L", () -> {
            for (int i = 1; i <= CAUTIONS; i++) {
                String caution = words.text("report.caution." + i);
                flow.need(flow.broken(caution, text, flow.width() - 14).size() * text.leading());
                flow.leaf().fill(Ink.INK, flow.left(), flow.y() + 3, 4, text.size());
                flow.booklet().tags().within("LI", () ->
                        flow.paragraph("LBody", caution, text, flow.left() + 14, flow.width() - 14));
                flow.down(3);
            }
        });
    }
}
