package bedmark.office;

import bedmark.office.Receiving.Proved;
import java.nio.file.Path;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.Iterator;
import java.util.List;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.function.Function;

/** Proves packs beside their receiving, a few ahead and in their order; what is ahead is held in memory. */
final class Provers implements AutoCloseable {
    private static final int AHEAD = 3;

    private final ExecutorService threads;
    private final Iterator<Path> files;
    private final Function<Path, Proved> proving;
    private final Deque<Future<Proved>> ahead = new ArrayDeque<>();

    Provers(List<Path> files, Function<Path, Proved> proving) {
        this.files = files.iterator();
        this.proving = proving;
        int processors = Math.min(Runtime.getRuntime().availableProcessors(), AHEAD);
        this.threads = Executors.newFixedThreadPool(processors, work -> {
            Thread thread = new Thread(work, "office-prover");
            thread.setDaemon(true);
            return thread;
        });
    }

    /** The next pack, proved. */
    Proved next() {
        while (ahead.size() < AHEAD && files.hasNext()) {
            Path file = files.next();
            ahead.add(threads.submit(() -> proving.apply(file)));
        }
        return await(ahead.remove());
    }

    /** Those that are under way: what they laid down has to be let go. */
    List<Proved> rest() {
        List<Proved> rest = new ArrayList<>();
        ahead.forEach(one -> rest.add(await(one)));
        ahead.clear();
        return rest;
    }

    /** Whoever waits may be interrupted; the work is done all the same. */
    private static Proved await(Future<Proved> one) {
        boolean interrupted = false;
        try {
            while (true) {
                try {
                    return one.get();
                } catch (InterruptedException e) {
                    interrupted = true;
                } catch (ExecutionException e) {
                    throw e.getCause() instanceof RuntimeException failure ? failure
                            : new IllegalStateException(e.getCause());
                }
            }
        } finally {
            if (interrupted) {
                Thread.currentThread().interrupt();
            }
        }
    }

    @Override
    public void close() {
        threads.shutdown();
    }
}
