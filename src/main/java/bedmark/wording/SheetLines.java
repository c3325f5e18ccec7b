package bedmark.wording;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;

/** Lines of text of a given width in the making. */
final class SheetLines {
    private static final String INDENT = "  ";
    private static final String AFTER_NAME = "      ";

    private final int width;
    private final List<String> lines = new ArrayList<>();

    SheetLines(int width) {
        this.width = width;
    }

    List<String> all() {
        return List.copyOf(lines);
    }

    void heading(String text) {
        lines.add(text);
    }

    /** A sentence from the edge. */
    void sentence(String text) {
        wrapped("", "", text);
    }

    /** A sentence in a list. */
    void item(String text) {
        wrapped(INDENT + "- ", INDENT + "  ", text);
    }

    /** Things one after the other. */
    void flow(List<String> items) {
        if (!items.isEmpty()) {
            wrapped(INDENT, INDENT, String.join("; ", items));
        }
    }

    /** A name in its column, and a text beside it; where that takes fewer lines, closer together. */
    void row(int names, String name, String text) {
        String head = INDENT + name + " ".repeat(Math.max(1, names - name.length() - INDENT.length()));
        String close = text.replace(" + ", "+").replace(", ", ",");
        Stream.of(broken(head, AFTER_NAME, text), broken(INDENT + name + " ", AFTER_NAME, text),
                        broken(INDENT + name + " ", AFTER_NAME, close))
                .filter(some -> some.stream().allMatch(line -> line.length() <= width))
                .min(Comparator.comparingInt(List::size))
                .ifPresentOrElse(lines::addAll, () -> wrapped(head, AFTER_NAME, text));
    }

    private void wrapped(String first, String next, String text) {
        lines.addAll(broken(first, next, text));
    }

    /** A text broken between words; a number and its unit are one word. */
    private List<String> broken(String first, String next, String text) {
        List<String> broken = new ArrayList<>();
        StringBuilder line = new StringBuilder(first);
        boolean empty = true;
        for (String word : text.split(" ")) {
            if (!empty && line.length() + 1 + word.length() > width) {
                broken.add(line.toString());
                line = new StringBuilder(next);
                empty = true;
            }
            line.append(empty ? "" : " ").append(word);
            empty = false;
        }
        broken.add(line.toString().stripTrailing());
        return broken;
    }
}
