package bedmark.screen.theme;

import bedmark.picture.LevelFigure;
import java.util.List;
import java.util.stream.Stream;
import javafx.beans.property.ObjectProperty;
import javafx.beans.property.SimpleObjectProperty;
import javafx.scene.layout.Region;
import javafx.scene.shape.SVGPath;

/** Shows a level as its miniature cross-section. The words for it come from outside, as its accessible text. */
public final class LevelGlyph extends Region {

    private final ObjectProperty<LevelShape> level;
    private final SVGPath bed = path("bed");
    private final SVGPath limit = path("limit");
    private final SVGPath walls = path("walls");
    private final SVGPath dashes = path("dashes");

    public LevelGlyph(LevelShape first) {
        level = new SimpleObjectProperty<>(this, "level", first);
        setMouseTransparent(true);
        walls.setContent(LevelFigure.TROUGH + " " + LevelFigure.BOARDS);
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
        // A list holds many glyphs: a path that draws nothing would be dressed and placed all the same.
        getChildren().setAll(Stream.of(bed, limit, walls, dashes).filter(path -> !path.getContent().isEmpty())
                .toList());
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
        double left = (getWidth() - LevelFigure.WIDTH * scale) / 2;
        double top = (getHeight() - LevelFigure.HEIGHT * scale) / 2;
        for (SVGPath path : List.of(bed, limit, walls, dashes)) {
            Grid.place(path, scale, left, top);
        }
    }
}
