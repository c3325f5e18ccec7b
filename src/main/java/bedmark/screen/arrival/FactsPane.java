package bedmark.screen.arrival;

import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.Texts;
import bedmark.wording.Wording;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import javafx.scene.layout.ColumnConstraints;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.VBox;

/** Who made a file, when, and what is in it, each under its name. */
final class FactsPane extends VBox {
    private final Wording wording;
    private final List<VBox> facts = new ArrayList<>();
    private final GridPane grid = new GridPane();

    FactsPane(Wording wording, Path file, Optional<Arrived> arrived) {
        this.wording = wording;
        getStyleClass().add("questions-inside");
        grid.getStyleClass().add("facts");
        getChildren().addAll(new SectionHeader(wording.text("arrival.facts")), grid);
        arrived.ifPresent(this::told);
        fact("arrival.file", file.getFileName().toString());
    }

    /** Upright there is room for two columns. */
    void turned(boolean portrait) {
        int columns = portrait ? 2 : 1;
        ColumnConstraints share = new ColumnConstraints();
        share.setPercentWidth(100.0 / columns);
        grid.getColumnConstraints().setAll(Collections.nCopies(columns, share));
        grid.getChildren().clear();
        for (int i = 0; i < facts.size(); i++) {
            grid.add(facts.get(i), i % columns, i / columns);
        }
    }

    private void told(Arrived arrived) {
        if (arrived instanceof Arrived.Pack pack) {
            signed("arrival.device", pack.device(), arrived);
            whereAndWhen(pack.plant(), pack.rounds(), pack.madeAt());
            fact("arrival.surveys", number(pack.surveys().size()));
            fact("arrival.photos", number(pack.photos()));
        } else if (arrived instanceof Arrived.NextRound round) {
            signed("arrival.office", round.office(), arrived);
            whereAndWhen(round.plant(), round.rounds(), round.madeAt());
            fact("arrival.results", number(round.results()));
            fact("arrival.notes", number(round.notes()));
        } else if (arrived instanceof Arrived.Receipt receipt) {
            signed("arrival.office", receipt.office(), arrived);
            fact("arrival.received", wording.moment(receipt.receivedAt()));
            fact("arrival.confirmed", number(receipt.surveys()));
            fact("arrival.pack", receipt.pack());
        }
    }

    /** The signature was proved when the file was read; without that there is nothing to tell. */
    private void signed(String key, String name, Arrived arrived) {
        fact(key, name.isBlank() ? wording.text("arrival.nameless") : name);
        fact("arrival.signature", wording.text("arrival.signature.valid"));
        // Four groups to a line, so that two people keep their place when they compare it aloud.
        facts.add(Texts.named(wording.text("arrival.key"), arrived.fingerprint().text()
                .replaceAll("((?:[0-9a-f]{4}-){4})", "$1\n")));
    }

    private void whereAndWhen(String plant, List<String> rounds, Optional<OffsetDateTime> madeAt) {
        fact("arrival.plant", plant);
        if (!rounds.isEmpty()) {
            fact("arrival.rounds", String.join(" · ", rounds));
        }
        madeAt.ifPresent(at -> fact("arrival.made", wording.moment(at)));
    }

    private String number(int count) {
        return wording.format().computed(count, 0);
    }

    private void fact(String key, String value) {
        facts.add(Texts.named(wording.text(key), Wording.plain(value)));
    }
}
