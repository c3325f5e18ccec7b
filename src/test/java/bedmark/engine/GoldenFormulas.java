package bedmark.engine;

import bedmark.engine.bed.Section;
import bedmark.engine.drag.RankinePressure;
import bedmark.engine.drag.SiteFactor;
import bedmark.engine.drag.SpecialResistance;
import bedmark.engine.drag.TabulatedFactor;
import bedmark.engine.flow.AccelerationLength;
import bedmark.engine.flow.BeltSpeed;
import bedmark.engine.flow.BoardPlacement;
import bedmark.engine.flow.LengthConventions;
import bedmark.engine.flow.LoadingForce;
import bedmark.engine.flow.MaximumBeltSpeed;
import bedmark.engine.flow.OpenBelt;
import bedmark.engine.flow.SettlingLength;
import bedmark.engine.flow.SpeedClass;
import bedmark.engine.seal.SealDrag;
import bedmark.engine.uncertainty.Uncertain;
import java.util.Map;
import java.util.Set;
import java.util.function.Function;
import java.util.function.ToDoubleFunction;

/** The engine's formulas by the names that golden files use, each a function of arguments in SI. */
final class GoldenFormulas {
    private static final Map<String, ToDoubleFunction<Arguments>> ALL = Map.ofEntries(
            formula("tabulated-factor", a -> TabulatedFactor.drag(a.get("factor"),
                    a.get("length").times(a.get("depth").square()))),
            formula("site-factor", a -> SiteFactor.drag(a.get("factor"),
                    a.get("length").times(a.get("depth").square()))),
            formula("rankine-pressure", a -> RankinePressure.drag(a.get("wallFriction"), a.get("frictionAngle"),
                    a.get("density"), a.get("length").times(a.get("depth").square()))),
            formula("tabulated-over-rankine", a -> TabulatedFactor.drag(a.get("factor"), Uncertain.ONE)
                    .over(RankinePressure.drag(Uncertain.ONE, a.get("frictionAngle"), a.get("density"),
                            Uncertain.ONE))),
            formula("special-resistance", a -> SpecialResistance.drag(a.get("boardGrip"), a.get("volumeFlow"),
                    a.get("density"), a.get("beltSpeed"), a.get("feedVelocity"), a.get("spacing"),
                    a.get("accelerationLength"), a.get("length"))),
            formula("acceleration-length", a -> AccelerationLength.of(a.get("beltSpeed"), a.get("feedVelocity"),
                    a.get("beltGrip"), a.get("incline")).orElseThrow()),
            formula("loading-force", a -> LoadingForce.of(a.get("massFlow"), a.get("beltSpeed"),
                    a.get("feedVelocity"))),
            formula("timed-speed", a -> BeltSpeed.timed(a.get("beltLength"), a.get("revolutions"),
                    a.get("elapsed"))),
            formula("pulley-speed", a -> BeltSpeed.atPulley(a.get("diameter"), a.get("rotation"))),
            formula("usable-width", a -> OpenBelt.usableWidth(a.get("beltWidth")).orElseThrow()),
            formula("open-belt-crown", a -> OpenBelt.crown(a.get("usableWidth"), a.get("centreRoll"),
                    a.get("troughAngle"), a.get("surchargeAngle"))),
            formula("open-belt-trough", a -> OpenBelt.trough(a.get("usableWidth"), a.get("centreRoll"),
                    a.get("troughAngle"))),
            formula("open-belt-area", a -> OpenBelt.area(a.get("usableWidth"), a.get("centreRoll"),
                    a.get("troughAngle"), a.get("surchargeAngle"))),
            formula("boarded-area", a -> section(a).area(a.get("depth"))),
            formula("depth-of-area", a -> section(a).level(a.get("area"))),
            formula("trough-depth", a -> section(a).troughDepth()),
            formula("crown-rise", a -> section(a).crownRise()),
            formula("free-edge", a -> BoardPlacement.freeEdge(a.get("beltWidth"), a.get("centreRoll"),
                    a.get("spacing"),
                    Section.wingRun(a.get("spacing"), a.get("centreRoll"), a.get("troughAngle")))),
            formula("least-edge", a -> BoardPlacement.leastEdge(a.get("beltWidth"))),
            formula("widest-spacing", a -> BoardPlacement.widestSpacing(a.get("beltWidth"), false)),
            formula("widest-spacing-free-flowing", a -> BoardPlacement.widestSpacing(a.get("beltWidth"), true)),
            formula("settling-length", a -> SettlingLength.of(LengthConventions.ALL, a.get("impactLength"), a.get("beltSpeed"),
                    a.get("accelerationLength"), false)),
            formula("settling-length-high-air-flow", a -> SettlingLength.of(LengthConventions.ALL, a.get("impactLength"),
                    a.get("beltSpeed"), a.get("accelerationLength"), true)),
            formula("seal-drag", a -> SealDrag.of(a.get("rate"), 1, a.get("length"))),
            Map.entry("maximum-speed-grain", a -> MaximumBeltSpeed.of(SpeedClass.GRAIN_FREE_FLOWING,
                    a.get("beltWidth").value())),
            Map.entry("maximum-speed-coal", a -> MaximumBeltSpeed.of(SpeedClass.COAL_SOFT_ORE_FINE_STONE,
                    a.get("beltWidth").value())),
            Map.entry("maximum-speed-heavy", a -> MaximumBeltSpeed.of(SpeedClass.HEAVY_HARD_SHARP_COARSE,
                    a.get("beltWidth").value())));

    /** Named numbers in SI. */
    private record Arguments(Map<String, Double> values) {
        Uncertain get(String name) {
            if (!values.containsKey(name)) {
                throw new IllegalArgumentException("the formula needs " + name);
            }
            return Uncertain.exact(values.get(name));
        }
    }

    private GoldenFormulas() {
    }

    static double evaluate(String name, Map<String, Double> arguments) {
        if (!ALL.containsKey(name)) {
            throw new IllegalArgumentException("no formula " + name + " among " + names());
        }
        return ALL.get(name).applyAsDouble(new Arguments(arguments));
    }

    static Set<String> names() {
        return ALL.keySet();
    }

    private static Section section(Arguments a) {
        return Section.troughed(a.get("spacing"), a.get("centreRoll"), a.get("troughAngle"),
                a.get("surchargeAngle"));
    }

    private static Map.Entry<String, ToDoubleFunction<Arguments>> formula(String name,
            Function<Arguments, Uncertain> formula) {
        return Map.entry(name, arguments -> formula.apply(arguments).value());
    }
}
