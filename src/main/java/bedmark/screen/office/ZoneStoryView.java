package bedmark.screen.office;

import bedmark.office.Answered;
import bedmark.office.FindingLine;
import bedmark.office.trend.Measure;
import bedmark.office.trend.Series;
import bedmark.report.TrendTelling;
import bedmark.screen.Listening;
import bedmark.screen.office.ZoneStoryModel.Story;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Texts;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.Icon;
import bedmark.screen.theme.LevelGlyph;
import bedmark.survey.OfficeDeed;
import bedmark.wording.Wording;
import java.util.Optional;
import javafx.beans.property.StringProperty;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.Scene;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Label;
import javafx.scene.control.ScrollPane;
import javafx.scene.control.TextField;
import javafx.scene.control.ToggleButton;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** One loading zone in the office: its story as a chart, its findings, its actions, its conflicts. */
final class ZoneStoryView extends ScrollPane {
    private final ZoneStoryModel model;
    private final Wording wording;
    private final TrendTelling telling;
    private final Runnable back;
    private final VBox content = new VBox();
    private final TextField reason = new TextField();
    private final DayField until;
    private final TextField actionText;
    private final TextField actionOwner;
    private final TextField actionOrder;
    private final DayField actionDue;
    private final TextField clashReason;
    private Measure measure = Measure.DEPTH;

    ZoneStoryView(OfficeDesk desk, ZoneStoryModel model, Listening listening, Runnable back) {
        this.model = model;
        this.wording = desk.wording();
        this.telling = new TrendTelling(wording);
        this.back = back;
        content.getStyleClass().add("room");
        setContent(content);
        setFitToWidth(true);
        reason.setId("reason");
        reason.textProperty().bindBidirectional(model.draft().reason);
        until = new DayField(wording, "until", wording.text("office.story.until"), model.draft().until);
        actionText = field("action-text", "office.story.what", model.draft().action);
        actionOwner = field("action-owner", "office.story.owner", model.draft().owner);
        actionOrder = field("action-order", "office.story.order", model.draft().order);
        actionDue = new DayField(wording, "action-due", wording.text("office.story.due"), model.draft().due);
        clashReason = field("clash-reason", "office.story.reason", model.draft().clashReason);
        listening.to(model.storyProperty(), story -> show());
    }

    private void show() {
        Optional<Node> focused = Optional.ofNullable(getScene()).map(Scene::getFocusOwner).filter(this::holds);
        fill();
        // The screen is made anew around the person, who goes on where they were.
        focused.ifPresent(one -> Optional.ofNullable(one.getId()).map(id -> content.lookup("#" + id)).orElse(this)
                .requestFocus());
    }

    private boolean holds(Node node) {
        return node != null && (node == content || holds(node.getParent()));
    }

    private void fill() {
        content.getChildren().clear();
        model.storyProperty().get().ifPresent(story -> content.getChildren().addAll(head(story), chart(story),
                findings(story), actions(story)));
        model.storyProperty().get().filter(story -> !story.conflicts().isEmpty()).ifPresent(story ->
                content.getChildren().add(clashes(story)));
    }

    private Node head(Story story) {
        ActionButton list = ActionButton.with(Icon.BACK, ContentDisplay.LEFT, Weight.PLAIN,
                wording.text("office.story.back"), back);
        list.setId("back");
        Label name = new Label(story.ranked().names().tag() + "  ›  " + story.ranked().names().conveyorTag());
        name.getStyleClass().add("story-name");
        Label place = new Label(wording.text("office.place." + story.ranked().place().code()));
        place.getStyleClass().add("zone-name");
        VBox words = new VBox(name, place);
        if (story.own().isPresent()) {
            words.getChildren().add(soft(telling.judged(story.own(), story.today())));
        }
        words.setMinWidth(0);
        HBox.setHgrow(words, Priority.ALWAYS);
        HBox head = new HBox(new LevelGlyph(ZoneCell.shape(story.ranked().place())), words, list);
        head.getStyleClass().add("zone-row");
        head.setAlignment(Pos.CENTER_LEFT);
        return head;
    }

    private static Label soft(String text) {
        Label label = Texts.wrapped(text);
        label.getStyleClass().add("soft");
        return label;
    }

    private Node chart(Story story) {
        FlowPane measures = new FlowPane();
        measures.getStyleClass().add("filters");
        VBox box = section("office.story.trend", measures);
        Optional<Series> shown = story.trend().series().stream().filter(one -> one.measure() == measure).findFirst()
                .or(() -> story.trend().series().stream().findFirst());
        for (Series series : story.trend().series()) {
            ToggleButton button = new ToggleButton(wording.text("office.measure." + series.measure().code()));
            button.setId("measure-" + series.measure().code());
            button.setSelected(shown.filter(series::equals).isPresent());
            button.setOnAction(event -> {
                measure = series.measure();
                show();
            });
            measures.getChildren().add(button);
        }
        shown.ifPresentOrElse(series -> {
            box.getChildren().addAll(new TrendChart(series, story.trend().changes(), value ->
                    telling.value(series.measure(), value)), soft(telling.drawn(series, story.trend().changes())));
            telling.outlook(series).forEach(line -> box.getChildren().add(Texts.wrapped(line)));
        }, () -> box.getChildren().add(Texts.wrapped(wording.text("office.worst.never"))));
        telling.around(story.trend(), Optional.empty(), Optional.empty()).forEach(line ->
                box.getChildren().add(soft(line)));
        return box;
    }

