package bedmark.screen.part;

import bedmark.screen.theme.LevelGlyph;
import bedmark.screen.theme.LevelShape;
import java.util.List;
import java.util.stream.Stream;
import javafx.css.PseudoClass;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.layout.ColumnConstraints;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** The verdict on the spot: shape, sentence, how sure, four numbers, one action. */
public final class VerdictBlock extends VBox {
    private static final PseudoClass OVERLOADED = PseudoClass.getPseudoClass(LevelShape.OVERLOADED.styleClass());
    private static final PseudoClass NOT_INSPECTED = PseudoClass.getPseudoClass(LevelShape.NOT_INSPECTED.styleClass());

    private final LevelGlyph glyph = new LevelGlyph(LevelShape.INCOMPLETE);
    private final Label sentence = Labels.wrapped("sentence", "");
    private final Label sure = Labels.wrapped("sure", "");
    private final List<RemarkLine> remarkLines = Stream.generate(RemarkLine::new).limit(Verdict.REMARKS).toList();
    private final FlowPane remarks = new FlowPane();
    private final Label advice = Labels.wrapped("advice", "");
    private final List<FigureBlock> figures = Stream.generate(FigureBlock::new).limit(Verdict.FIGURES).toList();
    private final GridPane numbers = grid();
    private Verdict shown;

    /**
     * @param actions what can be done about it, beside the advice; at most two buttons
     */
    public VerdictBlock(List<? extends Node> actions) {
        getStyleClass().add("verdict");
        HBox head = new HBox(glyph, sentence, sure);
        head.getStyleClass().add("head");
        head.setAlignment(Pos.CENTER_LEFT);
        HBox.setHgrow(sentence, Priority.ALWAYS);
        sentence.setMaxWidth(Double.MAX_VALUE);
        remarks.getStyleClass().add("remarks");
        remarks.getChildren().addAll(remarkLines);
        remarks.managedProperty().bind(remarks.visibleProperty());
        HBox foot = new HBox(advice);
        foot.getStyleClass().add("foot");
        foot.setAlignment(Pos.CENTER_LEFT);
        HBox.setHgrow(advice, Priority.ALWAYS);
        advice.setMaxWidth(Double.MAX_VALUE);
        foot.getChildren().addAll(actions);
        getChildren().addAll(head, remarks, numbers, foot);
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
        if (verdict.equals(shown)) {
            return;
        }
        for (int i = 0; i < remarkLines.size(); i++) {
            remarkLines.get(i).show(verdict.remarks().stream().skip(i).findFirst());
        }
        remarks.setVisible(!verdict.remarks().isEmpty());
        shown = verdict;
        glyph.levelProperty().set(verdict.level());
        glyph.setAccessibleText(verdict.levelWord());
        sentence.setText(verdict.sentence());
        // The number over its words: the column beside the sentence stays narrow.
        sure.setText(verdict.sure().replaceFirst("% ", "%\n"));
        advice.setText(verdict.advice().orElse(""));
        // Only the sentence is dressed by the level: a class on the block would have all of it dressed anew.
        sentence.pseudoClassStateChanged(OVERLOADED, verdict.level() == LevelShape.OVERLOADED);
        sentence.pseudoClassStateChanged(NOT_INSPECTED, verdict.level() == LevelShape.NOT_INSPECTED);
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
