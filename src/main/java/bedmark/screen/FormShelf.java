package bedmark.screen;

import bedmark.document.Branch;
import bedmark.document.Refused;
import bedmark.form.FieldForm;
import bedmark.json.FormReader;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** The forms of a plant by their ids; read, and checked, when they are first asked for, by any thread. */
final class FormShelf {
    private final List<Branch> written;
    private Optional<Map<String, FieldForm>> read = Optional.empty();

    FormShelf(List<Branch> written) {
        this.written = List.copyOf(written);
    }

    /** @throws Refused where one of them can't be read */
    synchronized Map<String, FieldForm> forms() {
        if (read.isEmpty()) {
            Map<String, FieldForm> forms = new LinkedHashMap<>();
            for (Branch each : written) {
                FieldForm form = FormReader.read(each);
                forms.put(form.id(), form);
            }
            read = Optional.of(forms);
        }
        return read.get();
    }
}
