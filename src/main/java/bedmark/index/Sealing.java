package bedmark.index;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.journal.Cover;
import bedmark.journal.Digest;
import bedmark.journal.FileLayer;
import bedmark.journal.Journal;
import bedmark.journal.Progress;
import bedmark.journal.Transcript;
import bedmark.json.JsonReader;
import bedmark.json.JsonWriter;
import bedmark.vault.DataKey;
import bedmark.vault.Passphrase;
import bedmark.vault.WrappedKey;
import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Turns encryption on for a store that holds something already. All of it is written anew beside the old, forced and
 * read back; the store is sealed from the moment at which the passphrase's file stands; only then the old files go.
 * Cut short before that moment, everything new is taken away at the next start; after it, the rest is done then.
 */
final class Sealing {

    /** Says that the work is under way, and lists the files that go at its end. */
    static final String FILE = "sealing.json";
    private static final int LONGEST = 16 << 20;
    private static final int CHUNK = 256 << 10;

    private final Path folder;
    private final FileLayer files;
    private final Path journal;
    private final Path photos;

    Sealing(Path folder, FileLayer files) {
        this.folder = folder;
        this.files = files;
        this.journal = folder.resolve(Ledger.JOURNAL);
        this.photos = folder.resolve(PhotoShelf.FOLDER);
    }

    /** What an earlier start left over; comes before anything else is opened. */
    void settle() throws IOException {
        if (!files.exists(folder.resolve(FILE))) {
            return;
        }
        if (new PassphraseFile(folder, files).exists()) {
            finish();
        } else {
            takeBack();
        }
    }

    boolean underWay() {
        return files.exists(folder.resolve(FILE));
    }

    /**
     * Seals the store.
     *
     * @throws Refused {@code store-sealed-already}, {@code sealing-no-room}, {@code journal-transcript-differs},
     *                 {@code photo-differs}, {@code work-cancelled}; nothing was changed
     */
    void run(Passphrase passphrase, int iterations, long segmentBytes, Progress progress) throws IOException {
        if (new PassphraseFile(folder, files).exists()) {
            throw new Refused(Defect.in(folder.toString(), "store-sealed-already"));
        }
        List<String> old = old();
        requireRoom(old);
        DataKey key = DataKey.random();
        begin(old);
        try {
            Transcript.Written written = new Transcript(journal, files, segmentBytes, progress)
                    .write(Cover.PLAIN, Cover.of(Optional.of(key)));
            for (String name : old) {
                if (name.startsWith(PhotoShelf.FOLDER) || name.endsWith(Journal.TORN)
                        || written.flawed().contains(folder.resolve(name).getFileName().toString())) {
                    copy(folder.resolve(name), key, progress);
                }
            }
            files.forceFolder(photos);
            files.forceFolder(journal);
            new PassphraseFile(folder, files).write(WrappedKey.wrap(key, passphrase, iterations));
        } catch (IOException | RuntimeException e) {
            undo(e);
            throw e;
        }
        finish();
    }

    /** The passphrase's file goes first and surely; where that fails too, nothing more goes, and a start settles it. */
    private void undo(Exception failure) {
        try {
            new PassphraseFile(folder, files).delete();
            takeBack();
        } catch (IOException | RuntimeException e) {
            failure.addSuppressed(e);
        }
    }

    /** What lies there as it is, relative to the store. */
    private List<String> old() throws IOException {
        List<String> old = new ArrayList<>();
        for (Path file : files.list(journal)) {
            old.add(Ledger.JOURNAL + "/" + file.getFileName());
        }
        for (Path file : files.list(photos)) {
            old.add(PhotoShelf.FOLDER + "/" + file.getFileName());
        }
        return old;
    }

    /** Everything is there twice for a while. Some systems don't know their free space and say zero. */
    private void requireRoom(List<String> old) throws IOException {
        long needed = 1 << 20;
        for (String name : old) {
            try (FileLayer.Input input = files.read(folder.resolve(name))) {
                needed += input.size() + input.size() / 1000 + 4096;
            }
        }
        long free = files.usableSpace(folder);
        if (free > 0 && free < needed) {
            throw new Refused(Defect.in(folder.toString(), "sealing-no-room", Long.toString(needed >> 20)));
        }
    }

