package bedmark.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import bedmark.survey.PlannedAction.SealOrder;
import java.math.BigDecimal;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;

class PlannedActionTest {
    private static final SealOrder ORDER = new SealOrder(Optional.of("vertical"), size("200", Unit.MILLIMETRE),
            size("9.50", Unit.INCH), size("6.5", Unit.METRE), OptionalInt.of(2));

    private static Optional<Quantity> size(String number, Unit unit) {
        return Optional.of(Quantity.of(new BigDecimal(number), unit));
    }

    @Test
    void everythingThatIsSaidComesBack() {
        PlannedAction action = PlannedAction.NONE.with("what", " Renew the seal ").with("who", "fitter")
                .with("workOrder", "WO-1").with("assetId", "A-1").withBy(Optional.of(LocalDate.of(2026, 9, 25)))
                .withSeal(ORDER);
        PlannedAction read = PlannedAction.of(Branch.EMPTY.with("actions", PlannedAction.series(List.of(action))),
                "actions").get(0);
        assertEquals("Renew the seal", read.what());
        assertEquals("fitter WO-1 A-1", read.who() + " " + read.workOrder() + " " + read.assetId());
        assertEquals(Optional.of(LocalDate.of(2026, 9, 25)), read.by());
        assertEquals(Optional.of(ORDER), read.seal());
        assertFalse(read.done());
        assertTrue(read.asDone().done());
    }

    @Test
    void whatThisVersionDoesNotKnowStays() {
        Branch foreign = Branch.EMPTY.with("what", "look").with("by", "next shutdown").with("crew", Node.number(3));
        PlannedAction read = new PlannedAction(foreign);
        assertEquals(Optional.empty(), read.by(), "words that are no day are no day");
        assertEquals(foreign, read.with("who", "").document());
        assertEquals("next shutdown", read.asDone().document().text("by").orElseThrow());
    }

    @Test
    void oddNumbersOfPiecesAndSizesAreNotBelieved() {
        Branch seal = Branch.EMPTY.with("pieces", Node.number(0)).with("width", "wide").with("length",
                Branch.EMPTY.with("value", Node.number(1)).with("unit", "furlong"));
        assertEquals(Optional.of(SealOrder.NONE), new PlannedAction(Branch.EMPTY.with("seal", seal)).seal());
        assertEquals(Branch.EMPTY, PlannedAction.NONE.withSeal(SealOrder.NONE).document());
    }

    @Test
    void theWorkOrderTellsActionsApartAndElseTheirWords() {
        PlannedAction plain = PlannedAction.NONE.with("what", "Renew the seal");
        PlannedAction ordered = plain.with("workOrder", "WO-1");
        assertTrue(plain.sameAs(PlannedAction.NONE.with("what", "renew the SEAL")));
        assertTrue(ordered.sameAs(PlannedAction.NONE.with("what", "something else").with("workOrder", "wo-1")));
        assertFalse(plain.sameAs(ordered));
    }
}
