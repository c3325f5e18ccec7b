package bedmark.report.paper;

import java.io.IOException;
import java.io.InputStream;
import java.util.HexFormat;
import java.util.Objects;
import org.apache.pdfbox.cos.COSDictionary;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.font.PDType0Font;

/**
 * A face of many scripts for the characters that the typeface of the app lacks: a sign of a formula, a name in another
 * alphabet. Only what is used of it is embedded.
 */
final class SpareFace implements EmbeddedFace {
    private static final double THOUSAND = 1000;

    private final PDType0Font font;

    SpareFace(PDDocument document, String resource) {
        try (InputStream file = Objects.requireNonNull(SpareFace.class.getResourceAsStream(resource), resource)) {
            font = PDType0Font.load(document, file, true);
        } catch (IOException e) {
            throw new IllegalStateException("the typeface cannot be read: " + resource, e);
        }
    }

    @Override
    public boolean covers(int character) {
        try {
            return font.encode(Character.toString(character)).length > 0;
        } catch (IllegalArgumentException | IOException e) {
            return false;
        }
    }

    @Override
    public double advance(int character) {
        try {
            return font.getStringWidth(Character.toString(character)) / THOUSAND;
        } catch (IOException e) {
            throw new IllegalStateException("the typeface cannot be read", e);
        }
    }

    @Override
    public String code(int character) {
        try {
            font.addToSubset(character);
            return HexFormat.of().withUpperCase().formatHex(font.encode(Character.toString(character)));
        } catch (IOException e) {
            throw new IllegalStateException("the typeface cannot be read", e);
        }
    }

    @Override
    public COSDictionary dictionary() {
        return font.getCOSObject();
    }

    @Override
    public void finish() throws IOException {
        font.subset();
    }
}
