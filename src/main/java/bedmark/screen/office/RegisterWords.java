package bedmark.screen.office;

import bedmark.document.Defect;
import bedmark.wording.Wording;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Says where something of the register's tables is wrong in the words that head them. */
final class RegisterWords {
    private RegisterWords() {
    }

    static String column(Wording wording, String key) {
        return wording.words().has("office.key." + key) ? wording.text("office.key." + key) : key;
    }

    static String list(Wording wording, String list) {
        return wording.text("office.list." + list);
    }

    /** A defect with its place and its columns in words. */
    static Defect of(Wording wording, RegisterEdits.Cell cell, Defect defect) {
        if (defect.where().isEmpty()) {
            return defect;
        }
        String row = cell.row().map(names -> String.join(" ", names)).orElseGet(() ->
                wording.text("office.register.new-row"));
        Optional<String> key = Optional.of(cell.key()).filter(one -> defect.where().endsWith(" " + one));
        String place = key.map(one -> wording.text("office.register.place-cell", list(wording, cell.list()), row,
                column(wording, one))).orElseGet(() -> wording.text("office.register.place", list(wording, cell.list()),
                row));
        List<String> details = new ArrayList<>(defect.details());
        if (defect.code().equals("cell-reference-unknown")) {
            details.set(1, list(wording, details.get(1)).toLowerCase(Locale.ROOT));
        } else if (defect.code().equals("row-name-twice")) {
            details.set(0, column(wording, details.get(0)).toLowerCase(Locale.ROOT));
        }
        return Defect.in(place, defect.code(), details.toArray(String[]::new));
    }
}
