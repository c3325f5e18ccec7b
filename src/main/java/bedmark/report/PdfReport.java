package bedmark.report;

import bedmark.picture.Ink;
import bedmark.report.paper.Booklet;
import bedmark.report.paper.Flow;
import bedmark.report.paper.Leaf;
import bedmark.report.paper.Lettering;
import java.io.IOException;
import java.io.OutputStream;
import java.util.List;

/**
 * The report as a PDF: overview, worst zones, plant energy, what was not inspected, every zone, method and cautions, and
 * behind them the working of each zone.
 */
public final class PdfReport {
    private static final double FOOT = 30;

    private final ReportContent content;
    private final ReportOptions options;
    private final ReportWords words;

    public PdfReport(ReportContent content, ReportOptions options) {
        this.content = content;
        this.options = options;
        words = new ReportWords(options.wording());
    }

    /**
     * Writes the report.
     *
     * @return whether it was written; not where it was stopped
     */
    public boolean write(OutputStream out) throws IOException {
        String plants = content.plants().isEmpty() ? words.text("report.no-plant")
                : String.join(", ", content.plants());
        String title = words.text("report.title", plants);
        try (Booklet booklet = new Booklet(options.paper(), new Booklet.Imprint(title,
                options.wording().words().locale(), options.version(), content.madeAt()))) {
            Flow flow = new Flow(booklet);
            booklet.entry(words.text("report.overview"), flow.leaf(), false);
            new OverviewPages(content, words, flow).set();
            new WorstPages(content, words, options, flow).set();
            new EnergyPages(content, words, flow).set();
            new ZoneLists(content, words, flow).set();
            new MethodPages(content, words, flow).set();
            if (!sheets(flow)) {
                return false;
            }
            int pages = booklet.leaves().size();
            booklet.write(out, leaf -> foot(leaf, title, pages, booklet));
            return true;
        }
    }

    private boolean sheets(Flow flow) {
        SheetPages sheets = new SheetPages(words, flow);
        List<ReportZone> examined = content.examined();
        for (int i = 0; i < examined.size(); i++) {
            if (options.progress().cancelled()) {
                return false;
            }
            options.progress().at(i, examined.size());
            sheets.set(examined.get(i), examined.get(i).examined().orElseThrow(), i == 0);
        }
        options.progress().at(examined.size(), examined.size());
        return true;
    }

    private void foot(Leaf leaf, String title, int pages, Booklet booklet) {
        Lettering small = Lettering.plain(8).soft();
        double y = booklet.size().height() - FOOT;
        double width = booklet.size().width() - 2 * Flow.SIDE;
        leaf.rule(Ink.LINE, 0.6, Flow.SIDE, y, width);
        String number = words.text("report.page", leaf.number(), pages);
        double wide = booklet.faces().width(number, small.face(), small.size());
        leaf.mutter(booklet.faces().fitting(title + " · " + words.text("report.estimate"), small, width - wide - 20),
                small, Flow.SIDE, y + 12);
        leaf.mutter(number, small, Flow.SIDE + width - wide, y + 12);
    }
}
