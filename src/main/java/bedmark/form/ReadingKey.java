package bedmark.form;

import bedmark.quantity.Dimension;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * The keys of a survey that have a meaning outside the form, so that a field with such a key must be of the right
 * kind and in the right group.
 */
public enum ReadingKey {
    LOADING_ZONE_LENGTH("loadingZoneLength", Group.READINGS, "quantity", Dimension.LENGTH),
    BELT_SPEED(SpeedField.KEY, Group.READINGS, "speed"),
    SKIRT_SPACING("skirtSpacing", Group.READINGS, "quantity", Dimension.LENGTH),
    SKIRT_HEIGHT("skirtHeight", Group.READINGS, "quantity", Dimension.LENGTH),
    BED_DEPTHS(StationsField.KEY, Group.READINGS, "stations"),
    SEALS(SealsField.KEY, Group.READINGS, "seals"),
    THROUGHPUT("throughput", Group.READINGS, "quantity", Dimension.MASS_FLOW),
    RUNNING_POWER("runningPower", Group.READINGS, "quantity", Dimension.POWER),
    MATERIAL_RUNNING("materialRunning", Group.READINGS, "text"),
    MOISTURE("moisture", Group.READINGS, "quantity", Dimension.RATIO),
    NOTES("notes", Group.SURVEY, "text"),
    PERMIT("permit", Group.SURVEY, "text");

    private final String key;
    private final Group group;
    private final String kind;
    private final Optional<Dimension> dimension;

    ReadingKey(String key, Group group, String kind) {
        this(key, group, kind, Optional.empty());
    }

    ReadingKey(String key, Group group, String kind, Dimension dimension) {
        this(key, group, kind, Optional.of(dimension));
    }

    ReadingKey(String key, Group group, String kind, Optional<Dimension> dimension) {
        this.key = key;
        this.group = group;
        this.kind = kind;
        this.dimension = dimension;
    }

    public static Optional<ReadingKey> ofKey(String key) {
        return Stream.of(values()).filter(reading -> reading.key.equals(key)).findFirst();
    }

    public String key() {
        return key;
    }

    public Group group() {
        return group;
    }

    /** The kind of the field, as in form files. */
    public String kind() {
        return kind;
    }

    /** What a quantity of this key measures. */
    public Optional<Dimension> dimension() {
        return dimension;
    }
}
