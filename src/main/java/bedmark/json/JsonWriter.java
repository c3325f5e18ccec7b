package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Members;
import bedmark.document.Node;
import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.StreamWriteFeature;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import com.fasterxml.jackson.core.util.Separators;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;

/** Writes documents: the same tree always gives the same bytes, on every machine. */
public final class JsonWriter {
    private static final JsonFactory FACTORY = JsonFactory.builder()
            .enable(StreamWriteFeature.WRITE_BIGDECIMAL_AS_PLAIN).build();

    private JsonWriter() {
    }

    /** One line without spaces, without a line end. */
    public static byte[] compact(Node node) {
        return write(node, false);
    }

    /** Indented for people, with a line end. */
    public static byte[] indented(Node node) {
        return write(node, true);
    }

    /** As {@link #compact(Node)}, with the keys of every object in their order. */
    static byte[] sorted(Node node) {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try (JsonGenerator generator = FACTORY.createGenerator(bytes)) {
            put(generator, node, true);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return bytes.toByteArray();
    }

    private static byte[] write(Node node, boolean indented) {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try (JsonGenerator generator = FACTORY.createGenerator(bytes)) {
            if (indented) {
                DefaultIndenter indenter = new DefaultIndenter("  ", "\n");
                generator.setPrettyPrinter(new DefaultPrettyPrinter(Separators.createDefaultInstance()
                        .withRootSeparator("").withObjectFieldValueSpacing(Separators.Spacing.AFTER)
                        .withObjectEmptySeparator("").withArrayEmptySeparator(""))
                        .withObjectIndenter(indenter).withArrayIndenter(indenter));
            }
            put(generator, node, false);
            if (indented) {
                generator.writeRaw('\n');
            }
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return bytes.toByteArray();
    }

    private static void put(JsonGenerator generator, Node node, boolean sorted) throws IOException {
        if (node instanceof Branch branch) {
            generator.writeStartObject();
            Members members = sorted ? branch.members().sorted() : branch.members();
            for (int i = 0; i < members.size(); i++) {
                generator.writeFieldName(members.key(i));
                put(generator, members.value(i), sorted);
            }
            generator.writeEndObject();
        } else if (node instanceof Node.Series series) {
            generator.writeStartArray();
            for (Node item : series.items()) {
                put(generator, item, sorted);
            }
            generator.writeEndArray();
        } else if (node instanceof Node.Text text) {
            generator.writeString(text.value());
        } else if (node instanceof Node.Decimal decimal) {
            generator.writeNumber(decimal.value());
        } else if (node instanceof Node.Flag flag) {
            generator.writeBoolean(flag.value());
        } else {
            generator.writeNull();
        }
    }
}
