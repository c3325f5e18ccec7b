package bedmark.form;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** A field form: sections of fields in the order in which they are asked. */
public final class FieldForm {
    private static final Pointer STATUS = Pointer.of("inspectionStatus");

    private final String id;
    private final int version;
    private final Texts title;
    private final List<Section> sections;
    private final Map<String, Field> fields;

    /**
     * @param version counts from 1; a form that changes gets the next one
     * @throws IllegalArgumentException where two fields have one key
     */
    public FieldForm(String id, int version, Texts title, List<Section> sections) {
        this.id = id;
        this.version = version;
        this.title = title;
        this.sections = List.copyOf(sections);
        Map<String, Field> byKey = new LinkedHashMap<>();
        for (Section section : sections) {
            for (Field field : section.fields()) {
                if (byKey.put(field.key(), field) != null) {
                    throw new IllegalArgumentException("two fields with the key " + field.key());
                }
            }
        }
        this.fields = Collections.unmodifiableMap(byKey);
    }

    public String id() {
        return id;
    }

    public int version() {
        return version;
    }

    public Texts title() {
        return title;
    }

    public List<Section> sections() {
        return sections;
    }

    /** All fields by key, in form order. */
    public Map<String, Field> fields() {
        return fields;
    }

    public Optional<Field> field(String key) {
        return Optional.ofNullable(fields.get(key));
    }

    /** The field that asks for what lies at a place of a survey. */
    public Optional<Field> fieldAt(Pointer where) {
        return fields.values().stream().filter(field -> field.places().stream().anyMatch(place -> place.holds(where)))
                .findFirst();
    }

    /**
     * Whether the field is to be shown with the answers so far. One that holds something impossible is shown
     * whatever its condition says, so that it can be mended.
     */
    public boolean shows(Field field, Branch survey) {
        return field.head().shownIf().map(condition -> holds(condition, survey)
                || field.judge(survey, Branch.EMPTY).stream().anyMatch(Judgement.Refusal.class::isInstance))
                .orElse(true);
    }

    /** Whether a survey with these answers needs this one too. */
    public boolean requires(Field field, Branch survey) {
        return shows(field, survey) && (field.head().required()
                || field.head().requiredIf().filter(condition -> holds(condition, survey)).isPresent());
    }

    private boolean holds(Condition condition, Branch survey) {
        return condition.holds(key -> field(key).flatMap(field -> field.answer(survey)));
    }

    /**
     * The required fields without a whole answer, in form order; none where the zone was not inspected.
     *
     * @param survey the survey's document
     */
    public List<Field> gaps(Branch survey) {
        if (survey.at(STATUS).filter(status -> !status.equals(Node.text("inspected"))).isPresent()) {
            return List.of();
        }
        return fields.values().stream().filter(field -> requires(field, survey) && !field.answered(survey)).toList();
    }

    /** What is impossible among the answers, in form order: a survey is completed without any. */
    public List<Judgement.Refusal> refusals(Branch survey) {
        return fields.values().stream().flatMap(field -> field.judge(survey, Branch.EMPTY).stream())
                .filter(Judgement.Refusal.class::isInstance).map(Judgement.Refusal.class::cast).toList();
    }
}
