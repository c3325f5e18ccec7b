package bedmark.screen;

import bedmark.screen.theme.Light;
import java.time.LocalTime;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Stream;

/** Which light the screen is set for. */
public enum Lighting {
    DAY,
    NIGHT,
    /** Night from seven in the evening to six in the morning, by the clock of the device. */
    CLOCK;

    private static final LocalTime DUSK = LocalTime.of(19, 0);
    private static final LocalTime DAWN = LocalTime.of(6, 0);

    /** The word used in settings. */
    public String code() {
        return name().toLowerCase(Locale.ROOT);
    }

    /** The one that follows where they are gone through one after the other. */
    Lighting next() {
        return values()[(ordinal() + 1) % values().length];
    }

    static Optional<Lighting> ofCode(String code) {
        return Stream.of(values()).filter(one -> one.code().equals(code)).findFirst();
    }

    /** The light at a time of day. */
    public Light at(LocalTime time) {
        return switch (this) {
            case DAY -> Light.DAY;
            case NIGHT -> Light.NIGHT;
            case CLOCK -> time.isBefore(DAWN) || !time.isBefore(DUSK) ? Light.NIGHT : Light.DAY;
        };
    }
}
