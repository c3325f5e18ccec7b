package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.quantity.Quantity;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The table of materials, and what a plant's material takes from it: one that names a row by {@code reference} takes
 * the numbers that it does not state itself. Of a range it takes the middle, with the standard uncertainty of a range
 * that is equally likely all over (JCGM 100, 4.3.7); of the angle of repose follows the surcharge angle.
 */
final class ReferenceMaterials {
    private static final MathContext DIGITS = new MathContext(4);
    private static final BigDecimal TWO = BigDecimal.valueOf(2);

    private final Branch file;

    ReferenceMaterials(Branch file) {
        this.file = file;
    }

    /**
     * The plant with its materials filled in.
     *
     * @throws Refused {@code reference-material-unknown}, {@code reference-material-left-out}; the place is a pointer
     *                 within the plant
     */
    Branch filled(Branch plant) {
        if (!plant.has("materials")) {
            return plant;
        }
        List<Node> materials = new ArrayList<>();
        List<Branch> rows = plant.branches("materials");
        for (int i = 0; i < rows.size(); i++) {
            Branch material = rows.get(i);
            Pointer place = Pointer.of("materials").child(i);
            materials.add(Refused.below(place, () -> material.text("reference"))
                    .map(id -> filled(material, id, place.child("reference"))).orElse(material));
        }
        return plant.with("materials", new Node.Series(materials));
    }

    /** Every row with a density and a surcharge angle, as a material that names it and is filled in from it. */
    List<Branch> complete(String language) {
        return file.branches("properties").stream().map(row -> {
            String id = row.text("id").orElseThrow();
            String name = row.branch("name").flatMap(names -> names.text(language).or(() -> names.text("en"))).orElse(id);
            return filled(Branch.EMPTY.with("id", id).with("name", name).with("reference", id), id,
                    Pointer.of("reference"));
        }).filter(material -> material.has("bulkDensity") && material.has("surchargeAngle")).toList();
    }

    private Branch filled(Branch material, String id, Pointer place) {
        Optional<Branch> factor = row("factors", id);
        Optional<Branch> properties = row("properties", id);
        if (factor.isEmpty() && properties.isEmpty()) {
            throw new Refused(Defect.at(place, row("leftOut", id).isPresent() ? "reference-material-left-out"
                    : "reference-material-unknown", id));
        }
        Branch filled = factor.map(row -> given(material, "skirtFrictionFactor", row.get("skirtFrictionFactor")))
                .orElse(material);
        if (properties.isEmpty()) {
            return filled;
        }
        Branch row = properties.get();
        Optional<Quantity> repose = row.branch("angleOfRepose").map(ReferenceMaterials::middle);
        filled = given(filled, "bulkDensity", row.branch("bulkDensity").map(range -> Branch.write(middle(range))));
        filled = given(filled, "angleOfRepose", repose.map(Branch::write));
        filled = given(filled, "surchargeAngle", repose.flatMap(this::surcharge));
        return given(filled, "wallFriction", row.get("wallFriction"));
    }

    private Optional<Branch> row(String list, String id) {
        return file.branches(list).stream().filter(row -> row.text("id").equals(Optional.of(id))).findFirst();
    }

    private static Branch given(Branch material, String key, Optional<? extends Node> value) {
        return material.has(key) || value.isEmpty() ? material : material.with(key, value.get());
    }

    private static Quantity middle(Branch range) {
        Quantity from = range.quantity("from").orElseThrow();
        Quantity to = range.quantity("to").orElseThrow();
        BigDecimal upper = from.unit().convert(to.value(), to.unit());
        Quantity middle = Quantity.of(from.value().add(upper).divide(TWO, MathContext.DECIMAL64), from.unit());
        double spread = upper.subtract(from.value()).doubleValue() / 2 / Math.sqrt(3);
        return spread == 0 ? middle : new Quantity(middle.value(), middle.unit(), middle.entered(),
                Optional.of(new BigDecimal(spread).round(DIGITS)), middle.quality(), middle.at(), middle.beltState());
    }

    private Optional<Node> surcharge(Quantity repose) {
        return file.branches("surcharges").stream()
                .filter(row -> Quantity.BY_SIZE.compare(row.quantity("fromRepose").orElseThrow(), repose) <= 0)
                .max((one, other) -> Quantity.BY_SIZE.compare(one.quantity("fromRepose").orElseThrow(),
                        other.quantity("fromRepose").orElseThrow()))
                .flatMap(row -> row.get("surchargeAngle"));
    }
}
