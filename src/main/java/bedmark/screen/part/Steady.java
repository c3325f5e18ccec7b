package bedmark.screen.part;

import javafx.scene.layout.Region;

/**
 * An island for a part that often changes what it says and seldom how high it has to be: the screen around it is laid
 * out only where the part wants another height, in the same frame. The part takes whatever width there is: were it to
 * ask for more at one word, it would keep it at the next.
 */
public final class Steady extends Island {
    private final Region held;
    /** Whether the part asked to be laid out since it was last asked how high it wants to be. */
    private boolean changed;
    /** How high it wanted to be when the screen around it was last laid out. */
    private double wanted;

    /** @param held a part that is as high as its width lets it be */
    public Steady(Region held) {
        super(held);
        this.held = held;
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
    protected double computeMinWidth(double height) {
        return 0;
    }

    @Override
    protected void layoutChildren() {
        wanted = held.prefHeight(getWidth());
        super.layoutChildren();
    }
}
