package bedmark.pack;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Supplier;

/** A disk whose nth step fails, and with it, if it is gone for good, every later one but deleting. */
final class FailingDisk implements Disk {
    private final Disk real = new SystemDisk();
    private final int failing;
    private final boolean forGood;
    private final Supplier<IOException> failure;
    final List<String> steps = new ArrayList<>();
    long free = 1L << 40;

    FailingDisk(int failing, boolean forGood, Supplier<IOException> failure) {
        this.failing = failing;
        this.forGood = forGood;
        this.failure = failure;
    }

    private void step(String name) throws IOException {
        steps.add(name);
        if (steps.size() == failing || forGood && steps.size() > failing) {
            throw failure.get();
        }
    }

    @Override
    public Output create(Path file, boolean ownerOnly) throws IOException {
        step("create");
        Output out = real.create(file, ownerOnly);
        return new Output() {
            @Override
            public void write(int single) throws IOException {
                step("write");
                out.write(single);
            }

            /** A failing write still leaves half of the bytes. */
            @Override
            public void write(byte[] bytes, int from, int length) throws IOException {
                try {
                    step("write");
                } catch (IOException e) {
                    out.write(bytes, from, length / 2);
                    throw e;
                }
                out.write(bytes, from, length);
            }

            @Override
            void force() throws IOException {
                step("force");
                out.force();
            }

            @Override
            public void close() throws IOException {
                out.close();
                step("close");
            }
        };
    }

    @Override
    public void move(Path from, Path to) throws IOException {
        step("move");
        real.move(from, to);
    }

    @Override
    public void forceFolder(Path folder) throws IOException {
        step("force folder");
        real.forceFolder(folder);
    }

    @Override
    public void delete(Path file) throws IOException {
        real.delete(file);
    }

    @Override
    public long free(Path folder) {
        return free;
    }
}
