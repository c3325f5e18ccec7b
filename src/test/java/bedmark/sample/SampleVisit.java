package bedmark.sample;

import java.time.LocalDateTime;
import java.time.OffsetDateTime;
import java.time.ZoneId;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * One stop of one round: what the tables say of it.
 *
 * @param round id of the round
 * @param row   what really lay on the belt, and when
 * @param habit how the zone is read
 * @param said  everything else that was read, seen, done and written
 */
record SampleVisit(String round, SampleTable.Row row, SampleTable.Row habit, List<SampleTable.Row> said) {
    private static final ZoneId SITE = ZoneId.of("Europe/Berlin");

    /** The stops of a round in the order in which they were reached. */
    static List<SampleVisit> of(String round, String table) {
        SampleTable habits = SampleTable.read("habits");
        SampleTable said = SampleTable.read("said-" + table);
        return SampleTable.read("round-" + table).rows().stream().map(row -> new SampleVisit(round, row,
                habits.row("transfer", row.text("transfer")), said.rows("transfer", row.text("transfer")))).toList();
    }

    String transfer() {
        return row.text("transfer");
    }

    /** When the person arrived, to a second that the tables leave open. */
    OffsetDateTime time() {
        return LocalDateTime.parse(row.text("time")).plusSeconds(1 + Math.floorMod((round + transfer()).hashCode(), 19))
                .atZone(SITE).toOffsetDateTime();
    }

    /** The one fact of a kind. */
    Optional<String> said(String what) {
        return all(what).reduce((first, second) -> {
            throw new IllegalStateException(transfer() + " says " + what + " twice");
        });
    }

    /** All facts of a kind. */
    Stream<String> all(String what) {
        return said.stream().filter(fact -> fact.text("what").equals(what)).map(fact -> fact.text("how"));
    }

    /** The fact, else the habit. */
    String saidOrHabit(String what) {
        return said(what).orElseGet(() -> habit.text(what));
    }

    boolean inspected() {
        return said("status").isEmpty();
    }

    boolean completed() {
        return said("open").isEmpty();
    }

    /** Whether the belt was isolated for the depths. */
    boolean isolated() {
        return inspected() && saidOrHabit("quality").equals("measured");
    }
}
