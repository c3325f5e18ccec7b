package bedmark.report.paper;

import bedmark.picture.Ink;
import bedmark.picture.Point;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.apache.pdfbox.cos.COSArray;
import org.apache.pdfbox.cos.COSDictionary;
import org.apache.pdfbox.cos.COSFloat;
import org.apache.pdfbox.cos.COSName;
import org.apache.pdfbox.pdmodel.PDPage;

/** One page under way. What is drawn outside of {@link #marked} is an artifact that nobody reads aloud. */
public final class Leaf {
    /** Reach of the control points of a quarter circle. */
    private static final double KAPPA = 0.552_284_75;

    private final Booklet booklet;
    private final PDPage page;
    private final int number;
    private final double height;
    private final Operators operators = new Operators();
    private final Map<COSDictionary, String> names = new HashMap<>();
    private boolean marking;

    Leaf(Booklet booklet, PDPage page, int number) {
        this.booklet = booklet;
        this.page = page;
        this.number = number;
        height = page.getMediaBox().getHeight();
        page.getCOSObject().setInt(COSName.STRUCT_PARENTS, number);
    }

    PDPage page() {
        return page;
    }

    /** Counted from 1. */
    public int number() {
        return number + 1;
    }

    Operators operators() {
        return operators;
    }

    /** The drawing is content of the element that is open. */
    void marked(Runnable drawing) {
        int content = booklet.tags().content(number, page.getCOSObject());
        operators.add("/" + booklet.tags().type() + " <</MCID " + content + ">>", "BDC");
        marking = true;
        drawing.run();
        marking = false;
        operators.add("EMC");
    }

    private void drawn(Runnable drawing) {
        if (marking) {
            drawing.run();
        } else {
            operators.add("/Artifact", "BMC");
            drawing.run();
            operators.add("EMC");
        }
    }

    COSArray box(double x, double y, double width, double depth) {
        COSArray box = new COSArray();
        for (double side : new double[] {x, height - y - depth, x + width, height - y}) {
            box.add(new COSFloat((float) side));
        }
        return box;
    }

    double up(double y) {
        return height - y;
    }

    /** A line of text, content of the element that is open. */
    public void write(String text, Lettering lettering, double x, double baseline) {
        marked(() -> letters(text, lettering, x, baseline));
    }

    /** A line of text that nobody reads aloud, such as a page's number. */
    public void mutter(String text, Lettering lettering, double x, double baseline) {
        drawn(() -> letters(text, lettering, x, baseline));
    }

    private void letters(String text, Lettering lettering, double x, double baseline) {
        operators.add("BT").add("rg", booklet.hue(lettering.ink()))
                .add("Tm", 1, 0, 0, 1, x, up(baseline));
        for (Faces.Run run : booklet.faces().runs(text, lettering.face())) {
            operators.add("/" + name(run.face().dictionary(), "F") + " " + Operators.number(lettering.size()), "Tf")
                    .add("<" + run.codes() + ">", "Tj");
        }
        operators.add("ET");
    }

    /** The name of a font or an image in the page's resources. */
    private String name(COSDictionary thing, String prefix) {
        return names.computeIfAbsent(thing, key -> {
            String made = prefix + names.size();
            COSName kind = prefix.equals("F") ? COSName.FONT : COSName.XOBJECT;
            COSDictionary resources = page.getResources().getCOSObject();
            if (!resources.containsKey(kind)) {
                resources.setItem(kind, new COSDictionary());
            }
            resources.getCOSDictionary(kind).setItem(COSName.getPDFName(made), thing);
            return made;
        });
    }

    public void fill(Ink ink, double x, double y, double width, double depth) {
        drawn(() -> operators.add("rg", booklet.hue(ink)).add("re", x, height - y - depth, width, depth).add("f"));
    }

    public void frame(Ink ink, double pen, double x, double y, double width, double depth) {
        drawn(() -> {
            solid(ink, pen);
            operators.add("re", x, height - y - depth, width, depth).add("S");
        });
    }

    public void fill(Ink ink, List<Point> outline) {
        drawn(() -> {
            operators.add("rg", booklet.hue(ink));
            path(outline);
            operators.add("f");
        });
    }

    /** A level rule. */
    public void rule(Ink ink, double pen, double x, double y, double width) {
        line(ink, pen, List.of(new Point(x, y), new Point(x + width, y)));
    }

    public void line(Ink ink, double pen, List<Point> points) {
        drawn(() -> {
            solid(ink, pen);
            path(points);
            operators.add("S");
        });
    }

    public void dashed(Ink ink, double pen, double dash, double gap, List<Point> points) {
        drawn(() -> {
            operators.add("q");
            solid(ink, pen);
            operators.add("J", 0).add("[" + Operators.number(dash) + " " + Operators.number(gap) + "] 0", "d");
            path(points);
            operators.add("S").add("Q");
        });
    }

    private void solid(Ink ink, double pen) {
        operators.add("RG", booklet.hue(ink)).add("w", pen).add("J", 1).add("j", 1);
    }

    private void path(List<Point> points) {
        for (int i = 0; i < points.size(); i++) {
            operators.add(i == 0 ? "m" : "l", points.get(i).x(), up(points.get(i).y()));
        }
    }

    public void disc(Ink ink, Point centre, double radius) {
        drawn(() -> {
            operators.add("rg", booklet.hue(ink));
            circle(centre, radius);
            operators.add("f");
        });
    }

    public void ring(Ink ink, double pen, Point centre, double radius) {
        drawn(() -> {
            solid(ink, pen);
            circle(centre, radius);
            operators.add("s");
        });
    }

    private void circle(Point centre, double r) {
        double x = centre.x();
        double y = up(centre.y());
        double k = r * KAPPA;
        operators.add("m", x + r, y).add("c", x + r, y + k, x + k, y + r, x, y + r)
                .add("c", x - k, y + r, x - r, y + k, x - r, y).add("c", x - r, y - k, x - k, y - r, x, y - r)
                .add("c", x + k, y - r, x + r, y - k, x + r, y);
    }

    /** A shape on a grid of its own, drawn with its upper left corner there, so many points to the grid's unit. */
    public void shape(String outline, Ink ink, double pen, boolean filled, double x, double y, double scale) {
        if (outline.isEmpty()) {
            return;
        }
        drawn(() -> {
            operators.add("q").add("cm", scale, 0, 0, -scale, x, up(y));
            operators.add(filled ? "rg" : "RG", booklet.hue(ink)).add("w", pen).add("J", 0).add("j", 1);
            OutlinePath.draw(outline, operators);
            operators.add(filled ? "f" : "S").add("Q");
        });
    }

    public void image(Photograph photo, double x, double y, double width, double depth) {
        drawn(() -> operators.add("q").add("cm", width, 0, 0, depth, x, height - y - depth)
                .add("/" + name(photo.dictionary(), "I"), "Do").add("Q"));
    }
}
