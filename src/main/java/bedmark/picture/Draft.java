package bedmark.picture;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** A drawing under way: gathers marks, and remembers where text and handles stand so that nothing covers them. */
final class Draft {
    /** Height of words (mm): 16 px at 149 dpi. */
    static final double WORDS = 2.73;
    /** Height of numbers (mm): 18 px at 149 dpi. */
    static final double NUMBERS = 3.07;
    /** Height of a row of text (mm). */
    static final double ROW = 4.1;

    private final Sheet sheet;
    private final TextMeasure measure;
    private final boolean still;
    private final List<Mark> marks = new ArrayList<>();
    private final List<Box> taken = new ArrayList<>();

    /** @param still whether nobody takes hold of anything */
    Draft(Sheet sheet, TextMeasure measure, boolean still) {
        this.sheet = sheet;
        this.measure = measure;
        this.still = still;
    }

    boolean still() {
        return still;
    }

    /** How a text is written. */
    record Style(Face face, double mm, Ink ink) {
        static final Style WORD = new Style(Face.PLAIN, WORDS, Ink.INK);
        static final Style NUMBER = new Style(Face.PLAIN, NUMBERS, Ink.INK);
        static final Style ASIDE = new Style(Face.PLAIN, WORDS, Ink.SOFT);

        Style bold() {
            return new Style(Face.BOLD, mm, ink);
        }

        /** The style of what is not known yet. */
        Style unknown() {
            return new Style(Face.ITALIC, mm, Ink.SOFT);
        }

        Style when(boolean known) {
            return known ? this : unknown();
        }
    }

    double mm(double millimetres) {
        return sheet.mm(millimetres);
    }

    Pen pen(Ink ink, double millimetres) {
        return Pen.solid(ink, mm(millimetres));
    }

    Pen dashes(Ink ink, double millimetres) {
        return Pen.dashed(ink, mm(millimetres));
    }

    void add(Mark mark) {
        marks.add(mark);
    }

    void line(Pen pen, Point... points) {
        add(new Mark.Line(List.of(points), pen));
    }

    void outline(Pen pen, List<Point> points) {
        List<Point> closed = new ArrayList<>(points);
        closed.add(points.get(0));
        add(new Mark.Line(closed, pen));
    }

    TextMeasure.Extent extent(String text, Style style) {
        return measure.of(text, style.face(), mm(style.mm()));
    }

    double width(String text, Style style) {
        return text.isEmpty() ? 0 : extent(text, style).width();
    }

    /** The room that a text takes with its left end and the middle of its height there. */
    Box room(String text, Style style, double left, double middle) {
        TextMeasure.Extent extent = extent(text, style);
        return new Box(left, middle - extent.height() / 2, extent.width(), extent.height());
    }

    /** Writes a text with its left end and the middle of its height there; an empty text leaves nothing. */
    void write(String text, Style style, double left, double middle) {
        if (!text.isEmpty()) {
            write(text, style, room(text, style, left, middle), 0, Optional.empty());
        }
    }

    void writeCentred(String text, Style style, double centre, double middle) {
        write(text, style, centre - width(text, style) / 2, middle);
    }

    /** Writes a text into its box, which has that much padding at the left and right. */
    void write(String text, Style style, Box box, double padding, Optional<Mark.Plate> plate) {
        TextMeasure.Extent extent = extent(text, style);
        double baseline = box.centre().y() + (extent.ascent() - extent.descent()) / 2;
        add(new Mark.Label(text, style.face(), mm(style.mm()), style.ink(), new Point(box.x() + padding, baseline),
                box, plate));
        take(box);
    }

    /** Breaks a text at its line ends and spaces into lines that fit a width; a word that is wider stands alone. */
    List<String> lines(String text, Style style, double room) {
        List<String> lines = new ArrayList<>();
        text.lines().forEach(line -> wrap(line, style, room, lines));
        return lines.isEmpty() ? List.of("") : lines;
    }

    private void wrap(String text, Style style, double room, List<String> lines) {
        String line = "";
        for (String word : text.split(" ")) {
            String longer = line.isEmpty() ? word : line + " " + word;
            if (!line.isEmpty() && width(longer, style) > room) {
                lines.add(line);
                longer = word;
            }
            line = longer;
        }
        lines.add(line);
    }

    void take(Box box) {
        taken.add(box);
    }

    boolean isFree(Box box) {
        return taken.stream().noneMatch(box::overlaps);
    }

    Drawing finish() {
        return new Drawing(marks);
    }
}
