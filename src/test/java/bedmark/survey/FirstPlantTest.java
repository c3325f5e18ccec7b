package bedmark.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Refused;
import bedmark.engine.verdict.Level;
import bedmark.json.BundleReader;
import bedmark.json.JsonReader;
import bedmark.json.JsonWriter;
import bedmark.json.ReferenceData;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.UUID;
import org.junit.jupiter.api.Test;

/** What a new plant is asked is enough for a verdict, and what it makes is a register like any other. */
class FirstPlantTest {
    private static final Branch READINGS = JsonReader.read("""
            {"loadingZoneLength": {"value": 3, "unit": "m"}, "beltSpeed": {"value": 1.6, "unit": "m/s"},
             "skirtSpacing": {"value": 500, "unit": "mm"}, "skirtHeight": {"value": 400, "unit": "mm"},
             "bedDepths": [{"position": {"value": 1, "unit": "m"}, "depth": {"value": 150, "unit": "mm"}}],
             "seals": [{"side": "left", "type": "vertical", "condition": "sound", "length": {"value": 3, "unit": "m"}},
               {"side": "right", "type": "vertical", "condition": "sound", "length": {"value": 3, "unit": "m"}}]}
            """.getBytes(StandardCharsets.UTF_8)).root();

    private static Quantity size(long value, Unit unit) {
        return Quantity.of(BigDecimal.valueOf(value), unit);
    }

    private static FirstPlant plant(long trough, Optional<Quantity> roll, Branch material) {
        return new FirstPlant("Holm", "B1", size(800, Unit.MILLIMETRE), size(trough, Unit.DEGREE), roll, "T1", "Crusher",
                material);
    }

    private static Level level(FirstPlant plant) {
        Branch head = plant.act(UUID.randomUUID(), "First walk", Branch.EMPTY.with("id", "loading-zone")).register();
        Register register = new Register(head.branch("plant").orElseThrow());
        Survey survey = new Survey(Survey.begin(UUID.randomUUID(), "first", "T1", "loading-zone", 1, "A. Vale",
                OffsetDateTime.parse("2026-09-22T14:00:00Z")).document().with("readings", READINGS));
        return new Assessor(register).assess(survey, List.of()).level();
    }

    @Test
    void everyMaterialOfTheTableIsEnoughForAVerdict() {
        List<Branch> materials = ReferenceData.shipped().materials("es");
        assertTrue(materials.size() > 10, "the table has materials");
        for (Branch material : materials) {
            for (int trough : new int[] {0, 35}) {
                assertNotEquals(Level.INCOMPLETE, level(plant(trough, Optional.of(size(300, Unit.MILLIMETRE)),
                        material)), material.text("id").orElseThrow());
            }
        }
        assertEquals("caliza triturada", materials.stream().filter(row -> row.text("id")
                .equals(Optional.of("limestone-crushed"))).findFirst().orElseThrow().text("name").orElseThrow());
    }

    @Test
    void aBundleOfItIsReadLikeAnyOther() {
        Branch head = plant(20, Optional.of(size(300, Unit.MILLIMETRE)), ReferenceData.shipped().materials("en").get(0))
                .act(UUID.randomUUID(), "First walk", Branch.EMPTY.with("id", "loading-zone")).register();
        Bundle bundle = BundleReader.read(JsonWriter.compact(Bundle.of(UUID.randomUUID(),
                OffsetDateTime.parse("2026-09-22T14:00:00Z"), Branch.EMPTY, head.without("forms"), "", List.of())
                .document()));
        assertEquals("Crusher", bundle.register().transfer("T1").flatMap(Register.Transfer::from).orElseThrow());
        assertEquals(List.of("T1"), bundle.rounds().get(0).points().stream().map(Round.Point::transfer).toList());
    }

    @Test
    void aTroughNeedsACentreRollNarrowerThanTheBelt() {
        Branch material = ReferenceData.shipped().materials("en").get(0);
        List<String> codes = new ArrayList<>();
        for (Optional<Quantity> roll : List.of(Optional.<Quantity>empty(),
                Optional.of(size(800, Unit.MILLIMETRE)))) {
            codes.add(assertThrows(Refused.class, () -> plant(20, roll, material)).defect().code());
        }
        assertEquals(List.of("centre-roll-absent", "centre-roll-beyond-belt"), codes);
    }
}
