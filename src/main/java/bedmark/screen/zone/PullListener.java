package bedmark.screen.zone;

import bedmark.picture.Snap;

/** Hears what a person does on the zone picture. */
public interface PullListener {

    /** A station was touched: it is the one in hand now. */
    void touched(int station);

    /**
     * The bed was pulled to a depth. Comes again and again while the finger moves, and the last time with
     * {@link Phase#RELEASED}; then the depth is the person's.
     */
    void pulled(Grip grip, Snap.Stepped depth, Phase phase);

    /** A station was moved along the zone; comes again and again as {@link #pulled} does. */
    void moved(int station, Snap.Stepped position, Phase phase);

    /**
     * The belt was pulled faster or slower, while that is what the picture is asked for.
     *
     * @param forward how far the finger went in the direction of travel since the last time (mm)
     */
    void sped(double forward);

    /** How far a pull is. */
    enum Phase {
        MOVING,
        RELEASED
    }
}
