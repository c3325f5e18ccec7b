package bedmark.screen.round;

import bedmark.document.Branch;
import bedmark.screen.AfterFrames;
import bedmark.screen.Heads;
import bedmark.screen.Navigator;
import bedmark.screen.SidedScreen;
import bedmark.screen.Workplace;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.CautionStrip;
import bedmark.screen.part.FootBar;
import bedmark.screen.part.Labels;
import bedmark.screen.part.Named;
import bedmark.screen.part.Plate;
import bedmark.screen.part.RoundTicks;
import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.Texts;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.Icon;
import bedmark.screen.theme.IconView;
import bedmark.screen.theme.LevelGlyph;
import bedmark.screen.theme.LevelShape;
import bedmark.survey.InspectionStatus;
import bedmark.wording.Wording;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import javafx.application.Platform;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Label;
import javafx.scene.control.ScrollPane;
import javafx.scene.control.ToggleButton;
import javafx.scene.layout.ColumnConstraints;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Pane;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.StackPane;
import javafx.scene.layout.VBox;
import org.controlsfx.control.textfield.CustomTextField;

/** The round: its stops in walking order, grouped by area; beside them what was found so far. */
public final class RoundView extends SidedScreen {
    /** How many stops are built before the screen is first drawn, about as many as it holds; one before the next. */
    private static final int IN_SIGHT = 8;
    private static final int BEFORE = 1;
    private static final int AT_A_TIME = 4;

    /** Which stops are built before the screen is first drawn. */
    public enum First {
        /** Those around the next one, since nothing is drawn yet and the person waits; the others follow. */
        IN_SIGHT,
        ALL
    }

    private final Workplace workplace;
    private final RoundModel model;
    private final Navigator navigator;
    private final Wording wording;
    private final VBox list = new VBox();
    private final VBox stops = new VBox();
    private final ScrollPane scroll = new ScrollPane(list);
    private boolean portrait;
    /** The stops that are in the list. */
    private int from;
    private int to;
    private boolean gone;
    private final CustomTextField search = new CustomTextField();

    public RoundView(Workplace workplace, RoundModel model, Navigator navigator, First first) {
        super("summary");
        this.workplace = workplace;
        this.model = model;
        this.navigator = navigator;
        this.wording = workplace.wording();
        ActionButton settings = ActionButton.with(Icon.SETTINGS, ContentDisplay.LEFT, Weight.PLAIN,
                wording.text("settings.title"), navigator::toSettings);
        settings.setId("to-settings");
        settings.getStyleClass().add("secondary-target");
        frame(Heads.head(workplace, listening, model.round().name(), workplace.site().register().name(), settings),
                footBar());
        list.getStyleClass().add("rows");
        scroll.setFitToWidth(true);
        scroll.getStyleClass().add("form-scroll");
        VBox.setVgrow(scroll, Priority.ALWAYS);
        stops.getChildren().setAll(finder(), scroll);
        stops.getStyleClass().add("stops");
        scroll.setFocusTraversable(false);
        side.getStyleClass().add("summary");
        body.getStyleClass().add("round-body");
        body.setCenter(stops);
        layOut(first);
        listening.onChange(model.shownProperty(), rows -> layOut(First.ALL));
        listening.onChange(model.rowsProperty(), rows -> summarise());
    }

    /** The search, and beside it which stops are shown at all. */
    private HBox finder() {
        HBox finder = new HBox(searchField(), shownStops("show-all", "walk.all", false),
                shownStops("show-waiting", "walk.waiting", true));
        finder.getStyleClass().add("row");
        HBox.setHgrow(search, Priority.ALWAYS);
        return finder;
    }

    private ToggleButton shownStops(String id, String key, boolean waiting) {
        ToggleButton button = new ToggleButton(wording.text(key));
        button.setId(id);
        button.getStyleClass().add("secondary-target");
        button.setMinWidth(Region.USE_PREF_SIZE);
        button.setOnAction(event -> {
            button.setSelected(true);
            model.waitingOnlyProperty().set(waiting);
        });
        listening.to(model.waitingOnlyProperty(), only -> button.setSelected(only == waiting));
        return button;
    }

    private CustomTextField searchField() {
        search.setId("search");
        search.setPromptText(wording.text("screen.round.search"));
        search.setAccessibleText(wording.text("screen.round.search"));
        search.getStyleClass().add("secondary-target");
        IconView glass = new IconView(Icon.FIND);
        StackPane left = new StackPane(glass);
        left.getStyleClass().add("search-icon");
        search.setLeft(left);
        search.textProperty().bindBidirectional(model.searchProperty());
        return search;
    }

