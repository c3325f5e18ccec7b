package bedmark.office;

import java.io.IOException;
import java.nio.file.Files;
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

/** Proves packs beside their receiving, some ahead and in their order; what is ahead is held in memory. */
final class Provers implements AutoCloseable {
    /** So many whatever they hold, and more where they are small. */
    private static final int AHEAD = 3;
    private static final int SMALL_AHEAD = 32;
    private static final long SMALL_BYTES = 64 << 20;

    private final ExecutorService threads;
    private final Iterator<Path> files;
    private final Function<Path, Proved> proving;
    private final Deque<Work> ahead = new ArrayDeque<>();

    private record Work(Future<Proved> proving, long bytes) {
    }

    Provers(List<Path> files, Function<Path, Proved> proving) {
        this.files = files.iterator();
        this.proving = proving;
        // Taking in costs about as much as proving, and takes its turn beside them: one more would only slow it.
        int many = Math.min(Runtime.getRuntime().availableProcessors(), AHEAD);
        this.threads = Executors.newFixedThreadPool(many, work -> {
            Thread thread = new Thread(work, "office-prover");
            thread.setDaemon(true);
            return thread;
        });
    }

    /** The next pack, proved. */
    Proved next() {
        begin();
        Future<Proved> next = ahead.remove().proving();
        begin();
        return await(next);
    }

    private void begin() {
        while (files.hasNext() && (ahead.size() < AHEAD || ahead.size() < SMALL_AHEAD
                && ahead.stream().mapToLong(Work::bytes).sum() < SMALL_BYTES)) {
            Path file = files.next();
            ahead.add(new Work(threads.submit(() -> proving.apply(file)), bytes(file)));
        }
    }

    /** One that can't be looked at holds nothing; proving says why. */
    private static long bytes(Path file) {
        try {
            return Files.size(file);
        } catch (IOException e) {
            return 0;
        }
    }

    /** Those that are under way: what they laid down has to be let go. */
    List<Proved> rest() {
        List<Proved> rest = new ArrayList<>();
        ahead.forEach(one -> rest.add(await(one.proving())));
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
