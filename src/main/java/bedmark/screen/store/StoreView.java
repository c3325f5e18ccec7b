package bedmark.screen.store;

import bedmark.document.Defect;
import bedmark.index.Restored;
import bedmark.index.StoreCheck;
import bedmark.index.StoreFacts;
import bedmark.screen.Heads;
import bedmark.screen.SidedScreen;
import bedmark.screen.Workplace;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.FootBar;
import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.Texts;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.Icon;
import bedmark.survey.QueueState;
import bedmark.vault.Passphrase;
import bedmark.wording.Wording;
import java.math.BigDecimal;
import java.nio.file.Path;
import java.time.format.DateTimeFormatter;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.function.Consumer;
import javafx.scene.Node;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Label;
import javafx.scene.control.PasswordField;
import javafx.scene.control.ProgressBar;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** How the store does, in words; its proof, its backup, and the surveys of another tablet. */
public final class StoreView extends SidedScreen {
    private static final DateTimeFormatter TIME = DateTimeFormatter.ofPattern("yyyy-MM-dd HH:mm");
    private static final int DEFECTS_SHOWN = 12;

    private final Workplace workplace;
    private final StoreModel model;
    private final Wording wording;
    private final VBox facts = new VBox();
    private final VBox outcome = new VBox();
    private final ProgressBar bar = new ProgressBar(0);
    private final PasswordField passphrase = new PasswordField();
    private Optional<Path> sealedBackup = Optional.empty();

    /** @param back where the person came from */
    public StoreView(Workplace workplace, StoreModel model, Runnable back) {
        super("summary");
        this.workplace = workplace;
        this.model = model;
        this.wording = workplace.wording();
        ActionButton foot = ActionButton.with(Icon.BACK, ContentDisplay.LEFT, Weight.QUIET,
                wording.text("store.back"), back);
        foot.setId("foot-back");
        frame(Heads.head(workplace, listening, wording.text("store.title"), workplace.store().device().name()),
                new FootBar(Optional.of(foot), Optional.empty(), Optional.empty()));
        facts.getStyleClass().add("questions");
        outcome.getStyleClass().add("questions-inside");
        side.getStyleClass().add("summary");
        scrollSide(outcome);
        bar.setMaxWidth(Double.MAX_VALUE);
        bar.setAccessibleText(wording.text("store.working"));
        passphrase.setId("backup-passphrase");
        passphrase.setAccessibleText(wording.text("store.passphrase"));
        passphrase.setPromptText(wording.text("store.passphrase"));
        body.setCenter(scrolling(facts));
        listening.onChange(model.factsProperty(), known -> layOut());
        listening.onChange(model.errand().progressProperty(), share -> progress(share.doubleValue()));
        listening.onChange(model.errand().troubleProperty(), trouble -> showOutcome());
        listening.onChange(model.outcomeProperty(), told -> showOutcome());
        layOut();
        showOutcome();
    }

    private void progress(double share) {
        if (share >= 0 != facts.getChildren().contains(bar)) {
            layOut();
        }
        bar.setProgress(Math.max(0, share));
    }

    private void layOut() {
        StoreFacts known = model.factsProperty().get();
        facts.getChildren().setAll(new SectionHeader(wording.text("store.holds")), surveys(),
                fact("store.entries", wording.format().exact(BigDecimal.valueOf(known.last()))),
                fact("store.saved", known.savedAt().map(TIME::format).orElse(wording.text("store.never"))),
                fact("store.free", free(known.freeBytes())),
                fact("store.sealed", wording.text(known.sealed() ? "store.sealed.yes" : "store.sealed.no")));
        if (model.errand().running()) {
            facts.getChildren().addAll(Texts.wrapped(wording.text("store.working")), bar,
                    button("cancel-work", Weight.PLAIN, "screen.cancel", model.errand()::cancel));
            return;
        }
        facts.getChildren().addAll(button("prove", Weight.PLAIN, "store.prove", model::prove),
                new SectionHeader(wording.text("store.backup")), backup(known),
                button("back-up", Weight.PRIMARY, "store.back-up",
                        () -> chosen("store.back-up.where", model::backUp)),
                Texts.wrapped(wording.text("store.hand-over")),
                new SectionHeader(wording.text("store.other")), Texts.wrapped(wording.text("store.other.what")),
                button("take-over", Weight.PLAIN, "store.take-over",
                        () -> chosen("store.take-over.where", backup -> takeOver(backup, Optional.empty()))));
    }