    private void layOut(First built) {
        List<RoundRow> rows = model.shownProperty().get();
        boolean some = built == First.IN_SIGHT;
        int next = some ? model.nextToDo("").map(row -> model.index(row.transfer())).orElse(0) : 0;
        from = some ? Math.max(0, Math.min(next - BEFORE, rows.size() - IN_SIGHT)) : 0;
        to = some ? Math.min(rows.size(), from + IN_SIGHT) : rows.size();
        list.getChildren().setAll(lines(rows, from, to));
        whole();
    }

    /** The stops of a range, each area with its title before it. */
    private List<Node> lines(List<RoundRow> rows, int first, int end) {
        List<Node> lines = new ArrayList<>();
        for (int i = first; i < end; i++) {
            if (i == 0 || !rows.get(i).area().equals(rows.get(i - 1).area())) {
                lines.add(new SectionHeader(rows.get(i).area()));
            }
            lines.add(stop(rows.get(i)));
        }
        return lines;
    }

    /** Takes more stops into the list, behind and then before it; a few at a time, so that presses get their turn. */
    private void fillSome() {
        List<RoundRow> rows = model.shownProperty().get();
        if (gone || from == 0 && to == rows.size()) {
            return;
        }
        if (to < rows.size()) {
            int end = Math.min(rows.size(), to + AT_A_TIME);
            list.getChildren().addAll(lines(rows, to, end));
            to = end;
        } else {
            int start = Math.max(0, from - AT_A_TIME);
            list.getChildren().addAll(0, lines(rows, start, from));
            from = start;
        }
        whole();
        scroll.applyCss();
        scroll.layout();
        revealNext();
        Platform.runLater(this::fillSome);
    }

    /** Once all stops are in the list, it is told what else there is, or that there are none. */
    private void whole() {
        List<RoundRow> rows = model.shownProperty().get();
        if (from > 0 || to < rows.size()) {
            return;
        }
        if (rows.isEmpty()) {
            list.getChildren().add(Texts.wrapped(wording.text(model.rowsProperty().get().isEmpty() ? "first.no-stops"
                    : "screen.round.nothing-found")));
        }
        proposals();
    }

    /** What was found beside the register, and the way to propose more. */
    private void proposals() {
        List<Branch> proposals = model.proposals();
        if (!proposals.isEmpty()) {
            list.getChildren().add(new SectionHeader(wording.text("walk.proposed")));
        }
        for (int i = 0; i < proposals.size(); i++) {
            Branch proposal = proposals.get(i);
            Label tag = new Label(proposal.text("tag").orElse(""));
            tag.getStyleClass().add("tag");
            Label note = Labels.wrapped("what", proposal.text("note").or(() -> proposal.text("from")).orElse(""));
            VBox names = new VBox(tag, note);
            HBox.setHgrow(names, Priority.ALWAYS);
            ActionButton withdraw = new ActionButton(Weight.QUIET, wording.text("walk.withdraw"),
                    () -> model.withdraw(proposal, () -> layOut(First.ALL)));
            withdraw.setId("withdraw-" + i);
            withdraw.setAccessibleText(wording.text("walk.withdraw") + ": " + tag.getText());
            withdraw.getStyleClass().add("secondary-target");
            HBox row = new HBox(names, withdraw);
            row.getStyleClass().addAll("rule-row", "proposal");
            row.setAlignment(Pos.CENTER_LEFT);
            list.getChildren().add(row);
        }
        ActionButton propose = ActionButton.with(Icon.PLUS, ContentDisplay.LEFT, Weight.QUIET,
                wording.text("walk.propose"), this::propose);
        propose.setId("propose");
        propose.getStyleClass().add("secondary-target");
        propose.setMaxWidth(Double.MAX_VALUE);
        list.getChildren().add(propose);
    }

    private void propose() {
        ProposalForm form = new ProposalForm(wording, model, () -> {
            stops.getChildren().setAll(finder(), scroll);
            layOut(First.ALL);
        });
        stops.getChildren().setAll(form);
        form.begin();
    }

