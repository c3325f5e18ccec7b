package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonLocation;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.JsonToken;
import com.fasterxml.jackson.core.StreamReadConstraints;
import com.fasterxml.jackson.core.StreamReadFeature;
import com.fasterxml.jackson.core.exc.StreamConstraintsException;
import com.fasterxml.jackson.core.io.JsonEOFException;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Reads JSON strictly: one object, valid UTF-8, no key twice, no number that a decimal of sensible size can't hold,
 * nothing after the end. Every refusal names line and column.
 */
public final class JsonReader {
    private static final int DEEPEST = 64;
    private static final int LONGEST_NUMBER = 100;
    private static final int LARGEST_EXPONENT = 100;
    private static final JsonFactory FACTORY = factory(DEEPEST);
    /** What was read from elsewhere lies deeper in what holds it here. */
    private static final JsonFactory OWN = factory(DEEPEST + 8);

    private final JsonParser parser;
    private final boolean placing;
    private final Map<Pointer, Document.Place> places = new HashMap<>();

    /** @param placing whether the place of each value is kept */
    private JsonReader(JsonParser parser, boolean placing) {
        this.parser = parser;
        this.placing = placing;
    }

    /**
     * Reads one object.
     *
     * @param bytes UTF-8, with or without a byte-order mark
     * @throws Refused {@code json-unreadable} with line, column, the code of what is wrong there, and the key or number
     *                 that it is about; {@code json-not-utf8}
     */
    public static Document read(byte[] bytes) {
        return read(bytes, FACTORY);
    }

    /** As {@link #read(byte[])}, for what this program wrote around documents that were read before. */
    static Document readOwn(byte[] bytes) {
        return read(bytes, OWN);
    }

    private static JsonFactory factory(int deepest) {
        return JsonFactory.builder().disable(StreamReadFeature.INCLUDE_SOURCE_IN_LOCATION)
                .streamReadConstraints(StreamReadConstraints.builder().maxNestingDepth(deepest)
                        .maxNumberLength(LONGEST_NUMBER).maxStringLength(10_000_000).build())
                .build();
    }

    private static Document read(byte[] bytes, JsonFactory factory) {
        String text = decode(bytes);
        return new Document(read(text, factory, false).root(), () -> Map.copyOf(read(text, factory, true).reader().places));
    }

    private record Read(JsonReader reader, Branch root) {
    }

    private static Read read(String text, JsonFactory factory, boolean placing) {
        try (JsonParser parser = factory.createParser(text)) {
            JsonReader reader = new JsonReader(parser, placing);
            return new Read(reader, read(reader));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static Branch read(JsonReader reader) throws IOException {
        try {
            return reader.document();
        } catch (StreamConstraintsException e) {
            // It names no place of its own.
            throw new Refused(unreadable(reader.parser.currentLocation(), "size", ""), e);
        } catch (JsonProcessingException e) {
            throw new Refused(unreadable(e.getLocation(), e instanceof JsonEOFException ? "end" : "syntax", ""), e);
        }
    }

    /** What is not UTF-8 is read as something else, and then does not give the same bytes again. */
    private static String decode(byte[] bytes) {
        String text = new String(bytes, StandardCharsets.UTF_8);
        if (!Arrays.equals(text.getBytes(StandardCharsets.UTF_8), bytes)) {
            throw new Refused(Defect.in("", "json-not-utf8"));
        }
        return text.startsWith("\uFEFF") ? text.substring(1) : text;
    }

    private Branch document() throws IOException {
        JsonToken first = parser.nextToken();
        if (first != JsonToken.START_OBJECT) {
            throw refused("object", "");
        }
        Branch root = (Branch) value(first, Pointer.ROOT);
        if (parser.nextToken() != null) {
            throw refused("trailing", "");
        }
        return root;
    }

    private Node value(JsonToken token, Pointer here) throws IOException {
        if (placing) {
            JsonLocation location = parser.currentTokenLocation();
            places.put(here, new Document.Place(location.getLineNr(), location.getColumnNr()));
        }
        return switch (token) {
            case START_OBJECT -> branch(here);
            case START_ARRAY -> series(here);
            case VALUE_STRING -> new Node.Text(wellFormed(parser.getText()));
            case VALUE_NUMBER_INT, VALUE_NUMBER_FLOAT -> new Node.Decimal(decimal());
            case VALUE_TRUE -> new Node.Flag(true);
            case VALUE_FALSE -> new Node.Flag(false);
            case VALUE_NULL -> new Node.Blank();
            default -> throw refused("syntax", "");
        };
    }

    private Branch branch(Pointer here) throws IOException {
        Map<String, Node> members = new LinkedHashMap<>();
        while (parser.nextToken() != JsonToken.END_OBJECT) {
            String key = wellFormed(parser.currentName());
            if (members.containsKey(key)) {
                throw refused("key-twice", key);
            }
            members.put(key, value(parser.nextToken(), placing ? here.child(key) : here));
        }
        return new Branch(members);
    }

    private Node.Series series(Pointer here) throws IOException {
        List<Node> items = new ArrayList<>();
        for (JsonToken token = parser.nextToken(); token != JsonToken.END_ARRAY; token = parser.nextToken()) {
            items.add(value(token, placing ? here.child(items.size()) : here));
        }
        return new Node.Series(items);
    }

    private BigDecimal decimal() throws IOException {
        try {
            BigDecimal number = new BigDecimal(parser.getText());
            // It is written without an exponent, and has to be read again then.
            if (Math.abs((long) number.scale()) <= LARGEST_EXPONENT
                    && number.toPlainString().length() <= LONGEST_NUMBER) {
                return number.scale() < 0 ? number.setScale(0) : number;
            }
        } catch (NumberFormatException e) {
            throw new Refused(refused("number", parser.getText()).defect(), e);
        }
        throw refused("number", parser.getText());
    }

    /** Escapes can smuggle half a surrogate pair into a text, which no file could then hold. */
    private String wellFormed(String text) {
        for (int i = 0; i < text.length(); i++) {
            if (Character.isSurrogate(text.charAt(i))) {
                if (!StandardCharsets.UTF_8.newEncoder().canEncode(text)) {
                    throw refused("surrogate", "");
                }
                return text;
            }
        }
        return text;
    }

    private Refused refused(String what, String about) {
        return new Refused(unreadable(parser.currentLocation(), what, about));
    }

    private static Defect unreadable(JsonLocation location, String what, String about) {
        String line = location == null ? "1" : Integer.toString(location.getLineNr());
        String column = location == null ? "1" : Integer.toString(location.getColumnNr());
        return Defect.in("", "json-unreadable", line, column, what, about);
    }
}
