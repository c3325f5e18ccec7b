package bedmark.screen.zone;

import bedmark.engine.Assessment;
import bedmark.engine.Engine;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.Weight;
import bedmark.survey.Survey;
import bedmark.wording.CalculationSheet;
import bedmark.wording.SheetPart;
import bedmark.wording.Wording;
import javafx.scene.control.Label;
import javafx.scene.control.ScrollPane;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/** The calculation sheet of a transfer point: every formula with its numbers, set for the width that there is. */
final class WorkingPane extends VBox {

    /** @param found what came of the survey as it stands */
    WorkingPane(ZoneSetting setting, Survey survey, Assessment found, Wording wording, Runnable close) {
        getStyleClass().addAll("rules", "working");
        VBox list = new VBox();
        list.getStyleClass().add("rows");
        new CalculationSheet(wording, setting.form()).parts(survey, found,
                Engine.explain(setting.assessor().zone(survey), setting.assessor().settings()))
                .forEach(part -> list.getChildren().add(shown(part)));
        ScrollPane scroll = new ScrollPane(list);
        scroll.setId("working-sheet");
        scroll.setFitToWidth(true);
        scroll.getStyleClass().add("form-scroll");
        VBox.setVgrow(scroll, Priority.ALWAYS);
        ActionButton back = new ActionButton(Weight.PLAIN, wording.text("working.back"), close);
        back.setId("working-close");
        back.setMaxWidth(Double.MAX_VALUE);
        getChildren().addAll(new SectionHeader(wording.text("working.sheet")), scroll, back);
    }

    private static Region shown(SheetPart part) {
        if (part instanceof SheetPart.Heading heading) {
            Label head = styled(wrapped(heading.text()), "working-heading");
            head.setMaxWidth(Double.MAX_VALUE);
            return head;
        } else if (part instanceof SheetPart.Flow flow) {
            FlowPane items = new FlowPane();
            flow.items().forEach(item -> items.getChildren().add(wrapped(item)));
            return styled(items, "working-items");
        } else if (part instanceof SheetPart.Row row) {
            Label name = styled(wrapped(row.lead().isEmpty() ? row.name() : row.name() + " \u00B7 " + row.lead()),
                    "rule-name");
            return styled(new VBox(name, wrapped(row.text())), "working-row");
        }
        return wrapped(part instanceof SheetPart.Item item ? "\u2013 " + item.text()
                : ((SheetPart.Sentence) part).text());
    }

    private static <R extends Region> R styled(R region, String style) {
        region.getStyleClass().add(style);
        return region;
    }

    private static Label wrapped(String text) {
        Label label = new Label(text);
        label.setWrapText(true);
        label.setMinHeight(USE_PREF_SIZE);
        return label;
    }
}
