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
import bedmark.screen.part.Texts;
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
import java.util.function.Consumer;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Label;
import javafx.scene.control.ProgressBar;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.VBox;

/** The way to the office: surveys into the queue, the queue onto a stick, the office's receipts back. */
public final class QueueView extends SidedScreen {
    private static final DateTimeFormatter TIME = DateTimeFormatter.ofPattern("yyyy-MM-dd HH:mm");
    private static final int EXPORTS_SHOWN = 6;

    private static final List<LevelShape> WORST_FIRST = List.of(LevelShape.OVERLOADED, LevelShape.UNDECIDED,
            LevelShape.INCOMPLETE, LevelShape.NEAR, LevelShape.WITHIN, LevelShape.NOT_INSPECTED);

    private final Workplace workplace;
    private final QueueModel model;
    private final Wording wording;
    private final VBox steps = new VBox();
    private final VBox outcome = new VBox();
    private final ProgressBar bar = new ProgressBar(0);

    public QueueView(Workplace workplace, QueueModel model, RoundModel round, Navigator navigator) {
        super("summary");
        this.workplace = workplace;
        this.model = model;
        this.wording = workplace.wording();
        ActionButton back = ActionButton.with(Icon.BACK, ContentDisplay.LEFT, Weight.QUIET,
                wording.text("screen.round.title"), () -> navigator.toRound(round));
        back.setId("foot-back");
        ActionButton store = new ActionButton(Weight.PLAIN, wording.text("queue.to-store"),
                () -> navigator.toStore(() -> navigator.toQueue(round)));
        store.setId("to-store");
        frame(Heads.head(workplace, listening, wording.text("screen.queue.title"), round.round().name()),
                new FootBar(Optional.of(back), Optional.empty(), Optional.of(store)));
        steps.getStyleClass().add("questions");
        outcome.getStyleClass().add("questions-inside");
        side.getStyleClass().add("summary");
        scrollSide(outcome);
        bar.setMaxWidth(Double.MAX_VALUE);
        bar.setAccessibleText(wording.text("screen.queue.exporting"));
        body.getStyleClass().add("queue-body");
        body.setCenter(scrolling(steps));
        listening.onChange(model.completedProperty(), lines -> layOut());
        listening.onChange(model.queuedProperty(), lines -> layOut());
        listening.onChange(model.awaitedProperty(), lines -> layOut());
        listening.onChange(model.errand().progressProperty(), share -> progress(share.doubleValue()));
        listening.onChange(model.errand().troubleProperty(), trouble -> showOutcome());
        listening.onChange(model.leftProperty(), left -> showOutcome());
        listening.onChange(model.receipts().resultProperty(), result -> showOutcome());
        listening.onChange(model.exportsProperty(), exports -> showOutcome());
        layOut();
        showOutcome();
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
        List<SurveyLine> awaited = model.awaitedProperty().get();
        boolean running = model.errand().running();
        steps.getChildren().setAll(new SectionHeader(wording.text("screen.queue.completed")),
                completed.isEmpty() ? Texts.wrapped(wording.text("screen.queue.none-completed")) : tags(completed));
        if (!completed.isEmpty()) {
            steps.getChildren().add(button("queue-all", Weight.PRIMARY,
                    wording.text("screen.queue.queue-all", completed.size()), model::queueAll));
        }
        steps.getChildren().addAll(new SectionHeader(wording.text("screen.queue.queued")),
                queued.isEmpty() ? Texts.wrapped(wording.text("screen.queue.none-queued")) : tags(queued));
        if (running) {
            steps.getChildren().addAll(Texts.wrapped(wording.text("screen.queue.exporting")), bar,
                    button("cancel-export", Weight.PLAIN, wording.text("screen.cancel"), model.errand()::cancel));
        } else if (!queued.isEmpty()) {
            steps.getChildren().add(button("export", Weight.PRIMARY,
                    wording.text("screen.queue.export", queued.size()), () -> chosen(model::export)));
        }
        steps.getChildren().addAll(new SectionHeader(wording.text("queue.awaited")),
                Texts.wrapped(wording.text("queue.awaited-count", awaited.size())));
        if (!running && !awaited.isEmpty()) {
            steps.getChildren().add(button("read-receipts", Weight.PLAIN, wording.text("queue.read-receipts"),
                    () -> chosen(model::readReceipts)));
        }
        steps.getChildren().add(Texts.wrapped(wording.text("screen.queue.not-deleted")));
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

    private void chosen(Consumer<Path> then) {
        workplace.folderChoice().choose(wording.text("screen.queue.choose-folder"),
                workplace.preferences().exportFolder().map(Path::of)).ifPresent(then);
    }

    private void showOutcome() {
        outcome.getChildren().clear();
        model.errand().troubleProperty().get().ifPresent(defect -> {
            Label trouble = Texts.trouble(wording.sentence(defect));
            trouble.setId("trouble");
            outcome.getChildren().addAll(new SectionHeader(wording.text("queue.failed")), trouble);
        });
        model.leftProperty().get().ifPresent(this::showLeft);
        model.receipts().resultProperty().get().ifPresent(result -> outcome.getChildren().add(
                new ReceiptsPane(wording, result, model.receipts(), model::reload)));
        outcome.getChildren().add(new SectionHeader(wording.text("screen.queue.left")));
        List<Export> exports = model.exportsProperty().get();
        if (exports.isEmpty()) {
            outcome.getChildren().add(Texts.wrapped(wording.text("screen.queue.none-left")));
        }
        exports.stream().limit(EXPORTS_SHOWN).forEach(this::showExport);
    }

    private void showExport(Export export) {
        outcome.getChildren().add(Texts.wrapped(wording.text("screen.queue.export-line", TIME.format(export.at()),
                export.pack(), export.surveys().size(), export.folder())));
        ActionButton again = button("again-" + export.sequence(), Weight.QUIET, wording.text("queue.export-again"),
                () -> chosen(folder -> model.exportAgain(export, folder)));
        again.setAccessibleText(wording.text("queue.export-again-of", export.pack()));
        again.getStyleClass().add("secondary-target");
        outcome.getChildren().add(again);
    }

    private void showLeft(QueueModel.Left left) {
        Label done = Texts.wrapped(wording.text("screen.receipt.done", left.surveys()));
        done.getStyleClass().add("card-title");
        done.setId("receipt");
        VBox box = new VBox(done,
                line("screen.receipt.file", left.file().getFileName().toString()),
                line("screen.receipt.folder", String.valueOf(left.file().getParent())),
                line("screen.receipt.sha256", left.sha256()),
                line("screen.receipt.key", left.fingerprint()),
                line("screen.receipt.time", TIME.format(left.at())));
        box.getStyleClass().add("receipt");
        outcome.getChildren().add(box);
    }

    private VBox line(String key, String value) {
        return Texts.named(wording.text(key), value);
    }
}
