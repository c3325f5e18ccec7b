package bedmark.photo;

import java.util.Optional;
import java.util.stream.Stream;

/** How a picture is to be turned to stand upright, as the Exif standard counts it (CIPA DC-008, tag 0x0112). */
public enum Orientation {
    UPRIGHT(1, 0, false),
    MIRRORED(2, 0, true),
    HALF_TURN(3, 180, false),
    MIRRORED_HALF_TURN(4, 180, true),
    MIRRORED_LEFT(5, 270, true),
    RIGHT(6, 90, false),
    MIRRORED_RIGHT(7, 90, true),
    LEFT(8, 270, false);

    private final int code;
    private final int degrees;
    private final boolean mirrored;

    Orientation(int code, int degrees, boolean mirrored) {
        this.code = code;
        this.degrees = degrees;
        this.mirrored = mirrored;
    }

    static Optional<Orientation> ofCode(int code) {
        return Stream.of(values()).filter(one -> one.code == code).findFirst();
    }

    /** How far to turn the picture clockwise, once it is mirrored: 0, 90, 180 or 270. */
    public int degrees() {
        return degrees;
    }

    /** Whether left and right are to be changed first. */
    public boolean mirrored() {
        return mirrored;
    }
}
