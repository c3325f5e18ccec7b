package bedmark.report.paper;

import java.util.Optional;
import java.util.stream.Stream;

/** The sizes of paper that offices have. */
public enum PaperSize {
    A4("a4", 595.276, 841.89),
    LETTER("letter", 612, 792);

    private final String code;
    private final double width;
    private final double height;

    PaperSize(String code, double width, double height) {
        this.code = code;
        this.width = width;
        this.height = height;
    }

    /** The word used in options. */
    public String code() {
        return code;
    }

    public static Optional<PaperSize> ofCode(String code) {
        return Stream.of(values()).filter(size -> size.code.equals(code)).findFirst();
    }

    /** (pt). */
    public double width() {
        return width;
    }

    /** (pt). */
    public double height() {
        return height;
    }
}
