package bedmark.office;

import static org.junit.jupiter.api.Assertions.assertEquals;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import bedmark.survey.Survey;
import java.math.BigDecimal;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/** What the sides of a conflict say differently. */
class DifferenceTest {
    private static final Branch SURVEY = Offices.sample("round-under-way").document().branches("surveys").stream()
            .filter(one -> one.text("transfer").equals(Optional.of("TP-08"))).findFirst().orElseThrow();
    private static final Pointer LENGTH = Pointer.of("readings", "loadingZoneLength");

    private static List<String> places(Branch other) {
        return Difference.among(List.of(new Survey(SURVEY), new Survey(other))).stream()
                .map(one -> one.place().toString()).toList();
    }

    private static Branch length(String value, Unit unit) {
        Branch held = (Branch) SURVEY.at(LENGTH).orElseThrow();
        Branch typed = Branch.write(Quantity.of(new BigDecimal(value), unit));
        return SURVEY.with(LENGTH, held.with("value", typed.get("value").orElseThrow())
                .with("unit", typed.get("unit").orElseThrow()));
    }

    @Test
    void theSameRecordedOnceMoreDiffersInNothing() {
        assertEquals(List.of(), places(SURVEY.with("revision", Node.number(9)).with("inspector", "Somebody Else")
                .without("assessment")));
    }

    @Test
    void aReadingInAnotherNumberOrUnitDiffersOnce() {
        assertEquals(List.of("/readings/loadingZoneLength"), places(length("9.75", Unit.METRE)));
        assertEquals(List.of("/readings/loadingZoneLength"), places(length("6.40", Unit.FOOT)));
        assertEquals(List.of("/readings/loadingZoneLength/quality"),
                places(SURVEY.with(LENGTH.child("quality"), Node.text("suspect"))));
    }

    @Test
    void readingsComeFirstAndWhatOneSideLacksIsNothingThere() {
        Branch other = length("9.75", Unit.METRE).with("notes", "told otherwise").without("photos");
        List<Difference> found = Difference.among(List.of(new Survey(other), new Survey(SURVEY)));
        assertEquals(List.of("/readings/loadingZoneLength", "/notes", "/photos"), found.stream()
                .map(one -> one.place().toString()).toList());
        assertEquals(Optional.empty(), found.get(2).values().get(0));
        assertEquals(Optional.of(Node.text("told otherwise")), found.get(1).values().get(0));
    }
}
