package bedmark.office;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.pack.PackSender;
import java.nio.file.Path;
import java.util.Optional;

/**
 * A pack that was looked at; nothing of it is taken in yet.
 *
 * @param laid   its copy in the store's folder
 * @param sound  what it brings, where it is sound
 * @param defect why it is refused, where it is not
 * @param signer who signed it, where that is proved
 */
record Proved(Path file, Optional<PackShelf.Laid> laid, Optional<Sound> sound, Optional<Defect> defect,
              Optional<PackSender> signer) {

    /**
     * A pack that is sound.
     *
     * @param signer who signed it
     * @param head   the bundle's own id, time and device
     */
    record Sound(Path file, Books.Pack pack, PackSender signer, Branch head) {
        String fingerprint() {
            return signer.fingerprint().text();
        }

        String sha256() {
            return pack.laid().sha256();
        }

        Branch device() {
            return head.branch("device").orElse(Branch.EMPTY);
        }

        /** The tablet's name, or its fingerprint where it has none. */
        String shown() {
            String name = device().text("name").orElse("");
            return name.isBlank() ? fingerprint() : name;
        }
    }

    static Proved sound(Sound sound) {
        return new Proved(sound.file(), Optional.of(sound.pack().laid()), Optional.of(sound), Optional.empty(),
                Optional.of(sound.signer()));
    }

    static Proved refused(Path file, Optional<PackShelf.Laid> laid, Defect defect, Optional<PackSender> signer) {
        return new Proved(file, laid, Optional.empty(), Optional.of(defect), signer);
    }
}
