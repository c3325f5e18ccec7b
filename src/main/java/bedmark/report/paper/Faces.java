package bedmark.report.paper;

import bedmark.picture.Face;
import bedmark.picture.TextMeasure;
import java.io.IOException;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.apache.pdfbox.pdmodel.PDDocument;

/** The faces of a document: the typeface of the app, and a spare one for what it lacks. Measures text in them. */
public final class Faces implements TextMeasure {
    private static final String FOLDER = "/bedmark/screen/font/B612-";
    private static final String SPARE = "/bedmark/report/DejaVuSans.ttf";
    private static final int UNKNOWN = '\uFFFD';
    /** Cap height and figures of the typeface rise 0.76 of its size; what hangs below the line takes 0.2. */
    private static final double ASCENT = 0.76;
    private static final double DESCENT = 0.2;
    private static final int KEPT = 20_000;

    private final PDDocument document;
    private final Map<Face, EmbeddedFace> own = new EnumMap<>(Face.class);
    private Optional<EmbeddedFace> spare = Optional.empty();
    /** Widths as a share of the size: a page is tried at several sizes. */
    private final Map<Face, Map<String, Double>> widths = new EnumMap<>(Face.class);

    Faces(PDDocument document) {
        this.document = document;
        own.put(Face.PLAIN, new OutlineFace(document, FOLDER + "Regular.otf"));
        own.put(Face.BOLD, new OutlineFace(document, FOLDER + "Bold.otf"));
        own.put(Face.ITALIC, new OutlineFace(document, FOLDER + "Italic.otf"));
    }

    /** A stretch of text in one embedded face, its characters as codes. */
    record Run(EmbeddedFace face, String codes) {
    }

    /** The text in its faces. */
    List<Run> runs(String text, Face face) {
        List<Run> runs = new ArrayList<>();
        StringBuilder codes = new StringBuilder();
        EmbeddedFace current = own.get(face);
        for (int character : text.codePoints().map(Faces::plain).toArray()) {
            EmbeddedFace next = faceOf(character, face);
            if (next != current && !codes.isEmpty()) {
                runs.add(new Run(current, codes.toString()));
                codes.setLength(0);
            }
            current = next;
            codes.append(current.code(known(current, character)));
        }
        if (!codes.isEmpty()) {
            runs.add(new Run(current, codes.toString()));
        }
        return runs;
    }

    /** Spaces and hyphens of one meaning are one to a face; what commands a terminal is a space. */
    private static int plain(int character) {
        return switch (character) {
            case '\u202F', '\u2009', '\u2007' -> '\u00A0';
            case '\u2011' -> '-';
            default -> Character.isISOControl(character) || Character.getType(character) == Character.FORMAT
                    ? ' ' : character;
        };
    }

    private EmbeddedFace faceOf(int character, Face face) {
        EmbeddedFace first = own.get(face);
        if (first.covers(character)) {
            return first;
        }
        if (spare.isEmpty()) {
            spare = Optional.of(new SpareFace(document, SPARE));
        }
        return spare.get();
    }

    private static int known(EmbeddedFace face, int character) {
        return face.covers(character) ? character : UNKNOWN;
    }

    /** The width of a text (pt). */
    public double width(String text, Face face, double size) {
        Map<String, Double> known = widths.computeIfAbsent(face, key -> new HashMap<>());
        if (known.size() > KEPT) {
            known.clear();
        }
        return known.computeIfAbsent(text, word -> width(word, face)) * size;
    }

    private double width(String text, Face face) {
        double width = 0;
        for (int i = 0; i < text.length(); i += Character.charCount(text.codePointAt(i))) {
            int character = plain(text.codePointAt(i));
            EmbeddedFace one = faceOf(character, face);
            width += one.advance(known(one, character));
        }
        return width;
    }

    /** As much of a text as fits, with an ellipsis where it is cut. */
    public String fitting(String text, Lettering lettering, double room) {
        if (width(text, lettering.face(), lettering.size()) <= room) {
            return text;
        }
        int end = text.length();
        while (end > 0 && width(text.substring(0, end) + "…", lettering.face(), lettering.size()) > room) {
            end = text.offsetByCodePoints(end, -1);
        }
        return end == 0 ? "" : text.substring(0, end).stripTrailing() + "…";
    }

    @Override
    public Extent of(String text, Face face, double size) {
        return new Extent(width(text, face, size), ASCENT * size, DESCENT * size);
    }

    void finish() throws IOException {
        for (EmbeddedFace face : own.values()) {
            face.finish();
        }
        if (spare.isPresent()) {
            spare.get().finish();
        }
    }
}
