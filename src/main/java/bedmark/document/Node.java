package bedmark.document;

import java.math.BigDecimal;
import java.time.OffsetDateTime;
import java.time.format.DateTimeFormatter;
import java.util.List;
import java.util.Objects;

/** A value of a document: an object, a list or a leaf. Numbers are decimals and never pass through binary. */
public sealed interface Node permits Branch, Node.Series, Node.Text, Node.Decimal, Node.Flag, Node.Blank {

    /** A list of values. */
    record Series(List<Node> items) implements Node {
        public Series {
            items = List.copyOf(items);
        }

        public static Series of(Node... items) {
            return new Series(List.of(items));
        }
    }

    /** A text. */
    record Text(String value) implements Node {
        public Text {
            Objects.requireNonNull(value);
        }
    }

    /** A decimal number with its trailing zeros. */
    record Decimal(BigDecimal value) implements Node {
        public Decimal {
            Objects.requireNonNull(value);
        }
    }

    /** True or false. */
    record Flag(boolean value) implements Node {
    }

    /** The explicit nothing of a document. */
    record Blank() implements Node {
    }

    static Node text(String value) {
        return new Text(value);
    }

    static Node number(BigDecimal value) {
        return new Decimal(value);
    }

    static Node number(long value) {
        return new Decimal(BigDecimal.valueOf(value));
    }

    /** A time as RFC 3339 writes it, always with its seconds. */
    static Node time(OffsetDateTime value) {
        return new Text(DateTimeFormatter.ISO_OFFSET_DATE_TIME.format(value));
    }

    static Node flag(boolean value) {
        return new Flag(value);
    }
}