    private void begin(List<String> old) throws IOException {
        Path part = folder.resolve(FILE + ".part");
        files.delete(part);
        try (FileLayer.Output output = files.create(part)) {
            output.write(ByteBuffer.wrap(JsonWriter.indented(Branch.EMPTY.with("files",
                    new Node.Series(old.stream().map(Node::text).toList())))));
            output.force();
        }
        files.move(part, folder.resolve(FILE));
        files.forceFolder(folder);
    }

    /** Seals a file into one beside it, and reads that back. */
    private void copy(Path file, DataKey key, Progress progress) throws IOException {
        if (progress.cancelled()) {
            throw new Refused(Defect.in("", "work-cancelled"));
        }
        Path sealed = file.resolveSibling(file.getFileName() + PhotoShelf.SEALED);
        byte[] chunk = new byte[CHUNK];
        try (InputStream content = new LayerStream(files.read(file));
             Sealed.Writing writing = Sealed.write(files, sealed, Optional.of(key))) {
            for (int count = content.read(chunk); count > 0; count = content.read(chunk)) {
                writing.write(chunk, count);
            }
            writing.finish();
        }
        Optional<Digest> there = Sealed.digest(files, sealed, Optional.of(key));
        if (there.isEmpty() || !there.equals(Sealed.digest(files, file, Optional.empty()))) {
            throw new Refused(Defect.in(file.getFileName().toString(), "photo-differs", ""));
        }
    }

    /**
     * The store is sealed; what lay there as it was goes. Needs no passphrase. Nobody knows whether the passphrase's
     * file that is read here was forced, so it is written once more before anything goes.
     */
    private void finish() throws IOException {
        PassphraseFile passphrase = new PassphraseFile(folder, files);
        passphrase.write(passphrase.read().orElseThrow());
        List<String> old = listed();
        Transcript.putInPlace(journal, files);
        requireNew(old);
        for (String name : old) {
            files.delete(folder.resolve(name));
        }
        files.forceFolder(journal);
        files.forceFolder(photos);
        Path index = folder.resolve(Ledger.INDEX);
        if (files.exists(index)) {
            for (Path file : files.list(index)) {
                files.delete(file);
            }
            files.forceFolder(index);
        }
        end();
    }

    /** Never deletes a journal that nothing stands in the place of. */
    private void requireNew(List<String> old) throws IOException {
        if (files.list(journal).stream().map(file -> Ledger.JOURNAL + "/" + file.getFileName())
                .noneMatch(name -> name.endsWith(".journal") && !old.contains(name))) {
            throw new Refused(Defect.in(FILE, "sealing-file-damaged"));
        }
    }

    /** The store is not sealed; what is new goes. */
    private void takeBack() throws IOException {
        List<String> old = listed();
        for (Path place : List.of(journal, photos)) {
            String prefix = place.getFileName() + "/";
            for (Path file : files.list(place)) {
                String name = file.getFileName().toString();
                if (!old.contains(prefix + name)
                        && (name.endsWith(Transcript.WAITING) || name.endsWith(PhotoShelf.SEALED))) {
                    files.delete(file);
                }
            }
            files.forceFolder(place);
        }
        end();
    }

    private void end() throws IOException {
        files.delete(folder.resolve(FILE));
        files.forceFolder(folder);
    }

    /** Names that this program wrote; anything else is a damaged list, and nothing is deleted by it. */
    private List<String> listed() throws IOException {
        try (InputStream content = new LayerStream(files.read(folder.resolve(FILE)))) {
            List<String> names = new ArrayList<>();
            for (Node item : JsonReader.read(content.readNBytes(LONGEST)).root().series("files")) {
                String name = item instanceof Node.Text text ? text.value() : "";
                if (!name.matches("(" + Ledger.JOURNAL + "|" + PhotoShelf.FOLDER + ")/[^/\\\\]+")) {
                    throw new Refused(Defect.in(FILE, "sealing-file-damaged"));
                }
                names.add(name);
            }
            return names;
        } catch (Refused e) {
            throw new Refused(Defect.in(FILE, "sealing-file-damaged"), e);
        }
    }
}
