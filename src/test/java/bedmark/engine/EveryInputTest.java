package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.bed.Station;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealSegment;
import bedmark.engine.seal.SealType;
import bedmark.engine.seal.Side;
import bedmark.engine.uncertainty.ImpossibleReading;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Level;
import java.lang.reflect.InvocationTargetException;
import java.lang.reflect.RecordComponent;
import java.util.Collection;
import java.util.EnumMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import java.util.Set;
import org.junit.jupiter.api.Test;

/** No finite input, however odd, brings out anything but finite numbers or a reason. */
class EveryInputTest {
    @Test
    void aPossibleZoneGivesFiniteNumbers() {
        Random random = new Random(3);
        for (int i = 0; i < Zones.MANY; i++) {
            LoadingZone zone = Zones.random(random);
            Settings settings = random.nextInt(4) == 0
                    ? Settings.standard().with(DragMethod.values()[random.nextInt(4)]) : Settings.standard();
            sound(Engine.assess(zone, settings));
        }
    }

    @Test
    void anyFiniteNumberIsComputedOrRefusedWithAReason() {
        Random random = new Random(4);
        Set<String> reasons = new HashSet<>();
        int computed = 0;
        for (int i = 0; i < 20_000; i++) {
            try {
                sound(Engine.assess(wild(random), Settings.standard()));
                computed++;
            } catch (ImpossibleReading refusal) {
                assertTrue(refusal.code().matches("[a-z]+(-[a-z]+)*"), refusal.code());
                assertTrue(refusal.readingName().startsWith("/"), refusal.readingName());
                reasons.add(refusal.code());
            }
        }
        assertTrue(computed > 500, computed + " computed");
        assertTrue(reasons.size() > 5, reasons::toString);
    }

    /** A survey comes to be in any order, and a site may have chosen any method. */
    @Test
    void anyPartOfAZoneIsComputedAsFarAsItGoes() {
        Random random = new Random(6);
        for (int i = 0; i < Zones.MANY; i++) {
            LoadingZone zone = Zones.random(random);
            for (Datum datum : Datum.values()) {
                zone = random.nextInt(6) == 0 ? zone.without(datum) : zone;
            }
            zone = random.nextInt(4) == 0 ? zone.withStations(List.of()) : zone;
            zone = random.nextInt(6) == 0 ? zone.withSeals(List.of()) : zone;
            Settings settings = random.nextInt(5) == 0 ? Settings.standard()
                    : Settings.standard().with(DragMethod.values()[random.nextInt(4)]);
            sound(Engine.assess(zone, settings));
            Engine.explain(zone, settings);
        }
    }

    @Test
    void theGreatestAndTheLeastPossibleNumbersStayFinite() {
        Random random = new Random(5);
        for (int i = 0; i < Zones.MANY; i++) {
            LoadingZone zone = Zones.random(random);
            Map<Datum, Reading> data = new EnumMap<>(zone.data());
            for (Datum datum : List.of(Datum.BELT_SPEED, Datum.THROUGHPUT, Datum.RATED_POWER, Datum.BULK_DENSITY,
                    Datum.DESIGN_SPEED, Datum.DESIGN_THROUGHPUT, Datum.DRIVE_EFFICIENCY, Datum.FEED_VELOCITY,
                    Datum.LUMP_SIZE, Datum.READ_HEIGHT, Datum.DESIGN_BED_DEPTH)) {
                double most = datum.domain() == Domain.EFFICIENCY ? 1 : 1e9;
                data.put(datum, new Reading(datum.pointer(), random.nextBoolean() ? most : 1e-9, 1e9));
            }
            sound(Engine.assess(zone.with(data), Settings.standard()));
        }
    }

    /** A zone like any other, some of its numbers replaced by anything that a double can hold. */
    private static LoadingZone wild(Random random) {
        LoadingZone zone = Zones.random(random);
        Map<Datum, Reading> data = new EnumMap<>(zone.data());
        for (Datum datum : zone.data().keySet()) {
            if (random.nextInt(12) == 0) {
                data.put(datum, new Reading(datum.pointer(), number(random), Math.abs(random.nextGaussian())));
            }
        }
        zone = zone.with(data);
        if (random.nextInt(4) == 0) {
            zone = zone.withStations(List.of(new Station(Reading.exact("/readings/bedDepths/0/position",
                    number(random)), Reading.exact("/readings/bedDepths/0/depth", number(random)),
                    DepthMethod.values()[random.nextInt(4)])));
        }
        if (random.nextInt(6) == 0) {
            zone = zone.withSeals(List.of(new SealSegment(Side.LEFT, SealType.VERTICAL, SealCondition.SOUND,
                    Reading.exact("/readings/seals/0/length", number(random)))));
        }
        return zone;
    }

    private static double number(Random random) {
        return switch (random.nextInt(6)) {
            case 0 -> 0;
            case 1 -> -random.nextDouble();
            case 2 -> Math.pow(10, random.nextInt(600) - 300);
            case 3 -> Double.MAX_VALUE;
            case 4 -> Double.MIN_VALUE;
            default -> Math.pow(10, random.nextInt(17) - 8);
        };
    }

    private static void sound(Assessment assessment) {
        finite(assessment);
        Set<Object> rules = new HashSet<>();
        for (Finding finding : assessment.findings()) {
            assertTrue(rules.add(finding.rule()), "each rule once");
            assertFalse(finding.level() == Level.INCOMPLETE, "a rule is judged or left out");
        }
        assertEquals(new HashSet<>(assessment.missing()).size(), assessment.missing().size(), "each place once");
        assertTrue(assessment.missing().containsAll(assessment.missingRequired()));
        double shares = assessment.powerShares().stream().mapToDouble(share -> share.share()).sum();
        assertTrue(assessment.powerShares().isEmpty() || Math.abs(shares - 1) < 1e-9, "shares of a whole");
        for (Finding finding : assessment.findings()) {
            probability(finding.probabilityNear());
            probability(finding.probabilityOverloaded());
        }
    }

    private static void probability(OptionalDouble probability) {
        probability.ifPresent(p -> assertTrue(p >= 0 && p <= 1, "a probability"));
    }

    /** Walks everything that the assessment is made of. */
    private static void finite(Object part) {
        if (part instanceof Double number) {
            assertTrue(Double.isFinite(number), "a number");
        } else if (part instanceof Optional<?> optional) {
            optional.ifPresent(EveryInputTest::finite);
        } else if (part instanceof OptionalDouble optional) {
            optional.ifPresent(EveryInputTest::finite);
        } else if (part instanceof Map<?, ?> map) {
            map.values().forEach(EveryInputTest::finite);
        } else if (part instanceof Collection<?> parts) {
            parts.forEach(EveryInputTest::finite);
        } else if (part instanceof Record whole) {
            for (RecordComponent component : whole.getClass().getRecordComponents()) {
                try {
                    finite(component.getAccessor().invoke(whole));
                } catch (IllegalAccessException | InvocationTargetException e) {
                    throw new AssertionError(component.toString(), e);
                } catch (AssertionError e) {
                    throw new AssertionError(component.getName() + " of " + whole, e);
                }
            }
        }
    }
}
