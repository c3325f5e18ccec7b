package bedmark.screen.round;

import bedmark.screen.Heads;
import bedmark.screen.Listening;
import bedmark.screen.Navigator;
import bedmark.screen.Screen;
import bedmark.screen.Workplace;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.FootBar;
import bedmark.screen.part.RoundTicks;
import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.Icon;
import bedmark.screen.theme.LevelGlyph;
import bedmark.screen.theme.LevelShape;
import bedmark.survey.InspectionStatus;
import bedmark.wording.Wording;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Label;
import javafx.scene.control.ScrollPane;
import javafx.scene.layout.BorderPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;
import org.controlsfx.control.textfield.CustomTextField;

/** The round: its stops in walking order, grouped by area; beside them what was found so far. */
public final class RoundView implements Screen {
    private final Workplace workplace;
    private final RoundModel model;
    private final Navigator navigator;
    private final Wording wording;
    private final Listening listening = new Listening();
    private final VBox list = new VBox();
    private final VBox summary = new VBox();
    private final BorderPane body = new BorderPane();
    private final CustomTextField search = new CustomTextField();
    private final VBox head;
    private final FootBar foot;

    public RoundView(Workplace workplace, RoundModel model, Navigator navigator) {
        this.workplace = workplace;
        this.model = model;
        this.navigator = navigator;
        this.wording = workplace.wording();
        this.head = Heads.head(workplace, listening, model.round().name(), workplace.site().register().name());
        this.foot = footBar();
        list.getStyleClass().add("rows");
        ScrollPane scroll = new ScrollPane(list);
        scroll.setFitToWidth(true);
        scroll.getStyleClass().add("form-scroll");
        VBox.setVgrow(scroll, Priority.ALWAYS);
        VBox stops = new VBox(searchField(), scroll);
        stops.getStyleClass().add("stops");
        summary.getStyleClass().add("summary");
        body.getStyleClass().add("round-body");
        body.setCenter(stops);
        listening.to(model.shownProperty(), rows -> layOut());
        listening.onChange(model.rowsProperty(), rows -> summarise());
        summarise();
    }

    private CustomTextField searchField() {
        search.setId("search");
        search.setPromptText(wording.text("screen.round.search"));
        search.setAccessibleText(wording.text("screen.round.search"));
        search.textProperty().bindBidirectional(model.searchProperty());
        return search;
    }

    private void layOut() {
        list.getChildren().clear();
        String area = null;
        for (RoundRow row : model.shownProperty().get()) {
            if (!row.area().equals(area)) {
                area = row.area();
                list.getChildren().add(new SectionHeader(area));
            }
            list.getChildren().add(stop(row));
        }
        if (list.getChildren().isEmpty()) {
            Label nothing = new Label(wording.text("screen.round.nothing-found"));
            nothing.setWrapText(true);
            list.getChildren().add(nothing);
        }
    }

    private HBox stop(RoundRow row) {
        LevelGlyph glyph = new LevelGlyph(shape(row));
        Label tag = new Label(row.tag());
        tag.getStyleClass().add("tag");
        Label what = new Label(row.what());
        what.getStyleClass().add("what");
        VBox names = new VBox(tag, what);
        names.setAlignment(Pos.CENTER_LEFT);
        HBox.setHgrow(names, Priority.ALWAYS);
        names.setMinWidth(0);
        Label state = new Label(state(row));
        state.getStyleClass().add("state");
        state.setMinWidth(Region.USE_PREF_SIZE);
        HBox content = new HBox(glyph, names, state);
        content.getStyleClass().add("stop");
        content.setAlignment(Pos.CENTER_LEFT);
        ActionButton open = new ActionButton(Weight.PLAIN, "", () -> navigator.toZone(model, row));
        open.setGraphic(content);
        open.setContentDisplay(ContentDisplay.GRAPHIC_ONLY);
        open.setId("stop-" + row.transfer());
        open.setAccessibleText(row.tag() + ", " + row.what() + ", " + state(row));
        open.setMaxWidth(Double.MAX_VALUE);
        content.prefWidthProperty().bind(open.widthProperty().subtract(36));
        HBox.setHgrow(open, Priority.ALWAYS);
        HBox line = new HBox(open);
        line.getStyleClass().add("row");
        if (row.progress() == RoundRow.Progress.TO_DO || row.progress() == RoundRow.Progress.BEGUN) {
            ActionButton skip = new ActionButton(Weight.QUIET, wording.text("screen.round.skip"), () -> askWhy(row));
            skip.setId("skip-" + row.transfer());
            line.getChildren().add(skip);
        }
        return line;
    }

    private static LevelShape shape(RoundRow row) {
        return row.level().isEmpty() ? LevelShape.NOT_INSPECTED
                : LevelShape.valueOf(row.level().toUpperCase(Locale.ROOT).replace('-', '_'));
    }

