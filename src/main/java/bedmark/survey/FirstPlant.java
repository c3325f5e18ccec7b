package bedmark.survey;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.quantity.Quantity;
import java.util.List;
import java.util.Optional;
import java.util.UUID;

/**
 * The least that a plant has to say of itself before a first transfer point can be judged: one belt, one loading zone
 * on it, one material. What the boards measure is read on the walk; the office adds everything else.
 *
 * @param name          of the plant
 * @param belt          tag of the conveyor
 * @param beltWidth     width of the belt, a length above zero
 * @param troughAngle   of the wing rolls, an angle from 0 (a flat belt) to below a right angle
 * @param centreRoll    length of the centre roll; needed with a trough, without meaning for a flat belt
 * @param tag           of the transfer point
 * @param from          what feeds it; empty where nobody said
 * @param material      a row of {@code materials} as in a bundle
 */
public record FirstPlant(String name, String belt, Quantity beltWidth, Quantity troughAngle,
                         Optional<Quantity> centreRoll, String tag, String from, Branch material) {

    /** @throws Refused {@code centre-roll-absent}, {@code centre-roll-beyond-belt} */
    public FirstPlant {
        boolean flat = troughAngle.si() == 0;
        if (!flat && centreRoll.isEmpty()) {
            throw new Refused(Defect.at(Pointer.of("conveyors", "0", "centreRollLength"), "centre-roll-absent"));
        }
        centreRoll.filter(roll -> !flat && roll.si() >= beltWidth.si()).ifPresent(roll -> {
            throw new Refused(Defect.at(Pointer.of("conveyors", "0", "centreRollLength"), "centre-roll-beyond-belt",
                    Double.toString(roll.si()), Double.toString(beltWidth.si())));
        });
    }

    /**
     * The act that puts the plant, the form and a round with its one stop into a store that has none.
     *
     * @param plant id of the plant, by which the office knows it from then on
     * @param round name of the round
     * @param form  the form that is asked with, whole
     */
    public Act.RegisterTaken act(UUID plant, String round, Branch form) {
        Branch conveyor = Branch.EMPTY.with("id", belt).with("tag", belt).with("beltWidth", beltWidth)
                .with("troughAngle", troughAngle);
        Branch transfer = Branch.EMPTY.with("id", tag).with("tag", tag).with("conveyor", belt)
                .with("material", material.text("id").orElseThrow());
        Branch register = Branch.EMPTY.with("id", plant.toString()).with("name", name)
                .with("materials", list(material))
                .with("conveyors", list(centreRoll.filter(roll -> troughAngle.si() != 0)
                        .map(roll -> conveyor.with("centreRollLength", roll)).orElse(conveyor)))
                .with("transfers", list(from.isEmpty() ? transfer : transfer.with("from", from)));
        return new Act.RegisterTaken(Branch.EMPTY.with("plant", new Register(register).document())
                .with("forms", list(form))
                .with("rounds", list(Branch.EMPTY.with("id", "first").with("name", round)
                        .with("points", list(Branch.EMPTY.with("transfer", tag))))));
    }

    private static Node list(Branch row) {
        return new Node.Series(List.of(row));
    }
}
