package bedmark.wording;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;

/** Lines of text of a given width in the making. */
final class SheetLines {
    private static final String INDENT = "  ";
    private static final String AFTER_NAME = "      ";
    private static final int NAMES = 25;
    private static final int RULES = 46;
    private static final int LEADS = 11;

    private final int width;
    private final List<String> lines = new ArrayList<>();

    SheetLines(int width) {
        this.width = width;
    }

    List<String> all() {
        return List.copyOf(lines);
    }

    void add(SheetPart part) {
        if (part instanceof SheetPart.Heading heading) {
            lines.add(heading.text());
        } else if (part instanceof SheetPart.Sentence sentence) {
            wrapped("", "", sentence.text());
        } else if (part instanceof SheetPart.Item item) {
            wrapped(INDENT + "- ", INDENT + "  ", item.text());
        } else if (part instanceof SheetPart.Flow flow) {
            if (!flow.items().isEmpty()) {
                wrapped(INDENT, INDENT, String.join("; ", flow.items()));
            }
        } else if (part instanceof SheetPart.Row row) {
            boolean plain = row.lead().isEmpty();
            row(plain ? NAMES : RULES, plain ? row.name()
                    : row.lead() + " ".repeat(Math.max(1, LEADS - row.lead().length())) + row.name(), row.text());
        }
    }

    /** A name in its column, and a text beside it; where that takes fewer lines, closer together. */
    private void row(int names, String name, String text) {
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
