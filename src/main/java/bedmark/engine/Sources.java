package bedmark.engine;

import bedmark.engine.uncertainty.Instrument;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.uncertainty.Tape;
import bedmark.engine.uncertainty.Uncertain;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;

/** The numbers of one zone as they enter the computation, each reading once. */
final class Sources {
    private final LoadingZone zone;
    private final Settings settings;
    private final Tape tape;
    private final boolean certain;
    private final Uncertain beltGrip;
    private final Uncertain boardGrip;
    private final Uncertain sealRate;
    private final List<Deduced<Uncertain>> numbers =
            new ArrayList<>(Collections.nCopies(Datum.values().length, Deduced.nothing()));

    private Sources(LoadingZone zone, Settings settings, boolean certain) {
        this.zone = zone;
        this.settings = settings;
        this.certain = certain;
        tape = new Tape(certain ? 0 : 160 + 32 * zone.stations().size() + 4 * zone.seals().size());
        for (Datum datum : Datum.values()) {
            numbers.set(datum.ordinal(), zone.get(datum).map(reading -> Deduced.known(take(reading)))
                    .orElseGet(() -> Deduced.waitingFor(datum.pointer())));
        }
        beltGrip = take(settings.beltGrip());
        boardGrip = take(settings.boardGrip());
        sealRate = take(settings.instruments().reading("/plant/sealRates", settings.sealRates().rate(),
                Instrument.SEAL_RATE));
    }

    /** The readings with their uncertainties. */
    static Sources uncertain(LoadingZone zone, Settings settings) {
        return new Sources(zone, settings, false);
    }

    /** The readings taken as they stand. */
    static Sources certain(LoadingZone zone, Settings settings) {
        return new Sources(zone, settings, true);
    }

    LoadingZone zone() {
        return zone;
    }

    Settings settings() {
        return settings;
    }

    Tape tape() {
        return tape;
    }

    Deduced<Uncertain> number(Datum datum) {
        return numbers.get(datum.ordinal());
    }

    /** The number, or what is assumed in its place; whoever asks so states the assumption. */
    Uncertain numberOr(Datum datum, double assumed) {
        return number(datum).value().orElseGet(() -> Uncertain.exact(assumed));
    }

    /** A number that stands in a row of its own; to be taken once, since each taking is a reading by itself. */
    Uncertain take(Reading reading) {
        return certain ? Uncertain.exact(reading.value()) : tape.take(reading);
    }

    /** μ1 of ISO 5048. */
    Uncertain beltGrip() {
        return beltGrip;
    }

    /** μ2 of ISO 5048. */
    Uncertain boardGrip() {
        return boardGrip;
    }

    /** Drag per length of a sound seal that touches (N/m). */
    Uncertain sealRate() {
        return sealRate;
    }
}
