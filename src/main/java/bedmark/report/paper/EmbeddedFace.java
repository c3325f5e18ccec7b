package bedmark.report.paper;

import java.io.IOException;
import org.apache.pdfbox.cos.COSDictionary;

/** A typeface that goes into the document. */
interface EmbeddedFace {

    boolean covers(int character);

    /** Width of a character, as a share of the size of the type. */
    double advance(int character);

    /** The character as a hexadecimal code of the face; it is embedded from now on. */
    String code(int character);

    /** The font's dictionary, to be named in the resources of pages. */
    COSDictionary dictionary();

    /** Completes the dictionary when all text is written. */
    void finish() throws IOException;
}
