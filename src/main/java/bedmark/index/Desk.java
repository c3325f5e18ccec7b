package bedmark.index;

import java.util.concurrent.Callable;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.FutureTask;
import java.util.concurrent.RejectedExecutionException;

/**
 * One thread that does all work of its kind in order and is never interrupted: an interrupted thread closes the files
 * and the database that it is busy with. Whoever waits may be interrupted; the work is done all the same.
 */
public final class Desk implements AutoCloseable {
    private final ExecutorService thread;

    public Desk(String name) {
        thread = Executors.newSingleThreadExecutor(work -> {
            Thread one = new Thread(work, name);
            one.setDaemon(true);
            return one;
        });
    }

    /** Does work and waits for its result. */
    public <T> T call(Callable<T> work) {
        FutureTask<T> task = new FutureTask<>(work);
        begin(task);
        return await(task);
    }

    /** Takes work that nobody waits for; it is done before all that is taken later. */
    public void begin(Runnable work) {
        try {
            thread.execute(work);
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

    /** Takes no more work; what was taken is done. */
    @Override
    public void close() {
        thread.shutdown();
    }
}
