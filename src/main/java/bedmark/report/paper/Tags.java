package bedmark.report.paper;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;
import java.util.function.Consumer;
import org.apache.pdfbox.cos.COSArray;
import org.apache.pdfbox.cos.COSBase;
import org.apache.pdfbox.cos.COSDictionary;
import org.apache.pdfbox.cos.COSInteger;
import org.apache.pdfbox.cos.COSName;
import org.apache.pdfbox.pdmodel.PDDocument;

/**
 * The structure of a document (ISO 32000-1, 14.7): what is a heading, a paragraph, a table cell, a figure, in the order
 * in which it is read aloud. What is drawn outside of an element is an artifact.
 */
public final class Tags {
    private static final COSName SCOPE = COSName.getPDFName("Scope");
    private static final COSName NUMS = COSName.getPDFName("Nums");

    private final COSDictionary root = new COSDictionary();
    private final Deque<COSDictionary> open = new ArrayDeque<>();
    /** For each page, for each marked content of it, its element. */
    private final List<COSArray> parents = new ArrayList<>();

    Tags() {
        root.setItem(COSName.TYPE, COSName.STRUCT_TREE_ROOT);
        COSDictionary whole = element("Document", root);
        root.setItem(COSName.K, whole);
        open.push(whole);
    }

    private static COSDictionary element(String type, COSDictionary parent) {
        COSDictionary element = new COSDictionary();
        element.setItem(COSName.TYPE, COSName.getPDFName("StructElem"));
        element.setName(COSName.S, type);
        element.setItem(COSName.P, parent);
        element.setItem(COSName.K, new COSArray());
        return element;
    }

    /** Does what is within an element of that standard type. */
    public void within(String type, Runnable content) {
        within(type, element -> { }, content);
    }

    /** A cell at the head of a column. */
    public void columnHead(Runnable content) {
        within("TH", element -> element.setItem(COSName.A, scope("Column")), content);
    }

    /** A cell at the head of a row. */
    public void rowHead(Runnable content) {
        within("TH", element -> element.setItem(COSName.A, scope("Row")), content);
    }

    private static COSDictionary scope(String scope) {
        COSDictionary attribute = new COSDictionary();
        attribute.setName(COSName.O, "Table");
        attribute.setName(SCOPE, scope);
        return attribute;
    }

    /** A figure with the words for who does not see it, and the room that it takes on its page. */
    public void figure(Leaf leaf, String words, double x, double y, double width, double height, Runnable drawing) {
        within("Figure", element -> {
            element.setString(COSName.ALT, words);
            COSDictionary layout = new COSDictionary();
            layout.setName(COSName.O, "Layout");
            layout.setItem(COSName.BBOX, leaf.box(x, y, width, height));
            element.setItem(COSName.A, layout);
        }, () -> leaf.marked(drawing));
    }

    private void within(String type, Consumer<COSDictionary> attributes, Runnable content) {
        COSDictionary element = element(type, open.peek());
        attributes.accept(element);
        kids(open.peek()).add(element);
        open.push(element);
        content.run();
        open.pop();
    }

    private static COSArray kids(COSDictionary element) {
        return (COSArray) element.getDictionaryObject(COSName.K);
    }

    /** Takes a page in; its contents are counted from 0. */
    int page() {
        parents.add(new COSArray());
        return parents.size() - 1;
    }

    /** The type of the element that is open. */
    String type() {
        return open.element().getNameAsString(COSName.S);
    }

    /** The number of a new marked content of the open element on a page. */
    int content(int page, COSDictionary pageDictionary) {
        COSArray contents = parents.get(page);
        int number = contents.size();
        COSDictionary element = open.element();
        contents.add(element);
        COSBase first = element.getDictionaryObject(COSName.PG);
        if (first == null) {
            element.setItem(COSName.PG, pageDictionary);
        }
        if (first == null || first == pageDictionary) {
            kids(element).add(COSInteger.get(number));
        } else {
            COSDictionary reference = new COSDictionary();
            reference.setName(COSName.TYPE, "MCR");
            reference.setItem(COSName.PG, pageDictionary);
            reference.setInt(COSName.MCID, number);
            kids(element).add(reference);
        }
        return number;
    }

    /** Hangs the structure into its document. */
    void finish(PDDocument document) {
        COSArray numbers = new COSArray();
        for (int page = 0; page < parents.size(); page++) {
            numbers.add(COSInteger.get(page));
            numbers.add(parents.get(page));
        }
        COSDictionary tree = new COSDictionary();
        tree.setItem(NUMS, numbers);
        root.setItem(COSName.PARENT_TREE, tree);
        root.setInt(COSName.PARENT_TREE_NEXT_KEY, parents.size());
        document.getDocumentCatalog().getCOSObject().setItem(COSName.STRUCT_TREE_ROOT, root);
    }
}
