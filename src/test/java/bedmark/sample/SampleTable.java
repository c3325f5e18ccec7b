package bedmark.sample;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * A table of the demo plant's data: a text resource with a row a line and its cells between bars, under a line of
 * heads. Lines that begin with {@code #} are remarks, a cell with a dash is empty.
 */
record SampleTable(List<Row> rows) {
    private static final String EMPTY = "-";

    /** One row, its cells by their heads. */
    record Row(Map<String, String> cells) {
        String text(String head) {
            return find(head).orElseThrow(() -> new IllegalStateException("no " + head + " in " + cells));
        }

        Optional<String> find(String head) {
            return Optional.ofNullable(cells.get(head)).filter(cell -> !cell.equals(EMPTY));
        }

        boolean yes(String head) {
            return text(head).equals("yes");
        }

        double number(String head) {
            return Double.parseDouble(text(head));
        }
    }

    /** Reads {@code bedmark/sample/<name>.txt}. */
    static SampleTable read(String name) {
        List<List<String>> lines = lines(name).stream().filter(line -> !line.isBlank() && !line.startsWith("#"))
                .map(line -> Stream.of(line.split("\\|", -1)).map(String::strip).toList()).toList();
        List<String> heads = lines.get(0);
        List<Row> rows = new ArrayList<>();
        for (List<String> line : lines.subList(1, lines.size())) {
            if (line.size() != heads.size()) {
                throw new IllegalStateException(name + ": " + line + " does not stand under " + heads);
            }
            Map<String, String> cells = new LinkedHashMap<>();
            for (int i = 0; i < heads.size(); i++) {
                cells.put(heads.get(i), line.get(i));
            }
            rows.add(new Row(cells));
        }
        return new SampleTable(List.copyOf(rows));
    }

    private static List<String> lines(String name) {
        try (InputStream text = SampleTable.class.getResourceAsStream("/bedmark/sample/" + name + ".txt")) {
            return new String(text.readAllBytes(), StandardCharsets.UTF_8).lines().toList();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** The one row with that text under a head. */
    Row row(String head, String text) {
        return rows.stream().filter(row -> row.text(head).equals(text)).findFirst()
                .orElseThrow(() -> new IllegalStateException("no row with " + head + " " + text));
    }

    /** The rows with that text under a head. */
    List<Row> rows(String head, String text) {
        return rows.stream().filter(row -> row.text(head).equals(text)).toList();
    }
}
