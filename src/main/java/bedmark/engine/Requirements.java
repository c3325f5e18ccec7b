package bedmark.engine;

import java.util.Collection;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;

/** The readings without which there is no verdict, and everything else that a computation waits for. */
final class Requirements {
    private final ZoneFacts zone;

    Requirements(ZoneFacts zone) {
        this.zone = zone;
    }

    /**
     * The places of the required readings that are missing. A material needs a tabulated factor or an angle of repose
     * besides, since without one of them there is no drag to judge.
     */
    List<String> required(Deduced<?> materialDrag) {
        Set<String> missing = new LinkedHashSet<>(zone.zone().unfinished());
        missing.addAll(zone.length().missing());
        missing.addAll(zone.beltSpeed().missing());
        missing.addAll(zone.spacing().missing());
        missing.addAll(zone.height().missing());
        if (zone.zone().stations().isEmpty()) {
            missing.add(ZoneFacts.DEPTHS);
        }
        missing.addAll(zone.sealDrag().missing());
        missing.addAll(zone.number(Datum.BELT_WIDTH).missing());
        missing.addAll(zone.number(Datum.TROUGH_ANGLE).missing());
        if (!zone.isFlat()) {
            missing.addAll(zone.number(Datum.CENTRE_ROLL).missing());
        }
        missing.addAll(zone.number(Datum.BULK_DENSITY).missing());
        missing.addAll(zone.number(Datum.SURCHARGE_ANGLE).missing());
        if (materialDrag.missing().contains(Datum.ANGLE_OF_REPOSE.pointer()) && zone.settings().method().isEmpty()) {
            missing.add(Datum.SKIRT_FRICTION_FACTOR.pointer());
        }
        missing.addAll(materialDrag.missing());
        return withoutTheWhole(missing);
    }

    /** The required ones, then what else any of the numbers waits for. */
    List<String> all(List<String> required, Collection<? extends Deduced<?>> numbers) {
        Set<String> missing = new LinkedHashSet<>(required);
        for (Deduced<?> number : numbers) {
            missing.addAll(number.missing());
        }
        return withoutTheWhole(missing);
    }

    /** Where a row or a part was begun, it is that one which is missing, and not the whole again. */
    private List<String> withoutTheWhole(Set<String> missing) {
        if (isBegun(ZoneFacts.DEPTHS + "/")) {
            missing.remove(ZoneFacts.DEPTHS);
        }
        if (isBegun("/readings/beltTiming/") || isBegun("/readings/pulleySpeed/")) {
            missing.remove(Datum.BELT_SPEED.pointer());
        }
        return List.copyOf(missing);
    }

    private boolean isBegun(String beginning) {
        for (String place : zone.zone().unfinished()) {
            if (place.startsWith(beginning)) {
                return true;
            }
        }
        return false;
    }
}
