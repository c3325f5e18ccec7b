package bedmark.screen;

import bedmark.screen.theme.Light;
import java.time.Clock;
import java.time.LocalTime;
import java.util.function.Consumer;
import java.util.function.Supplier;
import javafx.animation.Animation;
import javafx.animation.KeyFrame;
import javafx.animation.Timeline;
import javafx.util.Duration;

/**
 * The light of one window. Day and night change while a screen is worked on: it keeps its focus and what is typed, only
 * colours change.
 */
public final class ClockedLight {
    private static final Duration TICK = Duration.seconds(20);

    private final Clock clock;
    private final Supplier<Lighting> chosen;
    private final Consumer<Light> dressing;
    private final Timeline ticks = new Timeline(new KeyFrame(TICK, event -> follow()));
    private Light worn = Light.DAY;

    /**
     * Follows the clock until it is stopped; nothing is dressed yet.
     *
     * @param chosen   what the person chose
     * @param dressing dresses the window in a light
     */
    public ClockedLight(Clock clock, Supplier<Lighting> chosen, Consumer<Light> dressing) {
        this.clock = clock;
        this.chosen = chosen;
        this.dressing = dressing;
        ticks.setCycleCount(Animation.INDEFINITE);
        ticks.play();
    }

    private Light wanted() {
        return chosen.get().at(LocalTime.now(clock));
    }

    /** Dresses the window as its person likes it now. */
    public void dress() {
        worn = wanted();
        dressing.accept(worn);
    }

    /** Dresses the window where the clock brought another light. */
    public void follow() {
        if (wanted() != worn) {
            dress();
        }
    }

    /** Looks at no clock any more. */
    public void stop() {
        ticks.stop();
    }
}
