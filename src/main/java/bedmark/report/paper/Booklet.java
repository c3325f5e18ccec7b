package bedmark.report.paper;

import bedmark.picture.Ink;
import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.io.Closeable;
import java.io.IOException;
import java.io.OutputStream;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.GregorianCalendar;
import java.util.List;
import java.util.Locale;
import java.util.function.Consumer;
import org.apache.pdfbox.cos.COSName;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.PDDocumentCatalog;
import org.apache.pdfbox.pdmodel.PDPage;
import org.apache.pdfbox.pdmodel.PDResources;
import org.apache.pdfbox.pdmodel.common.PDRectangle;
import org.apache.pdfbox.pdmodel.common.PDStream;
import org.apache.pdfbox.pdmodel.documentinterchange.logicalstructure.PDMarkInfo;
import org.apache.pdfbox.pdmodel.graphics.image.JPEGFactory;
import org.apache.pdfbox.pdmodel.interactive.documentnavigation.destination.PDPageFitWidthDestination;
import org.apache.pdfbox.pdmodel.interactive.documentnavigation.outline.PDDocumentOutline;
import org.apache.pdfbox.pdmodel.interactive.documentnavigation.outline.PDOutlineItem;
import org.apache.pdfbox.pdmodel.interactive.viewerpreferences.PDViewerPreferences;

/**
 * A document of pages under way: text with its structure (after ISO 14289-1), every face embedded, nothing fetched from
 * elsewhere. The same calls make the same bytes.
 */
public final class Booklet implements Closeable {
    private static final float PHOTO_QUALITY = 0.85f;

    private final PDDocument document = new PDDocument();
    private final PaperSize size;
    private final Imprint imprint;
    private final Faces faces = new Faces(document);
    private final Hues hues = new Hues();
    private final Tags tags = new Tags();
    private final List<Leaf> leaves = new ArrayList<>();
    private final PDDocumentOutline outline = new PDDocumentOutline();

    /**
     * What a document says of itself.
     *
     * @param title    what it is called
     * @param language of its words
     * @param producer the program
     * @param madeAt   when it was made
     */
    public record Imprint(String title, Locale language, String producer, OffsetDateTime madeAt) {
    }

    public Booklet(PaperSize size, Imprint imprint) {
        this.size = size;
        this.imprint = imprint;
    }

    public PaperSize size() {
        return size;
    }

    public Faces faces() {
        return faces;
    }

    public Tags tags() {
        return tags;
    }

    double[] hue(Ink ink) {
        return hues.of(ink);
    }

    /** A new page at the end. */
    public Leaf leaf() {
        PDPage page = new PDPage(new PDRectangle((float) size.width(), (float) size.height()));
        page.setResources(new PDResources());
        document.addPage(page);
        Leaf leaf = new Leaf(this, page, tags.page());
        leaves.add(leaf);
        return leaf;
    }

    /** The pages so far. */
    public List<Leaf> leaves() {
        return List.copyOf(leaves);
    }

    /**
     * An entry of the document's outline.
     *
     * @param within under the entry before it
     */
    public void entry(String title, Leaf leaf, boolean within) {
        PDOutlineItem item = new PDOutlineItem();
        item.setTitle(title);
        PDPageFitWidthDestination place = new PDPageFitWidthDestination();
        place.setPage(leaf.page());
        place.setTop((int) Math.ceil(size.height()));
        item.setDestination(place);
        if (within && outline.getLastChild() != null) {
            outline.getLastChild().addLast(item);
        } else {
            outline.addLast(item);
        }
    }

    /** A photo without what its camera wrote beside it. */
    public Photograph photograph(BufferedImage image) {
        try {
            return new Photograph(JPEGFactory.createFromImage(document, image, PHOTO_QUALITY));
        } catch (IOException e) {
            throw new IllegalStateException("a photo cannot be written", e);
        }
    }

    /**
     * Writes the document; nothing can be drawn afterwards.
     *
     * @param last is given each page, for what stands at the foot of all of them
     */
    public void write(OutputStream out, Consumer<Leaf> last) throws IOException {
        for (Leaf leaf : leaves) {
            last.accept(leaf);
            leaf.page().getCOSObject().setItem(COSName.CONTENTS, new PDStream(document,
                    new ByteArrayInputStream(leaf.operators().bytes()), COSName.FLATE_DECODE));
        }
        faces.finish();
        tags.finish(document);
        PDDocumentCatalog catalog = document.getDocumentCatalog();
        catalog.setLanguage(imprint.language().toLanguageTag());
        PDMarkInfo marks = new PDMarkInfo();
        marks.setMarked(true);
        catalog.setMarkInfo(marks);
        PDViewerPreferences preferences = new PDViewerPreferences(catalog.getCOSObject());
        preferences.setDisplayDocTitle(true);
        catalog.getCOSObject().setItem(COSName.VIEWER_PREFERENCES, preferences);
        catalog.setDocumentOutline(outline);
        catalog.getCOSObject().setItem(COSName.METADATA, Metadata.stream(document, imprint));
        document.getDocumentInformation().setTitle(imprint.title());
        document.getDocumentInformation().setProducer(imprint.producer());
        document.getDocumentInformation().setCreationDate(
                GregorianCalendar.from(imprint.madeAt().toZonedDateTime()));
        document.setDocumentId(imprint.madeAt().toInstant().toEpochMilli());
        document.save(out);
    }

    @Override
    public void close() throws IOException {
        document.close();
    }
}
