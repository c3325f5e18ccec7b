package bedmark.index.office;

import bedmark.survey.merge.ZoneId;

/**
 * How people know a loading zone, by the register that holds today. All may be empty but the tag.
 *
 * @param plant       the plant's name
 * @param area        the area's name
 * @param conveyor    the receiving conveyor's id
 * @param conveyorTag its tag
 * @param tag         the transfer point's tag
 * @param asset       its number in the site's maintenance system
 * @param material    the name of the material that the register expects
 * @param registered  whether the register still holds the zone
 */
public record ZoneNames(ZoneId zone, String plant, String area, String conveyor, String conveyorTag, String tag,
                        String asset, String material, boolean registered) {

    /** Of a zone that the register does not hold. */
    static ZoneNames unregistered(ZoneId zone, String plant) {
        return new ZoneNames(zone, plant, "", "", "", zone.transfer(), "", "", false);
    }
}
