package bedmark.sample;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.quantity.Dimension;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import bedmark.survey.Bundle;
import bedmark.survey.InspectionStatus;
import bedmark.survey.Register;
import bedmark.survey.Round;
import bedmark.survey.Survey;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.function.Function;
import java.util.function.Predicate;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** The demo plant shows everything that a plant may be and a person may read. */
class SampleVarietyTest {
    private static final List<Bundle> BUNDLES = SampleRound.ALL.stream().map(SampleFiles::committed).toList();
    private static final Bundle UNDER_WAY = BUNDLES.get(BUNDLES.size() - 1);
    private static final Register PLANT = UNDER_WAY.register();

    private static Stream<Survey> surveys() {
        return BUNDLES.stream().flatMap(bundle -> bundle.surveys().stream());
    }

    private static Set<String> words(String list, String key) {
        return surveys().flatMap(survey -> survey.readings().branches(list).stream())
                .flatMap(row -> row.text(key).stream()).collect(Collectors.toCollection(TreeSet::new));
    }

    private static boolean anyTransfer(Predicate<Branch> holds) {
        return PLANT.transfers().values().stream().map(Register.Transfer::document).anyMatch(holds);
    }

    private static boolean anyConveyor(Predicate<Branch> holds) {
        return PLANT.conveyors().values().stream().map(Register.Conveyor::document).anyMatch(holds);
    }

    @Test
    void plantIsLargeEnough() {
        assertEquals(4, PLANT.areas().size());
        assertTrue(PLANT.conveyors().size() >= 14, PLANT.conveyors().keySet().toString());
        assertTrue(PLANT.transfers().size() >= 24, PLANT.transfers().keySet().toString());
        assertTrue(PLANT.materials().size() >= 6, PLANT.materials().keySet().toString());
        Set<String> used = PLANT.transfers().values().stream().flatMap(transfer -> transfer.material().stream())
                .collect(Collectors.toSet());
        assertEquals(PLANT.materials().keySet(), used);
        assertEquals(PLANT.areaNames().keySet(), PLANT.transfers().values().stream()
                .flatMap(transfer -> transfer.area().stream()).collect(Collectors.toSet()));
    }

    @Test
    void everyBundleHoldsTheSamePlantAndTheForm() {
        BUNDLES.forEach(bundle -> {
            assertEquals(PLANT.document(), bundle.register().document());
            assertEquals(1, bundle.forms().size());
            assertEquals(1, bundle.rounds().size());
        });
        assertEquals(BUNDLES.size(), BUNDLES.stream().map(bundle -> bundle.rounds().get(0).id()).distinct().count());
    }

    @Test
    void conveyorUnderTheBunkersIsSkirtedAllAlong() {
        List<Register.Transfer> zones = PLANT.zonesOf("C12");
        assertEquals(3, zones.size());
        double skirted = zones.stream().mapToDouble(zone -> zone.quantity("designZoneLength").orElseThrow().si()).sum();
        double pulleys = PLANT.conveyors().get("C12").quantity("beltLength").orElseThrow().si() / 2;
        assertTrue(skirted > 0.9 * pulleys && skirted <= pulleys, skirted + " of " + pulleys);
    }

    @Test
    void surgeFeederIsASlowFlatBeltWithADeepBed() {
        Branch feeder = PLANT.conveyors().get("C1").document();
        assertEquals(0, feeder.quantity("troughAngle").orElseThrow().si());
        assertTrue(!feeder.has("centreRollLength"));
        assertTrue(feeder.quantity("designSpeed").orElseThrow().si() < 0.5);
        assertTrue(PLANT.transfer("TP-01").orElseThrow().quantity("designBedDepth").orElseThrow().si() > 0.5);
    }

    @Test
    void materialsGoFromWoodChipsToIronOre() {
        Function<String, Double> density = id ->
                PLANT.materials().get(id).document().quantity("bulkDensity").orElseThrow().si();
        assertTrue(density.apply("wood-chips") < 350);
        assertTrue(density.apply("iron-ore") > 3000);
        assertTrue(PLANT.materials().values().stream().anyMatch(one ->
                one.document().flag("freeFlowing").orElse(false)));
    }

