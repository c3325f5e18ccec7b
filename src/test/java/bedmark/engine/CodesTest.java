package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.flow.SpeedClass;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealRates;
import bedmark.engine.seal.SealType;
import bedmark.engine.seal.Side;
import bedmark.engine.uncertainty.Instrument;
import bedmark.engine.uncertainty.Instruments;
import bedmark.engine.verdict.Certainty;
import bedmark.engine.verdict.Component;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Rule;
import java.util.HashSet;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** The words that documents use for what the engine knows. */
class CodesTest {
    @Test
    void everyCodeIsAWordOfItsOwnAndLeadsBack() {
        codes(DepthMethod.values(), DepthMethod::code, DepthMethod::ofCode);
        codes(DragMethod.values(), DragMethod::code, DragMethod::ofCode);
        codes(SpeedClass.values(), SpeedClass::code, SpeedClass::ofCode);
        codes(SealCondition.values(), SealCondition::code, SealCondition::ofCode);
        codes(SealType.values(), SealType::code, SealType::ofCode);
        codes(Side.values(), Side::code, Side::ofCode);
        codes(Instrument.values(), Instrument::code, Instrument::ofCode);
        codes(Rule.values(), Rule::code, Rule::ofCode);
        codes(MethodSpread.Cause.values(), MethodSpread.Cause::code, code -> Stream.of(MethodSpread.Cause.values())
                .filter(cause -> cause.code().equals(code)).findFirst());
        codes(Component.values(), Component::code, code -> Stream.of(Component.values())
                .filter(component -> component.code().equals(code)).findFirst());
        codes(Level.values(), Level::code, code -> Stream.of(Level.values())
                .filter(level -> level.code().equals(code)).findFirst());
        codes(Assessment.EnergyKind.values(), Assessment.EnergyKind::code,
                code -> Stream.of(Assessment.EnergyKind.values()).filter(kind -> kind.code().equals(code)).findFirst());
    }

    @Test
    void everyDatumAndResultIsFoundByItsPlaceOrKey() {
        for (Datum datum : Datum.values()) {
            assertEquals(Optional.of(datum), Datum.ofPointer(datum.pointer()));
            assertEquals(datum.pointer().startsWith("/readings/"), datum.isReading());
        }
        assertEquals(Optional.empty(), Datum.ofPointer("/readings/notes"));
        for (Result result : Result.values()) {
            assertEquals(Optional.of(result), Result.ofKey(result.key()));
        }
    }

    @Test
    void theTableOfSealsIsTheConventionUnlessTheSiteKnowsBetter() {
        SealRates standard = SealRates.standard();
        for (SealType type : SealType.values()) {
            for (SealCondition condition : SealCondition.values()) {
                boolean touches = type != SealType.CONTACTLESS && type != SealType.NONE
                        && condition != SealCondition.MISSING;
                assertEquals(touches ? 1 : 0, standard.multiplier(type, condition));
                assertFalse(standard.isSiteAssumption(type, condition));
                assertEquals(condition != SealCondition.SOUND, condition.isDefect());
            }
        }
        SealRates site = standard.with(SealType.OBLIQUE, SealCondition.WORN, 0.7);
        assertEquals(0.7, site.multiplier(SealType.OBLIQUE, SealCondition.WORN));
        assertTrue(site.isSiteAssumption(SealType.OBLIQUE, SealCondition.WORN));
        assertEquals(43.78, standard.rate(), 0.005);
    }

    @Test
    void aSiteMayChangeOneThingAndKeepTheRest() {
        Settings standard = Settings.standard();
        Certainty certainty = new Certainty(0.95, 0.05, 0.5);
        assertEquals(certainty, standard.with(certainty).certainty());
        assertEquals(standard.limits(), standard.with(certainty).limits());
        Instruments finer = Instruments.standard().with(Instrument.TAPE, 0.001).with(Instrument.PULLEY, 0.02);
        assertEquals(0.001, finer.spread(Instrument.TAPE));
        assertEquals(0.02, finer.spread(Instrument.PULLEY));
        assertEquals(0.25, finer.spread(Instrument.SKIRT_FRICTION_FACTOR));
        assertEquals(finer, standard.with(finer).instruments());
    }

    private static <T> void codes(T[] values, Function<T, String> code, Function<String, Optional<T>> back) {
        Set<String> seen = new HashSet<>();
        for (T value : values) {
            String word = code.apply(value);
            assertTrue(word.matches("[a-z0-9]+(-[a-z0-9]+)*"), word);
            assertTrue(seen.add(word), word);
            assertEquals(Optional.of(value), back.apply(word));
        }
        assertEquals(Optional.empty(), back.apply("no-such-word"));
    }
}
