package bedmark.index;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.FileLayer;
import bedmark.vault.DataKey;
import bedmark.vault.Passphrase;
import bedmark.vault.WrappedKey;
import java.io.IOException;
import java.nio.file.Path;
import java.util.Optional;

/** The key of a store's folder, where it is sealed. */
final class Keys {
    private Keys() {
    }

    /**
     * The key; its files are mended where only one of them is whole.
     *
     * @throws Refused {@code store-sealed} where a passphrase is needed, {@code store-not-sealed} where one is given in
     *                 vain: the person would believe the store to be protected; {@code passphrase-…}
     */
    static Optional<DataKey> of(Path folder, FileLayer files, Optional<Passphrase> passphrase) throws IOException {
        PassphraseFile file = new PassphraseFile(folder, files);
        Optional<WrappedKey> wrapped = file.read();
        Optional<DataKey> key = unwrap(folder, wrapped, passphrase);
        if (wrapped.isPresent()) {
            file.mend(wrapped.get());
        }
        return key;
    }

    /** The same, without changing a byte. */
    static Optional<DataKey> look(Path folder, FileLayer files, Optional<Passphrase> passphrase) throws IOException {
        return unwrap(folder, new PassphraseFile(folder, files).read(), passphrase);
    }

    private static Optional<DataKey> unwrap(Path folder, Optional<WrappedKey> wrapped,
                                            Optional<Passphrase> passphrase) {
        if (wrapped.isPresent() && passphrase.isEmpty()) {
            throw new Refused(Defect.in(folder.toString(), "store-sealed"));
        } else if (wrapped.isEmpty() && passphrase.isPresent()) {
            throw new Refused(Defect.in(folder.toString(), "store-not-sealed"));
        }
        return wrapped.map(one -> one.unwrap(passphrase.orElseThrow()));
    }
}