    @Test
    void registerHoldsTheRareKeysToo() {
        assertTrue(anyConveyor(conveyor -> conveyor.has("skirtPowerBudget")));
        assertTrue(anyConveyor(conveyor -> conveyor.quantity("incline").orElseThrow().si() > 0.2));
        assertTrue(anyTransfer(transfer -> transfer.has("designBedDepth")));
        assertTrue(anyTransfer(transfer -> !transfer.has("designBedDepth")));
        assertTrue(anyTransfer(transfer -> transfer.flag("highAirFlow").orElse(false)));
        assertTrue(anyTransfer(transfer -> transfer.has("lumpSize")));
        assertTrue(anyTransfer(transfer -> !transfer.has("lumpSize")));
        for (String choice : List.of("limits", "sealRates", "instruments", "tariff", "co2Factor")) {
            assertTrue(PLANT.document().has(choice), choice);
        }
    }

    @Test
    void oneAreaIsInInchesWithFractions() {
        Set<Unit> inches = Set.of(Unit.INCH, Unit.FOOT);
        for (Register.Transfer transfer : PLANT.transfers().values()) {
            boolean american = inches.contains(transfer.quantity("skirtSpacing").orElseThrow().unit());
            assertEquals(transfer.area().orElseThrow().equals("load-out"), american, transfer.id());
        }
        Set<String> entered = surveys().flatMap(survey -> survey.readings().branches("bedDepths").stream())
                .map(row -> row.quantity("depth").orElseThrow()).flatMap(depth -> depth.entered().stream())
                .collect(Collectors.toSet());
        assertTrue(entered.stream().anyMatch(text -> text.matches("\\d+ \\d/[248]")), entered.toString());
        assertTrue(surveys().flatMap(survey -> survey.readings().branches("bedDepths").stream())
                .anyMatch(row -> row.quantity("depth").orElseThrow().unit() == Unit.CENTIMETRE));
    }

    @Test
    void depthsAndSpeedsAreReadInEveryWay() {
        assertEquals(Set.of("at-board", "from-board-top", "at-centre", "wear-line"), surveys()
                .flatMap(survey -> survey.readings().text("depthMethod").stream()).collect(Collectors.toSet()));
        for (String way : List.of("beltSpeed", "beltTiming", "pulleySpeed")) {
            assertTrue(surveys().anyMatch(survey -> survey.readings().has(way)), way);
        }
        Set<String> marks = surveys().flatMap(survey -> survey.readings().branches("bedDepths").stream())
                .map(row -> row.quantity("depth").orElseThrow())
                .map(depth -> depth.quality().orElseThrow().code() + " " + depth.beltState().orElseThrow().code())
                .collect(Collectors.toSet());
        assertEquals(Set.of("measured isolated", "estimated running-loaded", "suspect running-loaded"), marks);
    }

    @Test
    void sealsComeInEveryTypeAndMostConditions() {
        assertEquals(Set.of("vertical", "perpendicular", "oblique", "parallel", "contactless", "none"),
                words("seals", "type"));
        assertTrue(words("seals", "condition").containsAll(Set.of("sound", "worn", "torn", "over-tightened")));
        assertEquals(Set.of("none"), sealTypes("TP-07", "right"));
        assertEquals(Set.of("vertical"), sealTypes("TP-07", "left"));
        assertEquals(Set.of("contactless"), sealTypes("TP-09", "left"));
        assertEquals(Set.of("contactless"), sealTypes("TP-09", "right"));
    }

    private static Set<String> sealTypes(String transfer, String side) {
        return surveys().filter(survey -> survey.transfer().equals(transfer))
                .flatMap(survey -> survey.readings().branches("seals").stream())
                .filter(segment -> segment.text("side").orElseThrow().equals(side))
                .map(segment -> segment.text("type").orElseThrow()).collect(Collectors.toSet());
    }

