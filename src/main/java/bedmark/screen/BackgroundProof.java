package bedmark.screen;

import bedmark.document.Refused;
import bedmark.index.Store;
import bedmark.index.StoreCheck;
import bedmark.journal.Progress;
import java.time.Duration;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;
import java.util.function.Consumer;

/**
 * Proves a store once while it is worked with: a damaged index can leave a survey out of a list without anything failing,
 * and only the whole proof tells. It begins when the start is over and runs behind everything else.
 */
final class BackgroundProof implements AutoCloseable {
    private static final long PATIENCE_SECONDS = 10;

    private final CountDownLatch closing = new CountDownLatch(1);
    private final Thread thread;

    /**
     * @param delay   after which it begins
     * @param unsound told, on the proof's own thread, where something is wrong
     */
    BackgroundProof(Store store, Duration delay, Consumer<StoreCheck> unsound) {
        this.thread = new Thread(() -> prove(store, delay, unsound), "background-proof");
        thread.setDaemon(true);
        thread.setPriority(Thread.MIN_PRIORITY);
        thread.start();
    }

    private void prove(Store store, Duration delay, Consumer<StoreCheck> unsound) {
        try {
            if (closing.await(delay.toMillis(), TimeUnit.MILLISECONDS)) {
                return;
            }
            StoreCheck check = store.check(new Progress() {
                @Override
                public void at(long done, long total) {
                    // Nobody waits for it.
                }

                @Override
                public boolean cancelled() {
                    return closing.getCount() == 0;
                }
            });
            if (!check.sound()) {
                unsound.accept(check);
            }
        } catch (Refused e) {
            if (!e.defect().code().equals("work-cancelled")) {
                throw e;
            }
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }

    /** Stops the proof and waits until it has let go of the store. */
    @Override
    public void close() {
        closing.countDown();
        try {
            thread.join(TimeUnit.SECONDS.toMillis(PATIENCE_SECONDS));
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }
}
