package bedmark;

import java.time.Clock;
import java.time.Instant;
import java.time.ZoneId;

/**
 * The machine's time in its own zone. The zone is asked for when it is first needed: finding the rules of all zones looks
 * through every library, and the store can be opened meanwhile.
 */
final class MachineClock extends Clock {

    @Override
    public ZoneId getZone() {
        return ZoneId.systemDefault();
    }

    @Override
    public Clock withZone(ZoneId zone) {
        return Clock.system(zone);
    }

    @Override
    public Instant instant() {
        return Instant.now();
    }
}
