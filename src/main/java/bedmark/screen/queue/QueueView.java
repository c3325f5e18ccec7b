package bedmark.screen.queue;

import bedmark.index.Export;
import bedmark.index.SurveyLine;
import bedmark.screen.Heads;
import bedmark.screen.Navigator;
import bedmark.screen.SidedScreen;
import bedmark.screen.Workplace;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.FootBar;
import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.Weight;
import bedmark.screen.round.RoundModel;
import bedmark.screen.theme.Icon;
import bedmark.screen.theme.LevelGlyph;
import bedmark.screen.theme.LevelShape;
import bedmark.survey.InspectionStatus;
import bedmark.survey.Register;
import bedmark.wording.Wording;
import java.nio.file.Path;
import java.time.format.DateTimeFormatter;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Label;
import javafx.scene.control.ProgressBar;
import javafx.scene.control.ScrollPane;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/** The way to the office: completed surveys into the queue, the queue into a folder or onto a stick, the receipt. */
public final class QueueView extends SidedScreen {
    private static final DateTimeFormatter TIME = DateTimeFormatter.ofPattern("yyyy-MM-dd HH:mm");

    private static final List<LevelShape> WORST_FIRST = List.of(LevelShape.OVERLOADED, LevelShape.UNDECIDED,
            LevelShape.INCOMPLETE, LevelShape.NEAR, LevelShape.WITHIN, LevelShape.NOT_INSPECTED);

    private final Workplace workplace;
    private final QueueModel model;
    private final Wording wording;
    private final VBox steps = new VBox();
    private final ProgressBar bar = new ProgressBar(0);

    public QueueView(Workplace workplace, QueueModel model, RoundModel round, Navigator navigator) {
        super("summary");
        this.workplace = workplace;
        this.model = model;
        this.wording = workplace.wording();
        ActionButton back = ActionButton.with(Icon.BACK, ContentDisplay.LEFT, Weight.QUIET,
                wording.text("screen.round.title"), () -> navigator.toRound(round));
        back.setId("foot-back");
        frame(Heads.head(workplace, listening, wording.text("screen.queue.title"), round.round().name()),
                new FootBar(Optional.of(back), Optional.empty(), Optional.empty()));
        steps.getStyleClass().add("questions");
        side.getStyleClass().add("summary");
        bar.setMaxWidth(Double.MAX_VALUE);
        body.getStyleClass().add("queue-body");
        body.setCenter(scrolling(steps));
        listening.onChange(model.completedProperty(), lines -> layOut());
        listening.onChange(model.queuedProperty(), lines -> layOut());
        listening.onChange(model.progressProperty(), share -> progress(share.doubleValue()));
        listening.onChange(model.receiptProperty(), receipt -> showOutcome());
        listening.onChange(model.troubleProperty(), trouble -> showOutcome());
        listening.onChange(model.exportsProperty(), exports -> showOutcome());
        layOut();
        showOutcome();
    }

    private static ScrollPane scrolling(VBox content) {
        ScrollPane scroll = new ScrollPane(content);
        scroll.setFitToWidth(true);
        scroll.getStyleClass().add("form-scroll");
        return scroll;
    }

    private void progress(double share) {
        boolean running = share >= 0;
        if (running != steps.getChildren().contains(bar)) {
            layOut();
        }
        bar.setProgress(Math.max(0, share));
    }

    private void layOut() {
        List<SurveyLine> completed = model.completedProperty().get();
        List<SurveyLine> queued = model.queuedProperty().get();
        steps.getChildren().setAll(new SectionHeader(wording.text("screen.queue.completed")),
                completed.isEmpty() ? wrapped(wording.text("screen.queue.none-completed")) : tags(completed));
        if (!completed.isEmpty()) {
            steps.getChildren().add(button("queue-all", Weight.PRIMARY,
                    wording.text("screen.queue.queue-all", completed.size()), model::queueAll));
        }
        steps.getChildren().addAll(new SectionHeader(wording.text("screen.queue.queued")),
                queued.isEmpty() ? wrapped(wording.text("screen.queue.none-queued")) : tags(queued));
        if (model.progressProperty().get() >= 0) {
            steps.getChildren().addAll(wrapped(wording.text("screen.queue.exporting")), bar,
                    button("cancel-export", Weight.PLAIN, wording.text("screen.cancel"), model::cancel));
        } else if (!queued.isEmpty()) {
            steps.getChildren().add(button("export", Weight.PRIMARY,
                    wording.text("screen.queue.export", queued.size()), this::export));
        }
        steps.getChildren().add(wrapped(wording.text("screen.queue.not-deleted")));
    }

