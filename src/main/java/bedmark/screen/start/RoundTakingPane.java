package bedmark.screen.start;

import bedmark.screen.Listening;
import bedmark.screen.Workplace;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Texts;
import bedmark.screen.part.Weight;
import bedmark.wording.Wording;
import java.nio.file.Path;
import java.util.Optional;
import javafx.scene.control.Label;
import javafx.scene.layout.VBox;

/** The button that takes the office's round file in, and below it what came of that. */
final class RoundTakingPane extends VBox {
    private final RoundTaking taking;
    private final Wording wording;
    private final VBox outcome = new VBox();

    RoundTakingPane(Workplace workplace, RoundTaking taking, Listening listening) {
        this.taking = taking;
        this.wording = workplace.wording();
        getStyleClass().add("question");
        outcome.getStyleClass().add("question");
        ActionButton take = new ActionButton(Weight.PLAIN, wording.text("office.take.button"), () ->
                workplace.folderChoice().choose(wording.text("office.take.button"), workplace.preferences()
                        .exportFolder().map(Path::of)).ifPresent(taking::take));
        take.setId("take-round");
        take.setMaxWidth(Double.MAX_VALUE);
        getChildren().addAll(take, outcome);
        listening.to(taking.outcomeProperty(), this::show);
    }

    private void show(Optional<RoundTaking.Outcome> came) {
        outcome.getChildren().clear();
        outcome.setManaged(came.isPresent());
        came.ifPresent(one -> {
            if (one instanceof RoundTaking.Unknown unknown) {
                ActionButton accept = new ActionButton(Weight.PRIMARY, wording.text("office.take.accept"), () ->
                        taking.accept(unknown));
                accept.setId("accept-office");
                accept.setMaxWidth(Double.MAX_VALUE);
                outcome.getChildren().addAll(Texts.wrapped(wording.text("office.take.unknown",
                        unknown.file().fingerprint())), accept);
            } else if (one instanceof RoundTaking.Taken taken) {
                told("taken", Texts.wrapped(wording.text("office.take.taken", taken.rounds(), taken.results(),
                        taken.notes())));
            } else if (one instanceof RoundTaking.Failed failed) {
                told("not-taken", Texts.trouble(wording.sentence(failed.why())));
            }
        });
    }

    private void told(String id, Label words) {
        words.setId(id);
        outcome.getChildren().add(words);
    }
}
