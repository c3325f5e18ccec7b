package bedmark.journal;

import java.io.IOException;
import java.nio.channels.FileChannel;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;

/** The real disk without waiting for the medium, for looking at very many stores. */
public final class QuickLayer extends ForwardingLayer {
    public QuickLayer() {
        super(FileLayer.disk());
    }

    @Override
    public Output create(Path file) throws IOException {
        return new QuickOutput(super.create(file));
    }

    @Override
    public Output createPrivate(Path file) throws IOException {
        return new QuickOutput(super.createPrivate(file));
    }

    @Override
    public Output append(Path file) throws IOException {
        return new QuickOutput(super.append(file));
    }

    @Override
    public void truncate(Path file, long length) throws IOException {
        try (FileChannel channel = FileChannel.open(file, StandardOpenOption.WRITE)) {
            channel.truncate(length);
        }
    }

    @Override
    public void forceFolder(Path folder) {
        // Nothing is waited for.
    }

    private static final class QuickOutput extends ForwardingOutput {
        QuickOutput(Output output) {
            super(output);
        }

        @Override
        public void force() {
            // Nothing is waited for.
        }
    }
}
