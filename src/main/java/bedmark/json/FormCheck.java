package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Pointer;
import bedmark.form.Group;
import bedmark.form.ReadingKey;
import bedmark.form.SealsField;
import bedmark.form.StationsField;
import bedmark.form.Texts;
import bedmark.quantity.Dimension;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;

/**
 * Finds every fault of a field form: first those against its schema, and where there are none those that no schema
 * tells.
 */
final class FormCheck {
    static final String LANGUAGE_MISSING = "language-missing";

    /** What a survey holds beside the answers of its form. */
    private static final Set<String> TAKEN = Set.of("id", "revision", "supersedes", "round", "transfer", "form",
            "inspector", "signedOffBy", "startedAt", "completedAt", "inspectionStatus", "statusReason", "readings",
            "observations", "actions", "carriedOver", "photos", "assessment");
    /** Readings that a field of another key writes. */
    private static final Set<String> WRITTEN_ELSEWHERE = Set.of("beltTiming", "pulleySpeed", "depthMethod");

    private final List<Defect> found = new ArrayList<>();
    private final Map<String, Branch> fields = new LinkedHashMap<>();

    private FormCheck() {
    }

    /** Compiled when the first form is read, not when the program starts. */
    private static final class Compiled {
        private static final SchemaCheck SCHEMA = new SchemaCheck("field-form.schema.json");
    }

    /** The faults of a form in the order in which they stand in its text. */
    static List<Defect> check(Document document) {
        List<Defect> againstSchema = Compiled.SCHEMA.check(document);
        if (!againstSchema.isEmpty()) {
            return againstSchema;
        }
        FormCheck check = new FormCheck();
        check.form(document.root());
        return check.found.stream().sorted(document.inTextOrder()).toList();
    }

    private void form(Branch root) {
        texts(root, Pointer.of("title"), Pointer.ROOT);
        List<Branch> sections = root.branches("sections");
        sections.forEach(section -> section.branches("fields")
                .forEach(field -> fields.putIfAbsent(word(field, "key"), field)));
        Set<String> sectionKeys = new HashSet<>();
        Set<String> fieldKeys = new HashSet<>();
        for (int i = 0; i < sections.size(); i++) {
            Branch section = sections.get(i);
            Pointer where = Pointer.of("sections").child(i);
            once(sectionKeys, word(section, "key"), where.child("key"), "section-twice");
            texts(section, Pointer.of("title"), where);
            texts(section, Pointer.of("help"), where);
            List<Branch> inSection = section.branches("fields");
            for (int k = 0; k < inSection.size(); k++) {
                Pointer place = where.child("fields").child(k);
                once(fieldKeys, word(inSection.get(k), "key"), place.child("key"), "field-twice");
                field(inSection.get(k), place);
                parts(inSection.get(k), place);
            }
        }
    }

    private void once(Set<String> seen, String word, Pointer where, String code) {
        if (!seen.add(word)) {
            found.add(Defect.at(where, code, word));
        }
    }

    private void field(Branch field, Pointer where) {
        String key = word(field, "key");
        String kind = word(field, "kind");
        Group group = Group.ofCode(word(field, "group")).orElseThrow();
        if (group == Group.SURVEY && TAKEN.contains(key)
                || group == Group.READINGS && WRITTEN_ELSEWHERE.contains(key)) {
            found.add(Defect.at(where.child("key"), "key-taken", key));
        }
        ReadingKey.ofKey(key).ifPresent(reading -> {
            if (reading.group() != group) {
                found.add(Defect.at(where.child("group"), "group-wrong", key, reading.group().code()));
            }
            if (!reading.kind().equals(kind)) {
                found.add(Defect.at(where.child("kind"), "field-kind-wrong", key, reading.kind()));
            }
        });
        for (ReadingKey reading : ReadingKey.values()) {
            boolean table = Set.of("speed", "stations", "seals").contains(kind);
            if (table && reading.kind().equals(kind) && !reading.key().equals(key)) {
                found.add(Defect.at(where.child("key"), "field-key-wrong", kind, reading.key()));
            }
        }
        ConditionCheck conditions = new ConditionCheck(fields, found);
        field.branch("requiredIf").ifPresent(one -> conditions.check(key, one, where.child("requiredIf")));
        field.branch("shownIf").ifPresent(one -> conditions.check(key, one, where.child("shownIf")));
        if (kind.equals("stations")) {
            codes(field, where, "methods", StationsField.METHODS);
        } else if (kind.equals("seals")) {
            codes(field, where, "sides", SealsField.SIDES);
            codes(field, where, "types", SealsField.TYPES);
            codes(field, where, "conditions", SealsField.CONDITIONS);
        }
    }

    /** The choices of a table are words that the engine knows, all of them. */
    private void codes(Branch field, Pointer where, String key, List<String> wanted) {
        List<Branch> choices = field.branches(key);
        Set<String> absent = new TreeSet<>(wanted);
        for (int i = 0; i < choices.size(); i++) {
            String code = word(choices.get(i), "code");
            absent.remove(code);
            if (!wanted.contains(code)) {
                found.add(Defect.at(where.child(key).child(i).child("code"), "word-wrong", code,
                        String.join(", ", wanted)));
            }
        }
        if (!absent.isEmpty()) {
            found.add(Defect.at(where.child(key), "choice-absent", String.join(", ", absent)));
        }
    }

    /** What is the same in every kind of field: texts, choices, measures, counts. */
    private void parts(Branch field, Pointer where) {
        FieldShape shape = FieldShape.of(word(field, "kind"));
        MeasureCheck measures = new MeasureCheck(found);
        shape.measures().forEach((part, wanted) -> measures.measure((Branch) field.at(part).orElseThrow(),
                below(where, part), wanted.equals(FieldShape.Wanted.ANY) ? wanted(field) : wanted));
        shape.counts().forEach((part, floor) ->
                measures.count((Branch) field.at(part).orElseThrow(), below(where, part), floor));
        shape.texts().forEach(part -> texts(field, part, where));
        for (Pointer part : shape.choices()) {
            List<Branch> choices = field.branches(part.last());
            Set<String> seen = new HashSet<>();
            for (int i = 0; i < choices.size(); i++) {
                Pointer place = below(where, part).child(i);
                once(seen, word(choices.get(i), "code"), place.child("code"), "choice-twice");
                texts(choices.get(i), Pointer.of("label"), place);
            }
        }
    }

    /** What the measure of a quantity has to be: free, unless its key has a meaning outside the form. */
    private static FieldShape.Wanted wanted(Branch field) {
        Optional<ReadingKey> reading = ReadingKey.ofKey(word(field, "key"));
        return reading.flatMap(ReadingKey::dimension).map(dimension -> FieldShape.Wanted.of(dimension,
                dimension == Dimension.LENGTH ? FieldShape.Floor.ABOVE_ZERO : FieldShape.Floor.AT_ZERO))
                .orElse(FieldShape.Wanted.ANY);
    }

    private void texts(Branch around, Pointer part, Pointer where) {
        around.at(part).filter(Branch.class::isInstance).map(Branch.class::cast).ifPresent(texts ->
                new TreeSet<>(Texts.COMPLETE).stream().filter(language -> !texts.has(language)).forEach(language ->
                        found.add(Defect.at(below(where, part), LANGUAGE_MISSING, language))));
    }

    private static Pointer below(Pointer where, Pointer part) {
        return Pointer.parse(where.toString() + part);
    }

    private static String word(Branch branch, String key) {
        return branch.text(key).orElseThrow();
    }
}
