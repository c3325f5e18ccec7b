package bedmark.screen.part;

import bedmark.screen.theme.LevelGlyph;
import bedmark.screen.theme.LevelShape;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.layout.ColumnConstraints;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/** The verdict on the spot: shape, sentence, how sure, four numbers, one action. */
public final class VerdictBlock extends VBox {
    private final LevelGlyph glyph = new LevelGlyph(LevelShape.INCOMPLETE);
    private final Label sentence = Labels.wrapped("sentence", "");
    private final Label sure = Labels.label("sure");
    private final Label advice = Labels.wrapped("advice", "");
    private final List<FigureBlock> figures = Stream.generate(FigureBlock::new).limit(Verdict.FIGURES).toList();
    private final GridPane numbers = grid();

    /**
     * @param action what can be done about it, beside the advice; usually one button
     */
    public VerdictBlock(Optional<Node> action) {
        getStyleClass().add("verdict");
        HBox head = new HBox(glyph, sentence, sure);
        head.getStyleClass().add("head");
        head.setAlignment(Pos.CENTER_LEFT);
        HBox.setHgrow(sentence, Priority.ALWAYS);
        sentence.setMaxWidth(Double.MAX_VALUE);
        sure.setMinWidth(Region.USE_PREF_SIZE);
        HBox foot = new HBox(advice);
        foot.getStyleClass().add("foot");
        foot.setAlignment(Pos.CENTER_LEFT);
        HBox.setHgrow(advice, Priority.ALWAYS);
        advice.setMaxWidth(Double.MAX_VALUE);
        action.ifPresent(foot.getChildren()::add);
        getChildren().addAll(head, numbers, foot);
        setFocusTraversable(false);
    }

    private GridPane grid() {
        GridPane grid = new GridPane();
        grid.getStyleClass().add("figures");
        double[] shares = {31, 27, 21, 21};
        for (int i = 0; i < figures.size(); i++) {
            ColumnConstraints column = new ColumnConstraints();
            column.setPercentWidth(shares[i]);
            grid.getColumnConstraints().add(column);
            grid.add(figures.get(i), i, 0);
        }
        return grid;
    }

    public void show(Verdict verdict) {
        glyph.levelProperty().set(verdict.level());
        glyph.setAccessibleText(verdict.levelWord());
        sentence.setText(verdict.sentence());
        sure.setText(verdict.sure());
        advice.setText(verdict.advice().orElse(""));
        getStyleClass().setAll("verdict", verdict.level().styleClass());
        numbers.setVisible(!verdict.figures().isEmpty());
        numbers.setManaged(!verdict.figures().isEmpty());
        for (int i = 0; i < figures.size(); i++) {
            figures.get(i).setVisible(i < verdict.figures().size());
            if (i < verdict.figures().size()) {
                figures.get(i).show(verdict.figures().get(i));
            }
        }
        setAccessibleText(verdict.levelWord() + ". " + verdict.sentence() + " " + verdict.sure());
    }
}
