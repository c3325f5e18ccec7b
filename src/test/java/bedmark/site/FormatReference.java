package bedmark.site;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.json.JsonReader;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeSet;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** The page that lists every key of every document, made from the schemas, so that the two cannot differ. */
final class FormatReference {
    private static final Path SCHEMAS = Path.of("src/main/resources/bedmark/schema");
    private static final String REFERENCE = "#/$defs/";

    private final StringBuilder page = new StringBuilder();

    private FormatReference() {
    }

    /** The whole page in Markdown. */
    static String page() throws IOException {
        return new FormatReference().write();
    }

    private String write() throws IOException {
        line("# The documents, key by key");
        line("");
        line("Made from the JSON Schemas (2020-12) in `src/main/resources/bedmark/schema`, which are the authority; a test");
        line("holds this page equal to them. Keys that are not listed are kept by every reader and ride along.");
        line("");
        line("A *quantity* is an object with `value` (the number as the person entered it), `unit` (a UCUM code) and, where");
        line("they are known, `entered`, `standardUncertainty`, `quality`, `at` and `beltState`. The codes that a place takes");
        line("stand in brackets.");
        try (Stream<Path> files = Files.list(SCHEMAS)) {
            for (Path file : files.sorted().toList()) {
                schema(file.getFileName().toString(), JsonReader.read(Files.readAllBytes(file)).root());
            }
        }
        return page.toString();
    }

    private void schema(String name, Branch schema) {
        line("");
        line("## " + schema.text("title").orElseThrow());
        line("");
        line("`" + name + "`. " + schema.text("description").orElse(""));
        object("The document", schema, schema);
        Branch parts = schema.branch("$defs").orElse(Branch.EMPTY);
        for (Map.Entry<String, Node> part : parts.members().entrySet()) {
            if (part.getValue() instanceof Branch shape && shape.branch("properties").isPresent()
                    && !isQuantity(shape)) {
                object(part.getKey(), shape, schema);
            }
        }
    }

    private static boolean isQuantity(Branch shape) {
        Branch properties = shape.branch("properties").orElse(Branch.EMPTY);
        return properties.has("value") && properties.has("unit") || shape.text("$ref").isPresent();
    }

    /** The keys of an object, each followed by those of an object that has no name of its own. */
    private void rows(String before, Branch shape, Branch schema) {
        List<Node> required = shape.series("required");
        shape.branch("properties").orElse(Branch.EMPTY).members().forEach((key, value) -> {
            line("| `" + before + key + "`" + (required.contains(new Node.Text(key)) ? " *" : "") + " | "
                    + cell(kind(value, schema)) + " | " + cell(meaning(value, schema)) + " |");
            if (value instanceof Branch inner) {
                Branch item = inner.get("items").filter(Branch.class::isInstance).map(Branch.class::cast)
                        .orElse(inner);
                if (item.has("properties") && !isQuantity(item)) {
                    rows(before + key + (item == inner ? "." : "[]."), item, schema);
                }
            }
        });
    }

    private void object(String name, Branch shape, Branch schema) {
        if (shape.branch("properties").orElse(Branch.EMPTY).members().isEmpty()) {
            return;
        }
        line("");
        line("### " + name);
        line("");
        shape.text("description").filter(text -> !shape.has("$schema")).ifPresent(text -> {
            line(text);
            line("");
        });
        line("| key | value | |");
        line("|---|---|---|");
        rows("", shape, schema);
        if (shape.has("required")) {
            line("");
            line("\\* must be there.");
        }
    }

    private static String meaning(Node value, Branch schema) {
        if (!(value instanceof Branch shape)) {
            return "";
        }
        return shape.text("description").or(() -> target(shape, schema)
                .filter(FormatReference::isQuantity).flatMap(found -> found.text("description"))).orElse("");
    }

    private static String kind(Node value, Branch schema) {
        if (!(value instanceof Branch shape)) {
            return "anything";
        }
        List<String> units = new ArrayList<>(units(shape, schema));
        if (!units.isEmpty()) {
            return "quantity [" + String.join(", ", units) + "]";
        }
        if (shape.has("const")) {
            return literal(shape.get("const").orElseThrow());
        }
        if (shape.has("enum")) {
            return shape.series("enum").stream().map(FormatReference::literal).collect(Collectors.joining(", "));
        }
        if (shape.text("$ref").isPresent()) {
            String name = shape.text("$ref").orElseThrow().substring(REFERENCE.length());
            Branch found = target(shape, schema).orElseThrow();
            return found.branch("properties").isPresent() ? name : kind(found, schema);
        }
        for (String choice : List.of("oneOf", "anyOf")) {
            if (shape.has(choice)) {
                return shape.series(choice).stream().map(each -> kind(each, schema)).distinct()
                        .collect(Collectors.joining(" or "));
            }
        }
        if (shape.get("type").filter(Node.Series.class::isInstance).isPresent()) {
            return shape.series("type").stream().map(each -> ((Node.Text) each).value())
                    .collect(Collectors.joining(" or "));
        }
        String type = shape.text("type").orElse("anything");
        if (type.equals("array")) {
            return "list of " + kind(shape.get("items").orElse(Branch.EMPTY), schema);
        }
        return type + shape.text("format").map(format -> " (" + format + ")").orElse("") + bounds(shape);
    }

    private static String bounds(Branch shape) {
        return Stream.of(bound(shape, "minimum", "≥ "), bound(shape, "exclusiveMinimum", "> "),
                        bound(shape, "maximum", "≤ "), bound(shape, "exclusiveMaximum", "< "))
                .flatMap(Optional::stream).collect(Collectors.collectingAndThen(Collectors.joining(", "),
                        all -> all.isEmpty() ? "" : ", " + all));
    }

    private static Optional<String> bound(Branch shape, String key, String sign) {
        return shape.get(key).filter(Node.Decimal.class::isInstance).map(value -> sign + literal(value));
    }

    /** The units of a quantity: its own list, or the one of the definition that it narrows. */
    private static TreeSet<String> units(Branch shape, Branch schema) {
        TreeSet<String> own = new TreeSet<>();
        shape.branch("properties").flatMap(properties -> properties.branch("unit"))
                .map(unit -> unit.series("enum")).orElse(List.of())
                .forEach(unit -> own.add(((Node.Text) unit).value()));
        return own.isEmpty() ? target(shape, schema).map(found -> units(found, schema)).orElse(own) : own;
    }

    private static Optional<Branch> target(Branch shape, Branch schema) {
        return shape.text("$ref").filter(reference -> reference.startsWith(REFERENCE))
                .flatMap(reference -> schema.branch("$defs")
                        .flatMap(parts -> parts.branch(reference.substring(REFERENCE.length()))));
    }

    private static String literal(Node value) {
        if (value instanceof Node.Text text) {
            return "`" + text.value() + "`";
        }
        return value instanceof Node.Decimal number ? number.value().toPlainString() : "`true` or `false`";
    }

    private static String cell(String text) {
        return text.replace("|", "\\|");
    }

    private void line(String text) {
        page.append(text).append('\n');
    }
}
