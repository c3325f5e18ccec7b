package bedmark.engine.verdict;

import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Stream;

/**
 * The rules by which a zone is judged: what each observes, its default limits with their source, and what to do.
 * Each observes a ratio unless it says otherwise.
 */
public enum Rule {
    /** Deepest depth over the height of the board. */
    BED_OVER_BOARD("bed-over-board", Sense.OVER, "1", limit(0.85, 1.00, "A"), "lower-bed"),
    /** Root mean square depth over the reference depth. */
    BED_OVER_DESIGN("bed-over-design", Sense.OVER, "1", limit(1.10, 1.25, "A"), "lower-bed"),
    /** Flow over the capacity of the open belt; only with a belt scale, or at design feed. */
    FLOW_OVER_CAPACITY("flow-over-capacity", Sense.OVER, "1", limit(0.85, 1.00, "S12/C"), "lower-feed"),
    /** Running shaft power over rated power. */
    DRIVE_NEAR_RATING("drive-near-rating", Sense.OVER, "1", limit(0.90, 1.00, "C"), "relieve-drive"),
    /** Shaft power of all the conveyor's skirted zones over rated power; overloaded only against a budget. */
    SKIRTS_OVER_BUDGET("skirts-over-budget", Sense.OVER, "1", warning(0.10, "A"), "cut-skirt-drag"),
    /** Bed speed over belt speed, too low. */
    BED_BEHIND_BELT("bed-behind-belt", Sense.UNDER, "1", warning(0.8, "A"), "free-bed"),
    /** Bed speed over belt speed, too high to be. */
    READINGS_DISAGREE("readings-disagree", Sense.OVER, "1", warning(1.1, "A"), "repeat-readings"),
    /** Length over the length that the feed needs to settle. */
    ZONE_TOO_SHORT("zone-too-short", Sense.UNDER, "1", warning(1, "S9/R"), "lengthen-zone"),
    /** Spacing over the widest one for the belt. */
    BOARDS_TOO_WIDE("boards-too-wide", Sense.OVER, "1", warning(1, "S8"), "narrow-boards"),
    /** Free edge over the least one for the belt. */
    EDGE_TOO_SMALL("edge-too-small", Sense.UNDER, "1", warning(1, "S12"), "narrow-boards"),
    /** Height or spacing, the lesser, over the largest lumps. */
    BOARD_TOO_LOW_FOR_LUMPS("board-too-low-for-lumps", Sense.UNDER, "1", warning(2.5, "S9"), "enlarge-boards"),
    /** Belt speed (m/s); its limits are shares of the table's speed. */
    BELT_TOO_FAST("belt-too-fast", Sense.OVER, "m/s", warning(1, "R"), "slow-belt"),
    /** Change of depth over the last quarter of the zone, over the mean depth. */
    BED_NOT_SETTLED("bed-not-settled", Sense.OVER, "1", warning(0.15, "A"), "centre-loading"),
    /** Number of seal segments that are not sound. */
    SEAL_DEFECT("seal-defect", Sense.OVER, "1", warning(0, "C"), "mend-seal");

    private final String code;
    private final Sense sense;
    private final String unit;
    private final Limit limit;
    private final String action;

    Rule(String code, Sense sense, String unit, Limit limit, String action) {
        this.code = code;
        this.sense = sense;
        this.unit = unit;
        this.limit = limit;
        this.action = action;
    }

    /** The rule of that code. */
    public static Optional<Rule> ofCode(String code) {
        return Stream.of(values()).filter(rule -> rule.code.equals(code)).findFirst();
    }

    public String code() {
        return code;
    }

    public Sense sense() {
        return sense;
    }

    /** The UCUM code of what is observed. */
    public String unit() {
        return unit;
    }

    /** The default limits. */
    public Limit limit() {
        return limit;
    }

    /** The code of what to do about it. */
    public String action() {
        return action;
    }

    private static Limit limit(double near, double overloaded, String source) {
        return new Limit(OptionalDouble.of(near), OptionalDouble.of(overloaded), true, source, source.equals("A"));
    }

    private static Limit warning(double near, String source) {
        return new Limit(OptionalDouble.of(near), OptionalDouble.empty(), true, source, source.equals("A"));
    }
}
