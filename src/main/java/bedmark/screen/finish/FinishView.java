package bedmark.screen.finish;

import bedmark.document.Branch;
import bedmark.screen.Heads;
import bedmark.screen.Navigator;
import bedmark.screen.SidedScreen;
import bedmark.screen.Workplace;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.CautionStrip;
import bedmark.screen.part.Figure;
import bedmark.screen.part.FigureBlock;
import bedmark.screen.part.FootBar;
import bedmark.screen.part.Labels;
import bedmark.screen.part.Named;
import bedmark.screen.part.RoundTicks;
import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.Weight;
import bedmark.screen.round.RoundModel;
import bedmark.screen.round.RoundRow;
import bedmark.screen.round.Ticks;
import bedmark.screen.theme.Icon;
import bedmark.screen.theme.LevelGlyph;
import bedmark.screen.theme.LevelShape;
import bedmark.wording.Telling;
import bedmark.wording.Told;
import bedmark.wording.Wording;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import javafx.geometry.Pos;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Label;
import javafx.scene.control.ProgressBar;
import javafx.scene.control.ScrollPane;
import javafx.scene.control.ToggleButton;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** The end of a walk: what is overloaded, worst first; what is missing; what it takes in a year; the sign-off. */
public final class FinishView extends SidedScreen {
    private final Workplace workplace;
    private final FinishModel model;
    private final Navigator navigator;
    private final Wording wording;
    private final VBox found = new VBox();
    private final ActionButton finish;

    public FinishView(Workplace workplace, FinishModel model, Navigator navigator) {
        super("summary");
        this.workplace = workplace;
        this.model = model;
        this.navigator = navigator;
        this.wording = workplace.wording();
        RoundModel round = model.round();
        ActionButton back = ActionButton.with(Icon.BACK, ContentDisplay.LEFT, Weight.QUIET,
                wording.text("screen.round.title"), () -> navigator.toRound(round));
        back.setId("foot-back");
        finish = ActionButton.with(Icon.NEXT, ContentDisplay.RIGHT, Weight.PRIMARY,
                wording.text(model.finished() ? "finish.again" : "finish.finish"), this::finish);
        finish.setId("finish-walk");
        finish.disableProperty().bind(model.signedProperty().not());
        RoundTicks ticks = new RoundTicks();
        Ticks.show(ticks, round.rowsProperty().get(), "", wording);
        frame(Heads.head(workplace, listening, wording.text("finish.title"), round.round().name()),
                new FootBar(Optional.of(back), Optional.of(ticks), Optional.of(finish)));
        found.getStyleClass().add("questions");
        side.getStyleClass().add("summary");
        ScrollPane scroll = new ScrollPane(found);
        scroll.setFitToWidth(true);
        scroll.setFocusTraversable(false);
        scroll.getStyleClass().add("form-scroll");
        body.getStyleClass().add("finish-body");
        body.setCenter(scroll);
        listening.to(model.summaryProperty(), this::show);
    }

    private void finish() {
        finish.disableProperty().unbind();
        finish.setDisable(true);
        model.finish(() -> navigator.toQueue(model.round()));
    }

    private void show(Optional<FinishModel.Summary> judged) {
        found.getChildren().clear();
        side.getChildren().clear();
        if (judged.isEmpty()) {
            ProgressBar bar = new ProgressBar(ProgressBar.INDETERMINATE_PROGRESS);
            bar.setMaxWidth(Double.MAX_VALUE);
            bar.setAccessibleText(wording.text("finish.judging"));
            found.getChildren().addAll(Labels.wrapped("words", wording.text("finish.judging")), bar);
            return;
        }
        FinishModel.Summary summary = judged.get();
        SectionHeader worst = new SectionHeader(wording.text("finish.worst"));
        worst.asideProperty().set(wording.format().computed(summary.ranked().size(), 0));
        found.getChildren().add(worst);
        summary.ranked().forEach(one -> found.getChildren().add(ranked(one)));
        if (summary.ranked().isEmpty()) {
            found.getChildren().add(Labels.wrapped("words", wording.text("finish.none-over")));
        }
        SectionHeader missing = new SectionHeader(wording.text("finish.gaps"));
        missing.asideProperty().set(wording.format().computed(summary.gaps().size(), 0));
        found.getChildren().addAll(missing, gaps(summary.gaps()));
        List<Branch> proposals = model.proposals();
        if (!proposals.isEmpty()) {
            found.getChildren().add(new SectionHeader(wording.text("walk.proposed")));
            proposals.forEach(proposal -> found.getChildren().add(Labels.wrapped("words",
                    proposal.text("tag").orElse("") + proposal.text("note").map(note -> " \u00B7 " + note)
                            .orElse(""))));
        }
        total(summary.total());
        signOff(summary.gaps().size());
    }

