package bedmark.screen.arrival;

import bedmark.document.Defect;
import bedmark.pack.FileKind;
import bedmark.screen.SidedScreen;
import bedmark.screen.arrival.ArrivalModel.Reception;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.CautionStrip;
import bedmark.screen.part.FootBar;
import bedmark.screen.part.Labels;
import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.Texts;
import bedmark.screen.part.TopBar;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.Icon;
import bedmark.wording.Wording;
import java.util.Optional;
import javafx.application.Platform;
import javafx.collections.FXCollections;
import javafx.scene.Node;
import javafx.scene.control.Button;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Label;
import javafx.scene.control.ListView;
import javafx.scene.layout.BorderPane;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** One file that came: its proof, then what it holds or why it is refused, and the one thing to do next. */
final class ArrivalView extends SidedScreen {
    private final ArrivalModel model;
    private final Wording wording;
    private final Runnable close;
    private final Runnable toOffice;
    private final BorderPane foot = new BorderPane();
    private final VBox shownFacts = new VBox();
    private final WorkPane proof;
    private FactsPane facts;
    private boolean portrait;
    private Optional<ReceptionPane> reception = Optional.empty();
    private Optional<Next> next = Optional.empty();
    private Optional<Button> onward = Optional.empty();

    /** What a person can do next. */
    private enum Next {
        CLOSE, AGAIN, RECEIVE,
        /** Say whether the device is to be trusted; that stands beside its fingerprint. */
        ANSWER, OPEN_OFFICE
    }

    /**
     * @param close    closes the window
     * @param toOffice goes on in the office's window
     * @param more     buttons at the far right of the head
     */
    ArrivalView(ArrivalModel model, Runnable close, Runnable toOffice, Node... more) {
        super("summary");
        this.model = model;
        this.wording = model.wording();
        this.close = close;
        this.toOffice = toOffice;
        TopBar bar = new TopBar(more);
        bar.titleProperty().set(wording.text("screen.name"));
        bar.subtitleProperty().set(wording.text("arrival.title." + model.kind().code()));
        frame(bar, foot);
        proof = new WorkPane(wording.text("arrival.proving"), wording.text("arrival.stop"), model.errand()::cancel);
        scrollSide(shownFacts);
        listening.onChange(model.arrivedProperty(), arrived -> show());
        listening.onChange(model.errand().troubleProperty(), trouble -> troubled());
        listening.to(model.errand().progressProperty(), share -> proof.at(share.doubleValue()));
        show();
    }

    /** Trouble after the proof is the office's, and is told beside the pack. */
    private void troubled() {
        if (model.arrivedProperty().get().isEmpty()) {
            show();
        }
    }

    private void show() {
        Optional<Arrived> arrived = model.arrivedProperty().get();
        reception = Optional.empty();
        facts = new FactsPane(wording, model.file(), arrived);
        facts.turned(portrait);
        shownFacts.getChildren().setAll(facts);
        body.setCenter(arrived.map(this::content).orElseGet(this::unproved));
        next = Optional.empty();
        showFoot();
    }

    private Node unproved() {
        VBox words = new VBox(proof);
        words.getStyleClass().add("questions");
        model.errand().troubleProperty().get().ifPresent(why -> words.getChildren().addAll(refusal(why)));
        return words;
    }

    private Node[] refusal(Defect why) {
        boolean stopped = why.code().equals("pack-cancelled");
        Label title = Labels.wrapped("card-title", wording.text(stopped ? "arrival.stopped"
                : "arrival.refused." + model.kind().code()));
        Label sentence = Texts.trouble(wording.sentence(why));
        sentence.setId("refusal");
        return stopped ? new Node[] {title, sentence}
                : new Node[] {title, sentence, Texts.wrapped(wording.text("arrival.refused.nothing"))};
    }

