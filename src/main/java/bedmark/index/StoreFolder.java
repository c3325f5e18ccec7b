package bedmark.index;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Fault;
import bedmark.journal.FileLayer;
import bedmark.journal.Progress;
import bedmark.vault.Passphrase;
import bedmark.vault.WrappedKey;
import java.io.Closeable;
import java.io.IOException;
import java.nio.file.Path;
import java.util.Optional;

/** What is done with the folder of a store as a whole, while nobody has it open. */
public final class StoreFolder {
    private final Path folder;
    private final StoreOptions options;
    private final FileLayer files;
    private final int iterations;

    public StoreFolder(Path folder, StoreOptions options) {
        this(folder, options, WrappedKey.ITERATIONS);
    }

    /** @param iterations of PBKDF2; fewer where nobody is kept from guessing */
    StoreFolder(Path folder, StoreOptions options, int iterations) {
        this.folder = folder.toAbsolutePath().normalize();
        this.options = options;
        this.files = options.files();
        this.iterations = iterations;
    }

    /** Whether a store is there. */
    public boolean holdsStore() {
        return files.exists(folder.resolve(Ledger.JOURNAL));
    }

    /** Whether it holds a store that takes a passphrase. */
    public boolean sealed() {
        return new PassphraseFile(folder, files).exists();
    }

    /**
     * Turns encryption on; an empty or missing folder becomes a new, sealed store.
     *
     * @throws Refused those of {@link Store#open(Path, StoreOptions)}, {@code store-sealed-already},
     *                 {@code sealing-no-room}, {@code work-cancelled}; nothing was changed
     */
    public void seal(Passphrase passphrase) {
        if (!sealed()) {
            Store.open(folder, options.withPassphrase(Optional.empty()).withProgress(Progress.NONE)).close();
        }
        locked(() -> new Sealing(folder, files).run(passphrase, iterations, options.segmentBytes(),
                options.progress()));
        index(Optional.of(passphrase));
    }

    /** Makes the index at once, so that a proof finds everything in its place. */
    private void index(Optional<Passphrase> passphrase) {
        Store.open(folder, options.withPassphrase(passphrase).withProgress(Progress.NONE)).close();
    }

    /**
     * Changes the passphrase; the old one opens the store no longer. A backup keeps the one that it was made under.
     *
     * @throws Refused {@code store-not-sealed}, {@code passphrase-wrong}
     */
    public void changePassphrase(Passphrase old, Passphrase passphrase) {
        locked(() -> {
            PassphraseFile file = new PassphraseFile(folder, files);
            WrappedKey wrapped = file.read().orElseThrow(() ->
                    new Refused(Defect.in(folder.toString(), "store-not-sealed")));
            file.write(WrappedKey.wrap(wrapped.unwrap(old), passphrase, iterations));
        });
    }

    /**
     * Brings a backup to this device. Where the folder is missing or empty, it becomes a store with the backup's whole
     * history and an identity of its own; where it holds a store, that one takes the backup's surveys over. Doing it
     * again changes nothing.
     *
     * @param passphrase of the backup, where it is sealed; that of the store that is there comes with the options
     * @throws Refused {@code backup-…}, {@code restore-…}, and those of {@link Store#takeOver}
     */
    public Restored restore(Path backup, Optional<Passphrase> passphrase, String person) {
        Database.requireFit(folder);
        try {
            if (Restoring.isFree(folder)) {
                Restored restored = new Restoring(Backups.find(backup, files), folder, options)
                        .run(passphrase, options.progress());
                index(sealed() ? passphrase : Optional.empty());
                return restored;
            }
        } catch (IOException e) {
            throw new Refused(Fault.defect("restore", e, files, folder.getParent()), e);
        }
        Store.requireStore(folder, files);
        try (Store store = Store.open(folder, options.withProgress(Progress.NONE))) {
            return store.takeOver(backup, passphrase, person, options.progress());
        }
    }

    /**
     * Whether a backup was made of a store that takes a passphrase.
     *
     * @throws Refused {@code backup-absent}, {@code backup-several}, {@code backup-list-damaged}
     */
    public boolean takesPassphrase(Path backup) {
        try {
            return BackupList.read(Backups.find(backup, files), files).filter(BackupList::sealed).isPresent();
        } catch (IOException e) {
            throw new Refused(Fault.defect("restore", e, files, backup), e);
        }
    }

    /** Work on the files. */
    @FunctionalInterface
    private interface Work {
        void run() throws IOException;
    }

    /** Does such work under the store's lock, on a thread that is never interrupted. */
    private void locked(Work work) {
        Store.requireStore(folder, files);
        Desk desk = new Desk("bedmark-folder");
        try (desk) {
            desk.call(() -> {
                try {
                    Closeable lock = files.lock(folder.resolve(Store.LOCK)).orElseThrow(() ->
                            new Refused(Defect.in(folder.toString(), "store-locked")));
                    try {
                        work.run();
                        return true;
                    } finally {
                        lock.close();
                    }
                } catch (IOException e) {
                    throw new Refused(Fault.defect("store", e, files, folder), e);
                }
            });
        }
    }
}
