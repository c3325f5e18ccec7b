package bedmark.index;

import bedmark.journal.Digest;
import bedmark.journal.FileLayer;
import bedmark.vault.DataKey;
import bedmark.vault.SealedInput;
import bedmark.vault.SealedOutput;
import java.io.Closeable;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.util.Optional;

/** Whole files of the layer that are sealed where there is a key, and lie as they are where there is none. */
final class Sealed {
    private static final int CHUNK = 256 << 10;

    private Sealed() {
    }

    static InputStream read(FileLayer files, Path file, Optional<DataKey> key) throws IOException {
        InputStream plain = new LayerStream(files.read(file));
        if (key.isEmpty()) {
            return plain;
        }
        try {
            return new SealedInput(plain, key.get());
        } catch (IOException e) {
            plain.close();
            throw e;
        }
    }

    /** The digest of what a file holds; nothing where a sealed one is damaged. */
    static Optional<Digest> digest(FileLayer files, Path file, Optional<DataKey> key) throws IOException {
        MessageDigest sha = Digest.sha256();
        byte[] chunk = new byte[CHUNK];
        try (InputStream content = read(files, file, key)) {
            for (int count = content.read(chunk); count > 0; count = content.read(chunk)) {
                sha.update(chunk, 0, count);
            }
            return Optional.of(Digest.ofBytes(sha.digest()));
        } catch (SealedInput.Damaged e) {
            return Optional.empty();
        }
    }

    static Writing write(FileLayer files, Path file, Optional<DataKey> key) throws IOException {
        return new Writing(files.create(file), key);
    }

    /** A new file that is being filled. */
    static final class Writing implements Closeable {
        private final FileLayer.Output output;
        private final Optional<SealedOutput> sealing;
        private final OutputStream content;

        private Writing(FileLayer.Output output, Optional<DataKey> key) {
            this.output = output;
            this.sealing = key.map(one -> new SealedOutput(output.stream(), one));
            this.content = sealing.isPresent() ? sealing.get() : output.stream();
        }

        void write(byte[] bytes, int length) throws IOException {
            content.write(bytes, 0, length);
        }

        /** Makes it whole and forces it. */
        void finish() throws IOException {
            if (sealing.isPresent()) {
                sealing.get().finish();
            }
            output.force();
        }

        @Override
        public void close() throws IOException {
            output.close();
        }
    }
}
