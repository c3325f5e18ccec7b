package bedmark.engine.fit;

import bedmark.engine.uncertainty.Estimate;
import java.util.List;
import java.util.Optional;

/**
 * The site's own factor, and the drag of its seals, from pairs of running power by weighted least squares [D].
 *
 * <pre>
 * (P1 − P2) η/v = C (I1 − I2) + r (S1 − S2)        one equation a pair, all in SI
 * </pre>
 *
 * <table><caption>Symbols</caption>
 * <tr><td>P</td><td>running electrical power of the drive (W)</td></tr>
 * <tr><td>η</td><td>motor efficiency times drive efficiency</td></tr>
 * <tr><td>v</td><td>belt speed (m/s)</td></tr>
 * <tr><td>I</td><td>∫h² dx, the skirted length times the mean of the square of the depth at the board (m³)</td></tr>
 * <tr><td>S</td><td>length of seal that touches, both sides (m)</td></tr>
 * <tr><td>C</td><td>the site's factor, here in N/m³; reported in lbf/(ft·in²), 22 620.594 79 N/m³ [S11]</td></tr>
 * <tr><td>r</td><td>drag per length of seal (N/m)</td></tr>
 * </table>
 *
 * <p>Each pair weighs by its effective variance, {@code u²(ΔF) + C² u²(ΔI)}, found by repetition; the covariance of the
 * fit is {@code (XᵀWX)⁻¹}, widened by the residual where that is larger than the readings explain (χ²/ν over 1), and by
 * the uncertainty of the efficiencies, which err in all pairs alike.
 *
 * <p>What the pairs cannot carry is refused: fewer pairs than unknowns and one more, depths that hardly differ, depth
 * and seals that were only ever changed together, a factor that is not positive or that is uncertain by more than half
 * of itself, pairs that contradict each other by more than their uncertainties explain (χ² over its mean by more than four
 * of its standard deviations, {@code ν + 4 √(2ν)}), a flow that differs between the two states by more than 5 %.
 */
public sealed interface SiteFit {

    /** 1 lbf/(ft·in²) in N/m³. */
    double NEWTON_PER_CUBIC_METRE = 4.448_221_615_260_5 / (0.3048 * (0.0254 * 0.0254));

    /**
     * What was fitted.
     *
     * @param factor   C (lbf/(ft·in²)); nothing where only seals were lifted
     * @param sealRate r (N/m); nothing where no seals were lifted
     * @param pairs    how many readings of two
     * @param residual χ²/ν, about 1 where the pairs agree as well as their uncertainties say
     */
    record Fitted(Optional<Estimate> factor, Optional<Estimate> sealRate, int pairs, double residual)
            implements SiteFit {
    }

    /**
     * Why nothing can be fitted.
     *
     * @param code      lower-case words joined by hyphens
     * @param arguments what a sentence about it names
     */
    record Unfit(String code, List<String> arguments) implements SiteFit {
    }

    /** Fits the pairs of one site, or says why it cannot. */
    static SiteFit of(List<DrivePair> pairs) {
        return new LeastSquares(pairs).fit();
    }
}
