package bedmark.json;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import java.nio.charset.StandardCharsets;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** What is told of eight bytes at once is what is told of them one by one, wherever they lie. */
class JsonScanTest {
    private static final int TEXTS = 3000;
    private static final int LONGEST = 40;
    /** Those that are looked for, and their neighbours in each way that eight bytes can be mistaken. */
    private static final byte[] NEAR = {',', ',' - 1, ',' + 1, '[', '{', ']', '}', '\\', 'u', ';', 0, 1, 0x7F,
        (byte) 0x80, (byte) (',' | 0x80), (byte) ('[' | 0x80), (byte) ('\\' | 0x80), (byte) 0xFF, 'K', ' '};

    private final Random random = new Random(11);

    private byte[] text() {
        byte[] text = new byte[random.nextInt(LONGEST)];
        for (int i = 0; i < text.length; i++) {
            text[i] = NEAR[random.nextInt(NEAR.length)];
        }
        return text;
    }

    @Test
    void commasAndOpeningBracketsBoundTheValuesWhereverTheyStand() {
        for (int i = 0; i < TEXTS; i++) {
            byte[] text = text();
            int values = 1;
            for (byte one : text) {
                values += one == ',' || one == '[' || one == '{' ? 1 : 0;
            }
            assertEquals(values, JsonScan.mostValues(text));
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"{}", "{\"a\":[]}", "{\"a\":[1,2,{\"b\":null,\"c\":[true]}],\"d\":\",[{\"}"})
    void noTextHoldsMoreValues(String text) {
        int held = values(JsonReader.read(text.getBytes(StandardCharsets.UTF_8)).root());
        assertTrue(held <= JsonScan.mostValues(text.getBytes(StandardCharsets.UTF_8)), text);
    }

    private static int values(Node node) {
        if (node instanceof Branch branch) {
            return 1 + branch.members().values().stream().mapToInt(JsonScanTest::values).sum();
        }
        return node instanceof Node.Series series
                ? 1 + series.items().stream().mapToInt(JsonScanTest::values).sum() : 1;
    }

    @Test
    void oneByteBeyondAsciiIsSeenAtEveryPlace() {
        for (int length = 1; length < LONGEST; length++) {
            byte[] text = "x".repeat(length).getBytes(StandardCharsets.US_ASCII);
            assertTrue(JsonScan.isAscii(text));
            for (int place = 0; place < length; place++) {
                byte[] beyond = text.clone();
                beyond[place] = (byte) 0x80;
                assertFalse(JsonScan.isAscii(beyond), place + " of " + length);
            }
        }
    }

    @Test
    void aByteIsFoundWhereItStandsFirst() {
        for (int i = 0; i < TEXTS; i++) {
            byte[] text = text();
            int from = random.nextInt(text.length + 1);
            int found = from;
            while (found < text.length && text[found] != '\\') {
                found++;
            }
            assertEquals(found == text.length ? -1 : found, JsonScan.find(text, '\\', from));
        }
    }

    @ParameterizedTest
    @CsvSource({"'{\"a\":\"\\n\"}',true", "'{\"aaaaaaaaaaaaaaa\":\"\\u0041\"}',false", "'\\',true", "'\\\\u',false",
        "'u\\',true", "'12345678\\u',false", "'1234567\\u',false"})
    void aTextIsSureWhereNoCharacterIsWrittenAsACode(String text, boolean sure) {
        assertEquals(sure, WellFormed.isSure(text.getBytes(StandardCharsets.UTF_8)));
    }

    @Test
    void aTextEndsAtTheFirstQuoteBackslashOrControlCharacter() {
        byte[] stops = {'"', '\\', 0, 1, '\n', 0x1F};
        byte[] goesOn = {' ', '!', '#', '[', ']', 'a', 0x7F, (byte) 0x80, (byte) 0x9F, (byte) 0xA2, (byte) 0xDC, (byte) 0xFF};
        for (int i = 0; i < TEXTS; i++) {
            byte[] text = new byte[random.nextInt(LONGEST)];
            int end = text.length;
            for (int at = text.length - 1; at >= 0; at--) {
                boolean stop = random.nextInt(8) == 0;
                text[at] = stop ? stops[random.nextInt(stops.length)] : goesOn[random.nextInt(goesOn.length)];
                end = stop ? at : end;
            }
            assertEquals(end, JsonScan.endOfText(text, 0, text.length));
            assertEquals(end / 2, JsonScan.endOfText(text, 0, end / 2), "what stands behind is not looked at");
        }
    }

    @Test
    void textsThatAreTheSameMixToTheSameWhereverTheyStand() {
        for (int i = 0; i < TEXTS; i++) {
            byte[] text = text();
            byte[] other = new byte[text.length + LONGEST];
            random.nextBytes(other);
            int from = random.nextInt(LONGEST);
            System.arraycopy(text, 0, other, from, text.length);
            assertEquals(JsonScan.mix(text, 0, text.length), JsonScan.mix(other, from, from + text.length));
        }
    }
}
