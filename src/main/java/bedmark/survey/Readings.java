package bedmark.survey;

import bedmark.engine.Datum;
import bedmark.quantity.Dimension;
import java.util.Optional;

/** What the engine's readings are as quantities. */
public final class Readings {
    private Readings() {
    }

    /**
     * The dimension of a reading.
     *
     * @param name a JSON Pointer as the engine names its readings
     * @return nothing where it is a plain number
     */
    public static Optional<Dimension> dimension(String name) {
        return Datum.ofPointer(name).map(ZoneMapping::dimension).orElseGet(() ->
                name.startsWith("/readings/bedDepths/") || name.startsWith("/readings/seals/")
                        ? Optional.of(Dimension.LENGTH) : Optional.empty());
    }
}
