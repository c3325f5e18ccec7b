package bedmark.engine;

import java.util.Optional;
import java.util.stream.Stream;

/** The numbers of an assessment, each with its key in documents: SI, the unit in the key. */
public enum Result {
    /** Belt speed in use (m/s). */
    BELT_SPEED("beltSpeedMPerS"),
    /** Mean of the square of the depth along the zone (m²). */
    MEAN_SQUARE_DEPTH("meanSquareDepthM2"),
    /** Mean depth along the zone (m). */
    MEAN_DEPTH("meanDepthM"),
    /** Deepest depth (m). */
    DEEPEST_DEPTH("deepestDepthM"),
    /** (Mean depth)² over the mean of the square: 1 for a constant depth, under it by how much it understates. */
    SQUARE_OF_MEAN_SHARE("squareOfMeanShare"),
    /** Drag of the material on both boards, by the method in use (N). */
    MATERIAL_DRAG("materialDragN"),
    /** Drag of the seals (N). */
    SEAL_DRAG("sealDragN"),
    /** Material and seals, without loading (N). */
    SKIRT_DRAG("skirtDragN"),
    /** Force that brings the feed to belt speed (N). */
    LOADING_FORCE("loadingForceN"),
    /** Skirt drag times belt speed (W). */
    SKIRT_POWER("skirtPowerW"),
    /** The same at the motor shaft (W). */
    DRIVE_POWER("drivePowerW"),
    /** Drive power of this zone as a share of the rated power. */
    DRIVE_SHARE("driveShare"),
    /** Drive power of this zone as a share of the shaft power that was running. */
    RUNNING_SHARE("runningShare"),
    /** Mean area of the bed between the boards (m²). */
    BED_AREA("bedAreaM2"),
    /** Flow if the bed moved at belt speed: an upper bound (kg/s). */
    IMPLIED_THROUGHPUT("impliedThroughputKgPerS"),
    /** Flow over the capacity of the open belt after the boards. */
    FILL("fill"),
    /** Read over implied flow: mean speed of the bed as a share of belt speed. */
    BED_SPEED_RATIO("bedSpeedRatio"),
    /** Depth at design throughput, design speed and registered geometry (m). */
    DESIGN_DEPTH("designDepthM"),
    /** Depth against which the bed is judged (m). */
    REFERENCE_DEPTH("referenceDepthM"),
    /** Length over which the feed comes to belt speed (m). */
    ACCELERATION_LENGTH("accelerationLengthM"),
    /** Energy of the skirts in a year of loaded hours (Wh). */
    ENERGY("energyWhPerYear"),
    /** What that energy costs, where it is electrical and the site knows a price (the site's currency). */
    COST("energyCostPerYear"),
    /** CO₂ of that energy, likewise (kg). */
    CO2("co2KgPerYear");

    private final String key;

    Result(String key) {
        this.key = key;
    }

    /** The result of that key. */
    public static Optional<Result> ofKey(String key) {
        return Stream.of(values()).filter(result -> result.key.equals(key)).findFirst();
    }

    /** Whether it is a multiple of the skirt drag, and uncertain with it. */
    public boolean followsDrag() {
        return switch (this) {
            case SKIRT_DRAG, SKIRT_POWER, DRIVE_POWER, DRIVE_SHARE, RUNNING_SHARE, ENERGY, COST, CO2 -> true;
            default -> false;
        };
    }

    public String key() {
        return key;
    }
}
