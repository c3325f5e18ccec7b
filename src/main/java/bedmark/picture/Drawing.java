package bedmark.picture;

import java.util.List;
import java.util.stream.Stream;

/** A finished drawing: marks in the order in which they are drawn. */
public record Drawing(List<Mark> marks) {
    public Drawing {
        marks = List.copyOf(marks);
    }

    /** The marks of one kind, in their order. */
    public <M extends Mark> Stream<M> each(Class<M> kind) {
        return marks.stream().filter(kind::isInstance).map(kind::cast);
    }
}
