package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.drag.DragMethod;
import bedmark.engine.flow.LengthConventions;
import bedmark.engine.uncertainty.ImpossibleReading;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Rule;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

/** Every rule and every convention can be switched by the site. */
class ConventionsTest {
    private static final LoadingZone ZONE = Zones.healthy().with(Datum.BELT_SPEED, 2, 0)
            .with(Datum.FEED_VELOCITY, 0, 0);

    @Test
    void everyRuleCanBeSwitchedOff() {
        for (Rule rule : Rule.values()) {
            Assessment assessment = Engine.assess(ZONE, Settings.standard().with(
                    Settings.standard().limits().without(rule)));
            assertTrue(assessment.findings().stream().noneMatch(finding -> finding.rule() == rule));
            assertTrue(assessment.findingsAtDesign().stream().noneMatch(finding -> finding.rule() == rule));
            assertEquals(Rule.values().length - 1, assessment.findings().size());
        }
    }

    @Test
    void theLongestOfTheConventionsInUseIsTheLengthThatAZoneNeeds() {
        double bySpeed = 1.5 + 1.2 * 2;
        double byAcceleration = 4 / (2 * 9.80665 * (0.6 * Math.cos(0.05) - Math.sin(0.05)));
        double least = 0.9144;
        assertEquals(bySpeed, needed(true, true, true), 1e-12);
        assertEquals(bySpeed, needed(true, false, false), 1e-12);
        assertEquals(least, needed(false, true, true), 1e-12);
        assertEquals(byAcceleration, needed(false, true, false), 1e-12);
        assertEquals(least, needed(false, false, true), 1e-12);
        assertTrue(byAcceleration > 0.3 && byAcceleration < least);
    }

    private static double needed(boolean bySpeed, boolean byAcceleration, boolean least) {
        return 6 / settled(new LengthConventions(bySpeed, byAcceleration, least)).orElseThrow().observed();
    }

    private static Optional<Finding> settled(LengthConventions lengths) {
        return Engine.assess(ZONE, with(Conventions.standard().with(lengths))).findings().stream()
                .filter(finding -> finding.rule() == Rule.ZONE_TOO_SHORT).findFirst();
    }

    @Test
    void withoutAnyConventionNoLengthIsAskedForNorCut() {
        LengthConventions none = new LengthConventions(false, false, false);
        assertEquals(Optional.empty(), settled(none));
        Assessment assessment = Engine.assess(ZONE, with(Conventions.standard().with(none)));
        assertTrue(assessment.remedies().stream().noneMatch(remedy -> remedy.code().equals("shorten-zone")));
        assertEquals(List.of(), assessment.missing());
        assertTrue(Engine.assess(ZONE, Settings.standard()).remedies().stream()
                .anyMatch(remedy -> remedy.code().equals("shorten-zone")));
    }

    @Test
    void theImpactLengthIsTakenForGrantedOnlyWhereItCounts() {
        LoadingZone unknown = ZONE.without(Datum.IMPACT_LENGTH);
        Assumption zero = Assumption.of("impact-length-zero", "/transfer/impactLength");
        assertTrue(Engine.assess(unknown, Settings.standard()).assumptions().contains(zero));
        assertFalse(Engine.assess(unknown, with(Conventions.standard().with(new LengthConventions(false, true, true))))
                .assumptions().contains(zero));
    }

    @Test
    void theInclineCanBeLeftOutOfTheAccelerationLength() {
        LoadingZone steep = ZONE.with(Datum.INCLINE, Math.toRadians(15), 0);
        Settings level = with(Conventions.standard().withIncline(false));
        assertEquals(4 / (2 * 9.80665 * 0.6), length(steep, level), 1e-12);
        assertTrue(length(steep, Settings.standard()) > 1.5 * length(steep, level));
        assertEquals(length(ZONE.with(Datum.INCLINE, 0, 0), Settings.standard()), length(steep, level), 1e-12);
        assertTrue(Engine.assess(steep, level).assumptions().contains(Assumption.of("incline-not-counted")));
        assertFalse(Engine.assess(steep, Settings.standard()).assumptions()
                .contains(Assumption.of("incline-not-counted")));
        assertTrue(Engine.assess(steep.without(Datum.INCLINE), level).assumptions().stream()
                .noneMatch(one -> one.code().startsWith("incline-")));
        double drag = Engine.assess(steep, level).methods().get(DragMethod.ISO_5048).value();
        assertTrue(drag < Engine.assess(steep, Settings.standard()).methods().get(DragMethod.ISO_5048).value());
    }

    private static double length(LoadingZone zone, Settings settings) {
        return Engine.assess(zone, settings).get(Result.ACCELERATION_LENGTH).orElseThrow().value();
    }

    @Test
    void eachConventionIsChangedAlone() {
        Conventions standard = Conventions.standard();
        assertEquals(standard, standard.withIncline(false).withSpread(false).withTrials(5).withIncline(true)
                .withSpread(true).withTrials(standard.trials()));
        assertEquals(standard.lengths(), standard.withGrip(0.5, 0.7).lengths());
        assertEquals(0.5, standard.withGrip(0.5, 0.7).beltGrip().value());
        assertEquals(0.7, standard.withGrip(0.5, 0.7).boardGrip().value());
        assertEquals(7, standard.withTrials(7).trials());
        assertFalse(standard.withSpread(false).spread());
        assertTrue(standard.withSpread(false).incline());
        assertTrue(new LengthConventions(false, false, false).none());
        assertFalse(new LengthConventions(false, false, true).none());
    }

    @Test
    void pricesAndFactorsThatCannotBeAreRefused() {
        assertThrows(ImpossibleReading.class, () -> Conventions.standard().withGrip(0, 0.6));
        assertThrows(ImpossibleReading.class, () -> Conventions.standard().withGrip(0.6, 1.1));
        for (double price : new double[]{-0.1, 2e6, Double.NaN}) {
            assertEquals("/plant/tariff/energy", assertThrows(ImpossibleReading.class, () -> new Prices(
                    OptionalDouble.of(price), Optional.empty(), OptionalDouble.empty())).readingName());
            assertEquals("/plant/co2Factor", assertThrows(ImpossibleReading.class, () -> new Prices(
                    OptionalDouble.empty(), Optional.empty(), OptionalDouble.of(price))).readingName());
        }
    }

    private static Settings with(Conventions conventions) {
        return Settings.standard().with(conventions);
    }
}
