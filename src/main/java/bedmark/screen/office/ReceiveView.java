package bedmark.screen.office;

import bedmark.office.Received;
import bedmark.screen.Listening;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Plate;
import bedmark.screen.part.Texts;
import bedmark.screen.part.Weight;
import bedmark.survey.merge.Clash;
import bedmark.wording.Wording;
import java.io.File;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import javafx.collections.ListChangeListener;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.control.ScrollPane;
import javafx.scene.input.TransferMode;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** Where packs come in: dropped, chosen, or put into a watched folder; below, what came of each. */
final class ReceiveView extends VBox {
    private final ReceiveModel model;
    private final Wording wording;
    private final VBox rows = new VBox();

    ReceiveView(OfficeDesk desk, ReceiveModel model, Listening listening) {
        this.model = model;
        this.wording = desk.wording();
        getStyleClass().add("room");
        rows.getStyleClass().add("received");
        ScrollPane scroll = new ScrollPane(rows);
        scroll.setFitToWidth(true);
        VBox.setVgrow(scroll, Priority.ALWAYS);
        getChildren().addAll(dropPlace(desk, listening), scroll);
        ListChangeListener<Received> shown = change -> show();
        model.received().addListener(shown);
        show();
    }

    private Node dropPlace(OfficeDesk desk, Listening listening) {
        Label words = Texts.wrapped(wording.text("office.receive.drop"));
        words.getStyleClass().add("drop-words");
        ActionButton folder = new ActionButton(Weight.PRIMARY, wording.text("office.receive.choose"), () ->
                desk.folders().choose(wording.text("office.receive.choose"), Optional.empty())
                        .ifPresent(chosen -> model.receive(List.of(chosen))));
        folder.setId("receive-folder");
        ActionButton watch = new ActionButton(Weight.PLAIN, "", () -> {
            if (model.watchedProperty().get().isPresent()) {
                model.watch(Optional.empty());
            } else {
                model.watch(desk.folders().choose(wording.text("office.receive.watch"), Optional.empty()));
            }
        });
        watch.setId("watch-folder");
        Label watching = Texts.wrapped("");
        watching.getStyleClass().add("soft");
        listening.to(model.watchedProperty(), path -> {
            watch.setText(wording.text(path.isPresent() ? "office.receive.unwatch" : "office.receive.watch"));
            watching.setText(path.map(one -> wording.text("office.receive.watching", one)).orElse(""));
            watching.setManaged(path.isPresent());
        });
        FlowPane buttons = new FlowPane(folder, watch);
        buttons.getStyleClass().add("buttons");
        VBox place = new VBox(words, buttons, watching);
        place.setId("drop-place");
        place.getStyleClass().add("drop-place");
        place.setOnDragOver(event -> {
            if (event.getDragboard().hasFiles()) {
                event.acceptTransferModes(TransferMode.COPY);
            }
            event.consume();
        });
        place.setOnDragDropped(event -> {
            List<Path> files = event.getDragboard().getFiles().stream().map(File::toPath).toList();
            event.setDropCompleted(!files.isEmpty());
            event.consume();
            model.receive(files);
        });
        return place;
    }

    private void show() {
        rows.getChildren().setAll(model.received().stream().map(this::row).toList());
        if (rows.getChildren().isEmpty()) {
            Label none = Texts.wrapped(wording.text("office.receive.none"));
            none.getStyleClass().add("soft");
            rows.getChildren().add(none);
        }
    }

    private Node row(Received received) {
        VBox words = new VBox();
        words.setMinWidth(0);
        HBox.setHgrow(words, Priority.ALWAYS);
        Label file = Texts.wrapped(received.file().getFileName().toString());
        file.getStyleClass().add("zone-name");
        words.getChildren().add(file);
        HBox row = new HBox(plate(received), words);
        row.getStyleClass().add("received-row");
        row.setAlignment(Pos.CENTER_LEFT);
        if (received instanceof Received.Taken taken) {
            words.getChildren().add(Texts.wrapped(wording.text("office.receive.from", taken.device(), taken.fresh(),
                    taken.known())));
            taken.clashes().forEach(clash -> words.getChildren().add(Texts.trouble(clash(clash))));
            if (taken.clock() > 0) {
                words.getChildren().add(Texts.trouble(wording.text("office.receive.clock", taken.device(),
                        Math.max(1, taken.clock() / 60))));
            }
        } else if (received instanceof Received.Turned turned) {
            words.getChildren().add(Texts.wrapped(wording.sentence(turned.why())));
            if (turned.why().code().equals("device-untrusted")) {
                ActionButton trust = new ActionButton(Weight.PRIMARY, wording.text("office.receive.trust"), () ->
                        model.trust(turned));
                trust.setId("trust");
                row.getChildren().add(trust);
            }
        } else if (received instanceof Received.AlreadyHere here) {
            words.getChildren().add(Texts.wrapped(wording.text("office.receive.known", here.device())));
        }
        return row;
    }

    private Plate plate(Received received) {
        if (received instanceof Received.Turned) {
            return new Plate(Plate.Tone.OVER, wording.text("office.receive.refused"));
        }
        return received instanceof Received.Taken
                ? new Plate(Plate.Tone.PLAIN, wording.text("office.receive.received"))
                : new Plate(Plate.Tone.FAINT, wording.text("office.receive.before"));
    }

    private String clash(Clash clash) {
        return wording.text("office.clash." + clash.kind().code(), clash.sides().get(0).zone().transfer(),
                clash.sides().get(0).id(), clash.sides().get(0).revision());
    }
}