    private HBox stop(RoundRow row) {
        LevelGlyph glyph = new LevelGlyph(shape(row));
        Label tag = new Label(row.tag());
        tag.getStyleClass().add("tag");
        tag.setMinWidth(Region.USE_PREF_SIZE);
        Label what = new Label(row.what());
        what.getStyleClass().add("what");
        HBox first = new HBox(tag);
        first.getStyleClass().add("names");
        first.setAlignment(Pos.CENTER_LEFT);
        if (row.notes() > 0) {
            first.getChildren().add(new Plate(Plate.Tone.FAINT, wording.text("walk.notes", row.notes())));
        }
        VBox names = new VBox(first, what);
        names.setAlignment(Pos.CENTER_LEFT);
        HBox.setHgrow(names, Priority.ALWAYS);
        names.setMinWidth(0);
        HBox content = new HBox(glyph, names, states(row));
        content.getStyleClass().add("stop");
        content.setAlignment(Pos.CENTER_LEFT);
        ActionButton open = new ActionButton(Weight.PLAIN, "", () -> navigator.toZone(model, row));
        open.setGraphic(content);
        open.setContentDisplay(ContentDisplay.GRAPHIC_ONLY);
        Named.as(open, "stop-" + row.transfer());
        open.setAccessibleText(row.tag() + ", " + row.what() + ", " + now(row).map(now -> now + ", ").orElse("")
                + due(row).map(due -> due + ", ").orElse("") + last(row)
                + (row.notes() > 0 ? ", " + wording.text("walk.notes", row.notes()) : ""));
        open.getStyleClass().add("secondary-target");
        open.setMaxWidth(Double.MAX_VALUE);
        // Its content is as wide as the button: a width that it asked for itself would never become less again.
        open.setMinWidth(0);
        open.setPrefWidth(100);
        content.prefWidthProperty().bind(open.widthProperty().subtract(36));
        HBox.setHgrow(open, Priority.ALWAYS);
        HBox line = new HBox(open);
        line.getStyleClass().add("row");
        if (row.progress() == RoundRow.Progress.TO_DO || row.progress() == RoundRow.Progress.BEGUN) {
            ActionButton skip = new ActionButton(Weight.QUIET, wording.text("screen.round.skip"), () -> askWhy(row));
            Named.as(skip, "skip-" + row.transfer());
            skip.getStyleClass().add("secondary-target");
            line.getChildren().add(skip);
        }
        return line;
    }

    private static LevelShape shape(RoundRow row) {
        return row.level().isEmpty() ? LevelShape.NOT_INSPECTED
                : LevelShape.valueOf(row.level().toUpperCase(Locale.ROOT).replace('-', '_'));
    }

    /** What was found now stands out over what was found last time. */
    private VBox states(RoundRow row) {
        VBox states = new VBox();
        states.setAlignment(Pos.CENTER_RIGHT);
        now(row).ifPresent(words -> {
            Label now = new Label(words);
            now.getStyleClass().addAll("now", row.level().isEmpty() ? "none" : row.level());
            states.getChildren().add(now);
        });
        due(row).ifPresent(words -> {
            Label due = new Label(words);
            due.getStyleClass().addAll("now", row.overdue(model.today()) ? "overdue" : "due");
            states.getChildren().setAll(due);
        });
        Label last = new Label(row.last().flatMap(RoundRow.Last::on).isEmpty() ? last(row)
                : wording.text("walk.last-dated", level(row.last().get()), wording.day(row.last().get().on().get())));
        last.getStyleClass().addAll("state", "ghost");
        states.getChildren().add(last);
        states.setMinWidth(Region.USE_PREF_SIZE);
        return states;
    }

    private Optional<String> now(RoundRow row) {
        return switch (row.progress()) {
            case TO_DO -> Optional.empty();
            case BEGUN -> Optional.of(wording.text("screen.round.begun"));
            case DONE -> Optional.of(wording.text("verdict.level."
                    + (row.level().isEmpty() ? "incomplete" : row.level())));
            case SKIPPED -> Optional.of(wording.text("screen.status."
                    + row.survey().orElseThrow().inspectionStatus().code()));
        };
    }

    /** By when a stop that waits is to be done. */
    private Optional<String> due(RoundRow row) {
        return row.dueBy().filter(day -> row.waits()).map(day -> wording.text(row.overdue(model.today())
                ? "walk.overdue" : "walk.due", wording.day(day)));
    }

    private String level(RoundRow.Last last) {
        return wording.text("verdict.level." + (last.level().isEmpty() ? "incomplete" : last.level()));
    }

