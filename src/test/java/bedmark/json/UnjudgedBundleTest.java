package bedmark.json;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Refused;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Random;
import java.util.function.Function;
import java.util.function.UnaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** A bundle whose assessments are read over: the rest is the same, and so is everything that is refused. */
class UnjudgedBundleTest {
    private static final Path SAMPLE = Path.of("sample-surveys", "round-under-way.json");
    private static final int CHANGES = 2000;

    /** With a byte-order mark a document is read as a text, and every place in it stays. */
    private static final UnaryOperator<byte[]> WITH_MARK = bytes -> {
        byte[] marked = new byte[bytes.length + 3];
        marked[0] = (byte) 0xEF;
        marked[1] = (byte) 0xBB;
        marked[2] = (byte) 0xBF;
        System.arraycopy(bytes, 0, marked, 3, bytes.length);
        return marked;
    };

    private static String assessed(String assessment) {
        return "{\"format\":\"bedmark.bundle\",\"version\":1,\"plant\":{\"conveyors\":[{\"id\":\"c\"}],"
                + "\"transfers\":[{\"id\":\"t\",\"conveyor\":\"c\"}]},\"surveys\":[{\"id\":\"0b2f6c1e-6f0e-4f6f-9a70-0d0e3f8f1a03\","
                + "\"transfer\":\"t\",\"assessment\":" + assessment + ",\"observations\":{\"assessment\":{\"own\":1}}}],"
                + "\"assessment\":{\"kept\":[1]}}";
    }

    private static String told(Function<byte[], Object> reading, byte[] text) {
        try {
            return String.valueOf(reading.apply(text));
        } catch (Refused e) {
            return e.defect().toString();
        }
    }

    private static Object unjudged(Branch bundle) {
        List<Node> surveys = bundle.branches("surveys").stream().map(survey -> survey.has("assessment")
                ? (Node) survey.with("assessment", Branch.EMPTY) : survey).toList();
        return bundle.with("surveys", new Node.Series(surveys));
    }

    @Test
    void everythingButTheAssessmentsIsKept() {
        byte[] text = assessed("{\"a\":[1,{\"b\":\"\\u00e9\\ud83d\\ude00\",\"c\":null}],\"d\":1e99,\"e\":{},"
                + "\"f\":true}").getBytes(StandardCharsets.UTF_8);
        assertEquals(unjudged(BundleReader.read(text).document()), BundleReader.readUnjudged(text).document());
    }

    @ParameterizedTest
    @ValueSource(strings = {"{\"a\":1,\"a\":2}", "{\"a\":[{\"b\":1,\"c\":{\"b\":1},\"b\":1}]}", "{\"a\":1e100}",
        "{\"a\":\"\\ud800\"}", "{\"\\udc00\":1}", "{\"a\":NaN}", "{\"a\":01}", "{\"a\":[1,]}", "{\"a\":\"\t\"}",
        "{\"a\":tru}", "[]", "1", "{\"a\":1e999999999}", "{\"a\"}", "{\"a\":{}"})
    void whatIsRefusedElsewhereIsRefusedInAnAssessmentToo(String assessment) {
        byte[] text = assessed(assessment).getBytes(StandardCharsets.UTF_8);
        assertEquals(assertThrows(Refused.class, () -> BundleReader.read(text)).defect(),
                assertThrows(Refused.class, () -> BundleReader.readUnjudged(text)).defect());
    }

    @Test
    void aKeyThatStandsTwiceIsFoundAmongMany() {
        for (int keys : List.of(2, 24, 25, 26, 300)) {
            StringBuilder many = new StringBuilder("{");
            for (int i = 0; i < keys; i++) {
                many.append("\"k").append(i).append("\":{\"k0\":").append(i).append("},");
            }
            assertEquals(1, BundleReader.readUnjudged(assessed(many + "\"last\":0}")
                    .getBytes(StandardCharsets.UTF_8)).surveys().size());
            for (int twice : List.of(0, keys / 2, keys - 1)) {
                byte[] text = assessed(many + "\"k" + twice + "\":0}").getBytes(StandardCharsets.UTF_8);
                assertThrows(Refused.class, () -> BundleReader.readUnjudged(text));
            }
        }
    }

    /** An assessment lies four levels deep; the deepest that may be read is level 64. */
    @Test
    void anAssessmentMayLieAsDeepAsAnythingElse() {
        for (int lists : List.of(1, 59, 60, 61, 62, 70)) {
            byte[] text = assessed("{\"a\":" + "[".repeat(lists) + "]".repeat(lists) + "}")
                    .getBytes(StandardCharsets.UTF_8);
            String whole = told(bytes -> unjudged(BundleReader.read(bytes).document()), text);
            assertEquals(lists > 60, whole.startsWith("Defect"), lists + " lists: " + whole);
            assertEquals(whole, told(bytes -> BundleReader.readUnjudged(bytes).document(), text));
        }
    }

    /** One survey of a real bundle, its bytes changed, dropped and doubled: all ways of reading say the same of each. */
    @Test
    void damagedTextsAreToldAlike() throws IOException {
        Branch bundle = JsonReader.read(Files.readAllBytes(SAMPLE)).root();
        byte[] sound = JsonWriter.compact(bundle.without("forms")
                .with("surveys", new Node.Series(List.of(bundle.series("surveys").get(0)))));
        Random random = new Random(5);
        byte[] signs = "{}[]\",:0123456789eE+-.\\u \n\t\u00e9\ud83d\ude00ax".getBytes(StandardCharsets.UTF_8);
        int refused = 0;
        for (int i = 0; i < CHANGES; i++) {
            int at = random.nextInt(sound.length);
            byte[] text = sound.clone();
            switch (random.nextInt(4)) {
                case 0 -> text[at] = (byte) random.nextInt(256);
                case 1 -> System.arraycopy(sound, at, text, Math.max(0, at - 1), sound.length - at);
                default -> text[at] = signs[random.nextInt(signs.length)];
            }
            String whole = told(bytes -> unjudged(BundleReader.read(bytes).document()), text);
            assertEquals(whole, told(bytes -> BundleReader.readUnjudged(bytes).document(), text));
            assertEquals(told(bytes -> JsonReader.read(bytes).root(), text), told(bytes -> JsonReader.read(
                    WITH_MARK.apply(bytes)).root(), text));
            refused += whole.startsWith("Defect") ? 1 : 0;
        }
        assertTrue(refused > CHANGES / 10, "some were refused: " + refused);
    }
}