    private ActionButton button(String id, Weight weight, String text, Runnable action) {
        ActionButton button = new ActionButton(weight, text, action);
        button.setId(id);
        button.setMaxWidth(Double.MAX_VALUE);
        return button;
    }

    /** The surveys by tag, each with what was found; the worst first. */
    private FlowPane tags(List<SurveyLine> lines) {
        Register register = workplace.site().register();
        FlowPane tags = new FlowPane();
        tags.getStyleClass().add("tags");
        lines.stream().sorted(Comparator.comparing(line -> WORST_FIRST.indexOf(shape(line)))).forEach(line -> {
            Label tag = new Label(register.transfer(line.transfer()).map(Register.Transfer::tag)
                    .orElse(line.transfer()));
            tag.getStyleClass().add("tag");
            LevelGlyph glyph = new LevelGlyph(shape(line));
            glyph.setAccessibleText(wording.text("verdict.level." + shape(line).styleClass()));
            HBox one = new HBox(glyph, tag);
            one.getStyleClass().add("one");
            tags.getChildren().add(one);
        });
        return tags;
    }

    private static LevelShape shape(SurveyLine line) {
        return line.inspectionStatus() != InspectionStatus.INSPECTED || line.level().isEmpty()
                ? LevelShape.NOT_INSPECTED
                : LevelShape.valueOf(line.level().toUpperCase(Locale.ROOT).replace('-', '_'));
    }

    private void export() {
        workplace.folderChoice().choose(wording.text("screen.queue.choose-folder"),
                workplace.preferences().exportFolder().map(Path::of)).ifPresent(model::export);
    }

    private void showOutcome() {
        side.getChildren().clear();
        model.troubleProperty().get().ifPresent(defect -> {
            Label trouble = wrapped(wording.sentence(defect));
            trouble.getStyleClass().add("trouble-text");
            trouble.setId("trouble");
            side.getChildren().addAll(new SectionHeader(wording.text("screen.queue.failed")), trouble);
        });
        model.receiptProperty().get().ifPresent(this::showReceipt);
        side.getChildren().add(new SectionHeader(wording.text("screen.queue.left")));
        List<Export> exports = model.exportsProperty().get();
        if (exports.isEmpty()) {
            side.getChildren().add(wrapped(wording.text("screen.queue.none-left")));
        }
        exports.stream().limit(6).forEach(export -> side.getChildren().add(wrapped(
                wording.text("screen.queue.export-line", TIME.format(export.at()), export.pack(),
                        export.surveys().size(), export.folder()))));
    }

    private void showReceipt(QueueModel.Receipt receipt) {
        Label done = wrapped(wording.text("screen.receipt.done", receipt.surveys()));
        done.getStyleClass().add("card-title");
        done.setId("receipt");
        VBox box = new VBox(done,
                line("screen.receipt.file", receipt.file().getFileName().toString()),
                line("screen.receipt.folder", String.valueOf(receipt.file().getParent())),
                line("screen.receipt.sha256", receipt.sha256()),
                line("screen.receipt.key", receipt.fingerprint()),
                line("screen.receipt.time", TIME.format(receipt.at())));
        box.getStyleClass().add("receipt");
        side.getChildren().add(box);
    }

    private VBox line(String key, String value) {
        Label name = new Label(wording.text(key));
        name.getStyleClass().add("caption");
        return new VBox(name, wrapped(value));
    }

    private static Label wrapped(String text) {
        Label label = new Label(text);
        label.setWrapText(true);
        label.setMinHeight(Region.USE_PREF_SIZE);
        return label;
    }
}
