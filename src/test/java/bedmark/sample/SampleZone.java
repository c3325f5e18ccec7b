package bedmark.sample;

import bedmark.document.Branch;
import bedmark.quantity.Quantity;
import bedmark.survey.Register;

/** A loading zone of the demo plant as numbers in SI, from the register. */
final class SampleZone {
    private final Branch transfer;
    private final Branch conveyor;
    private final Branch material;

    /** @param material the id of what runs */
    SampleZone(Register register, String transfer, String material) {
        Register.Transfer found = register.transfer(transfer).orElseThrow();
        this.transfer = found.document();
        this.conveyor = register.conveyorOf(found).document();
        this.material = register.materials().get(material).document();
    }

    double transfer(String key) {
        return transfer.quantity(key).map(Quantity::si).orElseThrow();
    }

    double conveyor(String key) {
        return conveyor.quantity(key).map(Quantity::si).orElseThrow();
    }

    /** A plain number of the conveyor. */
    double share(String key) {
        return conveyor.number(key).orElseThrow().doubleValue();
    }

    /** The quantity of the transfer as it stands in the register. */
    Quantity written(String key) {
        return transfer.quantity(key).orElseThrow();
    }

    /** Length of the whole belt as it stands in the register. */
    Quantity beltLength() {
        return conveyor.quantity("beltLength").orElseThrow();
    }

    /** Bulk density that the register knows (kg/m³). */
    double density() {
        return material.quantity("bulkDensity").map(Quantity::si).orElseThrow();
    }

    double skirtFrictionFactor() {
        return material.number("skirtFrictionFactor").orElseThrow().doubleValue();
    }

    SampleTrough trough() {
        double spacing = transfer("skirtSpacing");
        double angle = conveyor("troughAngle");
        return new SampleTrough(spacing, angle == 0 ? spacing : conveyor("centreRollLength"), angle,
                material.quantity("surchargeAngle").map(Quantity::si).orElseThrow());
    }
}
