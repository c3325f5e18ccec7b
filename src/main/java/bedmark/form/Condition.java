package bedmark.form;

import bedmark.document.Node;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** A condition on the answers of a form: plain data, no expression language. An absent answer equals nothing. */
public sealed interface Condition {

    /**
     * Whether the condition holds.
     *
     * @param answers the answer of the field with a key
     */
    boolean holds(Function<String, Optional<Node>> answers);

    /** The keys of the fields that the condition looks at. */
    Set<String> fields();

    /** {@code {"field": "dust", "is": "critical"}}. */
    record Is(String field, Node value) implements Condition {
        @Override
        public boolean holds(Function<String, Optional<Node>> answers) {
            return answers.apply(field).filter(answer -> same(answer, value)).isPresent();
        }

        @Override
        public Set<String> fields() {
            return Set.of(field);
        }
    }

    /** {@code {"field": "dust", "isOneOf": ["critical", "failed"]}}. */
    record IsOneOf(String field, List<Node> values) implements Condition {
        public IsOneOf {
            values = List.copyOf(values);
        }

        @Override
        public boolean holds(Function<String, Optional<Node>> answers) {
            return answers.apply(field).filter(answer -> values.stream().anyMatch(value -> same(answer, value)))
                    .isPresent();
        }

        @Override
        public Set<String> fields() {
            return Set.of(field);
        }
    }

    /** {@code {"field": "throughput", "present": true}}. */
    record Present(String field, boolean present) implements Condition {
        @Override
        public boolean holds(Function<String, Optional<Node>> answers) {
            return answers.apply(field).isPresent() == present;
        }

        @Override
        public Set<String> fields() {
            return Set.of(field);
        }
    }

    /** {@code {"all": [...]}}. */
    record All(List<Condition> conditions) implements Condition {
        public All {
            conditions = List.copyOf(conditions);
        }

        @Override
        public boolean holds(Function<String, Optional<Node>> answers) {
            return conditions.stream().allMatch(condition -> condition.holds(answers));
        }

        @Override
        public Set<String> fields() {
            return fieldsOf(conditions.stream());
        }
    }

    /** {@code {"any": [...]}}. */
    record Any(List<Condition> conditions) implements Condition {
        public Any {
            conditions = List.copyOf(conditions);
        }

        @Override
        public boolean holds(Function<String, Optional<Node>> answers) {
            return conditions.stream().anyMatch(condition -> condition.holds(answers));
        }

        @Override
        public Set<String> fields() {
            return fieldsOf(conditions.stream());
        }
    }

    /** {@code {"not": {...}}}. */
    record Not(Condition condition) implements Condition {
        @Override
        public boolean holds(Function<String, Optional<Node>> answers) {
            return !condition.holds(answers);
        }

        @Override
        public Set<String> fields() {
            return condition.fields();
        }
    }

    private static boolean same(Node answer, Node value) {
        if (answer instanceof Node.Decimal one && value instanceof Node.Decimal other) {
            return one.value().compareTo(other.value()) == 0;
        }
        return answer.equals(value);
    }

    private static Set<String> fieldsOf(Stream<Condition> conditions) {
        return conditions.flatMap(condition -> condition.fields().stream()).collect(Collectors.toUnmodifiableSet());
    }
}
