package bedmark.engine;

import bedmark.engine.bed.DepthPoint;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.seal.Side;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.Share;
import bedmark.engine.verdict.AllowedDepth;
import bedmark.engine.verdict.Component;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.RefusedVerdict;
import bedmark.engine.verdict.Remedy;
import bedmark.engine.verdict.Repeat;
import java.util.ArrayList;
import java.util.Collections;
import java.util.Comparator;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What the engine found of one loading zone. What could not be computed is not there.
 *
 * @param method            the method of the material drag, where one could be used
 * @param results           the numbers with their standard uncertainties
 * @param methods           the material drag by every method that could be computed (N)
 * @param spread            how far those methods lie apart, and why; nothing where there is one
 * @param energyKind        whether the energy is the motor's electrical or the shaft's
 * @param profile           the depth at the board at each station
 * @param level             the verdict
 * @param levelAtDesignFeed the verdict at design throughput, where a belt scale was read
 * @param findings          every rule that could be evaluated, once
 * @param findingsAtDesign  the same at design throughput; none where that could not be judged
 * @param allowedDepths     the depth at the board that each depth rule allows
 * @param remedies          what would lower the skirt power, the greatest saving first
 * @param assumptions       what was taken for granted
 * @param missing           the JSON Pointers of the readings that something waits for, each once
 * @param missingRequired   those of them without which there is no verdict
 * @param sidesWithoutSeals the sides of which no seal was recorded
 * @param powerShares       the share of each reading in the variance of the skirt power, greatest first
 * @param leading           which of bed, seal and loading asks for most
 * @param repeat            the reading to take again first where the verdict is undecided
 */
public record Assessment(Optional<DragMethod> method, Map<Result, Estimate> results,
        Map<DragMethod, Estimate> methods, Optional<MethodSpread> spread, Optional<EnergyKind> energyKind,
        Optional<String> currency, List<DepthPoint> profile, Level level,
        Optional<Level> levelAtDesignFeed, List<Finding> findings, List<Finding> findingsAtDesign,
        List<RefusedVerdict> refused, List<AllowedDepth> allowedDepths, List<Remedy> remedies,
        List<Assumption> assumptions, List<String> missing,
        List<String> missingRequired, List<Side> sidesWithoutSeals, List<Share> powerShares,
        Optional<Component> leading, Optional<Repeat> repeat) {

    /** Where the energy of an assessment is counted. */
    public enum EnergyKind {
        /** At the motor's shaft, since the motor's efficiency is not known. */
        SHAFT("shaft"),
        /** At the motor's terminals. */
        ELECTRICAL("electrical");

        private final String code;

        EnergyKind(String code) {
            this.code = code;
        }

        public String code() {
            return code;
        }
    }

    public Assessment {
        results = ordered(Result.class, results);
        methods = ordered(DragMethod.class, methods);
        profile = List.copyOf(profile);
        findings = List.copyOf(findings);
        findingsAtDesign = List.copyOf(findingsAtDesign);
        refused = List.copyOf(refused);
        allowedDepths = List.copyOf(allowedDepths);
        remedies = List.copyOf(remedies);
        assumptions = List.copyOf(assumptions);
        missing = List.copyOf(missing);
        missingRequired = List.copyOf(missingRequired);
        sidesWithoutSeals = List.copyOf(sidesWithoutSeals);
        powerShares = List.copyOf(powerShares);
    }

    /** The number, where it could be computed. */
    public Optional<Estimate> get(Result result) {
        return Optional.ofNullable(results.get(result));
    }

    /**
     * A number with everything that makes it uncertain: what the readings bring, and what the disagreement of the drag
     * methods brings where it counts.
     */
    public Optional<Estimate> counted(Result result) {
        double drag = get(Result.SKIRT_DRAG).map(Estimate::value).orElse(0.0);
        double methodsApart = spread.map(MethodSpread::standardUncertainty).orElse(0.0);
        double share = result == Result.MATERIAL_DRAG || result == Result.SKIRT_DRAG ? 1
                : get(result).filter(number -> result.followsDrag() && drag > 0)
                        .map(number -> number.value() / drag).orElse(0.0);
        return get(result).map(number -> new Estimate(number.value(),
                Math.hypot(number.standardUncertainty(), share * methodsApart)));
    }

    /** The same assessment with one more thing that was taken for granted before the engine saw the zone. */
    public Assessment with(Assumption assumption) {
        List<Assumption> more = new ArrayList<>(assumptions);
        more.add(assumption);
        return new Assessment(method, results, methods, spread, energyKind, currency, profile, level,
                levelAtDesignFeed, findings, findingsAtDesign, refused, allowedDepths, remedies, more, missing,
                missingRequired, sidesWithoutSeals, powerShares, leading, repeat);
    }

    /** Today's verdict or the one at design throughput, whichever is worse: half a feed makes no zone healthy. */
    public Level worstLevel() {
        return levelAtDesignFeed.map(level::or).orElse(level);
    }

    /** The depth that may not be overstepped at the board and the rule that sets it, where one is known. */
    public Optional<AllowedDepth> lowestAllowedDepth() {
        return allowedDepths.stream().filter(depth -> depth.overloaded().isPresent())
                .min(Comparator.comparingDouble(depth -> depth.overloaded().orElseThrow()));
    }

    private static <K extends Enum<K>> Map<K, Estimate> ordered(Class<K> keys, Map<K, Estimate> values) {
        Map<K, Estimate> copy = new EnumMap<>(keys);
        copy.putAll(values);
        return Collections.unmodifiableMap(copy);
    }
}
