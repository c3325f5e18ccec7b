package bedmark.screen.office;

import bedmark.report.ReportFile;
import bedmark.report.paper.PaperSize;
import bedmark.screen.Listening;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Texts;
import bedmark.screen.part.Weight;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.Function;
import javafx.beans.property.ObjectProperty;
import javafx.scene.control.Label;
import javafx.scene.control.ToggleButton;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.VBox;

/** The report, as a file of one's choice. */
final class ReportView extends VBox {
    private final Wording wording;
    private final Listening listening;

    ReportView(OfficeDesk desk, ReportModel model, Listening listening) {
        this.wording = desk.wording();
        this.listening = listening;
        getStyleClass().addAll("room", "report-choice");
        ActionButton write = new ActionButton(Weight.PRIMARY, wording.text("office.report.write"), () ->
                desk.folders().choose(wording.text("office.report.write"), Optional.empty()).ifPresent(model::write));
        write.setId("report-write");
        Label written = Texts.wrapped("");
        written.setId("report-written");
        listening.to(model.outcomeProperty(), outcome -> written.setText(outcome.map(one -> one.written()
                ? wording.text("office.report.written", one.file())
                : wording.text("office.report.stopped", one.file())).orElse("")));
        VBox paper = choice("paper", model.paperProperty(), List.of(PaperSize.values()), PaperSize::code, size ->
                wording.text("office.report.paper." + size.code()));
        listening.to(model.kindProperty(), kind -> paper.setDisable(kind != ReportFile.Kind.PDF));
        getChildren().addAll(Texts.wrapped(wording.text("office.report.what")),
                choice("kind", model.kindProperty(), List.of(ReportFile.Kind.values()), kind ->
                        kind.name().toLowerCase(Locale.ROOT), kind -> wording.text("office.report.kind."
                        + kind.name().toLowerCase(Locale.ROOT))),
                choice("language", model.languageProperty(), Words.LANGUAGES, Locale::getLanguage, locale ->
                        wording.text("office.report.language." + locale.getLanguage())),
                paper, new FlowPane(write), written);
    }

    private <T> VBox choice(String name, ObjectProperty<T> chosen, List<T> of, Function<T, String> code,
                            Function<T, String> shown) {
        Label label = new Label(wording.text("office.report." + name));
        label.getStyleClass().add("caption");
        FlowPane buttons = new FlowPane();
        buttons.getStyleClass().add("filters");
        for (T one : of) {
            ToggleButton button = new ToggleButton(shown.apply(one));
            button.setId("report-" + name + "-" + code.apply(one));
            button.setAccessibleText(wording.text("office.report." + name) + ": " + shown.apply(one));
            // What is chosen stays chosen when it is clicked once more.
            button.setOnAction(event -> {
                chosen.set(one);
                button.setSelected(true);
            });
            listening.to(chosen, now -> button.setSelected(code.apply(now).equals(code.apply(one))));
            buttons.getChildren().add(button);
        }
        VBox choice = new VBox(label, buttons);
        choice.getStyleClass().add("choice");
        return choice;
    }
}
