package bedmark.command;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.json.JsonWriter;
import bedmark.office.Conflict;
import bedmark.report.SideTelling;
import bedmark.wording.Wording;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.util.List;

/** The conflicts that wait, as text and as JSON lines. */
final class ConflictText {
    private final Wording wording;
    private final SideTelling telling;

    ConflictText(Wording wording) {
        this.wording = wording;
        this.telling = new SideTelling(wording);
    }

    void print(List<Conflict> conflicts, PrintWriter out) {
        for (Conflict conflict : conflicts) {
            out.println(Wording.plain(wording.text("office.settle.zone", conflict.names().plant(),
                    conflict.names().zone().plant(), conflict.names().tag(), conflict.names().zone().transfer(),
                    telling.kind(conflict))));
            conflict.sides().forEach(side -> out.println("  " + Wording.plain(line(side))));
        }
        out.println(wording.text("office.settle.count", conflicts.size()));
    }

    private String line(Conflict.Side side) {
        return side.copy().digest() + "  " + String.join("; ", telling.side(side));
    }

    /** One conflict as a JSON object in one line; what is not known is absent. */
    static String json(Conflict conflict) {
        Branch branch = Branch.EMPTY.with("plantId", conflict.names().zone().plant())
                .with("plant", conflict.names().plant()).with("transfer", conflict.names().zone().transfer())
                .with("tag", conflict.names().tag()).with("kind", conflict.kind().code())
                .with("sides", new Node.Series(conflict.sides().stream().map(ConflictText::document).toList()));
        return new String(JsonWriter.compact(branch), StandardCharsets.UTF_8);
    }

    private static Node document(Conflict.Side side) {
        Branch branch = Branch.EMPTY.with("digest", side.copy().digest()).with("survey", side.copy().id().toString())
                .with("revision", Node.number(side.copy().revision()));
        branch = side.survey().inspector().isPresent()
                ? branch.with("inspector", side.survey().inspector().get()) : branch;
        branch = side.survey().completedAt().isPresent()
                ? branch.with("completedAt", Node.time(side.survey().completedAt().get())) : branch;
        return side.level().isPresent() ? branch.with("level", side.level().get().code()) : branch;
    }
}
