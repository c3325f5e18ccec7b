package bedmark.screen.office;

import bedmark.office.Received;
import bedmark.office.Refusal;
import bedmark.screen.Listening;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Plate;
import bedmark.screen.part.Texts;
import bedmark.screen.part.Weight;
import bedmark.wording.Wording;
import java.io.File;
import java.nio.file.Path;
import java.util.ArrayList;
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
    private static final int REFUSED_SHOWN = 100;

    private final ReceiveModel model;
    private final Wording wording;
    private final VBox rows = new VBox();

    ReceiveView(OfficeDesk desk, ReceiveModel model, OfficeNameModel name, Listening listening) {
        this.model = model;
        this.wording = desk.wording();
        getStyleClass().add("room");
        rows.getStyleClass().add("received");
        ScrollPane scroll = new ScrollPane(rows);
        scroll.setFitToWidth(true);
        VBox.setVgrow(scroll, Priority.ALWAYS);
        getChildren().addAll(dropPlace(desk, listening), new OfficeNamePane(name, wording, listening), scroll);
        ListChangeListener<Received> shown = change -> show();
        model.received().addListener(shown);
        listening.onEnd(() -> model.received().removeListener(shown));
        listening.to(model.earlierProperty(), earlier -> show());
        listening.to(model.refusedProperty(), refused -> show());
        model.lookAtRefused();
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
        rows.getChildren().setAll(model.received().stream()
                .map(one -> new ReceivedRow(wording, one, model.receiptOf(one), model::trust)).toList());
        if (rows.getChildren().isEmpty()) {
            Label none = Texts.wrapped(wording.text("office.receive.none"));
            none.getStyleClass().add("soft");
            rows.getChildren().add(none);
        }
        section("office.receive.still-refused", stillRefused());
        section("office.receive.earlier", model.earlierProperty().get().stream().map(this::row).toList());
    }

    private void section(String title, List<? extends Node> under) {
        if (!under.isEmpty()) {
            Label label = new Label(wording.text(title));
            label.getStyleClass().add("section-title");
            rows.getChildren().add(label);
            rows.getChildren().addAll(under);
        }
    }

    private List<Node> stillRefused() {
        List<Refusal> refusals = model.refusedBefore();
        List<Node> shown = new ArrayList<>();
        refusals.stream().limit(REFUSED_SHOWN).forEach(one ->
                shown.add(new ReceivedRow(wording, one, model::trust, () -> model.putAway(one))));
        if (refusals.size() > REFUSED_SHOWN) {
            Label more = Texts.wrapped(wording.text("office.receive.more-refused", refusals.size() - REFUSED_SHOWN));
            more.getStyleClass().add("soft");
            shown.add(more);
        }
        return shown;
    }

    private Node row(ReceiveModel.Earlier earlier) {
        Label file = Texts.wrapped(earlier.file());
        file.getStyleClass().add("zone-name");
        VBox words = new VBox(file, Texts.wrapped(wording.text("office.receive.earlier-from", earlier.device(),
                wording.moment(earlier.at()))));
        words.setMinWidth(0);
        HBox.setHgrow(words, Priority.ALWAYS);
        HBox row = new HBox(new Plate(Plate.Tone.FAINT, wording.text("office.receive.received")), words);
        row.getStyleClass().add("received-row");
        row.setAlignment(Pos.CENTER_LEFT);
        return row;
    }
}
