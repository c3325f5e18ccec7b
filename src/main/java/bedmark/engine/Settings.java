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
 * @param conventions how it computes where practice knows more than one way
 * @param prices      what electricity costs
 * @param maximumSpeeds the highest belt speed by class of material and belt width
 */
public record Settings(Limits limits, SealRates sealRates, Instruments instruments, Certainty certainty,
        Optional<DragMethod> method, Conventions conventions, Prices prices,
        MaximumBeltSpeed maximumSpeeds) {

    private static final Settings STANDARD = new Settings(Limits.standard(), SealRates.standard(),
            Instruments.standard(), Certainty.standard(), Optional.empty(), Conventions.standard(), Prices.unknown(),
            MaximumBeltSpeed.standard());

    /** The defaults of the engineering page. */
    public static Settings standard() {
        return STANDARD;
    }

    /** μ1 of ISO 5048. */
    Reading beltGrip() {
        return conventions.beltGrip();
    }

    /** μ2 of ISO 5048. */
    Reading boardGrip() {
        return conventions.boardGrip();
    }

    public Settings with(Limits other) {
        return new Settings(other, sealRates, instruments, certainty, method, conventions, prices,
                maximumSpeeds);
    }

    public Settings with(SealRates other) {
        return new Settings(limits, other, instruments, certainty, method, conventions, prices,
                maximumSpeeds);
    }

    public Settings with(Instruments other) {
        return new Settings(limits, sealRates, other, certainty, method, conventions, prices,
                maximumSpeeds);
    }

    public Settings with(Certainty other) {
        return new Settings(limits, sealRates, instruments, other, method, conventions, prices,
                maximumSpeeds);
    }

    public Settings with(DragMethod chosen) {
        return new Settings(limits, sealRates, instruments, certainty, Optional.of(chosen), conventions, prices,
                maximumSpeeds);
    }

    public Settings with(Conventions other) {
        return new Settings(limits, sealRates, instruments, certainty, method, other, prices, maximumSpeeds);
    }

    public Settings with(Prices other) {
        return new Settings(limits, sealRates, instruments, certainty, method, conventions, other,
                maximumSpeeds);
    }

    public Settings with(MaximumBeltSpeed other) {
        return new Settings(limits, sealRates, instruments, certainty, method, conventions, prices, other);
    }

    /** The same settings with exact factors of ISO 5048. */
    public Settings withGrip(double onBelt, double onBoards) {
        return with(conventions.withGrip(onBelt, onBoards));
    }
}
