package bedmark.engine;

import bedmark.engine.drag.DragMethod;
import bedmark.engine.flow.MaximumBeltSpeed;
import bedmark.engine.seal.SealRates;
import bedmark.engine.uncertainty.Instruments;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.verdict.Certainty;
import bedmark.engine.verdict.Limits;
import java.util.Optional;

/**
 * What a site decides.
 *
 * @param limits      the limits of every rule
 * @param sealRates   the drag of its seals
 * @param instruments the default standard uncertainties
 * @param certainty   how sure a verdict must be
 * @param method      the method that decides, where the site chose one
 * @param beltGrip    μ1 of ISO 5048, material on belt while it is accelerated: 0.5–0.7 [R]
 * @param boardGrip   μ2 of ISO 5048, material on boards: 0.5–0.7 [R, range S7]
 * @param maximumSpeeds the highest belt speed by class of material and belt width
 */
public record Settings(Limits limits, SealRates sealRates, Instruments instruments, Certainty certainty,
        Optional<DragMethod> method, Reading beltGrip, Reading boardGrip,
        MaximumBeltSpeed maximumSpeeds) {

    /** Half the published range of 0.5–0.7, taken as equally likely all over (JCGM 100, 4.3.7) [D]. */
    private static final double GRIP_SPREAD = 0.1 / Math.sqrt(3);

    private static final Settings STANDARD = new Settings(Limits.standard(), SealRates.standard(),
            Instruments.standard(), Certainty.standard(), Optional.empty(),
            new Reading("/plant/limits/beltGrip", 0.6, GRIP_SPREAD),
            new Reading("/plant/limits/boardGrip", 0.6, GRIP_SPREAD), MaximumBeltSpeed.standard());

    public Settings {
        Domain.EFFICIENCY.check(beltGrip);
        Domain.EFFICIENCY.check(boardGrip);
    }

    /** The defaults of the engineering page. */
    public static Settings standard() {
        return STANDARD;
    }

    public Settings with(Limits other) {
        return new Settings(other, sealRates, instruments, certainty, method, beltGrip, boardGrip, maximumSpeeds);
    }

    public Settings with(SealRates other) {
        return new Settings(limits, other, instruments, certainty, method, beltGrip, boardGrip, maximumSpeeds);
    }

    public Settings with(Instruments other) {
        return new Settings(limits, sealRates, other, certainty, method, beltGrip, boardGrip, maximumSpeeds);
    }

    public Settings with(Certainty other) {
        return new Settings(limits, sealRates, instruments, other, method, beltGrip, boardGrip, maximumSpeeds);
    }

    public Settings with(DragMethod chosen) {
        return new Settings(limits, sealRates, instruments, certainty, Optional.of(chosen), beltGrip, boardGrip, maximumSpeeds);
    }

    public Settings with(MaximumBeltSpeed other) {
        return new Settings(limits, sealRates, instruments, certainty, method, beltGrip, boardGrip, other);
    }

    /** The same settings with other factors of ISO 5048 and their uncertainties. */
    public Settings withGrip(Reading onBelt, Reading onBoards) {
        return new Settings(limits, sealRates, instruments, certainty, method, onBelt, onBoards, maximumSpeeds);
    }

    /** The same settings with exact factors of ISO 5048. */
    public Settings withGrip(double onBelt, double onBoards) {
        return new Settings(limits, sealRates, instruments, certainty, method,
                Reading.exact(beltGrip.name(), onBelt), Reading.exact(boardGrip.name(), onBoards), maximumSpeeds);
    }
}
