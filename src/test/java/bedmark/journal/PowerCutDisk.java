package bedmark.journal;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.function.IntPredicate;
import java.util.stream.Stream;

/**
 * A real disk that remembers every operation, so that its state after a power cut at any point can be laid out:
 * what was forced is there; what was not is there, gone, torn or zero, in any combination, names as well as bytes.
 */
public final class PowerCutDisk extends ForwardingLayer {

    /** How a power cut treats what was not forced. */
    public enum Fate {
        LOST, KEPT, MIXED
    }

    private sealed interface Step {
        /** A name appears. */
        record Named(Path file, Contents contents) implements Step { }

        /** Bytes are written. */
        record Written(Contents contents, long at, byte[] bytes) implements Step { }

        /** A file's length shrinks, for good. */
        record Cut(Contents contents, long length) implements Step { }

        /** A file's bytes and length are on the medium. */
        record Forced(Contents contents) implements Step { }

        /** A force failed; the system forgets that these bytes still have to be written. */
        record ForceFailed(Contents contents) implements Step { }

        /** A name takes the place of another one. */
        record Moved(Path from, Path to, Contents contents) implements Step { }

        /** A name goes. */
        record Deleted(Path file) implements Step { }

        /** A folder's names are on the medium. */
        record FolderForced(Path folder) implements Step { }
    }

    /** The identity of a file, whatever its name. */
    private static final class Contents {
    }

    private final Path root;
    private final Map<Path, Contents> names = new HashMap<>();
    private final Map<Path, Contents> first = new HashMap<>();
    private final Map<Contents, byte[]> firstBytes = new HashMap<>();
    private final List<Step> steps = new ArrayList<>();
    private final IntPredicate failing;
    private final AtomicInteger forces = new AtomicInteger();

    /**
     * @param root the folder under which everything happens; what is there already counts as forced
     */
    public PowerCutDisk(Path root) throws IOException {
        this(root, force -> false);
    }

    /**
     * @param failing which forces of files fail, counted from 1
     */
    public PowerCutDisk(Path root, IntPredicate failing) throws IOException {
        super(FileLayer.disk());
        this.root = root;
        this.failing = failing;
        try (Stream<Path> files = Files.walk(root)) {
            for (Path file : files.filter(Files::isRegularFile).toList()) {
                Contents contents = new Contents();
                names.put(file, contents);
                first.put(file, contents);
                firstBytes.put(contents, Files.readAllBytes(file));
            }
        }
    }

    /** How many forces of files there were until now. */
    public int forces() {
        return forces.get();
    }

    /** How many operations there were until now. */
    public synchronized int operations() {
        return steps.size();
    }

    private synchronized void add(Step step) {
        steps.add(step);
    }

    /** Lays the disk out as it is after a power cut that comes after so many operations. */
    public synchronized void layOut(int after, Fate fate, Random random, Path target) throws IOException {
        Map<Contents, byte[]> bytes = bytes(after, fate, random);
        for (Map.Entry<Path, Contents> name : names(after, fate, random).entrySet()) {
            Path file = target.resolve(root.relativize(name.getKey()).toString());
            Files.createDirectories(file.getParent());
            Files.write(file, bytes.getOrDefault(name.getValue(), new byte[0]));
        }
        Files.createDirectories(target);
    }

    private Map<Contents, byte[]> bytes(int after, Fate fate, Random random) {
        Map<Contents, byte[]> bytes = new HashMap<>(firstBytes);
        for (int i = 0; i < after; i++) {
            if (steps.get(i) instanceof Step.Written written) {
                boolean sure = forcedNext(i, after, written.contents());
                byte[] stays = sure ? written.bytes() : unsure(written.bytes(), fate, random);
                if (stays.length > 0) {
                    bytes.putIfAbsent(written.contents(), new byte[0]);
                    bytes.compute(written.contents(), (contents, old) -> put(old, written.at(), stays));
                }
            } else if (steps.get(i) instanceof Step.Cut cut) {
                bytes.computeIfPresent(cut.contents(), (contents, old) -> Arrays.copyOf(old, (int) cut.length()));
            }
        }
        return bytes;
    }

