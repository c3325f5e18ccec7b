package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.bed.Profile;
import bedmark.engine.bed.ProfileFormula;
import bedmark.engine.bed.Section;
import bedmark.engine.flow.BoardPlacement;
import bedmark.engine.flow.OpenBelt;
import bedmark.engine.flow.SettlingLength;
import bedmark.engine.uncertainty.Tape;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.working.Formula;
import bedmark.engine.working.Step;
import bedmark.engine.working.Symbol;
import bedmark.engine.working.Working;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

/** Which formula is shown where two meet, and what is not shown at all. */
class WorkingEdgesTest {
    private static final LoadingZone ZONE = Zones.healthy();

    private static Working working(LoadingZone zone) {
        return Engine.explain(zone, Settings.standard());
    }

    private static Step step(LoadingZone zone, Formula formula) {
        return working(zone).stepOf(formula.code()).orElseThrow();
    }

    @Test
    void aDriveThatTakesNothingHasNoShareToShow() {
        assertTrue(working(ZONE).stepOf(Result.RUNNING_SHARE.key()).isPresent());
        assertEquals(Optional.empty(), working(ZONE.with(Datum.RUNNING_POWER, 0, 0))
                .stepOf(Result.RUNNING_SHARE.key()));
    }

    /** ISO 5048 takes 0.9 B − 0.05 m up to 2 m of belt, and B − 0.25 m beyond. */
    @Test
    void aBeltOfTwoMetresIsNotYetAWideOne() {
        assertEquals(OpenBelt.USABLE, step(ZONE.with(Datum.BELT_WIDTH, 2, 0), OpenBelt.USABLE).formula());
        assertEquals(OpenBelt.USABLE_WIDE, step(ZONE.with(Datum.BELT_WIDTH, 2.001, 0), OpenBelt.USABLE).formula());
    }

    @Test
    void aCentreRollOfAllTheUsableWidthLeavesNoWings() {
        LoadingZone wide = ZONE.with(Datum.BELT_WIDTH, 2, 0);
        assertEquals(OpenBelt.AREA, step(wide.with(Datum.CENTRE_ROLL, 1.749, 0), OpenBelt.AREA).formula());
        assertEquals(OpenBelt.AREA_FLAT, step(wide.with(Datum.CENTRE_ROLL, 1.75, 0), OpenBelt.AREA).formula());
        assertEquals(OpenBelt.AREA_FLAT, step(ZONE.with(Datum.TROUGH_ANGLE, 0, 0), OpenBelt.AREA).formula());
    }

    /** The section between the boards of the register is written out only where it differs from the one read. */
    @Test
    void theDesignTakesTheSectionThatStandsThereAlready() {
        assertEquals("max(0, (Qd/(ρ · vd) − A0r)/br)", designDepth(ZONE));
        assertEquals("max(0, (Qd/(ρ · vd) − A0)/b1)", designDepth(ZONE.without(Datum.READ_SPACING)));
        assertEquals(2, sections(ZONE));
        assertEquals(1, sections(ZONE.without(Datum.READ_SPACING)));
        assertEquals(1, sections(ZONE.without(Datum.DESIGN_THROUGHPUT)));
    }

    private static String designDepth(LoadingZone zone) {
        return working(zone).stepOf(Result.DESIGN_DEPTH.key()).orElseThrow().formula().expression();
    }

    private static long sections(LoadingZone zone) {
        return working(zone).steps().stream().filter(step -> step.formula().code().equals(Section.CARRIED.code()))
                .count();
    }

    /** On a belt too steep to take its feed along by friction no length is long enough; settling counts none then. */
    @Test
    void anEndlessAccelerationCountsAsNoneInTheSettlingLength() {
        LoadingZone steep = ZONE.with(Datum.INCLINE, Math.toRadians(40), 0);
        assertEquals(Optional.empty(), working(steep).stepOf(Result.ACCELERATION_LENGTH.key()));
        Step settling = step(steep, SettlingLength.formula(Conventions.standard().lengths(), false));
        assertEquals(Optional.of(new Symbol("lb", 0, "m", Optional.empty())), settling.symbols().stream()
                .filter(symbol -> symbol.sign().equals("lb")).findFirst());
        assertEquals(1.5 + 1.2 * 2, settling.value(), 1e-12, "2 ft for every 100 ft/min after the impact");
    }

    @Test
    void oneStationOrABedThatTouchesNowhereShowsNoChange() {
        LoadingZone bare = ZONE.withStations(List.of());
        LoadingZone one = bare.withStation(3, 0.2, DepthMethod.AT_BOARD, 0);
        LoadingZone nothing = bare.withStation(1, 0, DepthMethod.AT_BOARD, 0).withStation(5, 0, DepthMethod.AT_BOARD,
                0);
        for (Formula formula : List.of(ProfileFormula.atLastQuarter(bed(2)), ProfileFormula.changeOverLastQuarter(
                bed(2)))) {
            assertTrue(working(ZONE).stepOf(formula.code()).isPresent());
            assertEquals(Optional.empty(), working(one).stepOf(formula.code()));
            assertEquals(Optional.empty(), working(nothing).stepOf(formula.code()));
        }
    }

    private static Profile bed(int stations) {
        return Profile.of(Uncertain.exact(6), IntStream.rangeClosed(1, stations)
                .mapToObj(Uncertain::exact).toList(), IntStream.rangeClosed(1, stations).mapToObj(Uncertain::exact)
                .toList());
    }

