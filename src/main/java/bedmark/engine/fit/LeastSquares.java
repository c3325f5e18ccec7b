package bedmark.engine.fit;

import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.Reading;
import java.util.List;
import java.util.Optional;

/** The computation behind {@link SiteFit}. */
final class LeastSquares {
    private static final int REPETITIONS = 20;
    /** Depths, or forces, that differ by fewer standard uncertainties than this are alike. */
    private static final double APART = 2;
    /** Pairs contradict each other where χ² exceeds its mean by more than so many of its standard deviations. */
    private static final double MOST_RESIDUAL = 4;
    private static final double MOST_UNCERTAIN = 0.5;
    private static final double SAME_FLOW = 0.05;
    /** Where the square of the correlation of depth and seals over the pairs exceeds this, they cannot be told apart. */
    private static final double TOGETHER = 0.98;

    private final List<DrivePair> pairs;
    private final boolean byDepth;
    private final boolean bySeals;

    LeastSquares(List<DrivePair> pairs) {
        this.pairs = List.copyOf(pairs);
        byDepth = pairs.stream().anyMatch(pair -> Math.abs(pair.squares()) > APART * pair.squaresSpread()
                && pair.squares() != 0);
        bySeals = pairs.stream().anyMatch(pair -> pair.seals() != 0);
    }

    /** Sums over the pairs, weighted: of the squares, the products, and what the unknowns are solved from. */
    private record Sums(double depthDepth, double depthSeal, double sealSeal, double depthForce, double sealForce) {
        double determinant() {
            return depthDepth * sealSeal - depthSeal * depthSeal;
        }
    }

    /** C (N/m³) and r (N/m). */
    private record Solution(double factor, double sealRate) {
    }

    SiteFit fit() {
        Optional<DrivePair> flowing = pairs.stream().filter(LeastSquares::flowsDiffer).findFirst();
        if (flowing.isPresent()) {
            return unfit("site-flows-differ", flowing.get().first().power().name());
        }
        int unknowns = (byDepth ? 1 : 0) + (bySeals ? 1 : 0);
        if (pairs.size() < 2 || pairs.size() <= unknowns) {
            return unfit("site-pairs-too-few", Integer.toString(pairs.size()),
                    Integer.toString(Math.max(2, unknowns + 1)));
        }
        if (unknowns == 0) {
            return unfit("site-depths-alike");
        }
        Solution solution = new Solution(0, 0);
        for (int i = 0; i < REPETITIONS; i++) {
            Sums sums = sums(solution);
            if (unknowns == 2
                    && sums.depthSeal() * sums.depthSeal() > TOGETHER * sums.depthDepth() * sums.sealSeal()) {
                return unfit("site-changes-together");
            }
            solution = solve(sums);
        }
        return judged(solution, unknowns);
    }

    private SiteFit judged(Solution solution, int unknowns) {
        if (byDepth && solution.factor() <= 0) {
            return unfit("site-factor-not-positive", number(solution.factor() / SiteFit.NEWTON_PER_CUBIC_METRE));
        }
        if (bySeals && solution.sealRate() <= 0) {
            return unfit("site-seal-rate-not-positive", number(solution.sealRate()));
        }
        int freedom = pairs.size() - unknowns;
        double residual = residual(solution) / freedom;
        if (residual > 1 + MOST_RESIDUAL * Math.sqrt(2.0 / freedom)) {
            return unfit("site-pairs-contradict", number(residual));
        }
        Sums sums = sums(solution);
        double widening = Math.max(1, residual);
        double factorVariance = bySeals ? sums.sealSeal() / sums.determinant() : 1 / sums.depthDepth();
        double sealVariance = byDepth ? sums.depthDepth() / sums.determinant() : 1 / sums.sealSeal();
        Optional<Estimate> factor = byDepth ? Optional.of(estimate(solution.factor(), factorVariance * widening,
                SiteFit.NEWTON_PER_CUBIC_METRE)) : Optional.empty();
        Optional<Estimate> sealRate = bySeals ? Optional.of(estimate(solution.sealRate(), sealVariance * widening, 1))
                : Optional.empty();
        return isTooUncertain(factor) || isTooUncertain(sealRate)
                ? unfit("site-factor-too-uncertain", number(relative(factor)), number(relative(sealRate)))
                : new SiteFit.Fitted(factor, sealRate, pairs.size(), residual);
    }

    private Estimate estimate(double value, double variance, double unit) {
        double common = pairs.stream().mapToDouble(DrivePair::efficiencySpread).max().orElse(0);
        return new Estimate(value / unit, Math.hypot(Math.sqrt(variance), value * common) / unit);
    }

    private static boolean isTooUncertain(Optional<Estimate> estimate) {
        return relative(estimate) > MOST_UNCERTAIN;
    }

    private static double relative(Optional<Estimate> estimate) {
        return estimate.map(known -> known.standardUncertainty() / known.value()).orElse(0.0);
    }

    private Sums sums(Solution guess) {
        double depthDepth = 0;
        double depthSeal = 0;
        double sealSeal = 0;
        double depthForce = 0;
        double sealForce = 0;
        for (DrivePair pair : pairs) {
            double weight = 1 / variance(pair, guess);
            double squares = byDepth ? pair.squares() : 0;
            depthDepth += weight * squares * squares;
            depthSeal += weight * squares * pair.seals();
            sealSeal += weight * pair.seals() * pair.seals();
            depthForce += weight * squares * pair.force();
            sealForce += weight * pair.seals() * pair.force();
        }
        return new Sums(depthDepth, depthSeal, sealSeal, depthForce, sealForce);
    }

    private Solution solve(Sums sums) {
        if (!bySeals) {
            return new Solution(sums.depthForce() / sums.depthDepth(), 0);
        }
        if (!byDepth) {
            return new Solution(0, sums.sealForce() / sums.sealSeal());
        }
        return new Solution(
                (sums.sealSeal() * sums.depthForce() - sums.depthSeal() * sums.sealForce()) / sums.determinant(),
                (sums.depthDepth() * sums.sealForce() - sums.depthSeal() * sums.depthForce()) / sums.determinant());
    }

    /** χ² of the pairs. */
    private double residual(Solution solution) {
        double sum = 0;
        for (DrivePair pair : pairs) {
            double off = pair.force() - solution.factor() * pair.squares() - solution.sealRate() * pair.seals();
            sum += off * off / variance(pair, solution);
        }
        return sum;
    }

    /** Effective variance (N²); exact readings still count to a millinewton, so that none weighs without end. */
    private static double variance(DrivePair pair, Solution guess) {
        double force = pair.forceSpread();
        double squares = guess.factor() * pair.squaresSpread();
        return Math.max(1e-6, force * force + squares * squares);
    }

    private static boolean flowsDiffer(DrivePair pair) {
        Optional<Reading> first = pair.first().throughput();
        Optional<Reading> second = pair.second().throughput();
        return first.isPresent() && second.isPresent() && Math.abs(first.get().value() - second.get().value())
                > SAME_FLOW * Math.max(first.get().value(), second.get().value());
    }

    private static SiteFit unfit(String code, String... arguments) {
        return new SiteFit.Unfit(code, List.of(arguments));
    }

    private static String number(double value) {
        return Double.toString(value);
    }
}
