package bedmark.report;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.form.FieldForm;
import bedmark.office.Difference;
import bedmark.wording.Wording;
import java.util.List;

/** What the sides of a conflict say differently, in one person's language and units. */
public final class ConflictTelling {
    private static final String NOTHING = "–";
    /** What a quantity carries beside its number, which is named after it. */
    private static final List<String> BESIDE = List.of("at", "quality", "standardUncertainty", "beltState");

    private final Wording wording;
    private final FieldForm form;

    /** @param form by which readings are named */
    public ConflictTelling(Wording wording, FieldForm form) {
        this.wording = wording;
        this.form = form;
    }

    /** What people call the thing that is said differently. */
    public String name(Difference difference) {
        String last = difference.place().last();
        if (difference.place().tokens().size() > 2 && BESIDE.contains(last)) {
            String reading = difference.place().toString();
            return wording.reading(reading.substring(0, reading.length() - last.length() - 1), form) + ", "
                    + wording.text("office.side.beside." + last);
        }
        String key = "office.side.key." + difference.place().tokens().get(0);
        return difference.place().tokens().size() == 1 && wording.words().has(key) ? wording.text(key)
                : wording.reading(difference.place().toString(), form);
    }

    /** What a side says there. */
    public String value(Difference difference, int side) {
        return difference.values().get(side).map(node -> {
            if (node instanceof Branch quantity) {
                return wording.entered(quantity.asQuantity());
            } else if (node instanceof Node.Decimal number) {
                return number.value().toPlainString();
            } else if (node instanceof Node.Flag flag) {
                return wording.text(flag.value() ? "screen.yes" : "screen.no");
            }
            return node instanceof Node.Text text ? words(difference.place().last(), text.value()) : NOTHING;
        }).orElse(NOTHING);
    }

    private String words(String key, String text) {
        String code = "screen." + key + "." + text;
        return wording.words().has(code) ? wording.text(code) : text;
    }
}