    private HBox fact(String key, String value) {
        Label name = new Label(wording.text(key));
        name.getStyleClass().add("fact");
        Label what = Texts.wrapped(value);
        HBox.setHgrow(what, Priority.ALWAYS);
        HBox line = new HBox(name, what);
        line.getStyleClass().add("fact-line");
        return line;
    }

    private HBox surveys() {
        Map<QueueState, Long> counts = model.counts();
        String told = List.of(QueueState.values()).stream().map(state -> wording.text("store.state."
                + state.name().toLowerCase(Locale.ROOT), counts.get(state))).reduce((one, other) -> one + ", " + other)
                .orElseThrow();
        return fact("store.surveys", told);
    }

    private String free(long bytes) {
        return bytes <= 0 ? wording.text("store.free.unknown")
                : wording.text("store.free.megabytes", wording.format().computed(bytes / 1e6, 0));
    }

    private Label backup(StoreFacts known) {
        Label told = Texts.wrapped(known.backup().map(made -> wording.text("store.backup.last", TIME.format(made.at()),
                made.folder(), known.notBackedUp())).orElseGet(() -> wording.text("store.backup.none")));
        told.setId("last-backup");
        return told;
    }

    private ActionButton button(String id, Weight weight, String key, Runnable action) {
        ActionButton button = new ActionButton(weight, wording.text(key), action);
        button.setId(id);
        button.setMinWidth(0);
        button.setMaxWidth(Double.MAX_VALUE);
        return button;
    }

    private void chosen(String title, Consumer<Path> then) {
        workplace.folderChoice().choose(wording.text(title), workplace.preferences().exportFolder().map(Path::of))
                .ifPresent(then);
    }

    private void takeOver(Path backup, Optional<Passphrase> typed) {
        sealedBackup = Optional.of(backup);
        passphrase.clear();
        model.takeOver(backup, typed);
    }

    private void showOutcome() {
        outcome.getChildren().clear();
        Optional<Defect> trouble = model.errand().troubleProperty().get();
        if (trouble.isPresent()) {
            showTrouble(trouble.get());
            return;
        }
        StoreModel.Outcome told = model.outcomeProperty().get();
        if (told instanceof StoreModel.Outcome.Proved proved) {
            showProof(proved.check());
        } else if (told instanceof StoreModel.Outcome.BackedUp made) {
            add("store.done", Texts.wrapped(wording.text("store.backed-up", made.folder())));
        } else if (told instanceof StoreModel.Outcome.TakenOver taken) {
            showTaken(taken.restored());
        } else {
            List<Defect> found = workplace.store().opening().found();
            add("store.opening", found.isEmpty() ? Texts.wrapped(wording.text("store.opening.fine")) : defects(found));
        }
    }

    private void add(String title, Node content) {
        content.setId("outcome");
        outcome.getChildren().addAll(new SectionHeader(wording.text(title)), content);
    }

    private VBox defects(List<Defect> found) {
        VBox list = new VBox();
        list.getStyleClass().add("questions-inside");
        found.stream().limit(DEFECTS_SHOWN).forEach(defect ->
                list.getChildren().add(Texts.trouble(wording.sentence(defect))));
        if (found.size() > DEFECTS_SHOWN) {
            list.getChildren().add(Texts.wrapped(wording.text("store.more", found.size() - DEFECTS_SHOWN)));
        }
        return list;
    }

    private void showProof(StoreCheck check) {
        add("store.proved", Texts.wrapped(wording.text(check.sound() ? "store.sound" : "store.unsound",
                check.entries(), check.photos())));
        outcome.getChildren().add(Texts.wrapped(wording.text(check.chainIntact() ? "store.chain.intact"
                : "store.chain.broken")));
        if (!check.defects().isEmpty()) {
            outcome.getChildren().add(defects(check.defects()));
        }
    }

    private void showTaken(Restored restored) {
        add("store.done", Texts.wrapped(wording.text("store.taken-over", restored.taken().size(),
                restored.known().size())));
        if (!restored.differing().isEmpty()) {
            outcome.getChildren().add(Texts.trouble(wording.text("store.differing", restored.differing().size())));
        }
    }

    /** The backup of an encrypted store asks for that store's passphrase. */
    private void showTrouble(Defect defect) {
        add("queue.failed", Texts.trouble(wording.sentence(defect)));
        boolean asks = defect.code().equals("store-sealed") || defect.code().equals("passphrase-wrong");
        if (asks && sealedBackup.isPresent()) {
            Path backup = sealedBackup.get();
            outcome.getChildren().addAll(passphrase, button("backup-open", Weight.PRIMARY, "store.take-over.open",
                    () -> takeOver(backup, Optional.of(Passphrase.of(passphrase.getText())))));
        }
    }
}
