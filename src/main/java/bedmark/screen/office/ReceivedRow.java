package bedmark.screen.office;

import bedmark.office.Received;
import bedmark.office.Refusal;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Plate;
import bedmark.screen.part.Texts;
import bedmark.screen.part.Weight;
import bedmark.survey.merge.Clash;
import bedmark.wording.Wording;
import java.nio.file.Path;
import java.util.Optional;
import java.util.function.Consumer;
import javafx.geometry.Pos;
import javafx.scene.control.Label;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** What came of one pack: whether it is in, in words; of an unknown tablet the question whether to trust it. */
public final class ReceivedRow extends HBox {
    private final Wording wording;
    private final VBox words = new VBox();
    private final FlowPane under = new FlowPane();

    /**
     * A pack that was refused before, with the time.
     *
     * @param putAway told that nobody waits for it any more
     */
    ReceivedRow(Wording wording, Refusal refusal, Consumer<Received.Turned> trust, Runnable putAway) {
        this(wording, refusal.turned(), Optional.empty(), trust);
        Label when = Texts.wrapped(Wording.plain(refusal.first().equals(refusal.last())
                ? wording.text("office.receive.turned", wording.moment(refusal.last()), folder(refusal))
                : wording.text("office.receive.turned-again", wording.moment(refusal.last()), folder(refusal),
                        wording.moment(refusal.first()))));
        when.getStyleClass().add("soft");
        ActionButton away = new ActionButton(Weight.PLAIN, wording.text("office.receive.put-away"), putAway);
        away.setId("put-away");
        away.setAccessibleText(away.getText() + ": " + refusal.turned().file().getFileName());
        words.getChildren().remove(under);
        words.getChildren().add(when);
        if (refusal.turned().untrusted()) {
            under.getChildren().add(away);
            words.getChildren().add(under);
        } else {
            getChildren().add(away);
        }
    }

    private static String folder(Refusal refusal) {
        return String.valueOf(refusal.turned().file().getParent());
    }

    /**
     * @param receipt where the receipt for the tablet was written
     * @param trust   told that the person compared the fingerprint of a pack's device
     */
    public ReceivedRow(Wording wording, Received received, Optional<Path> receipt,
                       Consumer<Received.Turned> trust) {
        this.wording = wording;
        getStyleClass().add("received-row");
        under.getStyleClass().add("under");
        setAlignment(Pos.CENTER_LEFT);
        words.setMinWidth(0);
        HBox.setHgrow(words, Priority.ALWAYS);
        Label file = Texts.wrapped(received.file().getFileName().toString());
        file.getStyleClass().add("zone-name");
        words.getChildren().add(file);
        getChildren().addAll(plate(received), words);
        if (received instanceof Received.Taken taken) {
            taken(taken);
        } else if (received instanceof Received.AlreadyHere here) {
            words.getChildren().add(Texts.wrapped(wording.text("office.receive.known", here.device())));
        } else if (received instanceof Received.Turned turned) {
            words.getChildren().add(Texts.wrapped(wording.sentence(turned.why())));
            turned.unsaid().ifPresent(sender -> words.getChildren()
                    .add(Texts.wrapped(Wording.plain(wording.text("office.sender." + sender.code(), sender.told())))));
            if (!turned.kept()) {
                words.getChildren().add(Texts.trouble(wording.text("office.receive.unkept")));
            }
            if (turned.untrusted()) {
                ActionButton button = new ActionButton(Weight.PRIMARY, wording.text("office.receive.trust"), () ->
                        trust.accept(turned));
                button.setId("trust");
                // Beside the words it would leave the fingerprint too little room to be compared.
                under.getChildren().add(button);
                words.getChildren().add(under);
            }
        }
        receipt.ifPresent(this::receipt);
    }

    /** A whole path is longer than a line; the folder's own name says which stick it is. */
    private void receipt(Path file) {
        Path folder = file.getParent().getFileName();
        Label written = Texts.wrapped(Wording.plain(wording.text("office.receive.receipt",
                folder == null ? file : folder.resolve(file.getFileName()))));
        written.setAccessibleText(Wording.plain(wording.text("office.receive.receipt", file)));
        written.getStyleClass().add("soft");
        words.getChildren().add(written);
    }

    private void taken(Received.Taken taken) {
        words.getChildren().add(Texts.wrapped(wording.text("office.receive.from", taken.device(), taken.fresh(),
                taken.known())));
        taken.clashes().forEach(clash -> words.getChildren().add(Texts.trouble(clash(clash))));
        if (taken.clock() > 0) {
            words.getChildren().add(Texts.trouble(wording.text("office.receive.clock", taken.clockTold())));
        }
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
