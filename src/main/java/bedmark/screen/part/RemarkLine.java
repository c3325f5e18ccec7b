package bedmark.screen.part;

import bedmark.screen.theme.LevelGlyph;
import bedmark.screen.theme.LevelShape;
import java.util.Optional;
import javafx.geometry.Pos;
import javafx.scene.control.Label;
import javafx.scene.layout.HBox;

/** One remark below the sentence of a verdict, with the small shape of the level that it is about. */
final class RemarkLine extends HBox {
    private final LevelGlyph glyph = new LevelGlyph(LevelShape.INCOMPLETE);
    private final Label words = Labels.label("words");

    RemarkLine() {
        getStyleClass().add("remark");
        setAlignment(Pos.CENTER_LEFT);
        glyph.managedProperty().bind(glyph.visibleProperty());
        managedProperty().bind(visibleProperty());
        getChildren().addAll(glyph, words);
    }

    /** Shows a remark, or nothing. */
    void show(Optional<Verdict.Remark> remark) {
        setVisible(remark.isPresent());
        remark.ifPresent(shown -> {
            words.setText(shown.words());
            glyph.setVisible(shown.level().isPresent());
            shown.level().filter(level -> level != glyph.levelProperty().get()).ifPresent(glyph.levelProperty()::set);
        });
    }
}