    /** One zone: its level as a shape, its verdict as a sentence, the one action that helps most. */
    private HBox ranked(FinishModel.Judged judged) {
        Telling telling = model.telling(judged);
        Told told = telling.tell(judged.assessment());
        LevelShape shape = LevelShape.valueOf(judged.assessment().level().name());
        Label tag = Labels.label("tag", judged.row().tag());
        Label what = Labels.label("what", judged.row().what());
        HBox names = new HBox(tag, what);
        names.getStyleClass().add("names");
        names.setAlignment(Pos.BASELINE_LEFT);
        Label sentence = Labels.wrapped("verdict-line", told.sentence()
                + told.sure().map(sure -> " (" + sure + ")").orElse(""));
        sentence.getStyleClass().add(shape.styleClass());
        VBox words = new VBox(names, sentence);
        told.action().ifPresent(action -> words.getChildren().add(Labels.wrapped("action-line", action)));
        HBox.setHgrow(words, Priority.ALWAYS);
        ActionButton open = new ActionButton(Weight.PLAIN, wording.text("finish.open"),
                () -> navigator.toZone(model.round(), judged.row()));
        Named.as(open, "open-" + judged.row().transfer());
        open.setAccessibleText(wording.text("finish.open") + " " + judged.row().tag());
        open.getStyleClass().add("secondary-target");
        HBox row = new HBox(new LevelGlyph(shape), words, open);
        row.getStyleClass().addAll("rule-row", "ranked");
        row.setAlignment(Pos.CENTER_LEFT);
        return row;
    }

    private javafx.scene.Node gaps(List<RoundRow> gaps) {
        if (gaps.isEmpty()) {
            return Labels.wrapped("words", wording.text("finish.no-gaps"));
        }
        FlowPane tags = new FlowPane();
        tags.getStyleClass().add("gap-tags");
        for (RoundRow row : gaps) {
            boolean begun = row.progress() == RoundRow.Progress.BEGUN;
            ActionButton open = new ActionButton(Weight.PLAIN, begun
                    ? wording.text("finish.begun", row.tag()) : row.tag(), () -> navigator.toZone(model.round(), row));
            Named.as(open, "gap-" + row.transfer());
            open.getStyleClass().add("secondary-target");
            tags.getChildren().add(open);
        }
        ActionButton over = new ActionButton(Weight.PLAIN, wording.text("finish.hand-over"),
                () -> navigator.toStore(() -> navigator.toFinish(model.round())));
        over.setId("hand-over");
        over.getStyleClass().add("secondary-target");
        VBox box = new VBox(tags, over);
        box.getStyleClass().add("gaps");
        return box;
    }

    private void total(WalkTotal total) {
        side.getChildren().add(new SectionHeader(wording.text("finish.total")));
        if (total.zones() == 0) {
            side.getChildren().add(Labels.wrapped("words", wording.text("finish.no-energy")));
            return;
        }
        List<Figure> figures = new ArrayList<>();
        figures.add(new Figure(wording.text("finish.energy"), wording.format().computed(total.energyWh() / 1e6, 1),
                wording.text("finish.megawatt-hours")));
        if (total.cost().isPresent()) {
            figures.add(new Figure(wording.text("finish.cost"), wording.format().computed(total.cost().getAsDouble(),
                    0), total.currency().orElse("")));
        }
        if (total.co2Kg().isPresent()) {
            figures.add(new Figure(wording.text("finish.co2"), wording.format().computed(total.co2Kg().getAsDouble()
                    / 1000, 1), wording.text("finish.tonnes")));
        }
        if (total.savedWh() > 0) {
            figures.add(new Figure(wording.text("finish.saving"), wording.format().computed(total.savedWh() / 1e6, 1),
                    wording.text("finish.megawatt-hours")));
        }
        GridPane blocks = new GridPane();
        blocks.getStyleClass().add("total");
        for (int i = 0; i < figures.size(); i++) {
            FigureBlock block = new FigureBlock();
            block.show(figures.get(i));
            blocks.add(block, i % 2, i / 2);
        }
        side.getChildren().addAll(blocks, Labels.wrapped("words", wording.text("finish.over", total.zones())));
    }

    private void signOff(int gaps) {
        String person = workplace.preferences().person();
        ToggleButton sign = new ToggleButton(wording.text("finish.sign", person));
        sign.setId("sign-off");
        sign.setWrapText(true);
        sign.setMaxWidth(Double.MAX_VALUE);
        sign.setSelected(model.signedProperty().get());
        sign.setOnAction(event -> model.signedProperty().set(sign.isSelected()));
        side.getChildren().addAll(new SectionHeader(wording.text("finish.sign-off")),
                Labels.wrapped("words", gaps == 0 ? wording.text("finish.what-signed")
                        : wording.text("finish.what-signed-gaps", gaps)), sign,
                new CautionStrip(wording.text("screen.caution.always")));
    }
}
