package bedmark.screen.zone;

import bedmark.wording.Wording;
import java.util.HashMap;
import java.util.Map;
import java.util.Optional;
import java.util.function.DoubleUnaryOperator;
import javafx.scene.layout.StackPane;

/** The place of a row in the form: as high as a row, and empty until the row is built. */
final class RowPlace extends StackPane {
    private final SlotRow row;
    private final ZoneModel model;
    private final Wording wording;
    private final boolean quiet;
    private Optional<RowView> view = Optional.empty();
    private boolean upright;
    private final Map<Double, Double> heights = new HashMap<>();
    private final Map<Double, Double> leastHeights = new HashMap<>();

    /** @param quiet whether what is to be said of the row is said elsewhere */
    RowPlace(SlotRow row, ZoneModel model, Wording wording, boolean quiet) {
        this.row = row;
        this.model = model;
        this.wording = wording;
        this.quiet = quiet;
        getStyleClass().addAll("row-place", "to-come");
    }

    SlotRow row() {
        return row;
    }

    boolean isBuilt() {
        return view.isPresent();
    }

    void build() {
        built();
    }

    /** The row, built now where it was not. */
    RowView built() {
        if (view.isEmpty()) {
            view = Optional.of(new RowView(row, model, wording, quiet));
            view.orElseThrow().turned(upright);
            getStyleClass().remove("to-come");
            getChildren().setAll(view.orElseThrow());
        }
        return view.orElseThrow();
    }

    /** Told when the tablet is turned. */
    void turned(boolean portrait) {
        upright = portrait;
        view.ifPresent(row -> row.turned(portrait));
    }

    @Override
    public void requestLayout() {
        heights.clear();
        leastHeights.clear();
        super.requestLayout();
    }

    @Override
    protected double computePrefHeight(double width) {
        return known(heights, width, super::computePrefHeight);
    }

    @Override
    protected double computeMinHeight(double width) {
        return known(leastHeights, width, super::computeMinHeight);
    }

    /** A key changes one row; the list asks all of them how high they are, at its own width and at any. */
    private static double known(Map<Double, Double> heights, double width, DoubleUnaryOperator height) {
        Double known = heights.get(width);
        if (known == null) {
            known = height.applyAsDouble(width);
            heights.put(width, known);
        }
        return known;
    }

    /** Shows what the survey holds now, where the row is built. */
    void update() {
        view.ifPresent(RowView::update);
    }

    /** Whether the active cell is in this row. */
    boolean holdsActive() {
        return row.slots().stream().anyMatch(slot -> slot.where().equals(model.active().where()));
    }
}
