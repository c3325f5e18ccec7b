package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.DecimalNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import com.networknt.schema.Error;
import com.networknt.schema.InputFormat;
import com.networknt.schema.Schema;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SchemaRegistryConfig;
import com.networknt.schema.SpecificationVersion;
import com.networknt.schema.path.NodePath;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/** Checks documents against a published schema, which is compiled once. Nothing is fetched from anywhere. */
final class SchemaCheck {
    private static final int LONGEST_SHOWN = 60;
    private static final JsonNodeFactory NODES = JsonNodeFactory.instance;
    private static final SchemaRegistry REGISTRY = SchemaRegistry.withDefaultDialect(
            SpecificationVersion.DRAFT_2020_12, builder -> builder.schemaRegistryConfig(
                    SchemaRegistryConfig.builder().formatAssertionsEnabled(true).build()));

    private final Schema schema;
    private final QuickCheck quick;

    /** @param name the schema's file name, such as {@code bundle.schema.json} */
    SchemaCheck(String name) {
        try (InputStream text = SchemaCheck.class.getResourceAsStream("/bedmark/schema/" + name)) {
            schema = REGISTRY.getSchema(text, InputFormat.JSON);
            schema.initializeValidators();
            quick = new QuickCheck(schema.getSchemaNode());
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** Everything that the schema refuses, in the order in which it stands in the text. */
    List<Defect> check(Document document) {
        return quick.accepts(document.root()) ? List.of() : validate(document);
    }

    /** The same, told by the validator alone. */
    List<Defect> validate(Document document) {
        return schema.validate(tree(document.root())).stream().filter(error -> !isAlternative(error))
                .map(SchemaCheck::defect).sorted(document.inTextOrder()).toList();
    }

    /** The reasons why each alternative of a choice does not fit say less than that none fits. */
    private static boolean isAlternative(Error error) {
        NodePath path = error.getEvaluationPath();
        for (int i = 0; i < path.getNameCount() - 1; i++) {
            if ("oneOf".equals(path.getElement(i))) {
                return true;
            }
        }
        return false;
    }

    private static Defect defect(Error error) {
        Pointer where = pointer(error.getInstanceLocation());
        String met = oneLine(error.getInstanceNode().asText());
        JsonNode asked = error.getSchemaNode();
        String last = where.isRoot() ? "" : where.last();
        return switch (error.getKeyword()) {
            case "required" -> Defect.at(where, "key-absent", error.getProperty());
            case "type" -> Defect.at(where, "kind-wrong", kind(asked));
            case "const" -> Defect.at(where, "word-wrong", met, asked.asText());
            case "enum" -> Defect.at(where, last.equals("unit") ? "unit-wrong" : "word-wrong", met,
                    words(asked));
            case "minimum" -> asked.decimalValue().signum() == 0
                    ? Defect.at(where, "number-negative", met)
                    : Defect.at(where, "number-too-small", met, asked.asText());
            case "exclusiveMinimum" -> Defect.at(where, "number-not-positive", met);
            case "maximum" -> Defect.at(where, "number-too-large", met, asked.asText());
            case "format" -> Defect.at(where, asked.asText().equals("uuid") ? "uuid-wrong" : "time-wrong",
                    met);
            case "minLength", "minItems" -> Defect.at(where, "value-empty");
            case "pattern" -> error.getSchemaLocation().toString().contains("/moment/")
                    ? Defect.at(where, "time-wrong", met)
                    : Defect.at(where, "text-wrong", met, asked.asText());
            case "not" -> Defect.at(where, "range-with-two-starts");
            case "oneOf" -> Defect.at(where, "condition-wrong");
            default -> throw new IllegalStateException("a schema keyword without a defect: " + error.getKeyword());
        };
    }

    private static String oneLine(String text) {
        String line = text.lines().findFirst().orElse("");
        return line.length() > LONGEST_SHOWN ? line.substring(0, LONGEST_SHOWN) + "…" : line;
    }

    private static String kind(JsonNode asked) {
        String kind = asked.isArray() ? asked.get(0).asText() : asked.asText();
        return switch (kind) {
            case "string" -> "text";
            case "boolean" -> "true-or-false";
            case "array" -> "list";
            case "integer" -> "whole-number";
            default -> kind;
        };
    }

    private static String words(JsonNode asked) {
        List<String> words = new ArrayList<>();
        asked.forEach(word -> words.add(word.asText()));
        return String.join(", ", words);
    }

    private static Pointer pointer(NodePath path) {
        Pointer pointer = Pointer.ROOT;
        for (int i = 0; i < path.getNameCount(); i++) {
            pointer = pointer.child(String.valueOf(path.getElement(i)));
        }
        return pointer;
    }

    /** The document for the validator; an explicit nothing in an object is an absent key, as it is elsewhere. */
    private static JsonNode tree(Node node) {
        if (node instanceof Branch branch) {
            ObjectNode object = NODES.objectNode();
            for (Map.Entry<String, Node> member : branch.members().entrySet()) {
                if (!(member.getValue() instanceof Node.Blank)) {
                    object.set(member.getKey(), tree(member.getValue()));
                }
            }
            return object;
        } else if (node instanceof Node.Series series) {
            ArrayNode array = NODES.arrayNode(series.items().size());
            series.items().forEach(item -> array.add(tree(item)));
            return array;
        } else if (node instanceof Node.Text text) {
            return NODES.textNode(text.value());
        } else if (node instanceof Node.Decimal decimal) {
            return number(decimal.value());
        } else if (node instanceof Node.Flag flag) {
            return NODES.booleanNode(flag.value());
        }
        return NODES.nullNode();
    }

    private static JsonNode number(BigDecimal number) {
        return number.scale() == 0 ? NODES.numberNode(number.toBigInteger()) : DecimalNode.valueOf(number);
    }
}
