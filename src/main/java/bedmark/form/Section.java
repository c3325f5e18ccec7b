package bedmark.form;

import java.util.List;
import java.util.Optional;

/**
 * A part of a form that is shown together.
 *
 * @param key  unique among the sections of the form
 * @param help what the person does here
 */
public record Section(String key, Texts title, Optional<Texts> help, List<Field> fields) {
    public Section {
        fields = List.copyOf(fields);
    }
}
