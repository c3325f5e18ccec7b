package bedmark.engine;

import bedmark.engine.drag.DragMethod;
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
 */
public record Settings(Limits limits, SealRates sealRates, Instruments instruments, Certainty certainty,
        Optional<DragMethod> method, Conventions conventions, Prices prices) {

    private static final Settings STANDARD = new Settings(Limits.standard(), SealRates.standard(),
            Instruments.standard(), Certainty.standard(), Optional.empty(), Conventions.standard(), Prices.unknown());

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
        return new Settings(other, sealRates, instruments, certainty, method, conventions, prices);
    }

    public Settings with(SealRates other) {
        return new Settings(limits, other, instruments, certainty, method, conventions, prices);
    }

    public Settings with(Instruments other) {
        return new Settings(limits, sealRates, other, certainty, method, conventions, prices);
    }

    public Settings with(Certainty other) {
        return new Settings(limits, sealRates, instruments, other, method, conventions, prices);
    }

    public Settings with(DragMethod chosen) {
        return new Settings(limits, sealRates, instruments, certainty, Optional.of(chosen), conventions, prices);
    }

    public Settings with(Conventions other) {
        return new Settings(limits, sealRates, instruments, certainty, method, other, prices);
    }

    public Settings with(Prices other) {
        return new Settings(limits, sealRates, instruments, certainty, method, conventions, other);
    }

    /** The same settings with exact factors of ISO 5048. */
    public Settings withGrip(double onBelt, double onBoards) {
        return with(conventions.withGrip(onBelt, onBoards));
    }
}
