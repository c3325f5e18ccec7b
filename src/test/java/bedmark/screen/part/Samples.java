package bedmark.screen.part;

import bedmark.quantity.Quality;
import bedmark.screen.pad.PadNote;
import bedmark.screen.pad.PadSetup;
import bedmark.screen.pad.PadWords;
import bedmark.screen.theme.LevelShape;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalInt;

/** Words and values that fill parts in tests. */
public final class Samples {
    public static final PadSetup MILLIMETRES = new PadSetup('.', false, false,
            Optional.of(new PadSetup.Steps("−5", "+5")), Optional.of("mm | in"));
    public static final PadSetup INCHES = new PadSetup('.', false, true,
            Optional.of(new PadSetup.Steps("−¼", "+¼")), Optional.of("in | mm"));
    public static final PadWords WORDS = new PadWords("back", "next", "history", "undo", "take one sign away", "decimal point",
            "quarters", "turn the sign round", note -> note == PadNote.SECOND_DECIMAL_SIGN
                    ? "One decimal point is there already." : "refused: " + note.code());
    public static final Verdict OVERLOADED = new Verdict(LevelShape.OVERLOADED, "overloaded",
            "Overloaded: the bed is 1.8 times the depth laid out, and runs at half of belt speed.", "99 % sure",
            List.of(new Figure("drag of the boards", "1 329", "± 510 N"),
                    new Figure("power at the motor", "2.38", "± 0.92 kW"),
                    new Figure("of the 11 kW drive", "21.7", "%"), new Figure("leads", "bed", "58 %")),
            Optional.of("Free the bed: at belt speed the same 1 240 t/h lies 41 mm deep and saves 5.6 MWh a year."));
    public static final Verdict INCOMPLETE = new Verdict(LevelShape.INCOMPLETE, "incomplete",
            "Incomplete: the seals of the right side are missing.", "", List.of(
                    new Figure("drag of the boards", "–", ""), new Figure("power at the motor", "–", "")),
            Optional.of("Read the seals of the right side."));

    private Samples() {
    }

    public static String word(Quality quality) {
        return quality.name().toLowerCase(Locale.ROOT);
    }

    public static ReadingRow depth(String position, String value, String ghost, Quality quality, boolean active) {
        FieldBox box = new FieldBox("depth at " + position, () -> { });
        box.valueProperty().set(value);
        box.unitProperty().set("mm");
        box.ghostProperty().set(ghost);
        box.activeProperty().set(active);
        return new ReadingRow(position, ReadingRow.Lead.BESIDE, box,
                Optional.of(new QualityButton(quality, Samples::word, chosen -> { })));
    }

    public static RoundTicks ticks(int count) {
        List<RoundTicks.Tick> ticks = new ArrayList<>(List.of(RoundTicks.Tick.WITHIN, RoundTicks.Tick.WITHIN,
                RoundTicks.Tick.OVERLOADED, RoundTicks.Tick.NEAR, RoundTicks.Tick.SKIPPED, RoundTicks.Tick.UNDECIDED,
                RoundTicks.Tick.INCOMPLETE, RoundTicks.Tick.TO_DO));
        ticks.addAll(Collections.nCopies(count - ticks.size(), RoundTicks.Tick.TO_DO));
        RoundTicks strip = new RoundTicks();
        strip.show(ticks, OptionalInt.of(7));
        return strip;
    }
}
