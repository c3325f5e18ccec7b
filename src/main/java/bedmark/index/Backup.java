package bedmark.index;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Digest;
import bedmark.journal.Fault;
import bedmark.journal.FileLayer;
import bedmark.journal.Journal;
import bedmark.journal.Progress;
import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;

/**
 * Copies a store to a folder or stick: journal, photos and, where it is sealed, the wrapped key. Every file is written
 * beside what is there, forced and read back; the list that makes them a backup comes last and in one step. Until then
 * the earlier backup is whole; what only that one needed goes afterwards. The device's signing key stays at home.
 */
final class Backup {
    private static final int CHUNK = 256 << 10;
    private static final String PART = ".part";

    private final Path store;
    private final Path target;
    private final FileLayer files;
    private final Progress progress;
    private long done;
    private long total;

    /** @param target the backup's own folder, made where it is missing */
    Backup(Path store, Path target, FileLayer files, Progress progress) {
        this.store = store;
        this.target = target;
        this.files = files;
        this.progress = progress;
    }

    /** The folder of a device's backup within the one that a person chose. */
    static Path folder(Path chosen, Device device) {
        return chosen.resolve("bedmark-backup-" + device.id().toString().substring(0, 8));
    }

    /** What is to be copied, and how much of it. */
    private record Source(String file, long bytes) {
    }

    /**
     * Makes the backup.
     *
     * @param extent how much of the journal is on the medium
     * @param upTo   the last entry in it
     * @throws Refused {@code backup-vanished}, {@code backup-disk-full}, {@code backup-read-only},
     *                 {@code backup-force-failed}, {@code backup-failed}, {@code backup-source-unreadable},
     *                 {@code backup-differs}, {@code work-cancelled}; the store is untouched, the earlier backup whole
     */
    BackupList make(Device device, OffsetDateTime at, Journal.Extent extent, long upTo, boolean sealed) {
        List<Source> sources = sources(extent, sealed);
        // Read, copied, read back.
        total = 3 * sources.stream().mapToLong(Source::bytes).sum();
        List<BackupList.Item> items = new ArrayList<>();
        for (Source source : sources) {
            items.add(new BackupList.Item(source.file(), source.bytes(), digest(source)));
        }
        BackupList list = new BackupList(device, at, upTo, sealed, items);
        try {
            prepare();
            requireRoom(list);
            for (BackupList.Item item : items) {
                copy(item);
            }
            files.forceFolder(target.resolve(Ledger.JOURNAL));
            files.forceFolder(target.resolve(PhotoShelf.FOLDER));
            place(list);
        } catch (IOException e) {
            throw new Refused(Fault.defect("backup", e, files, target), e);
        }
        clear(list);
        return list;
    }

    private List<Source> sources(Journal.Extent extent, boolean sealed) {
        List<Source> sources = new ArrayList<>();
        String current = String.format(Locale.ROOT, "%08d.journal", extent.segment());
        try {
            for (Path file : files.list(store.resolve(Ledger.JOURNAL))) {
                String name = file.getFileName().toString();
                boolean later = name.endsWith(".journal") && name.compareTo(current) > 0;
                if (!later && !name.endsWith(PART)) {
                    long size = size(file);
                    sources.add(new Source(Ledger.JOURNAL + "/" + name,
                            name.equals(current) ? Math.min(size, extent.length()) : size));
                }
            }
            for (Path file : files.list(store.resolve(PhotoShelf.FOLDER))) {
                if (!file.getFileName().toString().endsWith(PART)) {
                    sources.add(new Source(PhotoShelf.FOLDER + "/" + file.getFileName(), size(file)));
                }
            }
            if (sealed) {
                for (String name : List.of(PassphraseFile.NAME, PassphraseFile.TWIN)) {
                    sources.add(new Source(name, size(store.resolve(name))));
                }
            }
            return sources;
        } catch (IOException e) {
            throw unreadable(e);
        }
    }

    private long size(Path file) throws IOException {
        try (FileLayer.Input input = files.read(file)) {
            return input.size();
        }
    }

    private String digest(Source source) {
        MessageDigest sha = Digest.sha256();
        try (InputStream content = new LayerStream(files.read(store.resolve(source.file())))) {
            byte[] chunk = new byte[CHUNK];
            long left = source.bytes();
            while (left > 0) {
                int count = content.read(chunk, 0, (int) Math.min(chunk.length, left));
                if (count < 0) {
                    throw new IOException("the file became shorter while it was read");
                }
                sha.update(chunk, 0, count);
                left -= count;
                step(count);
            }
        } catch (IOException e) {
            throw unreadable(e);
        }
        return Digest.ofBytes(sha.digest()).hex();
    }

