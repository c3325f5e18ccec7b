package bedmark.screen.zone;

import bedmark.engine.Assessment;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Level;
import bedmark.form.FieldForm;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.LevelGlyph;
import bedmark.screen.theme.LevelShape;
import bedmark.wording.Telling;
import bedmark.wording.Wording;
import java.util.Comparator;
import java.util.OptionalDouble;
import javafx.geometry.Pos;
import javafx.scene.control.Label;
import javafx.scene.control.ScrollPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** Every rule that was judged, the worst first: what was observed, its limits, how likely it is over them. */
final class RulesPane extends VBox {

    RulesPane(Assessment found, Wording wording, FieldForm form, Runnable working, Runnable close) {
        getStyleClass().add("rules");
        Telling telling = new Telling(wording, form);
        VBox list = new VBox();
        list.getStyleClass().add("rows");
        found.findings().stream()
                .sorted(Comparator.comparing(Finding::level, Comparator.reverseOrder()))
                .forEach(finding -> list.getChildren().add(row(finding, telling, wording)));
        if (!found.missing().isEmpty()) {
            list.getChildren().add(new SectionHeader(wording.text("screen.rules.missing")));
            found.missing().forEach(name -> list.getChildren().add(wrapped(wording.reading(name, form))));
        }
        if (!found.assumptions().isEmpty()) {
            list.getChildren().add(new SectionHeader(wording.text("screen.rules.assumptions")));
            found.assumptions().forEach(assumption ->
                    list.getChildren().add(wrapped(wording.assumption(assumption, form))));
        }
        ScrollPane scroll = new ScrollPane(list);
        scroll.setFitToWidth(true);
        scroll.getStyleClass().add("form-scroll");
        VBox.setVgrow(scroll, Priority.ALWAYS);
        ActionButton back = new ActionButton(Weight.PLAIN, wording.text("screen.rules.close"), close);
        back.setId("rules-close");
        back.setMaxWidth(Double.MAX_VALUE);
        ActionButton show = new ActionButton(Weight.PLAIN, wording.text("working.show"), working);
        show.setId("show-working");
        show.setMaxWidth(Double.MAX_VALUE);
        getChildren().addAll(new SectionHeader(wording.text("screen.rules.title")), scroll, show, back);
    }

    private static HBox row(Finding finding, Telling telling, Wording wording) {
        LevelGlyph glyph = new LevelGlyph(LevelShape.valueOf(finding.level().name()));
        Label name = wrapped(wording.text("rule." + finding.code()));
        name.getStyleClass().add("rule-name");
        Label clause = wrapped(telling.clause(finding) + "." + limits(finding, telling, wording));
        VBox words = new VBox(name, clause);
        HBox.setHgrow(words, Priority.ALWAYS);
        Label level = new Label(telling.level(finding.level()) + probability(finding, wording));
        level.setMinWidth(USE_PREF_SIZE);
        HBox row = new HBox(glyph, words, level);
        row.getStyleClass().add("rule-row");
        row.setAlignment(Pos.CENTER_LEFT);
        return row;
    }

    private static String limits(Finding finding, Telling telling, Wording wording) {
        StringBuilder limits = new StringBuilder();
        finding.near().ifPresent(near -> limits.append(" ").append(wording.text("screen.rules.near",
                telling.limit(finding, near))));
        finding.overloaded().ifPresent(over -> limits.append(" ").append(wording.text("screen.rules.over",
                telling.limit(finding, over))));
        return limits.append(" ").append(wording.text(finding.assumption() ? "screen.rules.source-assumed"
                : "screen.rules.source", finding.source())).toString();
    }

    private static String probability(Finding finding, Wording wording) {
        boolean over = finding.level() == Level.OVERLOADED || finding.level() == Level.UNDECIDED;
        OptionalDouble probability = over ? finding.probabilityOverloaded() : finding.probabilityNear();
        return probability.isPresent() ? "\n" + wording.text(over ? "screen.rules.likely-over"
                : "screen.rules.likely-near", wording.probability(probability.getAsDouble())) : "";
    }

    private static Label wrapped(String text) {
        Label label = new Label(text);
        label.setWrapText(true);
        label.setMinHeight(USE_PREF_SIZE);
        return label;
    }
}
