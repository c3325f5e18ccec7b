package bedmark.office;

import java.util.List;
import java.util.regex.Pattern;
import java.util.stream.Collectors;

/**
 * Rows of CSV as RFC 4180 has them, for spreadsheets: numbers plain with a decimal point, and a text that a spreadsheet
 * would take for a formula with an apostrophe before it. A text that begins with an apostrophe gets another one, so
 * that a reader who takes one away from each cell that has one has read exactly what was written.
 */
public final class Csv {
    private static final Pattern NUMBER = Pattern.compile("-?[0-9]+(\\.[0-9]+)?(E-?[0-9]+)?");
    private static final Pattern LIKE_A_FORMULA =
            Pattern.compile("['=+@\\-\\t\\r\\n\uFF1D\uFF0B\uFF0D\uFF20].*", Pattern.DOTALL);

    /** What separates cells, in some spreadsheet of some language at least, where it is not quoted. */
    private static final Pattern SPLITTING = Pattern.compile("[\",;\\t\\r\\n]");

    private Csv() {
    }

    /** One row with its line end. */
    public static String row(List<String> cells) {
        return cells.stream().map(Csv::cell).collect(Collectors.joining(",", "", "\r\n"));
    }

    private static String cell(String text) {
        String safe = !NUMBER.matcher(text).matches() && LIKE_A_FORMULA.matcher(text).matches() ? "'" + text : text;
        return SPLITTING.matcher(safe).find() ? "\"" + safe.replace("\"", "\"\"") + "\"" : safe;
    }

    /** Whether a cell that was read has the apostrophe before it that {@link #row} puts there. */
    public static boolean guarded(String cell) {
        return cell.startsWith("'") && LIKE_A_FORMULA.matcher(cell.substring(1)).matches();
    }
}
