package bedmark.json;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import bedmark.document.Branch;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import java.nio.charset.StandardCharsets;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class JsonReaderTest {
    private static byte[] bytes(String text) {
        return text.getBytes(StandardCharsets.UTF_8);
    }

    @Test
    void decimalsKeepTheirTrailingZeros() {
        byte[] text = bytes("{\"value\":9.50,\"many\":[1,2.00,0.250],\"unknown\":{\"a\":null}}");
        assertArrayEquals(text, JsonWriter.compact(JsonReader.read(text).root()));
    }

    /** A journal that takes in what it cannot read again would lose it. */
    @ParameterizedTest
    @ValueSource(strings = {"1e99", "-1E+98", "1e-97", "1.50e-40", "0e-90", "123456789012345678901234567890.5"})
    void whatIsReadCanBeWrittenAndReadAgain(String number) {
        Branch read = JsonReader.read(bytes("{\"a\":" + number + "}")).root();
        assertEquals(read, JsonReader.read(JsonWriter.compact(read)).root());
    }

    @ParameterizedTest
    @ValueSource(strings = {"1e100", "1e-99", "1e101", "-1.5e-100", "0e-100"})
    void numberThatIsLongerThanItsLimitWhenWrittenOutIsRefused(String number) {
        Refused refused = assertThrows(Refused.class, () -> JsonReader.read(bytes("{\"a\":" + number + "}")));
        assertEquals("number", refused.defect().details().get(2));
    }

    @Test
    void everyValueHasItsPlace() {
        Document document = JsonReader.read(bytes("{\n  \"a\": [\n    1,\n    {\"b\": true}\n  ]\n}"));
        assertEquals(4, document.placeOf(Pointer.parse("/a/1/b")).orElseThrow().line());
        assertEquals(4, document.placeOf(Pointer.parse("/a/1/absent")).orElseThrow().line());
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "[]", "{\"a\":1,\"a\":2}", "{\"a\":1e999999999}", "{\"a\":1e-99999999999}",
        "{\"a\":NaN}", "{} {}", "{\"a\":", "{\"a\":\"\\ud800\"}", "{\"a\":1,}", "{\"a\":01}", "{'a':1}"})
    void whatIsNoStrictObjectIsRefusedWithItsPlace(String text) {
        Refused refused = assertThrows(Refused.class, () -> JsonReader.read(bytes(text)));
        assertEquals("json-unreadable", refused.defect().code());
        assertEquals("1", refused.defect().details().get(0));
    }

    @Test
    void whatIsNoUtf8IsRefused() {
        Refused refused = assertThrows(Refused.class, () -> JsonReader.read(new byte[] {'{', (byte) 0xC3, '}'}));
        assertEquals("json-not-utf8", refused.defect().code());
    }

    @Test
    void nestingHasAnEnd() {
        String deep = "{\"a\":" + "[".repeat(1000) + "]".repeat(1000) + "}";
        assertEquals("json-unreadable",
                assertThrows(Refused.class, () -> JsonReader.read(bytes(deep))).defect().code());
    }
}
