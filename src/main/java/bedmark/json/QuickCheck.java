package bedmark.json;

import bedmark.document.Branch;
import com.fasterxml.jackson.databind.JsonNode;
import java.time.DateTimeException;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.Iterator;
import java.util.List;
import java.util.Map;
import java.util.function.Predicate;
import java.util.regex.Pattern;

/**
 * Tells at a glance that a schema accepts a document, as it does most. It knows the keywords that the published schemas
 * use and is sure of nothing else; whatever it is not sure of the validator says, with its reasons.
 */
final class QuickCheck {
    private static final Pattern UUID = Pattern.compile(
            "[0-9a-fA-F]{8}-[0-9a-fA-F]{4}-[0-9a-fA-F]{4}-[0-9a-fA-F]{4}-[0-9a-fA-F]{12}");
    private static final Pattern MOMENT = Pattern.compile("[1-9][0-9]{3}-(0[1-9]|1[0-2])-(0[1-9]|[12][0-9]|3[01])"
            + "T([01][0-9]|2[0-3]):[0-5][0-9]:[0-5][0-9](\\.[0-9]{1,9})?"
            + "(Z|\\+(0[0-9]|1[0-4]):[0-5][0-9]|-(0[1-9]|1[0-2]):[0-5][0-9])");
    private static final int DAY_AT = 8;
    private static final int DAY_END = 10;
    /** Every month has so many days. */
    private static final String SURE_DAY = "28";
    private static final String LINE_ENDS = "\n\r\u0085\u2028\u2029";

    private final JsonNode schema;
    private final Map<String, QuickRule> references = new HashMap<>();
    private final QuickRule root;

    QuickCheck(JsonNode schema) {
        this.schema = schema;
        this.root = rule(schema);
    }

    /** Whether the schema surely accepts a document. */
    boolean accepts(Branch document) {
        return root.of(document) == QuickRule.Answer.YES;
    }

    private QuickRule rule(JsonNode object) {
        if (!object.isObject()) {
            return QuickRule.UNSURE;
        }
        List<QuickRule> rules = new ArrayList<>();
        for (Map.Entry<String, JsonNode> keyword : object.properties()) {
            switch (keyword.getKey()) {
                case "$schema", "$id", "$defs", "title", "description", "then" -> { }
                default -> rules.add(rule(keyword.getKey(), keyword.getValue(), object));
            }
        }
        return rules.size() == 1 ? rules.get(0) : QuickRule.all(rules);
    }

    private QuickRule rule(String keyword, JsonNode asked, JsonNode object) {
        return switch (keyword) {
            case "$ref" -> reference(asked.asText());
            case "type" -> QuickRule.type(asked);
            case "const" -> QuickRule.one(asked);
            case "enum" -> QuickRule.words(asked);
            case "minimum" -> QuickRule.limit(asked, sign -> sign >= 0);
            case "exclusiveMinimum" -> QuickRule.limit(asked, sign -> sign > 0);
            case "maximum" -> QuickRule.limit(asked, sign -> sign <= 0);
            case "minLength" -> QuickRule.longEnough(asked);
            case "minItems" -> QuickRule.manyEnough(asked);
            case "pattern" -> pattern(asked.asText());
            case "format" -> format(asked.asText());
            case "required" -> QuickRule.required(asked);
            case "properties" -> QuickRule.properties(rules(asked));
            case "items" -> QuickRule.items(rule(asked));
            case "allOf" -> all(asked);
            case "not" -> QuickRule.not(rule(asked));
            case "if" -> object.has("else") || !object.has("then") ? QuickRule.UNSURE
                    : QuickRule.when(rule(asked), rule(object.get("then")));
            default -> QuickRule.UNSURE;
        };
    }

    private Map<String, QuickRule> rules(JsonNode properties) {
        Map<String, QuickRule> rules = new HashMap<>();
        properties.properties().forEach(property -> rules.put(property.getKey(), rule(property.getValue())));
        return rules;
    }

    private QuickRule all(JsonNode asked) {
        List<QuickRule> rules = new ArrayList<>();
        for (Iterator<JsonNode> each = asked.elements(); each.hasNext();) {
            rules.add(rule(each.next()));
        }
        return QuickRule.all(rules);
    }

    /** A rule that leads back to itself is looked up when it is asked. */
    private QuickRule reference(String target) {
        if (!target.startsWith("#/") || schema.at(target.substring(1)).isMissingNode()) {
            return QuickRule.UNSURE;
        }
        if (!references.containsKey(target)) {
            references.put(target, value -> references.get(target).of(value));
            references.put(target, rule(schema.at(target.substring(1))));
        }
        return references.get(target);
    }

    private static QuickRule pattern(String asked) {
        Predicate<String> found = Pattern.compile(asked).asPredicate();
        return QuickRule.text(text -> isOneLine(text) && found.test(text));
    }

    /** Where a line ends inside of a text, patterns mean different things to different programs. */
    private static boolean isOneLine(String text) {
        for (int i = 0; i < text.length(); i++) {
            if (LINE_ENDS.indexOf(text.charAt(i)) >= 0) {
                return false;
            }
        }
        return true;
    }

    private static QuickRule format(String asked) {
        return switch (asked) {
            case "uuid" -> QuickRule.text(UUID.asMatchPredicate());
            case "date-time" -> QuickRule.text(QuickCheck::isMoment);
            default -> QuickRule.UNSURE;
        };
    }

    private static boolean isMoment(String text) {
        return MOMENT.matcher(text).matches()
                && (text.substring(DAY_AT, DAY_END).compareTo(SURE_DAY) <= 0 || isDay(text.substring(0, DAY_END)));
    }

    private static boolean isDay(String text) {
        try {
            LocalDate.parse(text);
            return true;
        } catch (DateTimeException e) {
            // The validator says so too.
            return false;
        }
    }
}
