package bedmark.engine.flow;

import java.util.Optional;
import java.util.stream.Stream;

/** Materials by the belt speed that they bear (CEMA, recommended maximum belt speeds) [R]. */
public enum SpeedClass {
    /** Grain and other free-flowing material. */
    GRAIN_FREE_FLOWING("grain-free-flowing"),
    /** Coal, damp clay, soft ore, fine stone. */
    COAL_SOFT_ORE_FINE_STONE("coal-soft-ore-fine-stone"),
    /** Heavy, hard, sharp-edged ore, coarse stone. */
    HEAVY_HARD_SHARP_COARSE("heavy-hard-sharp-coarse");

    private final String code;

    SpeedClass(String code) {
        this.code = code;
    }

    /** The class of that code. */
    public static Optional<SpeedClass> ofCode(String code) {
        return Stream.of(values()).filter(speedClass -> speedClass.code.equals(code)).findFirst();
    }

    public String code() {
        return code;
    }
}
