package bedmark.report.paper;

import java.util.ArrayList;
import java.util.List;

/** Sets text from the top of a page downwards, and goes on on the next page where one is full. */
public final class Flow {
    /** White at the left and right of a page (pt). */
    public static final double SIDE = 48;
    private static final double TOP = 46;
    private static final double FOOT = 52;

    private final Booklet booklet;
    private Leaf leaf;
    private double side = SIDE;
    private double top = TOP;
    private double y = TOP;

    /** Begins on a new page. */
    public Flow(Booklet booklet) {
        this.booklet = booklet;
        leaf = booklet.leaf();
    }

    public Booklet booklet() {
        return booklet;
    }

    public Leaf leaf() {
        return leaf;
    }

    /** Where the next thing begins. */
    public double y() {
        return y;
    }

    public void down(double points) {
        y += points;
    }

    public double left() {
        return side;
    }

    /** The room between the white at both sides. */
    public double width() {
        return booklet.size().width() - 2 * side;
    }

    /** What is left of the page. */
    public double room() {
        return booklet.size().height() - FOOT - y;
    }

    /** The room of a whole page. */
    public double page() {
        return booklet.size().height() - FOOT - top;
    }

    public void nextLeaf() {
        leaf = booklet.leaf();
        y = top;
    }

    /** The same with less white, or more, at its sides and top (pt), for this page and those that follow. */
    public void nextLeaf(double newSide, double newTop) {
        side = newSide;
        top = newTop;
        nextLeaf();
    }

    /**
     * Sees to it that there is room for something that is to stay together.
     *
     * @return whether a new page was begun
     */
    public boolean need(double height) {
        if (room() >= height || y == top) {
            return false;
        }
        nextLeaf();
        return true;
    }

    /** A paragraph over the whole width. */
    public void paragraph(String type, String text, Lettering lettering) {
        paragraph(type, text, lettering, left(), width());
    }

    /** A paragraph in an element of that type, broken into lines that fit. */
    public void paragraph(String type, String text, Lettering lettering, double x, double width) {
        booklet.tags().within(type, () -> lines(text, lettering, x, width));
    }

    /** Lines of the element that is open. */
    public void lines(String text, Lettering lettering, double x, double width) {
        for (String line : broken(text, lettering, width)) {
            need(lettering.leading());
            leaf.write(line, lettering, x, y + lettering.rise());
            y += lettering.leading();
        }
    }

    /** A text in lines that fit a width: broken between words, and within one that is wider than a line. */
    public List<String> broken(String text, Lettering lettering, double width) {
        List<String> lines = new ArrayList<>();
        StringBuilder line = new StringBuilder();
        double used = 0;
        double space = measured(" ", lettering);
        for (String word : text.strip().split(" +")) {
            double wide = measured(word, lettering);
            if (!line.isEmpty() && used + space + wide > width) {
                lines.add(line.toString());
                line.setLength(0);
                used = 0;
            }
            String rest = word;
            while (measured(rest, lettering) > width && rest.codePointCount(0, rest.length()) > 1) {
                String head = head(rest, lettering, width);
                lines.add(head);
                rest = rest.substring(head.length());
            }
            used += (line.isEmpty() ? 0 : space) + measured(rest, lettering);
            line.append(line.isEmpty() ? "" : " ").append(rest);
        }
        lines.add(line.toString());
        return lines;
    }

    /** As much of a word as fits, one character at least. */
    private String head(String word, Lettering lettering, double width) {
        int end = word.offsetByCodePoints(0, 1);
        while (end < word.length()) {
            int next = word.offsetByCodePoints(end, 1);
            if (measured(word.substring(0, next), lettering) > width) {
                break;
            }
            end = next;
        }
        return word.substring(0, end);
    }

    /** As much of a text as fits, with an ellipsis where it is cut; nothing where there is no room for that. */
    public String fitting(String text, Lettering lettering, double width) {
        return booklet.faces().fitting(text, lettering, width);
    }

    /** The width of a text (pt). */
    public double measured(String text, Lettering lettering) {
        return booklet.faces().width(text, lettering.face(), lettering.size());
    }
}
