package bedmark.screen.part;

import javafx.geometry.Orientation;
import javafx.scene.layout.Region;

/**
 * Holds a part whose size does not depend on what it says: what changes in it is laid out again within it, and the
 * screen around it is not. The part fills it.
 */
public class Island extends Region {
    private final Region held;

    /** @param held the part; how large it wants to be is asked whenever the surroundings are laid out */
    public Island(Region held) {
        this.held = held;
        held.setManaged(false);
        getChildren().add(held);
    }

    @Override
    public Orientation getContentBias() {
        return held.getContentBias();
    }

    @Override
    protected double computeMinWidth(double height) {
        return held.minWidth(height);
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
        held.resizeRelocate(0, 0, getWidth(), getHeight());
    }
}
