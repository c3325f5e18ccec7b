package bedmark.screen.arrival;

import bedmark.document.Defect;
import bedmark.office.Received;
import bedmark.screen.Listening;
import bedmark.screen.arrival.ArrivalModel.Reception;
import bedmark.screen.office.ReceivedRow;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Labels;
import bedmark.screen.part.Texts;
import bedmark.screen.part.Weight;
import bedmark.wording.Wording;
import java.nio.file.Path;
import java.util.Optional;
import javafx.collections.ListChangeListener;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** Which office takes the pack in, how far that is, and what came of it. */
final class ReceptionPane extends VBox {
    private final ArrivalModel model;
    private final Wording wording;
    private final VBox told = new VBox();
    private final WorkPane work;
    private final Runnable changed;
    private Listening atOffice = new Listening();

    /** @param changed runs when what can be done next is another thing */
    ReceptionPane(ArrivalModel model, Listening listening, Runnable changed) {
        this.model = model;
        this.wording = model.wording();
        this.changed = changed;
        getStyleClass().add("reception");
        this.work = new WorkPane(wording.text("arrival.receiving"), wording.text("arrival.stop"), this::stop);
        getChildren().addAll(told, work);
        listening.onChange(model.errand().progressProperty(), share -> showWork());
        listening.onChange(model.errand().troubleProperty(), trouble -> show());
        listening.to(model.receptionProperty(), this::follow);
        listening.onEnd(() -> atOffice.end());
    }

    private void stop() {
        model.errand().cancel();
        model.receptionProperty().get().ifPresent(open -> open.desk().cancel());
    }

    /** An office that is open does its own work and has its own trouble. */
    private void follow(Optional<Reception> reception) {
        atOffice.end();
        atOffice = new Listening();
        reception.ifPresent(open -> {
            atOffice.onChange(open.desk().progressProperty(), share -> showWork());
            atOffice.onChange(open.desk().troubleProperty(), trouble -> show());
            ListChangeListener<Received> came = change -> show();
            open.receiving().received().addListener(came);
            atOffice.onEnd(() -> open.receiving().received().removeListener(came));
        });
        show();
    }

    private double share() {
        return Math.max(model.errand().progressProperty().get(), model.receptionProperty().get()
                .map(open -> open.desk().progressProperty().get()).orElse(-1.0));
    }

    /** Whether an office is being opened, or receives. */
    boolean working() {
        return share() >= 0;
    }

    /** The button that says that the person compared the fingerprint, where that is asked. */
    Optional<Node> question() {
        return Optional.ofNullable(told.lookup("#trust"));
    }

    private void showWork() {
        work.at(share());
        changed.run();
    }

    private void show() {
        told.getChildren().clear();
        Optional<Reception> reception = model.receptionProperty().get();
        Optional<Received> outcome = reception.flatMap(Reception::outcome);
        outcome.ifPresent(came -> told.getChildren().add(new ReceivedRow(wording, came, reception.get().receiving()
                .receiptOf(came), turned -> reception.get().receiving().trust(turned))));
        Optional<Defect> trouble = model.errand().troubleProperty().get().or(() ->
                reception.flatMap(open -> open.desk().troubleProperty().get()));
        trouble.ifPresent(defect -> {
            Label words = Texts.trouble(wording.sentence(defect));
            words.setId("trouble");
            told.getChildren().add(words);
        });
        if (reception.filter(Reception::in).isEmpty()) {
            model.knownOffice().ifPresent(folder -> told.getChildren().add(office(folder)));
        }
        showWork();
    }

    private Node office(Path folder) {
        Label words = Labels.wrapped("what", wording.text("arrival.at-office", model.shown(folder)));
        words.setMinWidth(0);
        words.setMaxWidth(Double.MAX_VALUE);
        HBox.setHgrow(words, Priority.ALWAYS);
        ActionButton other = new ActionButton(Weight.PLAIN, wording.text("arrival.other-office"), () ->
                model.folders().choose(wording.text("arrival.choose-office"), Optional.of(folder))
                        .ifPresent(model::receive));
        other.setId("other-office");
        other.getStyleClass().add("secondary-target");
        HBox row = new HBox(words, other);
        row.getStyleClass().add("received-row");
        row.setAlignment(Pos.CENTER_LEFT);
        return row;
    }
}