    @Test
    void boardsAsFarApartAsTheCentreRollIsLongStandOverIt() {
        assertEquals(BoardPlacement.FREE_EDGE_ON_CENTRE, step(ZONE.with(Datum.READ_SPACING, 0.45, 0),
                BoardPlacement.FREE_EDGE).formula());
        assertEquals(BoardPlacement.FREE_EDGE, step(ZONE.with(Datum.READ_SPACING, 0.451, 0),
                BoardPlacement.FREE_EDGE).formula());
    }

    /** A freeboard of the board's whole height is a depth of nothing, and one beyond it lies under the board line. */
    @Test
    void aFreeboardIsSubtractedDownToTheBoardLine() {
        LoadingZone bare = ZONE.withStations(List.of());
        assertEquals("H − f1", level(bare.withStation(3, 0.4, DepthMethod.FROM_BOARD_TOP, 0)));
        Step level = levelStep(bare.withStation(3, 0.41, DepthMethod.FROM_BOARD_TOP, 0));
        assertEquals(Section.LEVEL_ON_WINGS.code(), level.formula().code());
        assertTrue(level.value() < 0);
    }

    /** Under the board line a bed lies on the wings, then on the centre roll, then nowhere. */
    @Test
    void aFreeboardBeyondTheBoardIsShownByWhereItsEdgeLies() {
        LoadingZone bare = ZONE.withStations(List.of());
        double trough = section(ZONE).troughDepth().value();
        double crown = 0.45 * Math.tan(Math.toRadians(20)) / 4;
        assertTrue(level(bare.withStation(3, 0.4 + trough - 1e-9, DepthMethod.FROM_BOARD_TOP, 0)).contains("s′1"));
        Step onCentre = levelStep(bare.withStation(3, 0.4 + trough + 1e-9, DepthMethod.FROM_BOARD_TOP, 0));
        assertEquals(Section.LEVEL_ON_CENTRE_OF_DROP.withSigns(Map.of("f", "f1")).expression(),
                onCentre.formula().expression());
        assertTrue(onCentre.symbols().stream().anyMatch(symbol -> symbol.sign().equals("d")
                && symbol.value() == trough));
        assertTrue(level(bare.withStation(3, 0.4 + trough + crown - 1e-9, DepthMethod.FROM_BOARD_TOP, 0))
                .contains("− d)/tan θ"));
        assertEquals("−A0/b1", level(bare.withStation(3, 0.4 + trough + crown + 1e-9, DepthMethod.FROM_BOARD_TOP, 0)));
    }

    private static Section section(LoadingZone zone) {
        return new ZoneFacts(Sources.uncertain(Zones.exact(zone), Zones.exactSettings())).section().get();
    }

    private static String level(LoadingZone zone) {
        return levelStep(zone).formula().expression();
    }

    private static Step levelStep(LoadingZone zone) {
        return working(zone).steps().stream().filter(step -> step.formula().sign().equals("h1")).findFirst()
                .orElseThrow();
    }

    /** A bed is followed down: against the boards, on the wings, within the centre roll, and where there is none. */
    @Test
    void aDepthAtTheCentreIsShownByWhereItsEdgeLies() {
        LoadingZone bare = ZONE.withStations(List.of());
        double touching = section(ZONE).troughDepth().value() + section(ZONE).crownRise().value();
        double leavingWings = 0.45 * Math.tan(Math.toRadians(20)) / 4;
        assertEquals("D1 − d − r", level(bare.withStation(3, touching + 1e-9, DepthMethod.AT_CENTRE, 0)));
        assertEquals(Section.LEVEL_ON_WINGS.withSigns(Map.of("h", "h1", "s′", "s′1")).expression(),
                level(bare.withStation(3, touching - 1e-9, DepthMethod.AT_CENTRE, 0)));
        assertTrue(level(bare.withStation(3, leavingWings + 1e-9, DepthMethod.AT_CENTRE, 0)).contains("s′1"));
        assertTrue(level(bare.withStation(3, leavingWings - 1e-9, DepthMethod.AT_CENTRE, 0)).contains("4 · D1/tan θ"));
        assertEquals("−A0/b1", level(bare.withStation(3, 0, DepthMethod.AT_CENTRE, 0)));
        LoadingZone flat = bare.with(Datum.TROUGH_ANGLE, 0, 0);
        assertEquals("D1 − d − r", level(flat.withStation(3, section(flat).crownRise().value(), DepthMethod.AT_CENTRE,
                0)), "a crown that just reaches the boards");
    }

    /** The trough and the rise of the crown are written once, however many stations need them. */
    @Test
    void whatSeveralStationsNeedIsWrittenOnce() {
        LoadingZone three = ZONE.withStations(List.of());
        for (int i = 1; i <= 3; i++) {
            three = three.withStation(i, 0.3, DepthMethod.AT_CENTRE, 0);
        }
        Working working = working(three);
        for (Formula formula : List.of(Section.TROUGH_DEPTH, Section.CROWN_RISE)) {
            assertEquals(1, working.steps().stream().filter(step -> step.formula().code().equals(formula.code()))
                    .count());
        }
    }

    @Test
    void aStepOfAnUnknownSignIsADefect() {
        WorkingSheet sheet = new WorkingSheet(new Tape(0));
        sheet.constant("a", 1, "m");
        assertTrue(sheet.knows("a"));
        assertFalse(sheet.knows("b"));
        IllegalStateException defect = assertThrows(IllegalStateException.class, () -> sheet.step(
                Formula.of("sum", "c", "a + b", "D"), Uncertain.ONE, "m"));
        assertEquals("sum uses b, of which nothing is known", defect.getMessage());
    }
}
