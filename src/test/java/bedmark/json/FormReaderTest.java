package bedmark.json;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.form.Caution;
import bedmark.form.ChoiceField;
import bedmark.form.Field;
import bedmark.form.FieldForm;
import bedmark.form.Group;
import bedmark.form.NumberField;
import bedmark.form.QuantityField;
import bedmark.form.ReadingKey;
import bedmark.form.SealsField;
import bedmark.form.SpeedField;
import bedmark.form.StationsField;
import bedmark.form.TextField;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import bedmark.quantity.UnitSystem;
import java.io.IOException;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class FormReaderTest {
    private static final Path ZONE = Path.of("field-forms", "loading-zone.json");

    private static Document document() throws IOException {
        return JsonReader.read(Files.readAllBytes(ZONE));
    }

    private static FieldForm zone() throws IOException {
        return FormReader.read(document());
    }

    @Test
    void loadingZoneAsksForEveryReadingInTheRightKind() throws IOException {
        FieldForm form = zone();
        for (ReadingKey reading : ReadingKey.values()) {
            Field field = form.field(reading.key()).orElseThrow();
            assertEquals(reading.group(), field.head().group(), reading.key());
            reading.dimension().ifPresent(dimension -> assertEquals(dimension,
                    assertInstanceOf(QuantityField.class, field).measure().dimension()));
        }
        assertInstanceOf(SpeedField.class, form.field("beltSpeed").orElseThrow());
        assertInstanceOf(StationsField.class, form.field("bedDepths").orElseThrow());
        assertInstanceOf(SealsField.class, form.field("seals").orElseThrow());
        assertEquals(Optional.of(TextField.Offer.MATERIALS),
                ((TextField) form.field("materialRunning").orElseThrow()).offers());
    }

    @Test
    void loadingZoneRequiresWhatAVerdictNeedsAndTheRegisterCannotHave() throws IOException {
        assertEquals(List.of("loadingZoneLength", "beltSpeed", "bedDepths", "seals"),
                zone().gaps(Branch.EMPTY).stream().map(Field::key).toList());
    }

    @Test
    void depthSealAndSpeedAlwaysHaveTheirCaution() throws IOException {
        FieldForm form = zone();
        assertEquals(Optional.of(Caution.SPEED), form.field("beltSpeed").orElseThrow().head().caution());
        assertEquals(Optional.of(Caution.DEPTH), form.field("bedDepths").orElseThrow().head().caution());
        assertEquals(Optional.of(Caution.SEAL), form.field("seals").orElseThrow().head().caution());
    }

    @Test
    void observationsCoverWhatTheDataPageNames() throws IOException {
        FieldForm form = zone();
        for (String key : List.of("spillage", "dust", "linerWear", "beltEdge", "mistracking", "boardGap",
                "beltSupport", "guards")) {
            assertEquals(Group.OBSERVATIONS, form.field(key).orElseThrow().head().group(), key);
        }
    }

    @Test
    void followUpQuestionsWaitForTheirReason() throws IOException {
        FieldForm form = zone();
        Field where = form.field("spillageAt").orElseThrow();
        Pointer spillage = form.field("spillage").orElseThrow().where();
        assertTrue(!form.shows(where, Branch.EMPTY));
        assertTrue(!form.shows(where, Branch.EMPTY.with(spillage, Node.text("none"))));
        assertTrue(form.shows(where, Branch.EMPTY.with(spillage, Node.text("heavy"))));
        Field fault = form.field("guardsFault").orElseThrow();
        Pointer guards = form.field("guards").orElseThrow().where();
        assertTrue(form.requires(fault, Branch.EMPTY.with(guards, Node.text("failed"))));
        assertTrue(!form.requires(fault, Branch.EMPTY.with(guards, Node.text("degraded"))));
    }

    @Test
    void stepsSnapToQuarterInchAndFiveMillimetres() throws IOException {
        StationsField stations = (StationsField) zone().field("bedDepths").orElseThrow();
        assertEquals(new BigDecimal("0.25"), stations.depth().step(stations.depth().unit(UnitSystem.US)));
        assertEquals(new BigDecimal("5"), stations.depth().step(stations.depth().unit(UnitSystem.METRIC)));
        assertEquals(List.of(Unit.MILLIMETRE, Unit.CENTIMETRE, Unit.METRE, Unit.INCH, Unit.FOOT),
                stations.depth().units());
    }

    @Test
    void fieldsAddedToACopyAreReadLikeTheOthers() throws IOException {
        Branch root = document().root();
        List<Node> sections = new ArrayList<>(root.series("sections"));
        Branch last = (Branch) sections.get(sections.size() - 1);
        List<Node> fields = new ArrayList<>(last.series("fields"));
        Branch label = Branch.EMPTY.with("en", "Added").with("es", "Añadido");
        Branch head = Branch.EMPTY.with("group", "observations").with("label", label).with("x-own", "kept");
        fields.add(head.with("key", "weather").with("kind", "text"));
        fields.add(head.with("key", "holes").with("kind", "number")
                .with("count", Branch.EMPTY.with("step", Node.number(1))));
        fields.add(head.with("key", "noise").with("kind", "choice").with("choices", Node.Series.of(
                Branch.EMPTY.with("code", "loud").with("label", label))));
        sections.set(sections.size() - 1, last.with("fields", new Node.Series(fields)));
        FieldForm form = FormReader.read(root.with("sections", new Node.Series(sections)).with("x-own", label));
        assertInstanceOf(TextField.class, form.field("weather").orElseThrow());
        assertInstanceOf(NumberField.class, form.field("holes").orElseThrow());
        assertEquals("loud", assertInstanceOf(ChoiceField.class, form.field("noise").orElseThrow())
                .choices().get(0).code());
        assertEquals(Pointer.parse("/observations/noise"), form.field("noise").orElseThrow().where());
    }

    @Test
    void missingTranslationIsNoReasonToRefuse() throws IOException {
        FieldForm form = FormReader.read(JsonReader.read(FormsCheckerTest.sound()
                .replace(", \"es\": \"Polvo\"", "").getBytes(StandardCharsets.UTF_8)));
        assertEquals("Dust", form.field("dust").orElseThrow().head().label().in("es"));
    }

    @Test
    void rangesAreReadWithTheirUnits() throws IOException {
        QuantityField length = (QuantityField) zone().field("loadingZoneLength").orElseThrow();
        assertEquals(Optional.of(Quantity.of("0", Unit.METRE)), length.measure().possible().low());
        assertTrue(length.measure().possible().excluded());
        assertTrue(!length.measure().plausible().excluded());
    }

    @Test
    void brokenFormIsRefusedWithPointerAndLine() throws IOException {
        Refused refused = assertThrows(Refused.class, () -> FormReader.read(JsonReader.read(FormsCheckerTest.sound()
                .replace("\"field\": \"dust\"", "\"field\": \"rust\"").getBytes(StandardCharsets.UTF_8))));
        assertEquals("condition-field-unknown", refused.defect().code());
        assertEquals("/sections/1/fields/1/requiredIf/field (55:35)", refused.defect().where());
    }

    @Test
    void laterFormatIsRefused() throws IOException {
        Branch later = document().root().with("formatVersion", Node.number(2));
        assertEquals("word-wrong", assertThrows(Refused.class, () -> FormReader.read(later)).defect().code());
    }
}