    private Refused unreadable(IOException e) {
        return new Refused(Defect.in(store.toString(), "backup-source-unreadable",
                String.valueOf(e.getMessage()).lines().findFirst().orElse("")), e);
    }

    private void prepare() throws IOException {
        Path chosen = target.toAbsolutePath().getParent();
        if (!files.exists(chosen)) {
            throw new Refused(Defect.in(chosen.toString(), "backup-vanished"));
        }
        for (Path folder : List.of(target, target.resolve(Ledger.JOURNAL), target.resolve(PhotoShelf.FOLDER))) {
            files.createFolder(folder);
            for (Path file : files.list(folder)) {
                if (file.getFileName().toString().endsWith(PART)) {
                    files.delete(file);
                }
            }
        }
    }

    /** Some systems don't know their free space and say zero; then the writing itself will tell. */
    private void requireRoom(BackupList list) throws IOException {
        long needed = 64 << 10;
        for (BackupList.Item item : list.items()) {
            needed += files.exists(target.resolve(item.as())) ? 0 : item.bytes() + 4096;
        }
        long free = files.usableSpace(target);
        if (free > 0 && free < needed) {
            throw new Refused(Defect.in(target.toString(), "backup-disk-full"));
        }
    }

    private void copy(BackupList.Item item) throws IOException {
        Path file = target.resolve(item.as());
        if (files.exists(file) && size(file) == item.bytes()) {
            step(item.bytes());
            if (isAsListed(item)) {
                return;
            }
            done -= item.bytes();
        }
        Path part = file.resolveSibling(file.getFileName() + PART);
        files.delete(part);
        try (FileLayer.Output output = files.create(part)) {
            write(item, output);
            output.force();
        }
        files.move(part, file);
        if (!isAsListed(item)) {
            throw new Refused(Defect.in(file.toString(), "backup-differs"));
        }
    }

    private void write(BackupList.Item item, FileLayer.Output output) throws IOException {
        try (FileLayer.Input input = open(item)) {
            long at = 0;
            while (at < item.bytes()) {
                ByteBuffer chunk = ByteBuffer.allocate((int) Math.min(CHUNK, item.bytes() - at));
                int count = read(input, at, chunk);
                at += count;
                output.write(chunk.flip());
                step(count);
            }
        }
    }

    private FileLayer.Input open(BackupList.Item item) {
        try {
            return files.read(store.resolve(item.file()));
        } catch (IOException e) {
            throw unreadable(e);
        }
    }

    private int read(FileLayer.Input input, long at, ByteBuffer chunk) {
        try {
            int count = input.read(at, chunk);
            if (count > 0) {
                return count;
            }
            throw new IOException("the file became shorter while it was read");
        } catch (IOException e) {
            throw unreadable(e);
        }
    }

    private boolean isAsListed(BackupList.Item item) throws IOException {
        boolean same = Sealed.digest(files, target.resolve(item.as()), Optional.empty())
                .filter(digest -> digest.hex().equals(item.sha256())).isPresent();
        step(item.bytes());
        return same;
    }

    private void place(BackupList list) throws IOException {
        Path part = target.resolve(BackupList.NAME + PART);
        try (FileLayer.Output output = files.create(part)) {
            output.write(ByteBuffer.wrap(list.text()));
            output.force();
        }
        files.move(part, target.resolve(BackupList.NAME));
        files.forceFolder(target);
    }

    /** What the list does not name goes; where that fails, it stays and harms nobody. */
    private void clear(BackupList list) {
        Set<Path> needed = new HashSet<>();
        list.items().forEach(item -> needed.add(target.resolve(item.as())));
        needed.add(target.resolve(BackupList.NAME));
        try {
            for (Path folder : List.of(target, target.resolve(Ledger.JOURNAL), target.resolve(PhotoShelf.FOLDER))) {
                for (Path file : files.list(folder)) {
                    if (!needed.contains(file)) {
                        files.delete(file);
                    }
                }
            }
        } catch (IOException e) {
            return;
        }
    }

    private void step(long bytes) {
        done += bytes;
        progress.at(Math.min(done, total), Math.max(total, 1));
        if (progress.cancelled()) {
            throw new Refused(Defect.in("", "work-cancelled"));
        }
    }
}
