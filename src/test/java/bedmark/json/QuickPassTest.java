package bedmark.json;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Refused;
import com.fasterxml.jackson.core.JsonFactoryBuilder;
import com.fasterxml.jackson.core.JsonToken;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Whatever is passed at a glance is what the strict reader takes, to the same bracket. */
class QuickPassTest {
    private static final int DEEPEST = 64;
    private static final int CHANGES = 20_000;
    private static final String SIGNS = "{}[]\",:0123456789eE+-.\\u \n\t\u00e9ax\u0001";

    private static int end(String object) {
        byte[] text = object.getBytes(StandardCharsets.UTF_8);
        return new QuickPass(text).end(1, DEEPEST);
    }

    private static boolean isPassed(String object) {
        return end(object) == object.getBytes(StandardCharsets.UTF_8).length - 1;
    }

    private static boolean isRead(byte[] text) {
        try {
            JsonReader.read(text);
            return true;
        } catch (Refused e) {
            return false;
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"{}", "{ }", "{\"a\":1}", "{\"a\":-0.50,\"b\":[],\"c\":[ 1 , {\"a\":null} ],\"d\":\"\"}",
        "{\n  \"a\" : true,\r\n\t\"b\" : [false, \"\u00e9\ud83d\ude00, {[\"]\n}", "{\"\":{\"\":{}}}",
        "{\"ab\":0,\"ba\":0,\"abcdefgh\":1,\"abcdefg\":1,\"abcdefghi\":1,\"abcdefgh-abcdefgh\":1,\"abcdefgh+abcdefgh\":1}"})
    void whatProgramsWriteIsPassed(String object) {
        assertTrue(isRead(object.getBytes(StandardCharsets.UTF_8)));
        assertTrue(isPassed(object));
    }

    @ParameterizedTest
    @ValueSource(strings = {"{\"a\":1,\"a\":2}", "{\"abcdefghijkl\":1,\"b\":{},\"abcdefghijkl\":2}", "{\"a\":01}", "{\"a\":-}",
        "{\"a\":1.}", "{\"a\":.5}", "{\"a\":+1}", "{\"a\":tru}", "{\"a\":truex}", "{\"a\":1 2}", "{\"a\":[1,]}", "{\"a\":[,1]}",
        "{\"a\":1,}", "{,}", "{\"a\"}", "{\"a\":}", "{a:1}", "{\"a\":\"\u0001\"}", "{\"a\":\"\n\"}", "{\"a\":[1}", "{\"a\":{]}",
        "{\"a\":1", "{\"a", "{\"a\":\"b", "{", "{\"a\":NaN}", "{\"a\":\u00a01}", "{\"a\":1}}"})
    void whatTheReaderRefusesIsNotPassed(String object) {
        assertFalse(isRead(object.getBytes(StandardCharsets.UTF_8)));
        assertFalse(isPassed(object));
    }

    @ParameterizedTest
    @ValueSource(strings = {"{\"a\":1e3}", "{\"a\":\"\\n\"}", "{\"a\\u0062\":1}", "{\"a\":\"\\\"\"}"})
    void whatIsWrittenWithAnEscapeOrAnExponentIsLeftToTheReader(String object) {
        assertTrue(isRead(object.getBytes(StandardCharsets.UTF_8)));
        assertEquals(-1, end(object));
    }

