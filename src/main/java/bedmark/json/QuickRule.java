package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Members;
import bedmark.document.Node;
import com.fasterxml.jackson.databind.JsonNode;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.function.IntPredicate;
import java.util.function.Predicate;

/** What one schema object asks of a value, as far as that can be told at a glance. */
@FunctionalInterface
interface QuickRule {

    /** Whether a schema accepts a value. */
    enum Answer {
        YES, NO,
        /** The validator has to say. */
        UNSURE;

        static Answer of(boolean yes) {
            return yes ? YES : NO;
        }

        Answer and(Answer other) {
            if (this == NO || other == NO) {
                return NO;
            }
            return this == YES && other == YES ? YES : UNSURE;
        }

        Answer not() {
            return this == UNSURE ? UNSURE : of(this == NO);
        }
    }

    Answer of(Node value);

    QuickRule UNSURE = value -> Answer.UNSURE;

    /** All of them. */
    static QuickRule all(List<QuickRule> rules) {
        QuickRule[] each = rules.toArray(QuickRule[]::new);
        return value -> {
            Answer answer = Answer.YES;
            for (int i = 0; i < each.length && answer != Answer.NO; i++) {
                answer = answer.and(each[i].of(value));
            }
            return answer;
        };
    }

    static QuickRule not(QuickRule rule) {
        return value -> rule.of(value).not();
    }

    static QuickRule when(QuickRule condition, QuickRule then) {
        return value -> switch (condition.of(value)) {
            case YES -> then.of(value);
            case NO -> Answer.YES;
            case UNSURE -> Answer.UNSURE;
        };
    }

    /** An explicit nothing stands only in lists, where it is left to the validator. */
    static QuickRule type(JsonNode asked) {
        Set<String> types = new HashSet<>();
        (asked.isArray() ? asked : List.of(asked)).forEach(type -> types.add(type.asText()));
        return value -> {
            if (value instanceof Branch) {
                return Answer.of(types.contains("object"));
            } else if (value instanceof Node.Series) {
                return Answer.of(types.contains("array"));
            } else if (value instanceof Node.Text) {
                return Answer.of(types.contains("string"));
            } else if (value instanceof Node.Flag) {
                return Answer.of(types.contains("boolean"));
            } else if (value instanceof Node.Decimal number) {
                boolean whole = types.contains("integer") && number.value().scale() == 0;
                return types.contains("number") || whole ? Answer.YES
                        : types.contains("integer") ? Answer.UNSURE : Answer.NO;
            }
            return Answer.UNSURE;
        };
    }

    static QuickRule words(Iterable<JsonNode> asked) {
        Set<String> words = new HashSet<>();
        for (JsonNode word : asked) {
            if (!word.isTextual()) {
                return UNSURE;
            }
            words.add(word.asText());
        }
        return value -> value instanceof Node.Text text ? Answer.of(words.contains(text.value())) : Answer.UNSURE;
    }

    static QuickRule one(JsonNode asked) {
        if (!asked.isIntegralNumber()) {
            return words(List.of(asked));
        }
        BigDecimal number = asked.decimalValue();
        return value -> value instanceof Node.Decimal decimal && decimal.value().equals(number) ? Answer.YES
                : Answer.UNSURE;
    }

    /** @param signs which signs of the number compared with the limit are let through */
    static QuickRule limit(JsonNode asked, IntPredicate signs) {
        BigDecimal limit = asked.decimalValue();
        return value -> value instanceof Node.Decimal decimal
                ? Answer.of(signs.test(decimal.value().compareTo(limit))) : Answer.YES;
    }

    static QuickRule longEnough(JsonNode asked) {
        int least = asked.intValue();
        return value -> value instanceof Node.Text text
                ? Answer.of(text.value().codePointCount(0, text.value().length()) >= least) : Answer.YES;
    }

    static QuickRule manyEnough(JsonNode asked) {
        int least = asked.intValue();
        return value -> value instanceof Node.Series series ? Answer.of(series.items().size() >= least) : Answer.YES;
    }

    /** @param sure what surely fits; the rest is left to the validator */
    static QuickRule text(Predicate<String> sure) {
        return value -> value instanceof Node.Text text && !sure.test(text.value()) ? Answer.UNSURE : Answer.YES;
    }

    static QuickRule required(JsonNode asked) {
        List<String> keys = new ArrayList<>();
        asked.forEach(key -> keys.add(key.asText()));
        return value -> {
            if (value instanceof Branch branch) {
                for (String key : keys) {
                    if (!branch.has(key)) {
                        return Answer.NO;
                    }
                }
            }
            return Answer.YES;
        };
    }

    static QuickRule properties(Map<String, QuickRule> rules) {
        Map<String, QuickRule> byKey = new HashMap<>(rules);
        return value -> {
            Answer answer = Answer.YES;
            if (value instanceof Branch branch) {
                Members members = branch.members();
                for (int i = 0; i < members.size(); i++) {
                    QuickRule rule = byKey.get(members.key(i));
                    if (rule != null && !(members.value(i) instanceof Node.Blank)) {
                        answer = answer.and(rule.of(members.value(i)));
                    }
                }
            }
            return answer;
        };
    }

    static QuickRule items(QuickRule rule) {
        return value -> {
            Answer answer = Answer.YES;
            if (value instanceof Node.Series series) {
                for (Node item : series.items()) {
                    answer = answer.and(rule.of(item));
                }
            }
            return answer;
        };
    }
}
