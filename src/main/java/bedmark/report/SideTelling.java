package bedmark.report;

import bedmark.engine.Result;
import bedmark.engine.uncertainty.Estimate;
import bedmark.office.Conflict;
import bedmark.quantity.Dimension;
import bedmark.wording.Wording;
import java.util.ArrayList;
import java.util.List;

/** A conflict and its sides in words, for the screen and for the terminal alike. */
public final class SideTelling {
    private static final String NOTHING = "–";

    private final Wording wording;

    public SideTelling(Wording wording) {
        this.wording = wording;
    }

    /** What clashes, in one sentence. */
    public String kind(Conflict conflict) {
        return wording.text("office.side.kind." + conflict.kind().code());
    }

    /** Who recorded a side and when, where it came from, and what it comes to. */
    public List<String> side(Conflict.Side side) {
        List<String> lines = new ArrayList<>();
        String revision = Integer.toString(side.copy().revision());
        lines.add(side.survey().completedAt().map(at -> wording.text("office.side.completed", revision,
                wording.moment(at))).orElseGet(() -> wording.text("office.side.open", revision)));
        lines.add(wording.text("office.side.from", side.survey().inspector().filter(name -> !name.isBlank())
                .orElse(NOTHING), side.device().isBlank() ? NOTHING : side.device()));
        lines.add(side.judged().map(judged -> {
            String level = wording.text("verdict.level." + judged.level().code());
            return judged.get(Result.SKIRT_DRAG).map(Estimate::value).map(drag -> wording.text("office.side.result",
                    level, wording.computed(drag, wording.unit(Dimension.FORCE)))).orElse(level);
        }).orElseGet(() -> wording.text("office.side.no-result")));
        return lines;
    }
}
