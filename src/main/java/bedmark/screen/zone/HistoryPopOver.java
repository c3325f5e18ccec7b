package bedmark.screen.zone;

import bedmark.document.Node;
import bedmark.quantity.BeltState;
import bedmark.quantity.Quality;
import bedmark.quantity.Quantity;
import bedmark.screen.pad.PadText;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Weight;
import bedmark.wording.Wording;
import java.time.OffsetDateTime;
import java.time.format.DateTimeFormatter;
import java.time.format.FormatStyle;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import javafx.scene.control.Label;
import javafx.scene.control.ScrollPane;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;
import javafx.util.Duration;
import org.controlsfx.control.PopOver;

/** What happened to one field: how its reading is taken, what the last survey found, who entered what and when. */
final class HistoryPopOver {
    private final ZoneModel model;
    private final Wording wording;
    private final SlotWords words;
    private final PopOver popOver = new PopOver();

    HistoryPopOver(ZoneModel model, Wording wording) {
        this.model = model;
        this.wording = wording;
        this.words = new SlotWords(wording, model.setting().register());
        popOver.setDetachable(false);
        popOver.setAutoHide(true);
        popOver.setHideOnEscape(true);
        popOver.setAnimated(false);
        popOver.setFadeInDuration(Duration.ZERO);
    }

    /** Shows what happened to a cell, beside the box that it is filled in at. */
    void show(Slot slot, Region box, boolean portrait) {
        popOver.setArrowLocation(portrait ? PopOver.ArrowLocation.BOTTOM_CENTER : PopOver.ArrowLocation.LEFT_TOP);
        popOver.setContentNode(content(slot));
        popOver.show(box);
    }

    void hide() {
        popOver.hide();
    }

    private VBox content(Slot slot) {
        VBox lines = new VBox();
        lines.getStyleClass().add("history-lines");
        slot.field().head().help().ifPresent(help ->
                lines.getChildren().add(text("help", help.in(wording.words().language()))));
        model.answer(slot).flatMap(SlotWords::quantity).map(this::marks).filter(marks -> !marks.isEmpty())
                .ifPresent(marks -> lines.getChildren().add(text("marks", marks)));
        model.lastAnswer(slot).map(last -> words.shown(slot, Optional.of(last))).map(HistoryPopOver::joined)
                .filter(shown -> !shown.isEmpty())
                .ifPresent(shown -> lines.getChildren().add(text("last", wording.text("zone.history-last", shown))));
        List<FieldHistory.Step> steps = model.historyOf(slot);
        if (steps.isEmpty()) {
            lines.getChildren().add(text("none", wording.text("zone.history-none")));
        }
        steps.forEach(step -> lines.getChildren().add(step(slot, step)));
        ScrollPane scroll = new ScrollPane(lines);
        scroll.setFitToWidth(true);
        scroll.setHbarPolicy(ScrollPane.ScrollBarPolicy.NEVER);
        scroll.getStyleClass().add("form-scroll");
        Label title = text("card-title", words.label(slot));
        ActionButton close = new ActionButton(Weight.PLAIN, wording.text("zone.history-close"), popOver::hide);
        close.setId("history-close");
        close.setMaxWidth(Double.MAX_VALUE);
        VBox content = new VBox(title, scroll, close);
        content.setId("history");
        content.getStyleClass().add("history");
        return content;
    }

    private VBox step(Slot slot, FieldHistory.Step step) {
        String before = shown(slot, step.before());
        String after = shown(slot, step.after());
        Label change = text("change", wording.text(step.undone() ? "zone.history-undone" : "zone.history-change",
                before, after));
        VBox entry = new VBox(change, text("who", wording.text("zone.history-who", time(step.at()), step.person())));
        entry.getStyleClass().add("history-step");
        return entry;
    }

    private String shown(Slot slot, Optional<Node> value) {
        String joined = joined(words.shown(slot, value));
        return joined.isEmpty() ? wording.text("zone.history-nothing") : joined;
    }

    private static String joined(SlotWords.Shown shown) {
        return (PadText.shown(shown.value()) + " " + shown.unit()).strip();
    }

    /** Quality, belt state and time of a reading. */
    private String marks(Quantity reading) {
        Optional<String> quality = reading.quality().map(Quality::code)
                .map(code -> wording.text("screen.quality." + code));
        Optional<String> belt = reading.beltState().map(BeltState::code).map(code -> wording.text("screen.belt." + code));
        return String.join(" \u00B7 ", Stream.of(quality, belt, reading.at().map(this::time))
                .flatMap(Optional::stream).toList());
    }

    private String time(OffsetDateTime at) {
        return DateTimeFormatter.ofLocalizedDateTime(FormatStyle.MEDIUM, FormatStyle.SHORT)
                .withLocale(wording.words().locale()).format(at);
    }

    private static Label text(String style, String words) {
        Label label = new Label(words);
        label.getStyleClass().add(style);
        label.setWrapText(true);
        label.setMinHeight(Region.USE_PREF_SIZE);
        return label;
    }
}
