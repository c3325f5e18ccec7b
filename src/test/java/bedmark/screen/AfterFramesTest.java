package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.ArrayList;
import java.util.List;
import javafx.animation.AnimationTimer;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.testfx.api.FxToolkit;
import org.testfx.util.WaitForAsyncUtils;

/** What waits until the screen has been drawn. */
class AfterFramesTest {
    private final List<String> happened = new ArrayList<>();

    @BeforeEach
    void startToolkit() throws Exception {
        FxToolkit.registerPrimaryStage();
    }

    /** Notes each pulse as long as somebody looks. */
    private final AnimationTimer pulses = new AnimationTimer() {
        @Override
        public void handle(long now) {
            happened.add("pulse");
        }
    };

    private void until(int noted) throws Exception {
        WaitForAsyncUtils.waitFor(10, java.util.concurrent.TimeUnit.SECONDS,
                () -> Glass.on(() -> happened.size() >= noted));
    }

    @Test
    void comesAtThePulseBehindTheFrames() throws Exception {
        Glass.on(() -> {
            pulses.start();
            AfterFrames.run(2, () -> happened.add("done"));
            return null;
        });
        until(6);
        assertEquals(List.of("pulse", "pulse", "pulse", "done", "pulse", "pulse"),
                Glass.on(() -> List.copyOf(happened).subList(0, 6)));
        Glass.on(() -> {
            pulses.stop();
            return null;
        });
    }

    @Test
    void isLeftUndoneOnceStopped() throws Exception {
        Glass.on(() -> {
            pulses.start();
            AfterFrames.run(1, () -> happened.add("done")).stop();
            return null;
        });
        until(4);
        assertEquals(List.of("pulse", "pulse", "pulse", "pulse"),
                Glass.on(() -> List.copyOf(happened).subList(0, 4)));
        Glass.on(() -> {
            pulses.stop();
            return null;
        });
    }
}
