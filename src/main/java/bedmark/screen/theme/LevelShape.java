package bedmark.screen.theme;

import bedmark.picture.LevelFigure;

/** The levels as the screen shows them: their figures, and the names that the style sheet knows them by. */
public enum LevelShape {
    /** The bed lies well under its line. */
    WITHIN(LevelFigure.WITHIN),
    /** The bed comes up to its line. */
    NEAR(LevelFigure.NEAR),
    /** The bed is heaped over its line. */
    OVERLOADED(LevelFigure.OVERLOADED),
    /** The bed's surface may lie under its line or over it. */
    UNDECIDED(LevelFigure.UNDECIDED),
    /** Part of the bed has not been seen. */
    INCOMPLETE(LevelFigure.INCOMPLETE),
    /** Nobody has looked. */
    NOT_INSPECTED(LevelFigure.NOT_INSPECTED);

    private final LevelFigure figure;

    LevelShape(LevelFigure figure) {
        this.figure = figure;
    }

    /** The class that the style sheet knows the level by. */
    public String styleClass() {
        return figure.code();
    }

    LevelFigure figure() {
        return figure;
    }
}
