package bedmark.screen.start;

import bedmark.screen.Workplace;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Texts;
import bedmark.screen.part.Weight;
import bedmark.wording.Wording;
import java.nio.file.Path;
import javafx.scene.control.Label;
import javafx.scene.layout.VBox;

/** What came of a round file, in words; and the question whether its office is to be trusted. */
final class TakingPane extends VBox {
    private final Wording wording;

    TakingPane(Workplace workplace, RoundTaking taking) {
        wording = workplace.wording();
        getStyleClass().add("questions-inside");
        managedProperty().bind(visibleProperty());
        setVisible(taking.outcomeProperty().get().isPresent());
        taking.outcomeProperty().get().ifPresent(outcome -> {
            if (outcome instanceof RoundTaking.Unknown unknown) {
                getChildren().add(question(unknown, taking));
            } else if (outcome instanceof RoundTaking.Taken taken) {
                told("taken", Texts.wrapped(wording.text("first.taken", taken.rounds(), taken.results(),
                        taken.notes())));
            } else if (outcome instanceof RoundTaking.Failed failed) {
                told("not-taken", Texts.trouble(wording.sentence(failed.why())));
            }
        });
    }

    /** The button that asks for a folder and takes the newest round file in it. */
    static ActionButton button(Workplace workplace, RoundTaking taking, String key, Weight weight) {
        Wording wording = workplace.wording();
        ActionButton button = new ActionButton(weight, wording.text(key), () -> workplace.folderChoice()
                .choose(wording.text("first.take.where"), workplace.preferences().exportFolder().map(Path::of))
                .ifPresent(taking::take));
        button.setId("take-round");
        button.setMinWidth(0);
        button.setMaxWidth(Double.MAX_VALUE);
        return button;
    }

    private void told(String id, Label words) {
        words.setId(id);
        getChildren().add(words);
    }

    private VBox question(RoundTaking.Unknown unknown, RoundTaking taking) {
        Label title = Texts.wrapped(wording.text("first.unknown"));
        title.getStyleClass().add("card-title");
        ActionButton accept = new ActionButton(Weight.PRIMARY, wording.text("queue.office-accept"),
                () -> taking.accept(unknown));
        accept.setId("accept-office");
        accept.setMinWidth(0);
        accept.setMaxWidth(Double.MAX_VALUE);
        VBox box = new VBox(title, Texts.named(wording.text("queue.office-key"),
                unknown.file().fingerprint().toString()), Texts.wrapped(wording.text("queue.office-compare")), accept);
        box.getStyleClass().add("receipt");
        return box;
    }
}
