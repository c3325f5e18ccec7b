package bedmark.screen.start;

import bedmark.document.Defect;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Labels;
import bedmark.screen.part.Texts;
import bedmark.screen.part.Weight;
import bedmark.wording.Wording;
import javafx.scene.control.Label;

/** Says in one sentence why nothing opens: who starts the program by its icon sees no terminal. */
public final class RefusedView extends LonePage {
    private final ActionButton done;

    /** @param close closes the window */
    public RefusedView(Wording wording, Defect why, Runnable close) {
        super(wording, "");
        Label sentence = Texts.trouble(wording.sentence(why));
        sentence.setId("refusal");
        done = new ActionButton(Weight.PRIMARY, wording.text("arrival.close"), close);
        done.setId("close");
        done.setMaxWidth(Double.MAX_VALUE);
        say(Labels.wrapped("card-title", wording.text("screen.not-opened")), sentence, done);
    }

    /** Lets Enter close it. */
    @Override
    public void focus() {
        done.requestFocus();
    }
}
