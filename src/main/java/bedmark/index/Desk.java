package bedmark.index;

import java.util.concurrent.Callable;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.FutureTask;
import java.util.concurrent.RejectedExecutionException;
import java.util.concurrent.ScheduledThreadPoolExecutor;
import java.util.concurrent.TimeUnit;

/**
 * One thread that does all work of its kind in order and is never interrupted: an interrupted thread closes the files
 * and the database that it is busy with. Whoever waits may be interrupted; the work is done all the same.
 */
public final class Desk implements AutoCloseable {
    private final ScheduledThreadPoolExecutor thread;

    public Desk(String name) {
        thread = new ScheduledThreadPoolExecutor(1, work -> {
            Thread one = new Thread(work, name);
            one.setDaemon(true);
            return one;
        });
        thread.setExecuteExistingDelayedTasksAfterShutdownPolicy(false);
    }

    /** Does work and waits for its result. */
    public <T> T call(Callable<T> work) {
        FutureTask<T> task = new FutureTask<>(work);
        begin(task, 0);
        return await(task);
    }

    /** Takes work that nobody waits for, to be done after so many milliseconds, or not at all once this is closed. */
    void begin(Runnable work, long millis) {
        try {
            thread.schedule(work, millis, TimeUnit.MILLISECONDS);
        } catch (RejectedExecutionException e) {
            throw new IllegalStateException("the store is closed", e);
        }
    }

    private static <T> T await(FutureTask<T> task) {
        boolean interrupted = false;
        try {
            while (true) {
                try {
                    return task.get();
                } catch (InterruptedException e) {
                    interrupted = true;
                } catch (ExecutionException e) {
                    throw thrown(e.getCause());
                }
            }
        } finally {
            if (interrupted) {
                Thread.currentThread().interrupt();
            }
        }
    }

    private static RuntimeException thrown(Throwable cause) {
        if (cause instanceof Error error) {
            throw error;
        }
        return cause instanceof RuntimeException unchecked ? unchecked : new IllegalStateException(cause);
    }

    /** Takes no more work; what somebody waits for is done. */
    @Override
    public void close() {
        thread.shutdown();
    }
}
