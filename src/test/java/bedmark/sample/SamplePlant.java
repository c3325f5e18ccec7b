package bedmark.sample;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.function.BiFunction;

/**
 * The register of the demo plant: an invented lime and clinker works that burns coal and wood chips. Its load-out came
 * with drawings in inches, and is kept in them.
 */
final class SamplePlant {
    private static final List<String> TEXTS = List.of("id", "name", "area", "conveyor", "from", "material",
            "speedClass");
    private static final List<String> NUMBERS = List.of("skirtFrictionFactor", "wallFriction", "driveEfficiency",
            "motorEfficiency", "loadedHoursPerYear");
    private static final List<String> FLAGS = List.of("freeFlowing", "highAirFlow");

    private SamplePlant() {
    }

    /** The {@code plant} object of a bundle. */
    static Branch document() {
        return Branch.EMPTY
                .with("id", "ostermere")
                .with("name", "Ostermere Lime and Clinker Works")
                .with("areas", rows("areas", (row, branch) -> branch))
                .with("materials", rows("materials", (row, branch) -> branch))
                .with("conveyors", rows("conveyors", (row, branch) -> tagged(branch, "CV")))
                .with("transfers", rows("transfers", (row, branch) -> noted(tagged(branch, "LZ"))))
                .with("limits", Branch.EMPTY.with("skirts-over-budget", Branch.EMPTY.with("near", decimal("0.12"))))
                .with("sealRates", Node.Series.of(Branch.EMPTY.with("type", "oblique")
                        .with("condition", "over-tightened").with("multiplier", decimal("1.6"))))
                .with("instruments", Node.Series.of(Branch.EMPTY.with("kind", "belt-scale")
                        .with("relative", decimal("0.015"))))
                .with("tariff", Branch.EMPTY.with("currency", "EUR").with("energy", decimal("0.14")))
                .with("co2Factor", decimal("0.32"));
    }

    private static Node.Series rows(String table, BiFunction<SampleTable.Row, Branch, Branch> finish) {
        List<Node> items = new ArrayList<>();
        for (SampleTable.Row row : SampleTable.read(table).rows()) {
            Branch branch = Branch.EMPTY;
            for (Map.Entry<String, String> cell : row.cells().entrySet()) {
                if (row.find(cell.getKey()).isPresent()) {
                    branch = branch.with(cell.getKey(), value(cell.getKey(), cell.getValue()));
                }
            }
            items.add(finish.apply(row, branch));
        }
        return new Node.Series(items);
    }

    private static Node value(String head, String cell) {
        if (TEXTS.contains(head)) {
            return Node.text(cell);
        } else if (NUMBERS.contains(head)) {
            return decimal(cell);
        } else if (FLAGS.contains(head)) {
            return Node.flag(cell.equals("yes"));
        }
        Quantity quantity = SampleQuantity.parse(cell);
        return Branch.write(quantity);
    }

    /** The id is the tag; the asset's number in the maintenance system follows from its digits. */
    private static Branch tagged(Branch branch, String kind) {
        String tag = branch.text("id").orElseThrow();
        String digits = "000" + tag.replaceAll("\\D", "");
        Branch begun = Branch.EMPTY.with("id", tag).with("tag", tag)
                .with("assetId", "OST-" + kind + "-" + digits.substring(digits.length() - 3));
        for (Map.Entry<String, Node> member : branch.without("id").members().entrySet()) {
            begun = begun.with(member.getKey(), member.getValue());
        }
        return begun;
    }

    /** What the office wants to be known at two of the points, and what it knows to be open at a third. */
    private static Branch noted(Branch transfer) {
        return switch (transfer.text("id").orElseThrow()) {
            case "TP-12" -> transfer.with("officeNotes", Node.Series.of(Branch.EMPTY
                    .with("text", "The left inspection door sticks. Ask the control room for the key of the right one.")
                    .with("by", "plant office").with("at", "2026-09-15")));
            case "TP-19" -> transfer.with("officeNotes", Node.Series.of(Branch.EMPTY
                    .with("text", "New boards since August: take the spacing anew, and photograph both ends.")
                    .with("by", "plant office").with("at", "2026-09-18")))
                    .with("openActions", Node.Series.of(Branch.EMPTY
                            .with("what", "Renew the right seal over its whole length").with("who", "raw mix fitter")
                            .with("by", "2026-09-18").with("workOrder", "WO-26-0877")
                            .with("assetId", transfer.text("assetId").orElseThrow())
                            .with("seal", Branch.EMPTY.with("type", "vertical").with("width", length("200", Unit.MILLIMETRE))
                                    .with("thickness", length("15", Unit.MILLIMETRE))
                                    .with("length", length("6.5", Unit.METRE)).with("pieces", Node.number(2)))));
            default -> transfer;
        };
    }

    private static Quantity length(String number, Unit unit) {
        return Quantity.of(new BigDecimal(number), unit);
    }

    private static Node decimal(String number) {
        return Node.number(new BigDecimal(number));
    }
}
