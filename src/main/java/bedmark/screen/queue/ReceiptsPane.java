package bedmark.screen.queue;

import bedmark.dispatch.ReceiptBook;
import bedmark.pack.SignedReceipt;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.Texts;
import bedmark.screen.part.Weight;
import bedmark.wording.Wording;
import javafx.scene.control.Label;
import javafx.scene.layout.VBox;

/** What the office's receipts came to, in words; and the question whether an office is to be trusted. */
final class ReceiptsPane extends VBox {
    private final Wording wording;
    private final ReceiptsModel.Result result;

    ReceiptsPane(Wording wording, ReceiptsModel.Result result, ReceiptsModel model, Runnable then) {
        this.wording = wording;
        this.result = result;
        getStyleClass().add("questions-inside");
        getChildren().add(new SectionHeader(wording.text("queue.receipts")));
        result.unknown().forEach(unknown -> getChildren().add(question(unknown, model, then)));
        result.outcomes().forEach(this::told);
        result.refused().forEach(wrong -> getChildren().add(Texts.trouble(Wording.plain(wrong.file()) + ": "
                + wording.sentence(wrong.defect()))));
    }

    private VBox question(SignedReceipt unknown, ReceiptsModel model, Runnable then) {
        String office = unknown.receipt().office().name();
        Label title = Texts.wrapped(wording.text("queue.office-unknown", office));
        title.getStyleClass().add("card-title");
        ActionButton accept = new ActionButton(Weight.PRIMARY, wording.text("queue.office-accept"),
                () -> model.accept(unknown.fingerprint(), then));
        accept.setId("accept-office");
        accept.setMinWidth(0);
        accept.setMaxWidth(Double.MAX_VALUE);
        VBox box = new VBox(title, Texts.named(wording.text("queue.office-key"), unknown.fingerprint().toString()),
                Texts.wrapped(wording.text("queue.office-compare")), accept);
        box.getStyleClass().add("receipt");
        return box;
    }

    private void told(ReceiptBook.Outcome outcome) {
        Label told = Texts.wrapped(wording.text("queue.receipt", outcome.receipt().office().name(),
                outcome.received().size(), outcome.known().size()));
        if (outcome.equals(result.outcomes().get(0))) {
            told.setId("received");
        }
        getChildren().add(told);
        if (!outcome.differing().isEmpty()) {
            getChildren().add(Texts.trouble(wording.text("queue.receipt-differs", outcome.differing().size())));
        }
    }
}
