package bedmark.document;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.quantity.BeltState;
import bedmark.quantity.Quality;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import java.math.BigDecimal;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class BranchTest {

    @Test
    void quantityComesBackWithAllThatIsKnownOfIt() {
        Quantity quantity = new Quantity(new BigDecimal("9.50"), Unit.INCH, Optional.of("9 1/2"),
                Optional.of(new BigDecimal("0.10")), Optional.of(Quality.SUSPECT),
                Optional.of(OffsetDateTime.parse("2026-03-01T08:30:00+01:00")), Optional.of(BeltState.ISOLATED));
        assertEquals(quantity, Branch.EMPTY.with("depth", quantity).quantity("depth").orElseThrow());
    }

    @Test
    void quantityIsReadOnceAndAnewWhereAKeyOfItChanged() {
        Branch depth = Branch.EMPTY.with("value", Node.number(262)).with("unit", "mm").with("quality", "measured");
        assertSame(depth.asQuantity(), depth.asQuantity());
        assertEquals(Optional.of(Quality.SUSPECT), depth.with("quality", "suspect").asQuantity().quality());
        assertEquals(Optional.empty(), depth.without("quality").asQuantity().quality());
        assertEquals(Optional.of(Quality.MEASURED), depth.asQuantity().quality());
    }

    @Test
    void whatIsNoQuantityIsRefusedEachTimeItIsAsked() {
        Branch depth = Branch.EMPTY.with("value", Node.number(262));
        assertThrows(Refused.class, depth::asQuantity);
        assertThrows(Refused.class, depth::asQuantity);
    }

    @Test
    void refusalOfAQuantityNamesTheKeyInside() {
        Branch branch = Branch.EMPTY.with("beltSpeed",
                Branch.EMPTY.with("value", Node.number(2)).with("unit", "furlong"));
        Defect defect = assertThrows(Refused.class, () -> branch.quantity("beltSpeed")).defect();
        assertEquals(Defect.at(Pointer.parse("/beltSpeed/unit"), "unit-unknown", "furlong"), defect);
    }

    @Test
    void timesAlwaysHaveTheirSeconds() {
        assertEquals(Node.text("2026-03-01T08:30:00+01:00"),
                Node.time(OffsetDateTime.parse("2026-03-01T08:30+01:00")));
    }

    @Test
    void valueIsSetAndTakenAwayAtAPlace() {
        Pointer place = Pointer.parse("/readings/beltSpeed");
        Branch set = Branch.EMPTY.with(place, Node.text("fast"));
        assertEquals(Optional.of(Node.text("fast")), set.at(place));
        assertFalse(set.without(place).at(place).isPresent());
        assertTrue(set.without(place).has("readings"));
    }

    @Test
    void pointerEscapesAsRfc6901Says() {
        Pointer pointer = Pointer.of("a/b", "m~n", "0");
        assertEquals("/a~1b/m~0n/0", pointer.toString());
        assertEquals(pointer, Pointer.parse(pointer.toString()));
    }

    @Test
    void itemsOfListsAreReachedByTheirIndex() {
        Branch branch = Branch.EMPTY.with("list", new Node.Series(List.of(Node.text("a"), Node.text("b"))));
        assertEquals(Optional.of(Node.text("b")), branch.at(Pointer.parse("/list/1")));
        assertFalse(branch.at(Pointer.parse("/list/2")).isPresent());
        assertFalse(branch.at(Pointer.parse("/list/01")).isPresent());
    }

    @Test
    void valueOfTheWrongKindIsRefusedNotConverted() {
        Branch branch = Branch.EMPTY.with("n", "12");
        assertEquals("kind-wrong", assertThrows(Refused.class, () -> branch.number("n")).defect().code());
    }
}
