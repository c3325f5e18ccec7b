package bedmark.engine;

import bedmark.engine.uncertainty.Instrument;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.uncertainty.Tape;
import bedmark.engine.uncertainty.Uncertain;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;

/** The numbers of one zone as they enter the computation, each reading once. */
final class Sources {
    private static final Datum[] DATA = Datum.values();
    private static final List<Deduced<Uncertain>> ABSENT = List.of(DATA).stream()
            .map(datum -> Deduced.<Uncertain>waitingFor(datum.pointer())).toList();

    private final LoadingZone zone;
    private final Settings settings;
    private final Tape tape;
    private final Function<Reading, Uncertain> taking;
    private final Uncertain beltGrip;
    private final Uncertain boardGrip;
    private final Uncertain sealRate;
    private final List<Deduced<Uncertain>> numbers = new ArrayList<>(DATA.length);

    private Sources(LoadingZone zone, Settings settings, Tape tape, Function<Reading, Uncertain> taking) {
        this.zone = zone;
        this.settings = settings;
        this.tape = tape;
        this.taking = taking;
        for (Datum datum : DATA) {
            Optional<Reading> reading = zone.get(datum);
            numbers.add(reading.isPresent() ? Deduced.known(take(reading.get())) : ABSENT.get(datum.ordinal()));
        }
        beltGrip = take(settings.beltGrip());
        boardGrip = take(settings.boardGrip());
        sealRate = take(settings.instruments().reading("/plant/sealRates", settings.sealRates().rate(),
                Instrument.SEAL_RATE));
    }

    private Sources(Sources other) {
        zone = other.zone;
        settings = other.settings;
        tape = new Tape(0);
        taking = reading -> Uncertain.exact(reading.value());
        for (Deduced<Uncertain> number : other.numbers) {
            numbers.add(number.map(Uncertain::certain));
        }
        beltGrip = other.beltGrip.certain();
        boardGrip = other.boardGrip.certain();
        sealRate = other.sealRate.certain();
    }

    /** The readings with their uncertainties. */
    static Sources uncertain(LoadingZone zone, Settings settings) {
        Tape tape = new Tape(232 + 12 * zone.stations().size());
        return new Sources(zone, settings, tape, tape::take);
    }

    /** One drawing of the readings. */
    static Sources drawn(LoadingZone zone, Settings settings, Draw draw) {
        return new Sources(zone, settings, new Tape(0), draw::take);
    }

    /** The same readings taken as they stand. */
    Sources certain() {
        return new Sources(this);
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
        return number(datum).isKnown() ? number(datum).get() : Uncertain.exact(assumed);
    }

    /** A number that stands in a row of its own; to be taken once, since each taking is a reading by itself. */
    Uncertain take(Reading reading) {
        return taking.apply(reading);
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