    @Test
    void oneZoneRunsAnotherMaterialThanItsRegister() {
        Survey survey = UNDER_WAY.surveys().stream().filter(one -> one.readings().has("materialRunning")).findFirst()
                .orElseThrow();
        assertTrue(!survey.readings().text("materialRunning")
                .equals(PLANT.transfer(survey.transfer()).orElseThrow().material()));
    }

    @Test
    void pastRoundsAreFinishedAndTheLastIsUnderWay() {
        for (Bundle bundle : BUNDLES) {
            Round round = bundle.rounds().get(0);
            assertEquals(List.copyOf(PLANT.transfers().keySet()), round.points().stream().map(Round.Point::transfer)
                    .toList());
            Map<String, Survey> completed = bundle.surveys().stream()
                    .filter(survey -> survey.completedAt().isPresent()).collect(Collectors.toMap(Survey::transfer,
                            Function.identity(), (first, second) -> second));
            for (Round.Point point : round.points()) {
                String status = completed.containsKey(point.transfer())
                        ? completed.get(point.transfer()).inspectionStatus().code() : "not-inspected";
                assertEquals(status, point.status().orElseThrow(), round.name() + " " + point.transfer());
            }
            long left = round.points().size() - completed.size();
            assertTrue(bundle == UNDER_WAY ? left >= 6 : left == 0, round.name() + ": " + left);
            assertTrue(bundle.surveys().stream().anyMatch(survey -> survey.completedAt().isEmpty())
                    == (bundle == UNDER_WAY));
            assertTrue(bundle.surveys().stream().anyMatch(survey ->
                    survey.inspectionStatus() == InspectionStatus.NOT_ACCESSIBLE
                            && survey.document().text("statusReason").orElseThrow().length() > 20));
        }
    }

    @Test
    void surveysAreToldInOrderAndByDifferentIds() {
        Set<Object> ids = new HashSet<>();
        surveys().forEach(survey -> {
            assertTrue(ids.add(survey.id()), survey.transfer());
            survey.completedAt().ifPresent(done -> assertTrue(done.isAfter(survey.startedAt().orElseThrow())));
        });
        for (Bundle bundle : BUNDLES) {
            assertTrue(bundle.surveys().stream().flatMap(survey -> survey.completedAt().stream())
                    .allMatch(done -> done.isBefore(bundle.document().time("createdAt").orElseThrow())));
        }
    }

    @Test
    void everyReadingOnTheBeltSaysWhenAndHow() {
        for (Survey survey : surveys().toList()) {
            for (String place : List.of("/readings/beltSpeed", "/readings/throughput", "/readings/runningPower")) {
                survey.document().at(Pointer.parse(place)).map(node -> ((Branch) node).asQuantity())
                        .ifPresent(reading -> assertTrue(told(reading), survey.transfer() + place));
            }
            survey.readings().branches("bedDepths").forEach(row ->
                    assertTrue(told(row.quantity("depth").orElseThrow()), survey.transfer()));
        }
    }

    private static boolean told(Quantity reading) {
        return reading.at().isPresent() && reading.beltState().isPresent() && reading.quality().isPresent();
    }

    @Test
    void depthsAreTouchedOnlyUnderAPermit() {
        surveys().filter(survey -> survey.readings().branches("bedDepths").stream()
                .anyMatch(row -> row.quantity("depth").orElseThrow().quality().orElseThrow().code().equals("measured")))
                .forEach(survey -> assertTrue(survey.document().has("permit"), survey.transfer()));
    }

    @Test
    void whatPeopleWroteIsThereToo() {
        for (String key : List.of("notes", "actions", "photos", "carriedOver", "permit", "signedOffBy")) {
            assertTrue(surveys().anyMatch(survey -> survey.document().has(key)), key);
        }
        assertTrue(surveys().flatMap(survey -> survey.observations().members().values().stream())
                .anyMatch(node -> node instanceof Branch quantity
                        && quantity.asQuantity().unit().dimension() == Dimension.LENGTH));
        assertTrue(surveys().flatMap(survey -> survey.observations().members().values().stream())
                .anyMatch(Node.text("heavy")::equals));
    }
}
