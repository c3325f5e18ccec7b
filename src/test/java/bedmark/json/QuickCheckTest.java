package bedmark.json;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.InputStream;
import java.math.BigDecimal;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** What is accepted at a glance is what the validator accepts. */
class QuickCheckTest {
    private static final String SCHEMA = "bundle.schema.json";
    private static final int CHANGES = 4000;
    private static final List<String> TEXTS = List.of("", "x", "measured", "m", "mm", "kW", "t/h", "bedmark.bundle",
            "2026-03-02T07:00:00+01:00", "2026-02-30T07:00:00Z", "2026-03-02t07:00:00z", "2026-03-02T24:00:00Z",
            "2026-03-02T23:59:60Z", "2026-03-02T07:00:00-00:00", "2026-03-02T07:00:00+18:00", "2026-03-02T07:00:00Z\n",
            "0000-01-01T00:00:00Z", "2026-03-02", "0b2f6c1e-6f0e-4f6f-9a70-0d0e3f8f1a03",
            "0B2F6C1E-6F0E-4F6F-9A70-0D0E3F8F1A03", "1-1-1-1-1", "tape", "belt-scale", "repose", "vertical", "sound",
            "inspected", "left", "rankine");

    private final Random random = new Random(8);

    private static QuickCheck quick() throws IOException {
        try (InputStream text = QuickCheckTest.class.getResourceAsStream("/bedmark/schema/" + SCHEMA)) {
            return new QuickCheck(new ObjectMapper().readTree(text));
        }
    }

    private static List<Branch> samples() throws IOException {
        List<Branch> samples = new ArrayList<>();
        for (String name : List.of("round-2025-09", "round-2026-03", "round-under-way")) {
            samples.add(JsonReader.read(Files.readAllBytes(Path.of("sample-surveys", name + ".json"))).root());
        }
        try (InputStream text = QuickCheckTest.class.getResourceAsStream("bundle.json")) {
            samples.add(JsonReader.read(text.readAllBytes()).root());
        }
        return samples;
    }

    @Test
    void wholeBundlesAreAcceptedAtAGlance() throws IOException {
        QuickCheck quick = quick();
        assertTrue(samples().stream().allMatch(quick::accepts));
    }

    @Test
    void nothingIsAcceptedAtAGlanceThatTheValidatorRefuses() throws IOException {
        QuickCheck quick = quick();
        SchemaCheck schema = new SchemaCheck(SCHEMA);
        List<Branch> samples = samples();
        Branch base = samples.get(samples.size() - 1);
        int accepted = 0;
        int refused = 0;
        for (int i = 0; i < CHANGES; i++) {
            String key = pick(List.of("plant", "surveys", "surveys", "rounds", "forms", "createdAt", "id", "device"));
            Branch changed = base.with(key, changed(base.get(key).orElse(new Node.Blank())));
            boolean valid = schema.validate(new Document(changed)).isEmpty();
            boolean sure = quick.accepts(changed);
            assertTrue(valid || !sure, () -> new String(JsonWriter.compact(changed)));
            accepted += sure ? 1 : 0;
            refused += valid ? 0 : 1;
        }
        assertTrue(accepted > CHANGES / 20 && refused > CHANGES / 20, accepted + ", " + refused);
    }

    @ParameterizedTest
    @ValueSource(strings = {"{\"properties\":{\"a\":{\"oneOf\":[{\"type\":\"string\"}]}}}",
        "{\"additionalProperties\":false}", "{\"properties\":{\"a\":false}}",
        "{\"properties\":{\"a\":{\"$ref\":\"urn:elsewhere\"}}}",
        "{\"if\":{\"type\":\"object\"},\"then\":true,\"else\":true}"})
    void whatIsNotKnownIsLeftToTheValidator(String schema) throws IOException {
        Branch document = Branch.EMPTY.with("a", "b");
        assertEquals(false, new QuickCheck(new ObjectMapper().readTree(schema)).accepts(document));
    }

    /** The same with one value somewhere replaced, or one key dropped or blank. */
    private Node changed(Node node) {
        if (random.nextInt(6) > 0 && node instanceof Branch branch && !branch.members().isEmpty()) {
            String key = pick(new ArrayList<>(branch.members().keySet()));
            return switch (random.nextInt(24)) {
                case 0 -> branch.without(key);
                case 1 -> branch.with(key, new Node.Blank());
                default -> branch.with(key, changed(branch.members().get(key)));
            };
        } else if (random.nextInt(6) > 0 && node instanceof Node.Series series && !series.items().isEmpty()) {
            List<Node> items = new ArrayList<>(series.items());
            int at = random.nextInt(items.size());
            items.set(at, changed(items.get(at)));
            return new Node.Series(items);
        }
        return node instanceof Branch && random.nextInt(4) > 0 ? renamed((Branch) node) : any();
    }

    private Node renamed(Branch branch) {
        Map<String, Node> members = new LinkedHashMap<>();
        branch.members().forEach((key, value) -> members.put(random.nextInt(8) == 0 ? key + "x" : key, value));
        return new Branch(members);
    }

    private Node any() {
        return switch (random.nextInt(10)) {
            case 0 -> Node.number(random.nextInt(5) - 2);
            case 1 -> Node.number(new BigDecimal(pick(List.of("0.0", "1.0", "-0.5", "0.5", "1.000001", "100001",
                    "1000001"))));
            case 2 -> Node.flag(random.nextBoolean());
            case 3 -> new Node.Blank();
            case 4 -> Branch.EMPTY;
            case 5 -> new Node.Series(List.of());
            case 6 -> new Node.Series(Stream.generate(this::any).limit(2).toList());
            default -> Node.text(pick(TEXTS));
        };
    }

    private <T> T pick(List<T> some) {
        return some.get(random.nextInt(some.size()));
    }
}
