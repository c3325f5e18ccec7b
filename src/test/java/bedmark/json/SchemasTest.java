package bedmark.json;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.engine.Result;
import bedmark.engine.bed.DepthMethod;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealType;
import bedmark.engine.seal.Side;
import bedmark.engine.uncertainty.Instrument;
import bedmark.engine.verdict.Component;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Rule;
import bedmark.form.Group;
import bedmark.form.ReadingKey;
import bedmark.form.SealsField;
import bedmark.form.StationsField;
import bedmark.quantity.Dimension;
import bedmark.quantity.Unit;
import bedmark.survey.InspectionStatus;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class SchemasTest {
    private static byte[] bytes(String name) {
        try (InputStream text = SchemasTest.class.getResourceAsStream("/bedmark/schema/" + name + ".schema.json")) {
            return text.readAllBytes();
        } catch (IOException e) {
            throw new IllegalStateException(e);
        }
    }

    private static Branch schema(String name) {
        return JsonReader.read(bytes(name)).root();
    }

    @Test
    void schemaBesideTheFormsIsTheOneThatIsUsed() throws IOException {
        assertArrayEquals(bytes("field-form"), Files.readAllBytes(Path.of("field-forms", "field-form.schema.json")));
    }

    @ParameterizedTest
    @ValueSource(strings = {"bundle", "assessment", "field-form", "reference-materials", "reference-limits",
        "reference-seal-rates", "reference-speed-classes", "reference-instruments", "receipt"})
    void schemasAreOfTheNamedDraftAndLeaveRoomForUnknownKeys(String name) {
        assertEquals("https://json-schema.org/draft/2020-12/schema", schema(name).text("$schema").orElseThrow());
        requireRoom(schema(name));
    }

    private static void requireRoom(Node node) {
        if (node instanceof Branch branch) {
            branch.members().forEach((key, value) -> {
                assertTrue(!key.equals("unevaluatedProperties"));
                assertTrue(!key.equals("additionalProperties") || value instanceof Branch, key);
                requireRoom(value);
            });
        } else if (node instanceof Node.Series series) {
            series.items().forEach(SchemasTest::requireRoom);
        }
    }

    private static Set<String> words(String name, String where) {
        Node node = schema(name).at(Pointer.parse(where)).orElseThrow();
        return ((Node.Series) node).items().stream().map(item -> ((Node.Text) item).value())
                .collect(Collectors.toSet());
    }

    private static Set<String> codes(Stream<Unit> units) {
        return units.map(Unit::code).collect(Collectors.toSet());
    }

    @Test
    void unitsOfTheSchemaAreThoseOfTheProgram() {
        assertEquals(codes(Stream.of(Unit.values())), words("bundle", "/$defs/quantity/properties/unit/enum"));
        Map<String, Dimension> dimensions = Map.of("length", Dimension.LENGTH, "speed", Dimension.SPEED, "massFlow",
                Dimension.MASS_FLOW, "density", Dimension.DENSITY, "power", Dimension.POWER, "angle",
                Dimension.ANGLE, "time", Dimension.TIME, "ratio", Dimension.RATIO, "lineForce",
                Dimension.LINE_FORCE, "frequency", Dimension.FREQUENCY);
        dimensions.forEach((name, dimension) -> assertEquals(codes(Unit.of(dimension).stream()),
                words("bundle", "/$defs/" + name + "/properties/unit/enum"), name));
        assertEquals(Stream.of(Dimension.values()).map(Dimension::code).collect(Collectors.toSet()),
                words("field-form", "/$defs/measure/properties/dimension/enum"));
    }

    @Test
    void wordsOfTheTablesAreThoseOfTheForm() {
        String seals = "/$defs/readings/properties/seals/items/properties/";
        assertEquals(Set.copyOf(SealsField.SIDES), words("bundle", seals + "side/enum"));
        assertEquals(Set.copyOf(SealsField.TYPES), words("bundle", seals + "type/enum"));
        assertEquals(Set.copyOf(SealsField.CONDITIONS), words("bundle", seals + "condition/enum"));
        assertEquals(Set.copyOf(StationsField.METHODS), words("bundle", "/$defs/depthMethod/enum"));
    }

    @Test
    void codesOfTheSchemasAreThoseOfTheEngine() {
        Set<String> sides = codes(Side.values(), Side::code);
        Set<String> types = codes(SealType.values(), SealType::code);
        Set<String> conditions = codes(SealCondition.values(), SealCondition::code);
        Set<String> drags = codes(DragMethod.values(), DragMethod::code);
        String seals = "/$defs/readings/properties/seals/items/properties/";
        assertEquals(sides, words("bundle", seals + "side/enum"));
        assertEquals(types, words("bundle", seals + "type/enum"));
        assertEquals(conditions, words("bundle", seals + "condition/enum"));
        assertEquals(types, words("bundle", "/$defs/sealRate/properties/type/enum"));
        assertEquals(conditions, words("bundle", "/$defs/sealRate/properties/condition/enum"));
        assertEquals(codes(DepthMethod.values(), DepthMethod::code), words("bundle", "/$defs/depthMethod/enum"));
        assertEquals(drags, words("bundle", "/$defs/plant/properties/method/enum"));
        assertEquals(drags, words("assessment", "/$defs/assessment/properties/method/enum"));
        assertEquals(codes(Stream.of(Instrument.values()).filter(one -> one != Instrument.EXACT)
                        .toArray(Instrument[]::new), Instrument::code),
                words("bundle", "/$defs/instrument/properties/kind/enum"));
        assertEquals(codes(Level.values(), Level::code),
                words("assessment", "/$defs/assessment/properties/level/enum"));
        assertEquals(codes(InspectionStatus.values(), InspectionStatus::code),
                words("bundle", "/$defs/survey/properties/inspectionStatus/enum"));
    }

    @Test
    void everyResultIsInTheAssessment() {
        Branch keys = (Branch) schema("assessment").at(Pointer.parse("/$defs/assessment/properties")).orElseThrow();
        for (Result result : Result.values()) {
            assertTrue(keys.has(result.key()), result.key());
        }
        assertEquals(codes(Component.values(), Component::code),
                words("assessment", "/$defs/assessment/properties/leading/enum"));
    }

    @Test
    void everyRuleHasItsLimitsInTheBundle() {
        Branch limits = (Branch) schema("bundle").at(Pointer.parse("/$defs/limits/properties")).orElseThrow();
        Node ofRules = Node.text("#/$defs/limit");
        assertEquals(codes(Rule.values(), Rule::code), limits.members().keySet().stream()
                .filter(key -> limits.branch(key).flatMap(row -> row.get("$ref")).equals(Optional.of(ofRules)))
                .collect(Collectors.toSet()));
    }

    private static <T> Set<String> codes(T[] values, Function<T, String> code) {
        return Stream.of(values).map(code).collect(Collectors.toSet());
    }

    @Test
    void everyReadingOfTheFormIsInTheBundle() {
        Branch readings = (Branch) schema("bundle").at(Pointer.parse("/$defs/readings/properties")).orElseThrow();
        Branch survey = (Branch) schema("bundle").at(Pointer.parse("/$defs/survey/properties")).orElseThrow();
        for (ReadingKey reading : ReadingKey.values()) {
            assertTrue((reading.group() == Group.SURVEY ? survey : readings).has(reading.key()), reading.key());
        }
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "{'level':'within'} | 0",
        "{'level':'undecided','levelAtDesignFeed':'near','method':'rankine','skirtDragN':943.7,'x':1} | 0",
        "{'level':'within','findings':[{'code':'bed-over-board','level':'near','observed':0.9,'unit':'1','near':0.85,"
            + "'overloaded':1,'probabilityNear':0.8,'probabilityOverloaded':0.1,'source':'A','assumption':true}]} | 0",
        "{'level':'within','uncertainty':{'skirtDragN':12},'missing':['/readings/seals'],'energyIs':'shaft'} | 0",
        "{} | 1", "{'level':'fine'} | 1", "{'level':'within','skirtDragN':'943'} | 1",
        "{'level':'within','uncertainty':{'skirtDragN':-1}} | 1", "{'level':'within','missing':['seals']} | 1",
        "{'level':'within','findings':[{'code':'x','level':'near','probabilityNear':1.5}]} | 1",
        "{'level':'within','methods':[{'method':'tabulated'}]} | 1"})
    void assessmentsFollowTheirSchema(String assessment, int defects) {
        String text = ("{'format':'bedmark.assessment','version':1,'surveys':[{'id':"
                + "'0b2f6c1e-6f0e-4f6f-9a70-0d0e3f8f1a03','revision':1,'transfer':'t1','assessment':" + assessment
                + "}]}").replace('\'', '"');
        assertEquals(defects, new SchemaCheck("assessment.schema.json")
                .check(JsonReader.read(text.getBytes(StandardCharsets.UTF_8))).size());
    }

    @Test
    void nothingInAListIsNotSkipped() {
        String text = "{\"format\":\"bedmark.bundle\",\"version\":1,\"plant\":{\"areas\":[null]},\"surveys\":[]}";
        assertEquals(List.of("/plant/areas/0"), new SchemaCheck("bundle.schema.json")
                .check(JsonReader.read(text.getBytes(StandardCharsets.UTF_8))).stream()
                .map(defect -> defect.where()).toList());
    }
}
