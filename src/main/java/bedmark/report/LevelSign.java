package bedmark.report;

import bedmark.office.Place;
import bedmark.picture.Ink;
import bedmark.picture.LevelFigure;
import bedmark.report.paper.Grid;
import bedmark.report.paper.Leaf;

/** The miniature cross-section of a level, as the screen shows it; it says the same as the word beside it. */
final class LevelSign implements Grid.Sign {
    private static final double WHITE = 4;
    private static final double STROKE = 2.4;
    private static final double LINE = 1.8;

    private final LevelFigure figure;
    private final double height;

    /** @param height (pt) */
    LevelSign(Place place, double height) {
        figure = switch (place) {
            case OVERLOADED -> LevelFigure.OVERLOADED;
            case UNDECIDED -> LevelFigure.UNDECIDED;
            case INCOMPLETE -> LevelFigure.INCOMPLETE;
            case NOT_INSPECTED, STALE -> LevelFigure.NOT_INSPECTED;
            case NEAR -> LevelFigure.NEAR;
            case WITHIN -> LevelFigure.WITHIN;
        };
        this.height = height;
    }

    private double scale() {
        return height / LevelFigure.HEIGHT;
    }

    @Override
    public double width() {
        return LevelFigure.WIDTH * scale() + WHITE;
    }

    @Override
    public void draw(Leaf leaf, double x, double top) {
        boolean over = figure == LevelFigure.OVERLOADED;
        Ink ink = over ? Ink.OVER : figure == LevelFigure.NOT_INSPECTED ? Ink.SOFT : Ink.INK;
        leaf.shape(figure.bed(), over ? Ink.OVER : Ink.SOFT, 0, true, x, top, scale());
        leaf.shape(figure.limit(), over ? Ink.PAPER : Ink.INK, LINE, false, x, top, scale());
        leaf.shape(LevelFigure.TROUGH, ink, STROKE, false, x, top, scale());
        leaf.shape(LevelFigure.BOARDS, ink, STROKE, false, x, top, scale());
        leaf.shape(figure.dashes(), ink, over ? LINE : STROKE, false, x, top, scale());
    }
}
