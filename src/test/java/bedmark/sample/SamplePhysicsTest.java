package bedmark.sample;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.Assessment;
import bedmark.engine.Result;
import bedmark.quantity.Quantity;
import bedmark.survey.Assessor;
import bedmark.survey.Assessor.Assessed;
import bedmark.survey.Bundle;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;

/** The demo plant could stand somewhere: its numbers belong together. */
class SamplePhysicsTest {
    private static final Register PLANT = new Register(SamplePlant.document());

    /** Belts whose boards were set too far out, as the surveys find. */
    private static final List<String> TOO_WIDE = List.of("TP-24");

    private static double number(Register.Conveyor conveyor, String key) {
        return conveyor.quantity(key).map(Quantity::si).orElseThrow();
    }

    @Test
    void centreRollsSuitTheirBelts() {
        for (Register.Conveyor conveyor : PLANT.conveyors().values()) {
            conveyor.quantity("centreRollLength").ifPresent(roll -> assertEquals(
                    0.371 * number(conveyor, "beltWidth") + 0.006, roll.si(), 0.012, conveyor.id()));
        }
    }

    @Test
    void boardsStandOnTheBelt() {
        for (Register.Transfer transfer : PLANT.transfers().values()) {
            double spacing = transfer.quantity("skirtSpacing").orElseThrow().si();
            double belt = number(PLANT.conveyorOf(transfer), "beltWidth");
            assertEquals(!TOO_WIDE.contains(transfer.id()), spacing <= belt * 2 / 3, transfer.id());
        }
    }

    @Test
    void zonesOfOneConveyorCarryMoreAndMore() {
        for (String conveyor : List.of("C3", "C4", "C7", "C12", "C15")) {
            double before = 0;
            for (Register.Transfer zone : PLANT.zonesOf(conveyor)) {
                double flow = zone.quantity("designThroughput").orElseThrow().si();
                assertTrue(flow > before, zone.id());
                before = flow;
            }
        }
    }

    @Test
    void readingsTellThePaceThatTheBedHad() {
        for (SampleRound round : SampleRound.ALL) {
            Map<String, SampleVisit> visits = SampleVisit.of(round.id(), round.table()).stream()
                    .collect(Collectors.toMap(SampleVisit::transfer, visit -> visit));
            for (Assessed one : assessed(round)) {
                SampleVisit visit = visits.get(one.survey().transfer());
                boolean asItWas = List.of("scale", "depths", "corrected", "running-density").stream()
                        .allMatch(key -> visit.said(key).isEmpty());
                if (asItWas && one.assessment().get(Result.BED_SPEED_RATIO).isPresent()) {
                    assertEquals(visit.row().number("pace"),
                            one.assessment().get(Result.BED_SPEED_RATIO).get().value(), 0.06,
                            round.name() + " " + visit.transfer());
                }
            }
        }
    }

    @Test
    void drivesGiveWhatLiftAndSkirtsAskForAndNotMoreThanTheyCan() {
        for (SampleRound round : SampleRound.ALL) {
            for (Assessed one : assessed(round)) {
                Survey survey = one.survey();
                if (survey.readings().has("runningPower")) {
                    drives(survey, one.assessment(), round.name() + " " + survey.transfer());
                }
            }
        }
    }

    private static void drives(Survey survey, Assessment assessment, String where) {
        Register.Conveyor conveyor = PLANT.conveyorOf(PLANT.transfer(survey.transfer()).orElseThrow());
        double motor = conveyor.document().number("motorEfficiency").orElseThrow().doubleValue();
        double drive = conveyor.document().number("driveEfficiency").orElseThrow().doubleValue();
        double shaft = survey.readings().quantity("runningPower").orElseThrow().si() * motor;
        double flow = survey.readings().quantity("throughput").orElseThrow().si();
        double rise = number(conveyor, "beltLength") / 2 * Math.sin(number(conveyor, "incline"));
        double lift = flow * 9.80665 * rise / drive;
        double skirts = assessment.get(Result.DRIVE_POWER).orElseThrow().value();
        assertTrue(shaft > lift + skirts, where + ": " + shaft + " W for " + lift + " and " + skirts);
        assertTrue(shaft < number(conveyor, "ratedPower"), where + ": " + shaft + " W");
        assertTrue(shaft > 0.3 * number(conveyor, "ratedPower"), where + ": " + shaft + " W");
    }

    private static List<Assessed> assessed(SampleRound round) {
        Bundle bundle = SampleFiles.committed(round);
        return new Assessor(bundle.register()).assess(bundle.surveys());
    }
}