    private String state(RoundRow row) {
        String last = row.lastLevel().isEmpty() ? wording.text("screen.round.never")
                : wording.text("screen.round.last", wording.text("verdict.level." + row.lastLevel()));
        return switch (row.progress()) {
            case TO_DO -> last;
            case BEGUN -> wording.text("screen.round.begun") + "\n" + last;
            case DONE -> wording.text("verdict.level." + (row.level().isEmpty() ? "incomplete" : row.level()))
                    + "\n" + last;
            case SKIPPED -> wording.text("screen.status." + row.survey().orElseThrow().inspectionStatus().code())
                    + "\n" + last;
        };
    }

    /** Skipping needs a reason: the four that happen, each one press. */
    private void askWhy(RoundRow row) {
        VBox pane = new VBox(new SectionHeader(wording.text("screen.round.skip-why", row.tag())));
        pane.getStyleClass().add("choice-pane");
        Map<String, InspectionStatus> reasons = new LinkedHashMap<>();
        reasons.put("not-accessible", InspectionStatus.NOT_ACCESSIBLE);
        reasons.put("not-running", InspectionStatus.NOT_INSPECTED);
        reasons.put("not-safe", InspectionStatus.NOT_INSPECTED);
        reasons.put("not-present", InspectionStatus.NOT_APPLICABLE);
        reasons.forEach((reason, status) -> {
            String words = wording.text("screen.round.reason." + reason);
            ActionButton button = new ActionButton(Weight.PLAIN, words, () -> {
                model.skip(row, status, words);
                summarise();
            });
            button.setId("reason-" + reason);
            button.setMaxWidth(Double.MAX_VALUE);
            pane.getChildren().add(button);
        });
        ActionButton back = new ActionButton(Weight.QUIET, wording.text("screen.cancel"), this::summarise);
        back.setId("reason-cancel");
        back.setMaxWidth(Double.MAX_VALUE);
        pane.getChildren().add(back);
        summary.getChildren().setAll(pane);
    }

    private void summarise() {
        Map<LevelShape, Integer> counts = new EnumMap<>(LevelShape.class);
        model.rowsProperty().get().forEach(row -> counts.merge(shape(row), 1, Integer::sum));
        summary.getChildren().setAll(new SectionHeader(wording.text("screen.round.found")));
        for (LevelShape shape : List.of(LevelShape.OVERLOADED, LevelShape.UNDECIDED, LevelShape.INCOMPLETE,
                LevelShape.NEAR, LevelShape.WITHIN, LevelShape.NOT_INSPECTED)) {
            LevelGlyph glyph = new LevelGlyph(shape);
            Label word = new Label(wording.text("verdict.level." + shape.styleClass()));
            HBox.setHgrow(word, Priority.ALWAYS);
            word.setMaxWidth(Double.MAX_VALUE);
            Label count = new Label(wording.format().computed(counts.getOrDefault(shape, 0), 0));
            count.getStyleClass().add("count");
            HBox line = new HBox(glyph, word, count);
            line.getStyleClass().add("summary-line");
            line.setAlignment(Pos.CENTER_LEFT);
            summary.getChildren().add(line);
        }
        ActionButton export = ActionButton.with(Icon.EXPORT, ContentDisplay.LEFT, Weight.PLAIN,
                wording.text("screen.round.export"), () -> navigator.toQueue(model));
        export.setId("to-queue");
        export.setMaxWidth(Double.MAX_VALUE);
        Label caution = new Label(wording.text("screen.caution.always"));
        caution.setWrapText(true);
        caution.setMinHeight(Region.USE_PREF_SIZE);
        summary.getChildren().addAll(export, caution);
    }

    private FootBar footBar() {
        RoundTicks ticks = new RoundTicks();
        listening.to(model.rowsProperty(), rows -> Ticks.show(ticks, rows, "", wording));
        ActionButton back = ActionButton.with(Icon.BACK, ContentDisplay.LEFT, Weight.QUIET,
                wording.text("screen.start.title"), navigator::toStart);
        back.setId("foot-back");
        Optional<RoundRow> next = model.nextToDo("");
        ActionButton onward = next.map(row -> ActionButton.with(Icon.NEXT, ContentDisplay.RIGHT, Weight.PRIMARY,
                        wording.text("screen.round.next", row.tag()), () -> navigator.toZone(model, row)))
                .orElseGet(() -> ActionButton.with(Icon.NEXT, ContentDisplay.RIGHT, Weight.PRIMARY,
                        wording.text("screen.round.export"), () -> navigator.toQueue(model)));
        onward.setId("foot-next");
        return new FootBar(Optional.of(back), Optional.of(ticks), Optional.of(onward));
    }

    @Override
    public Node head() {
        return head;
    }

    @Override
    public Node body() {
        return body;
    }

    @Override
    public Node foot() {
        return foot;
    }

    @Override
    public void turned(boolean portrait) {
        body.setRight(null);
        body.setBottom(null);
        summary.getStyleClass().setAll("summary", portrait ? "portrait" : "landscape");
        if (portrait) {
            body.setBottom(summary);
        } else {
            body.setRight(summary);
        }
    }

    @Override
    public void shown() {
        body.requestFocus();
    }

    @Override
    public void left() {
        search.textProperty().unbindBidirectional(model.searchProperty());
        listening.end();
    }
}
