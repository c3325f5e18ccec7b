package bedmark.screen.zone;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.form.FieldForm;
import bedmark.form.SpeedField.Way;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import java.nio.file.Path;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Rows are kept from one key to the next; nobody may see that they are. */
class SlotsTest {
    private static final int ACTS = 300;

    @TempDir
    private Path temp;

    @Test
    void rowsThatAreKeptAreThoseThatWouldBeLaidOutNow() throws Exception {
        Set<List<SlotRow>> seen = new HashSet<>();
        try (Fidget person = new Fidget(temp.resolve("store"))) {
            FieldForm form = person.model().setting().form();
            Slots kept = new Slots(form);
            for (int i = 0; i < ACTS; i++) {
                person.act();
                Branch survey = person.model().keptProperty().get();
                Way way = Way.values()[i / 7 % Way.values().length];
                List<SlotRow> rows = kept.rows(survey, field -> way);
                assertEquals(new Slots(form).rows(survey, field -> way), rows, "act " + i);
                seen.add(rows);
            }
        }
        assertTrue(seen.size() > 5, "rows come and go: " + seen.size());
    }

    @Test
    void answerThatBringsNoRowLeavesAllRowsAsTheyAre() throws Exception {
        try (Fidget person = new Fidget(temp.resolve("store"))) {
            Slots slots = new Slots(person.model().setting().form());
            Branch survey = Answers.change(Branch.EMPTY.with("readings", Branch.EMPTY), BedLines.depth(0), depth("262"))
                    .in(Branch.EMPTY.with("readings", Branch.EMPTY));
            List<SlotRow> rows = slots.rows(survey, field -> Way.DIRECT);
            Branch deeper = Answers.change(survey, BedLines.depth(0), depth("270")).in(survey);
            assertSame(rows, slots.rows(deeper, field -> Way.DIRECT));
            Branch longer = Answers.withLine(deeper, BedLines.TABLE, Branch.EMPTY).in(deeper);
            assertEquals(rows.size() + 1, slots.rows(longer, field -> Way.DIRECT).size());
        }
    }

    private static Optional<Node> depth(String millimetres) {
        return Optional.of(Branch.write(Quantity.of(millimetres, Unit.MILLIMETRE)));
    }
}