    /** Whether the first force after a step succeeded; a later one does not make up for one that failed. */
    private boolean forcedNext(int from, int after, Contents contents) {
        return steps.subList(from, after).stream()
                .filter(step -> step instanceof Step.Forced forced && forced.contents() == contents
                        || step instanceof Step.ForceFailed failed && failed.contents() == contents)
                .findFirst().filter(step -> step instanceof Step.Forced).isPresent();
    }

    private static byte[] put(byte[] old, long at, byte[] more) {
        byte[] longer = Arrays.copyOf(old, Math.max(old.length, (int) at + more.length));
        System.arraycopy(more, 0, longer, (int) at, more.length);
        return longer;
    }

    private static byte[] unsure(byte[] written, Fate fate, Random random) {
        if (fate == Fate.KEPT) {
            return written;
        }
        if (fate == Fate.LOST) {
            return new byte[0];
        }
        int torn = random.nextInt(written.length + 1);
        return switch (random.nextInt(5)) {
            case 0 -> written;
            case 1 -> new byte[0];
            case 2 -> Arrays.copyOf(written, torn);
            // The length is there, the bytes are not.
            case 3 -> new byte[written.length];
            default -> Arrays.copyOf(Arrays.copyOf(written, torn), written.length);
        };
    }

    private Map<Path, Contents> names(int after, Fate fate, Random random) {
        Map<Path, Contents> there = new HashMap<>(first);
        for (int i = 0; i < after; i++) {
            Step step = steps.get(i);
            if (step instanceof Step.Named named && stays(i, after, named.file(), fate, random)) {
                there.put(named.file(), named.contents());
            } else if (step instanceof Step.Moved moved && stays(i, after, moved.to(), fate, random)) {
                there.remove(moved.from());
                there.put(moved.to(), moved.contents());
            } else if (step instanceof Step.Deleted deleted && stays(i, after, deleted.file(), fate, random)) {
                there.remove(deleted.file());
            }
        }
        return there;
    }

    private boolean stays(int from, int after, Path file, Fate fate, Random random) {
        boolean sure = steps.subList(from, after).stream().anyMatch(step ->
                step instanceof Step.FolderForced forced && forced.folder().equals(file.getParent()));
        return sure || fate == Fate.KEPT || fate == Fate.MIXED && random.nextBoolean();
    }

    @Override
    public synchronized Output create(Path file) throws IOException {
        Output output = super.create(file);
        Contents contents = new Contents();
        names.put(file, contents);
        add(new Step.Named(file, contents));
        return new Remembered(output, contents, 0);
    }

    @Override
    public Output createPrivate(Path file) throws IOException {
        return create(file);
    }

    @Override
    public synchronized Output append(Path file) throws IOException {
        Output output = super.append(file);
        return new Remembered(output, names.get(file), output.size());
    }

    @Override
    public synchronized void truncate(Path file, long length) throws IOException {
        super.truncate(file, length);
        add(new Step.Cut(names.get(file), length));
        add(new Step.Forced(names.get(file)));
    }

    @Override
    public synchronized void move(Path from, Path to) throws IOException {
        super.move(from, to);
        Contents contents = names.remove(from);
        names.put(to, contents);
        add(new Step.Moved(from, to, contents));
    }

    @Override
    public synchronized void delete(Path file) throws IOException {
        super.delete(file);
        names.remove(file);
        add(new Step.Deleted(file));
    }

    @Override
    public synchronized void forceFolder(Path folder) throws IOException {
        super.forceFolder(folder);
        add(new Step.FolderForced(folder));
    }

    private final class Remembered extends ForwardingOutput {
        private final Contents contents;
        private long size;

        Remembered(Output output, Contents contents, long size) {
            super(output);
            this.contents = contents;
            this.size = size;
        }

        @Override
        public void write(ByteBuffer bytes) throws IOException {
            byte[] written = new byte[bytes.remaining()];
            bytes.duplicate().get(written);
            super.write(bytes);
            add(new Step.Written(contents, size, written));
            size += written.length;
        }

        @Override
        public void force() throws IOException {
            if (failing.test(forces.incrementAndGet())) {
                add(new Step.ForceFailed(contents));
                throw new IOException("Input/output error");
            }
            super.force();
            add(new Step.Forced(contents));
        }
    }
}
