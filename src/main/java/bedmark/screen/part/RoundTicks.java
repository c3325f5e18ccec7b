package bedmark.screen.part;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;
import javafx.css.PseudoClass;
import javafx.scene.layout.Region;

/**
 * The round as a strip of ticks in walking order: one for each transfer point, what was found by shape and colour, the
 * one in hand framed. Where the room is too narrow for all to be told apart, those around the one in hand are shown;
 * the words for the whole strip come in as its accessible text.
 */
public final class RoundTicks extends Region {
    private static final PseudoClass CURRENT = PseudoClass.getPseudoClass("current");
    private static final double PITCH_TO_HEIGHT = 18.0 / 32;
    private static final double WIDTH_TO_PITCH = 13.0 / 18;
    private static final double PLAIN_HEIGHT = 0.72;
    private static final double SKIPPED_HEIGHT = 0.14;
    /** Narrower than this (px) ticks run into one another. */
    private static final double LEAST_PITCH = 5;
    /** How wide (px) each is then, where only some are shown. */
    private static final double SOME_PITCH = 9;

    /** What a tick says about its transfer point. */
    public enum Tick {
        TO_DO("to-do"),
        WITHIN("within"),
        NEAR("near"),
        OVERLOADED("overloaded"),
        UNDECIDED("undecided"),
        INCOMPLETE("incomplete"),
        /** Not inspected, for a reason. */
        SKIPPED("skipped");

        private final String styleClass;

        Tick(String styleClass) {
            this.styleClass = styleClass;
        }
    }

    private List<Tick> ticks = List.of();
    private OptionalInt current = OptionalInt.empty();

    public RoundTicks() {
        getStyleClass().add("round-ticks");
    }

    /** Shows the round. */
    public void show(List<Tick> round, OptionalInt inHand) {
        ticks = List.copyOf(round);
        current = inHand;
        List<Region> regions = new ArrayList<>();
        for (int i = 0; i < ticks.size(); i++) {
            Region region = new Region();
            region.getStyleClass().addAll("tick", ticks.get(i).styleClass);
            region.pseudoClassStateChanged(CURRENT, isCurrent(i));
            region.setManaged(false);
            regions.add(region);
        }
        getChildren().setAll(regions);
        requestLayout();
    }

    private boolean isCurrent(int index) {
        return current.isPresent() && current.getAsInt() == index;
    }

    /** How much of the strip's height a tick takes. */
    private double share(int index) {
        if (isCurrent(index) || ticks.get(index) == Tick.OVERLOADED) {
            return 1;
        }
        return ticks.get(index) == Tick.SKIPPED ? SKIPPED_HEIGHT : PLAIN_HEIGHT;
    }

    @Override
    protected double computePrefWidth(double height) {
        return snappedLeftInset() + snappedRightInset() + ticks.size() * PITCH_TO_HEIGHT * getPrefHeight();
    }

    @Override
    protected void layoutChildren() {
        double left = snappedLeftInset();
        double room = getWidth() - left - snappedRightInset();
        double tall = getHeight() - snappedTopInset() - snappedBottomInset();
        int fitting = room >= ticks.size() * LEAST_PITCH ? Math.max(1, ticks.size())
                : (int) Math.max(1, Math.floor(room / SOME_PITCH));
        int first = Math.max(0, Math.min(current.orElse(0) - fitting / 2, ticks.size() - fitting));
        double pitch = Math.min(PITCH_TO_HEIGHT * tall, room / fitting);
        double start = left + (room - pitch * fitting) / 2;
        for (int i = 0; i < ticks.size(); i++) {
            double height = snapSizeY(tall * share(i));
            double width = Math.max(3, snapSizeX(pitch * WIDTH_TO_PITCH));
            int place = i - first;
            getChildren().get(i).setVisible(place >= 0 && place < fitting);
            getChildren().get(i).resizeRelocate(snapPositionX(start + place * pitch + (pitch - width) / 2),
                    snapPositionY(snappedTopInset() + (tall - height) / 2), width, height);
        }
    }
}
