package bedmark.report.paper;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.HashMap;
import java.util.Map;
import java.util.Objects;
import java.util.TreeMap;
import org.apache.fontbox.ttf.CmapLookup;
import org.apache.fontbox.ttf.OTFParser;
import org.apache.fontbox.ttf.OpenTypeFont;
import org.apache.pdfbox.cos.COSArray;
import org.apache.pdfbox.cos.COSDictionary;
import org.apache.pdfbox.cos.COSInteger;
import org.apache.pdfbox.cos.COSName;
import org.apache.pdfbox.cos.COSString;
import org.apache.pdfbox.io.RandomAccessReadBuffer;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.common.PDStream;

/**
 * An OpenType face with PostScript outlines, embedded whole as a CID font of type 0 (ISO 32000-1, 9.7.4): since its
 * outlines are not keyed by CIDs, a code is a glyph's index. The library embeds TrueType outlines only.
 */
final class OutlineFace implements EmbeddedFace {
    private static final int SYMBOLIC = 4;

    private final String name;
    private final OpenTypeFont font;
    private final CmapLookup characters;
    private final double em;
    private final PDDocument document;
    private final COSDictionary dictionary = new COSDictionary();
    /** Glyph to character. */
    private final Map<Integer, Integer> used = new TreeMap<>();
    private final Map<Integer, Glyph> glyphs = new HashMap<>();

    /**
     * A character in the face.
     *
     * @param index   0 where the face has none
     * @param advance as a share of the size of the type
     * @param code    hexadecimal
     */
    private record Glyph(int index, double advance, String code) {
    }

    OutlineFace(PDDocument document, String resource) {
        this.document = document;
        try (InputStream file = Objects.requireNonNull(OutlineFace.class.getResourceAsStream(resource), resource)) {
            font = new OTFParser().parse(new RandomAccessReadBuffer(file.readAllBytes()));
            characters = font.getUnicodeCmapLookup();
            em = font.getUnitsPerEm();
            name = font.getName();
        } catch (IOException e) {
            throw new IllegalStateException("the typeface cannot be read: " + resource, e);
        }
    }

    @Override
    public boolean covers(int character) {
        return glyph(character).index() != 0;
    }

    @Override
    public double advance(int character) {
        return glyph(character).advance();
    }

    private Glyph glyph(int character) {
        return glyphs.computeIfAbsent(character, key -> {
            int index = characters.getGlyphId(key);
            return new Glyph(index, width(index) / em, hex(index));
        });
    }

    private double width(int glyph) {
        try {
            return font.getAdvanceWidth(glyph);
        } catch (IOException e) {
            throw new IllegalStateException("the typeface cannot be read: " + name, e);
        }
    }

    @Override
    public String code(int character) {
        Glyph glyph = glyph(character);
        used.putIfAbsent(glyph.index(), character);
        return glyph.code();
    }

    private static String hex(int number) {
        return String.format("%04X", number);
    }

    @Override
    public COSDictionary dictionary() {
        return dictionary;
    }

    @Override
    public void finish() throws IOException {
        COSDictionary descendant = new COSDictionary();
        descendant.setItem(COSName.TYPE, COSName.FONT);
        descendant.setItem(COSName.SUBTYPE, COSName.CID_FONT_TYPE0);
        descendant.setName(COSName.BASE_FONT, name);
        COSDictionary system = new COSDictionary();
        system.setItem(COSName.REGISTRY, new COSString("Adobe"));
        system.setItem(COSName.ORDERING, new COSString("Identity"));
        system.setInt(COSName.SUPPLEMENT, 0);
        descendant.setItem(COSName.CIDSYSTEMINFO, system);
        descendant.setItem(COSName.FONT_DESC, descriptor());
        COSArray widths = new COSArray();
        used.keySet().forEach(glyph -> {
            widths.add(COSInteger.get(glyph));
            COSArray one = new COSArray();
            one.add(COSInteger.get(Math.round(width(glyph) * 1000 / em)));
            widths.add(one);
        });
        descendant.setItem(COSName.W, widths);
        COSArray descendants = new COSArray();
        descendants.add(descendant);
        dictionary.setItem(COSName.TYPE, COSName.FONT);
        dictionary.setItem(COSName.SUBTYPE, COSName.TYPE0);
        dictionary.setName(COSName.BASE_FONT, name);
        dictionary.setItem(COSName.ENCODING, COSName.IDENTITY_H);
        dictionary.setItem(COSName.DESCENDANT_FONTS, descendants);
        dictionary.setItem(COSName.TO_UNICODE, stream(unicode().getBytes(StandardCharsets.US_ASCII)));
        font.close();
    }

    private COSDictionary descriptor() throws IOException {
        COSDictionary descriptor = new COSDictionary();
        descriptor.setItem(COSName.TYPE, COSName.FONT_DESC);
        descriptor.setName(COSName.FONT_NAME, name);
        descriptor.setInt(COSName.FLAGS, SYMBOLIC);
        COSArray box = new COSArray();
        box.add(COSInteger.get(thousandth(font.getHeader().getXMin())));
        box.add(COSInteger.get(thousandth(font.getHeader().getYMin())));
        box.add(COSInteger.get(thousandth(font.getHeader().getXMax())));
        box.add(COSInteger.get(thousandth(font.getHeader().getYMax())));
        descriptor.setItem(COSName.FONT_BBOX, box);
        descriptor.setFloat(COSName.ITALIC_ANGLE, font.getPostScript().getItalicAngle());
        descriptor.setInt(COSName.ASCENT, thousandth(font.getHorizontalHeader().getAscender()));
        descriptor.setInt(COSName.DESCENT, thousandth(font.getHorizontalHeader().getDescender()));
        descriptor.setInt(COSName.CAP_HEIGHT, thousandth(font.getOS2Windows().getCapHeight()));
        descriptor.setInt(COSName.STEM_V, font.getOS2Windows().getWeightClass() / 5);
        COSDictionary outlines = stream(font.getTableBytes(font.getTableMap().get("CFF ")));
        outlines.setName(COSName.SUBTYPE, "CIDFontType0C");
        descriptor.setItem(COSName.FONT_FILE3, outlines);
        return descriptor;
    }

    private int thousandth(double units) {
        return (int) Math.round(units * 1000 / em);
    }

    private COSDictionary stream(byte[] bytes) throws IOException {
        return new PDStream(document, new ByteArrayInputStream(bytes), COSName.FLATE_DECODE).getCOSObject();
    }

    /** What lets a reader turn codes back into characters. */
    private String unicode() {
        StringBuilder map = new StringBuilder("""
                /CIDInit /ProcSet findresource begin
                12 dict begin
                begincmap
                /CIDSystemInfo << /Registry (Adobe) /Ordering (UCS) /Supplement 0 >> def
                /CMapName /Adobe-Identity-UCS def
                /CMapType 2 def
                1 begincodespacerange
                <0000> <FFFF>
                endcodespacerange
                """);
        used.forEach((glyph, character) -> {
            StringBuilder units = new StringBuilder();
            for (char unit : Character.toChars(character)) {
                units.append(hex(unit));
            }
            map.append("1 beginbfchar\n<").append(hex(glyph)).append("> <").append(units)
                    .append(">\nendbfchar\n");
        });
        return map.append("endcmap\nCMapName currentdict /CMap defineresource pop\nend\nend\n").toString();
    }
}
