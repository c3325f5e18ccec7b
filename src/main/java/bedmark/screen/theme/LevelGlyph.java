package bedmark.screen.theme;

import bedmark.picture.LevelFigure;
import java.util.List;
import javafx.beans.property.ObjectProperty;
import javafx.beans.property.SimpleObjectProperty;
import javafx.scene.layout.Region;
import javafx.scene.shape.SVGPath;

/** Shows a level as its miniature cross-section. The words for it come from outside, as its accessible text. */
public final class LevelGlyph extends Region {

    private final ObjectProperty<LevelShape> level;
    private final SVGPath bed = path("bed");
    private final SVGPath limit = path("limit");
    private final SVGPath trough = path("trough");
    private final SVGPath boards = path("boards");
    private final SVGPath dashes = path("dashes");

    public LevelGlyph(LevelShape first) {
        level = new SimpleObjectProperty<>(this, "level", first);
        setMouseTransparent(true);
        trough.setContent(LevelFigure.TROUGH);
        boards.setContent(LevelFigure.BOARDS);
        getChildren().addAll(bed, limit, trough, boards, dashes);
        level.subscribe(this::draw);
    }

    public ObjectProperty<LevelShape> levelProperty() {
        return level;
    }

    private void draw(LevelShape shape) {
        getStyleClass().setAll("level-glyph", shape.styleClass());
        bed.setContent(shape.figure().bed());
        limit.setContent(shape.figure().limit());
        dashes.setContent(shape.figure().dashes());
    }

    private static SVGPath path(String styleClass) {
        SVGPath path = new SVGPath();
        path.getStyleClass().add(styleClass);
        path.setManaged(false);
        return path;
    }

    @Override
    protected void layoutChildren() {
        double scale = Math.min(getWidth() / LevelFigure.WIDTH, getHeight() / LevelFigure.HEIGHT);
        for (SVGPath path : List.of(bed, limit, trough, boards, dashes)) {
            Grid.place(path, scale, (getWidth() - LevelFigure.WIDTH * scale) / 2, (getHeight() - LevelFigure.HEIGHT * scale) / 2);
        }
    }
}
