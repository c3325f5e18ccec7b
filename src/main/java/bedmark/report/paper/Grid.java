package bedmark.report.paper;

import bedmark.picture.Ink;
import java.util.ArrayList;
import java.util.List;

/** A table: its head stands again on every page that it goes on to. A row stays together. */
public final class Grid {
    private static final double PAD = 3.2;
    private static final double BETWEEN = 9;
    private static final int MOST_LINES = 8;

    private final Flow flow;
    private final List<Column> columns;
    private final Lettering lettering;
    private final Lettering head;

    /**
     * A column.
     *
     * @param title at its head
     * @param share of the table's width
     * @param right whether its texts end at the right, as numbers do
     */
    public record Column(String title, double share, boolean right) {
        public static Column text(String title, double share) {
            return new Column(title, share, false);
        }

        public static Column number(String title, double share) {
            return new Column(title, share, true);
        }
    }

    /**
     * A cell.
     *
     * @param strong whether it is what its row is about
     * @param ink    of its text
     * @param sign   drawn ahead of its text
     * @param below  in the second place, in lines of its own; empty where there is nothing
     */
    public record Cell(String text, boolean strong, Ink ink, Sign sign, String below) {
        public static Cell of(String text) {
            return new Cell(text, false, Ink.INK, Sign.NONE, "");
        }

        public Cell bold() {
            return new Cell(text, true, ink, sign, below);
        }

        public Cell in(Ink other) {
            return new Cell(text, strong, other, sign, below);
        }

        public Cell with(Sign other) {
            return new Cell(text, strong, ink, other, below);
        }

        public Cell then(String other) {
            return new Cell(text, strong, ink, sign, other);
        }
    }

    /** A line of a cell. */
    private record Line(String text, Lettering lettering) {
    }

    /** Something small that is drawn ahead of a text, and says the same as it. */
    public interface Sign {
        Sign NONE = new Sign() {
            @Override
            public double width() {
                return 0;
            }

            @Override
            public void draw(Leaf leaf, double x, double top) {
                // There is nothing ahead of the text.
            }
        };

        /** The room it takes, with the white after it (pt). */
        double width();

        void draw(Leaf leaf, double x, double top);
    }

    public Grid(Flow flow, List<Column> columns, double size) {
        this.flow = flow;
        this.columns = List.copyOf(columns);
        lettering = Lettering.plain(size);
        head = Lettering.plain(size - 0.8).soft();
    }

    /** The table whole; the first cell of a row is its head. */
    public void set(List<List<Cell>> rows) {
        Tags tags = flow.booklet().tags();
        tags.within("Table", () -> {
            flow.need(headHeight() + 2 * lettering.leading());
            tags.within("THead", () -> tags.within("TR", () -> head(true)));
            tags.within("TBody", () -> rows.forEach(this::row));
        });
        flow.leaf().rule(Ink.INK, 0.6, flow.left(), flow.y(), flow.width());
        flow.down(8);
    }

    private double headHeight() {
        return columns.stream().mapToInt(column -> flow.broken(column.title(), head, inner(column)).size()).max()
                .orElse(0) * head.leading() + 2 * PAD;
    }

    /** @param first whether it is read aloud; its repetitions are not */
    private void head(boolean first) {
        double x = flow.left();
        double bottom = flow.y() + headHeight() - PAD;
        for (Column column : columns) {
            List<String> lines = flow.broken(column.title(), head, inner(column));
            double top = bottom - lines.size() * head.leading();
            double from = x;
            Runnable words = () -> {
                for (int i = 0; i < lines.size(); i++) {
                    double at = column.right() ? from + inner(column) - flow.measured(lines.get(i), head) : from;
                    double baseline = top + i * head.leading() + head.rise();
                    if (first) {
                        flow.leaf().write(lines.get(i), head, at, baseline);
                    } else {
                        flow.leaf().mutter(lines.get(i), head, at, baseline);
                    }
                }
            };
            if (first) {
                flow.booklet().tags().columnHead(words);
            } else {
                words.run();
            }
            x += width(column);
        }
        flow.down(headHeight());
        flow.leaf().rule(Ink.INK, 1, flow.left(), flow.y(), flow.width());
    }

    private double width(Column column) {
        return column.share() / columns.stream().mapToDouble(Column::share).sum() * (flow.width() + BETWEEN);
    }

    private double inner(Column column) {
        return width(column) - BETWEEN;
    }

    private void row(List<Cell> cells) {
        List<List<Line>> broken = new ArrayList<>();
        for (int i = 0; i < columns.size(); i++) {
            broken.add(lines(cells.get(i), inner(columns.get(i)) - cells.get(i).sign().width()));
        }
        double height = broken.stream().mapToInt(List::size).max().orElse(1) * lettering.leading() + 2 * PAD;
        if (flow.need(height)) {
            head(false);
        } else {
            flow.leaf().rule(Ink.LINE, 0.5, flow.left(), flow.y(), flow.width());
        }
        flow.booklet().tags().within("TR", () -> {
            double x = flow.left();
            for (int i = 0; i < columns.size(); i++) {
                cell(cells.get(i).sign(), broken.get(i), columns.get(i), x, i == 0);
                x += width(columns.get(i));
            }
        });
        flow.down(height);
    }

    private List<Line> lines(Cell cell, double room) {
        Lettering style = cell.strong() ? lettering.in(cell.ink()).bold() : lettering.in(cell.ink());
        List<Line> lines = new ArrayList<>();
        add(cell.text(), style, room, lines);
        if (!cell.below().isEmpty()) {
            add(cell.below(), head, room, lines);
        }
        return lines;
    }

    /** A text of many lines is cut, so that a row never outgrows a page. */
    private void add(String text, Lettering style, double room, List<Line> lines) {
        List<String> broken = flow.broken(text, style, room);
        for (int i = 0; i < Math.min(MOST_LINES, broken.size()); i++) {
            boolean cut = i == MOST_LINES - 1 && broken.size() > MOST_LINES;
            lines.add(new Line(cut ? flow.fitting(broken.get(i) + " …", style, room) : broken.get(i), style));
        }
    }

    private void cell(Sign sign, List<Line> lines, Column column, double x, boolean rowHead) {
        sign.draw(flow.leaf(), x, flow.y() + PAD);
        Runnable words = () -> {
            for (int i = 0; i < lines.size(); i++) {
                Line line = lines.get(i);
                double at = column.right() ? x + inner(column) - flow.measured(line.text(), line.lettering())
                        : x + sign.width();
                flow.leaf().write(line.text(), line.lettering(), at,
                        flow.y() + PAD + i * lettering.leading() + lettering.rise());
            }
        };
        if (rowHead) {
            flow.booklet().tags().rowHead(words);
        } else {
            flow.booklet().tags().within("TD", words);
        }
    }
}
