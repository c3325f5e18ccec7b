package bedmark.index;

import bedmark.document.Refused;
import bedmark.journal.FileLayer;
import bedmark.vault.WrappedKey;
import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * The file {@code passphrase.json} with the wrapped data key, and its twin: with it gone the store would be gone, so it
 * lies there twice. A store is sealed where one of them is.
 */
final class PassphraseFile {
    static final String NAME = "passphrase.json";
    static final String TWIN = "passphrase-twin.json";
    private static final int LONGEST = 64 << 10;

    private final Path folder;
    private final FileLayer files;

    PassphraseFile(Path folder, FileLayer files) {
        this.folder = folder;
        this.files = files;
    }

    boolean exists() {
        return files.exists(folder.resolve(NAME)) || files.exists(folder.resolve(TWIN));
    }

    /**
     * The wrapped key.
     *
     * @return nothing where the store is not sealed
     * @throws Refused {@code passphrase-file-damaged} where neither file can be read
     */
    Optional<WrappedKey> read() throws IOException {
        Optional<Refused> damage = Optional.empty();
        for (String name : List.of(NAME, TWIN)) {
            Path file = folder.resolve(name);
            if (files.exists(file)) {
                try (InputStream content = new LayerStream(files.read(file))) {
                    return Optional.of(WrappedKey.read(content.readNBytes(LONGEST), name));
                } catch (Refused e) {
                    damage = Optional.of(damage.orElse(e));
                }
            }
        }
        if (damage.isPresent()) {
            throw damage.get();
        }
        return Optional.empty();
    }

    /**
     * Writes both. The first one counts: what stood there before holds until it stands, and the new key from then on.
     */
    void write(WrappedKey key) throws IOException {
        for (String name : List.of(NAME, TWIN)) {
            place(key, name);
        }
    }

    /** Makes the two equal again, where one was lost or a change of the passphrase was cut short. */
    void mend(WrappedKey key) throws IOException {
        for (String name : flawed(key)) {
            place(key, name);
        }
    }

    /** Which of the two does not hold exactly that key. */
    List<String> flawed(WrappedKey key) throws IOException {
        byte[] text = key.text();
        List<String> flawed = new ArrayList<>();
        for (String name : List.of(NAME, TWIN)) {
            Path file = folder.resolve(name);
            byte[] there = new byte[0];
            if (files.exists(file)) {
                try (InputStream content = new LayerStream(files.read(file))) {
                    there = content.readNBytes(LONGEST);
                }
            }
            if (!Arrays.equals(text, there)) {
                flawed.add(name);
            }
        }
        return flawed;
    }

    /** Takes both away, surely: a store whose sealing failed. */
    void delete() throws IOException {
        for (String name : List.of(NAME, TWIN)) {
            files.delete(folder.resolve(name));
        }
        files.forceFolder(folder);
    }

    private void place(WrappedKey key, String name) throws IOException {
        Path part = folder.resolve(name + ".part");
        files.delete(part);
        try (FileLayer.Output output = files.create(part)) {
            output.write(ByteBuffer.wrap(key.text()));
            output.force();
        }
        files.move(part, folder.resolve(name));
        files.forceFolder(folder);
    }
}
