package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.DecimalReference.Row;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.Instrument;
import bedmark.engine.uncertainty.Instruments;
import bedmark.engine.uncertainty.Reading;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.Set;
import org.junit.jupiter.api.Test;

/** The engine against the decimal reference, over random troughed zones. */
class DecimalReferenceTest {
    private static final double AGREEMENT = 1e-12;
    private static final BigDecimal RATE = new BigDecimal("3").multiply(new BigDecimal("4.4482216152605"))
            .divide(new BigDecimal("0.3048"), new MathContext(60));

    private final Map<String, BigDecimal> numbers = new HashMap<>();
    private final Map<String, Double> uncertainties = new HashMap<>();

    @Test
    void valuesAgree() {
        Random random = new Random(41);
        for (int i = 0; i < Zones.MANY / 4; i++) {
            LoadingZone zone = complete(random);
            Assessment assessment = Engine.assess(zone, Settings.standard());
            Map<String, BigDecimal> expected = reference(zone).results();
            for (DragMethod method : DragMethod.values()) {
                agree(method.code(), expected.get(method.code()).doubleValue(),
                        assessment.methods().get(method).value(), 0);
            }
            expected.forEach((key, value) -> Result.ofKey(key).ifPresent(result ->
                    agree(key, value.doubleValue(), assessment.get(result).orElseThrow().value(), scale(key))));
        }
    }

    @Test
    void standardUncertaintiesAgree() {
        Random random = new Random(42);
        for (int i = 0; i < 40; i++) {
            LoadingZone zone = complete(random);
            Assessment assessment = Engine.assess(zone, Settings.standard());
            Map<String, Double> expected = reference(zone).uncertainties(uncertainties);
            for (Result result : List.of(Result.SKIRT_POWER, Result.IMPLIED_THROUGHPUT, Result.FILL,
                    Result.DRIVE_POWER, Result.MEAN_SQUARE_DEPTH)) {
                Estimate estimate = assessment.get(result).orElseThrow();
                agree("u of " + result, expected.get(result.key()), estimate.standardUncertainty(), 0);
            }
        }
    }

    /** What the result was subtracted from, where a difference of near equals is no more exact than those. */
    private static double scale(String key) {
        return switch (key) {
            case "designDepthM", "bedAreaM2" -> 1;
            case "impliedThroughputKgPerS" -> 1e4;
            case "loadingForceN" -> 1e4;
            default -> 0;
        };
    }

    private static void agree(String what, double expected, double actual, double scale) {
        assertEquals(expected, actual, AGREEMENT * Math.max(scale, Math.abs(expected)), what);
    }

    /** A random zone with a trough, all numbers there, and a belt that carries the feed along. */
    private static LoadingZone complete(Random random) {
        LoadingZone zone = Zones.random(random);
        Map<Datum, Reading> data = new HashMap<>();
        Zones.healthy().data().forEach(data::put);
        zone.data().forEach(data::put);
        data.remove(Datum.TIMED_BELT_LENGTH);
        data.remove(Datum.PULLEY_DIAMETER);
        data.remove(Datum.SKIRT_POWER_BUDGET);
        Zones.put(data, Datum.SITE_FACTOR, 0.02 + 0.2 * random.nextDouble());
        Zones.put(data, Datum.FEED_VELOCITY, Math.abs(data.get(Datum.FEED_VELOCITY).value()));
        Zones.put(data, Datum.TROUGH_ANGLE, Math.max(0.1, data.get(Datum.TROUGH_ANGLE).value()));
        double belt = data.get(Datum.BELT_WIDTH).value();
        double centre = data.get(Datum.CENTRE_ROLL).value();
        double reach = centre + (belt - centre) * Math.cos(data.get(Datum.TROUGH_ANGLE).value());
        for (Datum board : List.of(Datum.READ_SPACING, Datum.REGISTER_SPACING)) {
            Zones.put(data, board, Math.min(data.get(board).value(), reach * 0.999));
        }
        return new LoadingZone(data, zone.stations(), zone.seals(), zone.speedClass(), Set.of(), List.of());
    }

    private DecimalReference reference(LoadingZone zone) {
        numbers.clear();
        uncertainties.clear();
        zone.data().values().forEach(this::put);
        zone.stations().forEach(station -> {
            put(station.position());
            put(station.raw());
        });
        zone.seals().forEach(segment -> put(segment.length()));
        numbers.put("rate", RATE);
        uncertainties.put("rate", 0.30 * RATE.doubleValue());
        numbers.put("mu1", new BigDecimal(0.6));
        numbers.put("mu2", new BigDecimal(0.6));
        return new DecimalReference(Map.copyOf(numbers),
                zone.stations().stream().map(station -> new Row(station.position().name(), station.raw().name(),
                        station.method().code())).toList(),
                zone.seals().stream().map(segment -> new Row(segment.length().name(), "",
                        segment.type().touches() && segment.condition() != SealCondition.MISSING
                                ? "touches" : "not")).toList());
    }

    private void put(Reading reading) {
        numbers.put(reading.name(), new BigDecimal(reading.value()));
        if (reading.standardUncertainty() > 0) {
            uncertainties.put(reading.name(), reading.standardUncertainty());
        }
    }

    @Test
    void defaultsAreThoseOfThePage() {
        Instruments standard = Instruments.standard();
        assertEquals(0.005, standard.standardUncertainty(Instrument.TAPE, 7));
        assertEquals(0.02, standard.standardUncertainty(Instrument.DEPTH_ESTIMATED, 0.3));
        assertEquals(0.04, standard.standardUncertainty(Instrument.DEPTH_SUSPECT, 0.3));
        assertEquals(0.25 * 0.1, standard.standardUncertainty(Instrument.SKIRT_FRICTION_FACTOR, 0.1), 1e-15);
        assertEquals(Math.toRadians(3), standard.standardUncertainty(Instrument.SURCHARGE, 0.3));
        assertTrue(standard.standardUncertainty(Instrument.BULK_DENSITY, 1000) == 50);
    }
}
