package bedmark.screen;

import javafx.animation.AnimationTimer;

/**
 * Does something once the screen has been drawn, so that nobody waits for it. The toolkit draws a frame behind the
 * timers of its pulse: what is done at one pulse holds up the frame of that pulse and of none before it.
 */
public final class AfterFrames extends AnimationTimer {
    private final Runnable then;
    private int left;

    private AfterFrames(int frames, Runnable then) {
        this.left = frames;
        this.then = then;
    }

    /**
     * Called by the screen.
     *
     * @param frames how many are drawn before, at least 1
     * @return which can be stopped as long as it has not been done
     */
    public static AfterFrames run(int frames, Runnable then) {
        AfterFrames waiting = new AfterFrames(frames, then);
        waiting.start();
        return waiting;
    }

    @Override
    public void handle(long now) {
        if (left-- == 0) {
            stop();
            then.run();
        }
    }
}
