package bedmark.survey;

import bedmark.document.Defect;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.engine.bed.DepthMethod;
import bedmark.engine.uncertainty.Instrument;
import bedmark.engine.uncertainty.Instruments;
import bedmark.engine.uncertainty.Reading;
import bedmark.quantity.BeltState;
import bedmark.quantity.Dimension;
import bedmark.quantity.Quality;
import bedmark.quantity.Quantity;

/**
 * How what a person entered becomes a number of the engine: SI, with the reading's own standard uncertainty or its
 * instrument's.
 *
 * @param instruments of the site
 */
record Taking(Instruments instruments) {

    /**
     * A quantity as a reading.
     *
     * @param name JSON Pointer of the quantity
     * @throws Refused {@code unit-of-wrong-kind}; the place is a pointer within what holds the quantity
     */
    Reading reading(String name, Quantity quantity, Dimension dimension, Instrument instrument) {
        if (quantity.unit().dimension() != dimension) {
            throw new Refused(Defect.at(Pointer.of(Pointer.parse(name).last(), "unit"), "unit-of-wrong-kind",
                    quantity.unit().code()));
        }
        double value = quantity.si();
        return quantity.standardUncertaintySi()
                .map(uncertainty -> new Reading(name, value, uncertainty))
                .orElseGet(() -> instruments.reading(name, value, instrument));
    }

    /** A plain number as a reading. */
    Reading plain(String name, double value, Instrument instrument) {
        return instruments.reading(name, value, instrument);
    }

    /** A depth on a running belt is an estimate whatever its mark says; so is a wear line, which records history. */
    static Instrument depth(Quantity depth, DepthMethod method) {
        Quality marked = depth.quality().orElse(Quality.MEASURED);
        boolean sighted = method == DepthMethod.WEAR_LINE || depth.beltState().filter(BeltState::running).isPresent();
        return switch (sighted && marked == Quality.MEASURED ? Quality.ESTIMATED : marked) {
            case MEASURED -> Instrument.DEPTH_MEASURED;
            case ESTIMATED -> Instrument.DEPTH_ESTIMATED;
            case SUSPECT -> Instrument.DEPTH_SUSPECT;
        };
    }
}
