package bedmark.report.paper;

import org.apache.pdfbox.cos.COSDictionary;
import org.apache.pdfbox.pdmodel.graphics.image.PDImageXObject;

/** A photo that the document holds once. */
public final class Photograph {
    private final PDImageXObject image;

    Photograph(PDImageXObject image) {
        this.image = image;
    }

    COSDictionary dictionary() {
        return image.getCOSObject();
    }

    /** Width over height. */
    public double aspect() {
        return image.getWidth() / (double) image.getHeight();
    }
}