    @Test
    void whatIsLongDeepOrManyIsLeftToTheReader() {
        String digits = "1".repeat(Decimals.LONGEST);
        assertTrue(isPassed("{\"a\":" + digits + "}"));
        assertEquals(-1, end("{\"a\":" + digits + "1}"));
        assertTrue(isPassed("{\"a\":\"" + "x".repeat(16_000) + "\"}"));
        assertEquals(-1, end("{\"a\":\"" + "x".repeat(20_000) + "\"}"));
        assertEquals(-1, end("{\"" + "x".repeat(60_000) + "\":1}"));
        assertTrue(isPassed("{\"a\":" + "[".repeat(DEEPEST - 1) + "]".repeat(DEEPEST - 1) + "}"));
        assertEquals(-1, end("{\"a\":" + "[".repeat(DEEPEST) + "]".repeat(DEEPEST) + "}"));
        StringBuilder many = new StringBuilder("{");
        for (int i = 0; i < 64; i++) {
            many.append(i == 0 ? "" : ",").append("\"k").append(i).append("\":{\"k0\":0}");
        }
        assertTrue(isPassed(many + "}"));
        assertEquals(-1, end(many + ",\"last\":0}"));
    }

    @Test
    void keysOfManyOpenObjectsAreKeptApart() {
        String row = "\"a\":0,\"b\":0,\"c\":0,\"d\":0,\"e\":0,\"f\":0,\"g\":0,\"h\":0,\"i\":0";
        String deep = "{" + row + "}";
        for (int i = 0; i < DEEPEST - 1; i++) {
            deep = "{" + row + ",\"below\":" + deep + ",\"beside\":{}}";
        }
        assertTrue(isPassed(deep));
        assertEquals(-1, end(deep.substring(0, deep.length() - 1) + ",\"a\":1}"), "a key of the outermost once more");
        assertEquals(-1, end("{\"a\":" + deep + "}"), "one deeper");
    }

    @Test
    void theParserLeapsToTheEndOfAnObjectAndGoesOnBehindIt() throws IOException {
        byte[] text = "{\"a\":{\"b\":[{}],\"c\":\"}\"},\"d\":{\"e\":1e3},\"f\":1}".getBytes(StandardCharsets.UTF_8);
        try (LeapingParser parser = assertInstanceOf(LeapingParser.class,
                new LeapingParser.Factory(new JsonFactoryBuilder()).createParser(text))) {
            assertFalse(parser.leaps(), "nothing was begun");
            parser.nextToken();
            assertEquals("a", parser.nextFieldName());
            assertEquals(JsonToken.START_OBJECT, parser.nextToken());
            assertTrue(parser.leaps());
            assertEquals(JsonToken.END_OBJECT, parser.nextToken());
            assertEquals("d", parser.nextFieldName());
            assertEquals(JsonToken.START_OBJECT, parser.nextToken());
            assertFalse(parser.leaps(), "an exponent");
            assertEquals("e", parser.nextFieldName());
            assertEquals(JsonToken.VALUE_NUMBER_FLOAT, parser.nextToken());
            assertEquals(JsonToken.END_OBJECT, parser.nextToken());
            assertEquals("f", parser.nextFieldName());
        }
    }

    /** An assessment of the sample, its bytes changed one, two or three at a time. */
    @Test
    void noDamagedTextIsPassedThatTheReaderRefuses() throws IOException {
        byte[] sound = JsonWriter.compact(JsonReader.read(Files.readAllBytes(Path.of("sample-surveys",
                "round-2026-03.json"))).root().branches("surveys").get(0).branch("assessment").orElseThrow());
        assertEquals(sound.length - 1, new QuickPass(sound).end(1, DEEPEST));
        byte[] signs = SIGNS.getBytes(StandardCharsets.UTF_8);
        Random random = new Random(23);
        int passed = 0;
        for (int i = 0; i < CHANGES; i++) {
            byte[] text = sound.clone();
            for (int change = random.nextInt(3); change >= 0; change--) {
                text[1 + random.nextInt(text.length - 1)] = signs[random.nextInt(signs.length)];
            }
            int end = new QuickPass(text).end(1, DEEPEST);
            if (end >= 0 && Utf8.holds(text)) {
                assertTrue(isRead(Arrays.copyOf(text, end + 1)), new String(text, StandardCharsets.UTF_8));
                passed++;
            }
        }
        assertTrue(passed > CHANGES / 100, "some are sound still: " + passed);
    }
}