    private String last(RoundRow row) {
        return row.last().filter(last -> !last.level().isEmpty()).map(last -> {
            String level = level(last);
            return last.on().map(on -> wording.text("walk.last", level, wording.day(on)))
                    .orElseGet(() -> wording.text("screen.round.last", level));
        }).orElseGet(() -> wording.text("screen.round.never"));
    }

    /** Brings the stop where the walk goes on in sight, with the one before it. */
    private void revealNext() {
        model.nextToDo("").flatMap(row -> Named.find(list, "stop-" + row.transfer()))
                .ifPresent(stop -> {
                    double room = scroll.getViewportBounds().getHeight();
                    double all = list.getBoundsInLocal().getHeight();
                    double top = stop.getParent().getBoundsInParent().getMinY()
                            - stop.getParent().getBoundsInParent().getHeight() - list.getSpacing();
                    if (room > 0 && all > room) {
                        scroll.setVvalue(Math.max(0, Math.min(1, top / (all - room))));
                    }
                });
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
        side.getChildren().setAll(pane);
    }

    private void summarise() {
        Map<LevelShape, Integer> counts = new EnumMap<>(LevelShape.class);
        model.rowsProperty().get().forEach(row -> counts.merge(shape(row), 1, Integer::sum));
        GridPane found = new GridPane();
        found.getStyleClass().add("found");
        int columns = portrait ? 2 : 1;
        for (int i = 0; i < columns; i++) {
            ColumnConstraints column = new ColumnConstraints();
            column.setPercentWidth(100.0 / columns);
            found.getColumnConstraints().add(column);
        }
        side.getChildren().setAll(new SectionHeader(wording.text("screen.round.found")), found);
        int place = 0;
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
            found.add(line, portrait ? place / 3 : 0, portrait ? place % 3 : place);
            place++;
        }
        if (model.overdue() > 0) {
            side.getChildren().add(Labels.wrapped("overdue-count", wording.text("walk.overdue-count",
                    model.overdue())));
        }
        ActionButton end = ActionButton.with(Icon.FLAG, ContentDisplay.LEFT, Weight.PLAIN,
                wording.text("walk.finish"), () -> navigator.toFinish(model));
        end.setId("to-finish");
        ActionButton export = ActionButton.with(Icon.EXPORT, ContentDisplay.LEFT, Weight.PLAIN,
                wording.text("screen.round.export"), () -> navigator.toQueue(model));
        export.setId("to-queue");
        Pane ways = portrait ? new HBox(end, export) : new VBox(end, export);
        ways.getStyleClass().add("moves");
        for (ActionButton way : List.of(end, export)) {
            way.setMaxWidth(Double.MAX_VALUE);
            HBox.setHgrow(way, Priority.ALWAYS);
        }
        side.getChildren().addAll(ways, new CautionStrip(wording.text("screen.caution.always")));
    }

    private FootBar footBar() {
        RoundTicks ticks = new RoundTicks();
        listening.to(model.rowsProperty(), rows -> Ticks.show(ticks, rows, "", wording));
        ActionButton back = ActionButton.with(Icon.BACK, ContentDisplay.LEFT, Weight.QUIET,
                wording.text("screen.start.title"), navigator::toStart);
        back.setId("foot-back");
        ActionButton onward = ActionButton.with(Icon.NEXT, ContentDisplay.RIGHT, Weight.PRIMARY, "",
                () -> model.nextToDo("").ifPresentOrElse(row -> navigator.toZone(model, row),
                        () -> navigator.toFinish(model)));
        listening.to(model.rowsProperty(), rows -> {
            String words = model.nextToDo("").map(row -> wording.text("screen.round.next", row.tag()))
                    .orElse(wording.text("walk.finish"));
            onward.setText(words);
            onward.setAccessibleText(words);
        });
        onward.setId("foot-next");
        return new FootBar(Optional.of(back), Optional.of(ticks), Optional.of(onward));
    }

    @Override
    public void turned(boolean upright) {
        boolean asIs = portrait == upright && !side.getChildren().isEmpty();
        portrait = upright;
        if (!asIs) {
            summarise();
        }
        super.turned(upright);
    }

    @Override
    public void shown() {
        revealNext();
        body.requestFocus();
        listening.onEnd(AfterFrames.run(1, this::fillSome)::stop);
    }

    @Override
    public void left() {
        gone = true;
        search.textProperty().unbindBidirectional(model.searchProperty());
        super.left();
    }
}
