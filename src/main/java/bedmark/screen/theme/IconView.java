package bedmark.screen.theme;

import javafx.scene.layout.Region;
import javafx.scene.shape.SVGPath;

/** Shows an icon at the size that the style sheet gives it, strokes scaled along. */
public final class IconView extends Region {
    private static final double GRID = 24;

    private final SVGPath strokes = new SVGPath();

    public IconView(Icon icon) {
        getStyleClass().add("icon");
        setMouseTransparent(true);
        strokes.getStyleClass().add("strokes");
        strokes.setContent(icon.path());
        strokes.setManaged(false);
        getChildren().add(strokes);
    }

    @Override
    protected void layoutChildren() {
        double scale = Math.min(getWidth(), getHeight()) / GRID;
        Grid.place(strokes, scale, (getWidth() - GRID * scale) / 2, (getHeight() - GRID * scale) / 2);
    }
}
