package bedmark.engine.flow;

/**
 * Which conventions for the length of a loading zone a site goes by; the longest of them counts.
 *
 * @param bySpeed        2 ft for every 100 ft/min past the impact zone, 3 ft at high air flow [S9]
 * @param byAcceleration the length over which the belt brings the feed to its own speed [R]
 * @param least          3 ft [R]
 */
public record LengthConventions(boolean bySpeed, boolean byAcceleration, boolean least) {
    /** All of them. */
    public static final LengthConventions ALL = new LengthConventions(true, true, true);

    /** Whether none of them is in use. */
    public boolean none() {
        return !bySpeed && !byAcceleration && !least;
    }
}