    private VBox section(String key, Node... nodes) {
        Label title = new Label(wording.text(key));
        title.getStyleClass().add("section-title");
        VBox box = new VBox(title);
        box.getStyleClass().add("section");
        box.getChildren().addAll(nodes);
        return box;
    }

    private Node findings(Story story) {
        VBox box = section("office.story.findings");
        if (story.ranked().findings().isEmpty()) {
            box.getChildren().add(Texts.wrapped(wording.text("office.story.no-findings")));
            return box;
        }
        reason.setPromptText(wording.text("office.story.reason"));
        reason.setAccessibleText(wording.text("office.story.reason"));
        HBox.setHgrow(reason, Priority.ALWAYS);
        HBox decision = new HBox(reason, until);
        decision.getStyleClass().add("decision");
        box.getChildren().add(decision);
        for (FindingLine line : story.ranked().findings()) {
            box.getChildren().add(finding(story, line));
        }
        return box;
    }

    private Node finding(Story story, FindingLine line) {
        Optional<Answered> answered = story.ranked().answers().stream().filter(one -> one.rule() == line.rule())
                .findFirst();
        String words = wording.text("rule." + line.rule().code()) + ": "
                + wording.text("verdict.level." + line.level().code());
        VBox text = new VBox(Texts.wrapped(words));
        answered.ifPresent(one -> text.getChildren().add(Texts.wrapped(wording.text("office.story.answer."
                + one.answer().code(), one.person(), until(one),
                one.reason()))));
        text.setMinWidth(0);
        text.setAlignment(Pos.CENTER_LEFT);
        HBox.setHgrow(text, Priority.ALWAYS);
        HBox row = new HBox(text);
        row.getStyleClass().add("finding-row");
        row.setAlignment(Pos.CENTER_LEFT);
        if (answered.isPresent()) {
            row.getChildren().add(button("reopen-" + line.rule().code(), "office.story.reopen", () ->
                    model.reopen(line.rule(), reason.getText())));
        } else {
            row.getChildren().addAll(
                    button("accept-" + line.rule().code(), "office.story.accept", () -> until.read(day ->
                            model.answer(line.rule(), OfficeDeed.Answer.ACCEPTED, reason.getText(), day))),
                    button("shelve-" + line.rule().code(), "office.story.shelve", () -> until.read(day ->
                            model.answer(line.rule(), OfficeDeed.Answer.SHELVED, reason.getText(), day))));
        }
        return row;
    }

    private String until(Answered answered) {
        return answered.until().map(day -> wording.text("office.story.until.day", wording.day(day)))
                .orElseGet(() -> wording.text("office.story.until.open"));
    }

    private ActionButton button(String id, String key, Runnable action) {
        ActionButton button = new ActionButton(Weight.PLAIN, wording.text(key), action);
        button.setId(id);
        return button;
    }

    private Node actions(Story story) {
        VBox box = section("office.story.actions");
        for (OfficeDeed.ActionSet action : story.actions()) {
            Label words = Texts.wrapped(wording.text("office.story.action", action.text(), action.owner().isBlank()
                    ? "–" : action.owner(), action.due().map(wording::day).orElse("–"),
                    action.workOrder().isBlank() ? "–" : action.workOrder()));
            words.setMinWidth(0);
            words.setMaxWidth(Double.MAX_VALUE);
            HBox.setHgrow(words, Priority.ALWAYS);
            HBox row = new HBox(words, button("done-" + action.action(), "office.story.done", () ->
                    model.done(action)));
            row.getStyleClass().add("finding-row");
            row.setAlignment(Pos.CENTER_LEFT);
            box.getChildren().add(row);
        }
        FlowPane form = new FlowPane(actionText, actionOwner, actionDue, actionOrder, button("action-add",
                "office.story.add", () -> actionDue.read(day -> model.act(actionText.getText(), actionOwner.getText(),
                day, actionOrder.getText(), this::added))));
        form.getStyleClass().add("action-form");
        box.getChildren().add(form);
        return box;
    }

    /** What was typed has become an action; before that it stays, whatever else is decided. */
    private void added() {
        actionText.clear();
        actionOwner.clear();
        model.draft().due.set("");
        actionOrder.clear();
    }

    private TextField field(String id, String key, StringProperty text) {
        TextField field = new TextField();
        field.setId(id);
        field.textProperty().bindBidirectional(text);
        field.setPromptText(wording.text(key));
        field.setAccessibleText(wording.text(key));
        return field;
    }

    private Node clashes(Story story) {
        VBox box = section("office.story.clashes");
        box.getChildren().add(clashReason);
        story.conflicts().forEach(conflict -> box.getChildren().add(new ConflictView(conflict, story.forms(), wording,
                digest -> model.settle(digest, clashReason.getText()))));
        return box;
    }
}
