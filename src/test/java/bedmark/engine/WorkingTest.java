package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.flow.LengthConventions;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealType;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.ImpossibleReading;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Rule;
import bedmark.engine.working.Step;
import bedmark.engine.working.Symbol;
import bedmark.engine.working.Working;
import java.util.HashMap;
import java.util.HashSet;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.Set;
import java.util.TreeSet;
import java.util.function.BiConsumer;
import java.util.function.Supplier;
import org.junit.jupiter.api.Test;

/** The working that is shown is the working that was done. */
class WorkingTest {
    private static final int ZONES = Zones.atMost(150);

    private static void forEveryZone(BiConsumer<LoadingZone, Settings> test) {
        Random random = new Random(31);
        for (int i = 0; i < ZONES; i++) {
            LoadingZone zone = Zones.random(random);
            // Drawn numbers are the business of their own test.
            Settings settings = Settings.standard().with(Settings.standard().conventions().withTrials(0));
            if (random.nextInt(3) == 0) {
                settings = settings.with(DragMethod.values()[random.nextInt(DragMethod.values().length)])
                        .with(settings.sealRates().with(SealType.OBLIQUE, SealCondition.WORN, 1.5));
            }
            if (random.nextInt(3) == 0) {
                settings = settings.with(settings.conventions().with(new LengthConventions(random.nextBoolean(),
                        random.nextBoolean(), random.nextBoolean())).withIncline(random.nextBoolean()));
            }
            if (random.nextInt(4) == 0) {
                zone = zone.with(Datum.SITE_FACTOR, 0.05 + random.nextDouble(), 0.01);
                zone = random.nextBoolean() ? zone.with(Datum.SITE_SEAL_RATE, 60 * random.nextDouble() + 1, 2) : zone;
            }
            test.accept(zone, settings);
        }
    }

    private static void assertClose(double expected, double actual, double scale, String what) {
        assertEquals(expected, actual, 1e-9 * Math.max(Math.abs(expected), scale), what);
    }

    @Test
    void everyPrintedFormulaGivesThePrintedResult() {
        Set<String> formulas = new TreeSet<>();
        forEveryZone((zone, settings) -> {
            for (Step step : Engine.explain(zone, settings).steps()) {
                Map<String, Double> values = new HashMap<>();
                step.symbols().forEach(symbol -> values.put(symbol.sign(), symbol.value()));
                // A difference of nearly equal lengths is as sharp as the lengths are.
                double scale = step.unit().startsWith("m") ? 1e-3 : 0;
                assertClose(Notation.evaluate(step.formula().expression(), values), step.value(), scale,
                        () -> step.toString());
                formulas.add(step.formula().code() + " " + step.formula().sign().replaceAll("\\d+$", ""));
            }
        });
        assertTrue(formulas.size() > 60, formulas.size() + ": " + formulas);
    }

    private static void assertClose(double expected, double actual, double scale,
            Supplier<String> what) {
        assertEquals(expected, actual, 1e-9 * Math.max(Math.abs(expected), scale), what);
    }

    @Test
    void everySignIsAnInputOrCameOutOfAnEarlierStep() {
        forEveryZone((zone, settings) -> {
            Working working = Engine.explain(zone, settings);
            Map<String, Symbol> known = new HashMap<>();
            working.inputs().forEach(input -> known.put(input.symbol().sign(), input.symbol()));
            Set<String> used = new HashSet<>();
            for (Step step : working.steps()) {
                for (Symbol symbol : step.symbols()) {
                    assertEquals(known.get(symbol.sign()), symbol, step.toString());
                    used.add(symbol.sign());
                }
                known.put(step.formula().sign(), step.outcome());
            }
            working.inputs().forEach(input -> assertTrue(used.contains(input.symbol().sign()), input.toString()));
        });
    }

