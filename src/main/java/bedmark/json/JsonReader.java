package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Members;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonFactoryBuilder;
import com.fasterxml.jackson.core.JsonLocation;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.JsonStreamContext;
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
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Predicate;

/**
 * Reads JSON strictly: one object, valid UTF-8, no key twice, no number that a decimal of sensible size can't hold,
 * nothing after the end. Every refusal names line and column.
 */
public final class JsonReader {
    private static final int DEEPEST = 64;
    private static final int LONGEST_TEXT = 10_000_000;
    private static final JsonFactory FACTORY = factory(DEEPEST);
    /** What was read from elsewhere lies deeper in what holds it here. */
    private static final JsonFactory OWN = factory(DEEPEST + 8);

    private static final Predicate<JsonStreamContext> NONE = object -> false;

    private final JsonParser parser;
    private final boolean placing;
    private final boolean sure;
    private final Predicate<JsonStreamContext> passed;
    private final Map<Pointer, Document.Place> places = new HashMap<>();

    /**
     * @param placing whether the place of each value is kept
     * @param sure    whether every text is known to be well-formed and of sensible length
     * @param passed  which objects are only read over
     */
    private JsonReader(JsonParser parser, boolean placing, boolean sure, Predicate<JsonStreamContext> passed) {
        this.parser = parser;
        this.placing = placing;
        this.sure = sure;
        this.passed = passed;
    }

    /**
     * Reads one object.
     *
     * @param bytes UTF-8, with or without a byte-order mark
     * @throws Refused {@code json-unreadable} with line, column, the code of what is wrong there, and the key or number
     *                 that it is about; {@code json-not-utf8}
     */
    public static Document read(byte[] bytes) {
        return read(bytes, FACTORY, NONE);
    }

    /**
     * As {@link #read(byte[])}, without what some objects hold: that is read as strictly and may not be kept.
     *
     * @param passed which objects those are, by where they stand
     */
    static Document read(byte[] bytes, Predicate<JsonStreamContext> passed) {
        return read(bytes, FACTORY, passed);
    }

    /** As {@link #read(byte[])}, for what this program wrote around documents that were read before. */
    static Document readOwn(byte[] bytes) {
        return read(bytes, OWN, NONE);
    }

    private static JsonFactory factory(int deepest) {
        return new LeapingParser.Factory(new JsonFactoryBuilder()
                .disable(StreamReadFeature.INCLUDE_SOURCE_IN_LOCATION)
                .streamReadConstraints(StreamReadConstraints.builder().maxNestingDepth(deepest)
                        .maxNumberLength(Decimals.LONGEST).maxStringLength(LONGEST_TEXT).build()));
    }

    private static Document read(byte[] bytes, JsonFactory factory, Predicate<JsonStreamContext> passed) {
        Branch root = readBytes(bytes, factory, passed)
                .orElseGet(() -> read(decode(bytes), factory, false).root());
        return new Document(root, () -> Map.copyOf(read(decode(bytes), factory, true).reader().places));
    }

    /**
     * Reads the bytes as they are, which costs a fraction of reading their text.
     *
     * @return nothing where anything is not as it should be; its text tells what, and where that stands
     */
    private static Optional<Branch> readBytes(byte[] bytes, JsonFactory factory,
                                              Predicate<JsonStreamContext> passed) {
        // Without these two beginnings the parser would look for other encodings than UTF-8.
        if (bytes.length < 2 || bytes[0] != '{' || bytes[1] == 0 || !Utf8.holds(bytes)) {
            return Optional.empty();
        }
        try (JsonParser parser = factory.createParser(bytes)) {
            boolean sure = bytes.length <= LONGEST_TEXT && WellFormed.isSure(bytes);
            return Optional.of(new JsonReader(parser, false, sure, passed).document());
        } catch (IOException | Refused e) {
            return Optional.empty();
        }
    }

    private record Read(JsonReader reader, Branch root) {
    }

    private static Read read(String text, JsonFactory factory, boolean placing) {
        try (JsonParser parser = factory.createParser(text)) {
            JsonReader reader = new JsonReader(parser, placing, false, NONE);
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
            case START_OBJECT -> passed.test(parser.getParsingContext()) ? passedOver(token) : branch(here);
            case START_ARRAY -> series(here);
            case VALUE_STRING -> new Node.Text(wellFormed(parser.getText()));
            case VALUE_NUMBER_INT, VALUE_NUMBER_FLOAT -> new Node.Decimal(decimal());
            case VALUE_TRUE -> new Node.Flag(true);
            case VALUE_FALSE -> new Node.Flag(false);
            case VALUE_NULL -> new Node.Blank();
            default -> throw refused("syntax", "");
        };
    }

    private Branch passedOver(JsonToken token) throws IOException {
        if (parser instanceof LeapingParser leaping && leaping.leaps()) {
            parser.nextToken();
        } else if (!new PassedOver(parser, sure).isStrict(token)) {
            throw refused("syntax", "");
        }
        return Branch.EMPTY;
    }

    private Branch branch(Pointer here) throws IOException {
        Members.Gathering members = new Members.Gathering();
        while (parser.nextToken() != JsonToken.END_OBJECT) {
            String key = wellFormed(parser.currentName());
            if (!members.key(key)) {
                throw refused("key-twice", key);
            }
            members.value(value(parser.nextToken(), placing ? here.child(key) : here));
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
        Optional<BigDecimal> number = Decimals.read(parser.getTextCharacters(), parser.getTextOffset(),
                parser.getTextLength());
        if (number.isEmpty()) {
            throw refused("number", parser.getText());
        }
        return number.get();
    }

    private String wellFormed(String text) {
        if (!sure && !WellFormed.is(text)) {
            throw refused("surrogate", "");
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
