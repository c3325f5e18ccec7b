package bedmark.screen.part;

import javafx.geometry.Orientation;
import javafx.scene.layout.Region;

/**
 * Holds a part that often changes what it says and seldom how high it has to be: what changes in it is laid out again
 * within it, and the screen around it only where the part then wants another height, in the same frame. The part fills
 * it, and takes whatever width there is: were it to ask for more at one word, it would keep it at the next.
 */
public final class Steady extends Region {
    private final Region held;
    /** Whether the part asked to be laid out since it was last asked how high it wants to be. */
    private boolean changed;
    /** How high it wanted to be when the screen around it was last laid out. */
    private double wanted;

    /** @param held a part that is as high as its width lets it be */
    public Steady(Region held) {
        this.held = held;
        held.setManaged(false);
        getChildren().add(held);
        held.needsLayoutProperty().subscribe(needs -> changed |= needs);
        AfterLayout.in(this, this::laidOut);
    }

    private void laidOut() {
        if (changed && getWidth() > 0) {
            changed = false;
            if (held.prefHeight(getWidth()) != wanted) {
                requestLayout();
                getScene().getRoot().layout();
            }
        }
    }

    @Override
    public Orientation getContentBias() {
        return Orientation.HORIZONTAL;
    }

    @Override
    protected double computeMinWidth(double height) {
        return 0;
    }

    @Override
    protected double computeMinHeight(double width) {
        return held.minHeight(width);
    }

    @Override
    protected double computePrefWidth(double height) {
        return held.prefWidth(height);
    }

    @Override
    protected double computePrefHeight(double width) {
        return held.prefHeight(width);
    }

    @Override
    protected void layoutChildren() {
        wanted = held.prefHeight(getWidth());
        held.resizeRelocate(0, 0, getWidth(), getHeight());
    }
}