    @Test
    void resultsOfTheWorkingAreThoseOfTheAssessment() {
        forEveryZone((zone, settings) -> {
            Working working = Engine.explain(zone, settings);
            Assessment assessment = Engine.assess(zone, settings);
            assessment.results().forEach((result, estimate) -> {
                if (result == Result.BELT_SPEED && zone.get(Datum.BELT_SPEED).isPresent()
                        || result == Result.REFERENCE_DEPTH && working.stepOf(result.key()).isEmpty()) {
                    return;
                }
                same(estimate, working.stepOf(result.key()).orElseThrow(() ->
                        new AssertionError("no working for " + result)));
            });
            assessment.methods().forEach((method, estimate) ->
                    same(estimate, working.stepOf("methods." + method.code()).orElseThrow()));
            for (Finding finding : assessment.findings()) {
                if (finding.rule() != Rule.SKIRTS_OVER_BUDGET) {
                    // Its uncertainty may be drawn, or widened by what no formula says; the number is the same.
                    assertClose(finding.observed(), working.stepOf(finding.code()).orElseThrow().value(), 0,
                            finding.code());
                }
            }
        });
    }

    private static void same(Estimate estimate, Step step) {
        assertClose(estimate.value(), step.value(), 0, step.result());
        assertClose(estimate.standardUncertainty(), step.standardUncertainty().orElseThrow(), 1e-12, step.result());
    }

    @Test
    void whatIsReadIsShownWithItsPlace() {
        Working working = Engine.explain(Zones.healthy(), Settings.standard());
        Map<String, Working.Input> inputs = new HashMap<>();
        working.inputs().forEach(input -> inputs.put(input.symbol().sign(), input));
        for (Map.Entry<Datum, Reading> read : Zones.healthy().data().entrySet()) {
            boolean shadowed = Set.of(Datum.REGISTER_HEIGHT).contains(read.getKey());
            assertEquals(!shadowed, inputs.values().stream().anyMatch(input ->
                    input.symbol().reading().equals(Optional.of(read.getKey().pointer()))
                            && input.symbol().value() == read.getValue().value()), read.toString());
        }
        assertEquals(9.80665, inputs.get("g").symbol().value());
    }

    /** The rate of the seals is the fitted one only where the site's own method decides and a rate was fitted. */
    @Test
    void theRateOfTheSealsIsShownWhereItComesFrom() {
        LoadingZone fitted = Zones.healthy().with(Datum.SITE_FACTOR, 0.08, 0).with(Datum.SITE_SEAL_RATE, 55, 0);
        assertEquals(Optional.of(Datum.SITE_SEAL_RATE.pointer()), rate(fitted, Settings.standard()
                .with(DragMethod.SITE)));
        assertEquals(Optional.of("/plant/sealRates"), rate(fitted, Settings.standard()));
        assertEquals(Optional.of("/plant/sealRates"), rate(fitted.without(Datum.SITE_SEAL_RATE),
                Settings.standard().with(DragMethod.SITE)));
    }

    private static Optional<String> rate(LoadingZone zone, Settings settings) {
        return Engine.explain(zone, settings).inputs().stream().map(Working.Input::symbol)
                .filter(symbol -> symbol.sign().equals("q")).findFirst().orElseThrow().reading();
    }

    @Test
    void anEmptyZoneHasNothingToShow() {
        Working working = Engine.explain(LoadingZone.UNKNOWN, Settings.standard());
        assertEquals(0, working.steps().size());
        assertEquals(0, working.inputs().size());
    }

    @Test
    void aPartOfAZoneShowsThatPart() {
        Random random = new Random(32);
        int zones = Zones.atMost(2_000);
        int shown = 0;
        for (int i = 0; i < zones; i++) {
            LoadingZone zone = Zones.random(random);
            for (Datum datum : Datum.values()) {
                zone = random.nextInt(4) == 0 ? zone.without(datum) : zone;
            }
            shown += Engine.explain(zone, Settings.standard()).steps().size();
        }
        assertTrue(shown > zones);
    }

    @Test
    void whatCannotBeIsRefused() {
        LoadingZone zone = Zones.healthy().withStation(7, 0.1, DepthMethod.AT_BOARD, 0);
        assertThrows(ImpossibleReading.class, () -> Engine.explain(zone, Settings.standard()));
        assertFalse(Engine.explain(Zones.healthy(), Settings.standard()).steps().isEmpty());
    }
}
