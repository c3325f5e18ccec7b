package bedmark.screen.theme;

import java.util.List;
import javafx.beans.property.ObjectProperty;
import javafx.beans.property.SimpleObjectProperty;
import javafx.scene.layout.Region;
import javafx.scene.shape.SVGPath;

/** Shows a level as its miniature cross-section. The words for it come from outside, as its accessible text. */
public final class LevelGlyph extends Region {
    private static final double WIDTH = 40;
    private static final double HEIGHT = 30;

    private final ObjectProperty<LevelShape> level;
    private final SVGPath bed = path("bed");
    private final SVGPath limit = path("limit");
    private final SVGPath trough = path("trough");
    private final SVGPath boards = path("boards");
    private final SVGPath dashes = path("dashes");

    public LevelGlyph(LevelShape first) {
        level = new SimpleObjectProperty<>(this, "level", first);
        setMouseTransparent(true);
        trough.setContent(LevelShape.Shapes.TROUGH);
        boards.setContent(LevelShape.Shapes.BOARDS);
        getChildren().addAll(bed, limit, trough, boards, dashes);
        level.subscribe(this::draw);
    }

    public ObjectProperty<LevelShape> levelProperty() {
        return level;
    }

    private void draw(LevelShape shape) {
        getStyleClass().setAll("level-glyph", shape.styleClass());
        bed.setContent(shape.bed());
        limit.setContent(shape.limit());
        dashes.setContent(shape.dashes());
    }

    private static SVGPath path(String styleClass) {
        SVGPath path = new SVGPath();
        path.getStyleClass().add(styleClass);
        path.setManaged(false);
        return path;
    }

    @Override
    protected void layoutChildren() {
        double scale = Math.min(getWidth() / WIDTH, getHeight() / HEIGHT);
        for (SVGPath path : List.of(bed, limit, trough, boards, dashes)) {
            Grid.place(path, scale, (getWidth() - WIDTH * scale) / 2, (getHeight() - HEIGHT * scale) / 2);
        }
    }
}
