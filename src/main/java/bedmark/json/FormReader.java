package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.form.Caution;
import bedmark.form.Choice;
import bedmark.form.ChoiceField;
import bedmark.form.Condition;
import bedmark.form.Count;
import bedmark.form.Field;
import bedmark.form.FieldForm;
import bedmark.form.FlagField;
import bedmark.form.Group;
import bedmark.form.Head;
import bedmark.form.Measure;
import bedmark.form.NumberField;
import bedmark.form.QuantityField;
import bedmark.form.Range;
import bedmark.form.SealsField;
import bedmark.form.Section;
import bedmark.form.SpeedField;
import bedmark.form.StationsField;
import bedmark.form.TextField;
import bedmark.form.Texts;
import bedmark.quantity.Dimension;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import java.math.BigDecimal;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.BiFunction;
import java.util.function.Function;

/**
 * Reads field forms. A form that {@link FormCheck} finds fault with is refused, except for a translation that is
 * missing: English stands in for it.
 */
public final class FormReader {
    private static final int LONGEST_TEXT = 2000;

    /** One row for each kind of field. */
    private static final Map<String, BiFunction<Head, Branch, Field>> KINDS = Map.of(
            "text", FormReader::text,
            "number", (head, branch) -> new NumberField(head, count(inner(branch, "count"))),
            "quantity", (head, branch) -> new QuantityField(head, measure(inner(branch, "measure"))),
            "choice", (head, branch) -> new ChoiceField(head, choices(branch, "choices")),
            "flag", (head, branch) -> new FlagField(head),
            "speed", FormReader::speed,
            "stations", (head, branch) -> new StationsField(head.with(Caution.DEPTH), choices(branch, "methods"),
                    measure(inner(branch, "position")), measure(inner(branch, "depth"))),
            "seals", (head, branch) -> new SealsField(head.with(Caution.SEAL), choices(branch, "sides"),
                    choices(branch, "types"), choices(branch, "conditions"), measure(inner(branch, "length"))));

    private FormReader() {
    }

    /**
     * Reads a form file.
     *
     * @throws Refused with the first defect, its pointer, line and column
     */
    public static FieldForm read(Document document) {
        FormCheck.check(document).stream().filter(defect -> !defect.code().equals(FormCheck.LANGUAGE_MISSING))
                .findFirst().ifPresent(defect -> {
                    throw new Refused(document.placed(defect));
                });
        return form(document.root());
    }

    /**
     * Reads a form that another document holds.
     *
     * @throws Refused with the first defect and its pointer within the form
     */
    public static FieldForm read(Branch form) {
        return read(new Document(form));
    }

    private static FieldForm form(Branch root) {
        return new FieldForm(need(root.text("id")), need(root.number("version")).intValueExact(),
                texts(inner(root, "title")), root.branches("sections").stream().map(FormReader::section).toList());
    }

    private static Section section(Branch branch) {
        return new Section(need(branch.text("key")), texts(inner(branch, "title")),
                branch.branch("help").map(FormReader::texts),
                branch.branches("fields").stream().map(FormReader::field).toList());
    }

    private static Field field(Branch branch) {
        Head head = new Head(need(branch.text("key")), need(branch.text("group").flatMap(Group::ofCode)),
                texts(inner(branch, "label")), branch.branch("help").map(FormReader::texts),
                branch.flag("required").orElse(false), branch.branch("requiredIf").map(FormReader::condition),
                branch.branch("shownIf").map(FormReader::condition),
                branch.text("caution").flatMap(Caution::ofCode));
        return KINDS.get(need(branch.text("kind"))).apply(head, branch);
    }

    private static Field text(Head head, Branch branch) {
        return new TextField(head, branch.number("longest").map(BigDecimal::intValueExact).orElse(LONGEST_TEXT),
                branch.flag("lines").orElse(false), branch.text("offers").map(word -> TextField.Offer.MATERIALS));
    }

    private static Field speed(Head head, Branch branch) {
        Branch direct = inner(branch, "direct");
        Branch timed = inner(branch, "timed");
        Branch revolutions = inner(timed, "revolutions");
        Branch pulley = inner(branch, "pulley");
        return new SpeedField(head.with(Caution.SPEED),
                new SpeedField.Direct(texts(inner(direct, "label")), direct.branch("help").map(FormReader::texts),
                        measure(inner(direct, "measure"))),
                new SpeedField.Timed(texts(inner(timed, "label")), timed.branch("help").map(FormReader::texts),
                        part(timed, "beltLength"), texts(inner(revolutions, "label")),
                        count(inner(revolutions, "count")), part(timed, "elapsed")),
                new SpeedField.Pulley(texts(inner(pulley, "label")), pulley.branch("help").map(FormReader::texts),
                        part(pulley, "diameter"), part(pulley, "rotation")));
    }

    private static SpeedField.Part part(Branch way, String key) {
        Branch part = inner(way, key);
        return new SpeedField.Part(texts(inner(part, "label")), measure(inner(part, "measure")));
    }

    private static Texts texts(Branch branch) {
        Map<String, String> byLanguage = new LinkedHashMap<>();
        branch.members().keySet().forEach(language -> branch.text(language)
                .ifPresent(text -> byLanguage.put(language, text)));
        return new Texts(byLanguage);
    }

    private static List<Choice> choices(Branch branch, String key) {
        return branch.branches(key).stream()
                .map(choice -> new Choice(need(choice.text("code")), texts(inner(choice, "label")))).toList();
    }

    private static Measure measure(Branch branch) {
        Map<Unit, BigDecimal> steps = new LinkedHashMap<>();
        branch.branches("units").forEach(offer ->
                steps.put(unit(offer, "unit"), need(offer.number("step"))));
        return new Measure(need(branch.text("dimension").flatMap(Dimension::ofCode)), unit(branch, "metric"),
                unit(branch, "us"), steps, range(branch, "plausible", FormReader::quantity),
                range(branch, "possible", FormReader::quantity));
    }

    private static Count count(Branch branch) {
        return new Count(range(branch, "plausible", FormReader::number), range(branch, "possible", FormReader::number),
                need(branch.number("step")));
    }

    /** A range under a key; open where the key is absent. */
    static <T> Range<T> range(Branch branch, String key, Function<Node, T> end) {
        return branch.branch(key).map(range -> new Range<>(
                range.get("above").or(() -> range.get("from")).map(end), range.has("above"),
                range.get("to").map(end))).orElse(Range.open());
    }

    static Quantity quantity(Node node) {
        return ((Branch) node).asQuantity();
    }

    static BigDecimal number(Node node) {
        return ((Node.Decimal) node).value();
    }

    private static Condition condition(Branch branch) {
        if (branch.has("all")) {
            return new Condition.All(branch.branches("all").stream().map(FormReader::condition).toList());
        } else if (branch.has("any")) {
            return new Condition.Any(branch.branches("any").stream().map(FormReader::condition).toList());
        } else if (branch.has("not")) {
            return new Condition.Not(condition(inner(branch, "not")));
        }
        String field = need(branch.text("field"));
        if (branch.has("present")) {
            return new Condition.Present(field, need(branch.flag("present")));
        } else if (branch.has("isOneOf")) {
            return new Condition.IsOneOf(field, branch.series("isOneOf"));
        }
        return new Condition.Is(field, need(branch.get("is")));
    }

    private static Unit unit(Branch branch, String key) {
        return need(branch.text(key).flatMap(Unit::ofCode));
    }

    private static Branch inner(Branch branch, String key) {
        return need(branch.branch(key));
    }

    /** What the check has found to be there. */
    private static <T> T need(Optional<T> present) {
        return present.orElseThrow();
    }
}