    private Node content(Arrived arrived) {
        if (arrived instanceof Arrived.Pack pack) {
            return surveys(pack);
        }
        Label title = Labels.wrapped("card-title", wording.text("arrival.is." + model.kind().code()));
        Label belongs = Texts.wrapped(model.kind() == FileKind.ROUND
                ? wording.text("arrival.belongs.round", wording.text("office.take.button"))
                : wording.text("arrival.belongs.receipt", wording.text("queue.read-receipts"),
                        wording.text("screen.queue.title")));
        belongs.setId("belongs");
        VBox words = new VBox(title, belongs);
        words.getStyleClass().add("questions");
        return words;
    }

    private Node surveys(Arrived.Pack pack) {
        ReceptionPane received = new ReceptionPane(model, listening, this::showFoot);
        reception = Optional.of(received);
        SectionHeader header = new SectionHeader(wording.text("arrival.worst-first"));
        header.asideProperty().set(wording.format().computed(pack.surveys().size(), 0));
        ListView<ArrivedSurvey> list = new ListView<>(FXCollections.observableList(pack.surveys()));
        list.setId("surveys");
        list.setAccessibleText(wording.text("arrival.worst-first"));
        list.setCellFactory(view -> new SurveyCell(wording));
        VBox.setVgrow(list, Priority.ALWAYS);
        VBox all = new VBox(received, header, list, new CautionStrip(wording.text("screen.caution.always")));
        all.getStyleClass().add("arrived-pack");
        return all;
    }

    private Next wanted() {
        Optional<Arrived> arrived = model.arrivedProperty().get();
        if (arrived.isEmpty()) {
            return model.errand().troubleProperty().get().isPresent() ? Next.AGAIN : Next.CLOSE;
        }
        if (!(arrived.get() instanceof Arrived.Pack)) {
            return Next.CLOSE;
        }
        Optional<Reception> open = model.receptionProperty().get();
        return open.filter(Reception::in).isPresent() ? Next.OPEN_OFFICE
                : open.filter(Reception::asks).isPresent() ? Next.ANSWER : Next.RECEIVE;
    }

    /** The button at the right is made anew only where it is another one, so that it keeps the focus. */
    private void showFoot() {
        Next wanted = wanted();
        if (!next.equals(Optional.of(wanted))) {
            next = Optional.of(wanted);
            onward = onward(wanted);
            ActionButton away = ActionButton.with(Icon.CROSS, ContentDisplay.LEFT, Weight.QUIET,
                    wording.text("arrival.close"), close);
            away.setId("close");
            away.setCancelButton(true);
            foot.setCenter(new FootBar(Optional.of(away), Optional.empty(), onward));
            Platform.runLater(this::shown);
        }
        boolean working = reception.filter(ReceptionPane::working).isPresent();
        onward.filter(button -> button.isDisabled() != working).ifPresent(button -> {
            button.setDisable(working);
            Platform.runLater(this::shown);
        });
    }

    private Optional<Button> onward(Next wanted) {
        return switch (wanted) {
            case CLOSE, ANSWER -> Optional.empty();
            case AGAIN -> Optional.of(button("again", wording.text("arrival.again"), model::prove));
            case RECEIVE -> Optional.of(button("receive", wording.text("arrival.receive"), this::receive));
            case OPEN_OFFICE -> Optional.of(button("open-office", wording.text("arrival.open-office"), toOffice));
        };
    }

    private static Button button(String id, String text, Runnable action) {
        ActionButton button = ActionButton.with(Icon.NEXT, ContentDisplay.RIGHT, Weight.PRIMARY, text, action);
        button.setId(id);
        return button;
    }

    private void receive() {
        model.knownOffice().or(() -> model.folders().choose(wording.text("arrival.choose-office"), Optional.empty()))
                .ifPresent(model::receive);
    }

    @Override
    public void turned(boolean upright) {
        super.turned(upright);
        portrait = upright;
        facts.turned(upright);
    }

    /** The next useful button has the focus, so that a person goes on with one key. */
    @Override
    public void shown() {
        Optional<Node> useful = reception.flatMap(ReceptionPane::question).or(() -> onward);
        useful.ifPresentOrElse(Node::requestFocus, body::requestFocus);
    }
}
