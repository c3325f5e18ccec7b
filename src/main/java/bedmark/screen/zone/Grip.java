package bedmark.screen.zone;

import bedmark.picture.Snap;

/** What a finger on the picture has hold of. */
public sealed interface Grip {

    /**
     * A station that is there.
     *
     * @param index in the list of the sketch
     */
    record OfStation(int index) implements Grip {
    }

    /** A new station at that place; through one pull it stays the same place. */
    record AtPlace(Snap.Stepped position) implements Grip {
    }
}
