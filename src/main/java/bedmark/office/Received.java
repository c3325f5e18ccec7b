package bedmark.office;

import bedmark.document.Defect;
import bedmark.pack.Receipt;
import bedmark.survey.merge.Clash;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/** What came of one pack. */
public sealed interface Received {

    /** The file that came. */
    Path file();

    /**
     * It was taken in whole.
     *
     * @param pack        its digest
     * @param device      the tablet's name, or its fingerprint where it has none
     * @param fingerprint of the key that signed it
     * @param fresh       surveys that were not here before
     * @param known       surveys that were here with the same content
     * @param clashes     what clashes since in the zones that it is about
     * @param clock       how far the tablet's clock was ahead when the bundle was made (s); 0 where it was not
     * @param receipt     what the office confirms to the tablet; nothing where the bundle has no id to name
     */
    record Taken(Path file, String pack, String device, String fingerprint, int fresh, int known,
                 List<Clash> clashes, long clock, Optional<Receipt> receipt) implements Received {
        public Taken {
            clashes = List.copyOf(clashes);
        }

        /** The same, once it is known what of it was new and what clashes. */
        Taken counted(int news, List<Clash> found) {
            return new Taken(file, pack, device, fingerprint, news, fresh + known - news, found, clock, receipt);
        }

        /** How far the clock was ahead, as the words name it: the tablet, minutes from one on, and whole days. */
        public Object[] clockTold() {
            return new Object[] {device, Math.max(1, clock / 60), clock / 86_400};
        }
    }

    /** What the office confirms to the tablet, where it took the pack in, now or before. */
    default Optional<Receipt> confirmed() {
        return this instanceof Taken taken ? taken.receipt()
                : this instanceof AlreadyHere here ? here.receipt() : Optional.empty();
    }

    /** The very same pack was taken in before; nothing was done. */
    record AlreadyHere(Path file, String pack, String device, String fingerprint, Optional<Receipt> receipt)
            implements Received {
    }

    /** What a file holds: its SHA-256, hexadecimal, and its size (bytes). */
    record Content(String sha256, long bytes) {
    }

    /**
     * It was refused for one reason; nothing was done.
     *
     * @param content nothing where the file could not be read to its end
     * @param sender  whom it is from; nothing where the file could not be read to its end
     * @param kept    false where the refusal was to be noted for those who look in later, and could not be
     */
    record Turned(Path file, Defect why, Optional<Content> content, Optional<Sender> sender, boolean kept)
            implements Received {
        Turned(Path file, Defect why, Optional<Content> content, Optional<Sender> sender) {
            this(file, why, content, sender, true);
        }

        Turned unkept() {
            return new Turned(file, why, content, sender, false);
        }

        /** Of the key that signed it, where that is proved. */
        public Optional<String> fingerprint() {
            return sender.flatMap(Sender::fingerprint);
        }

        /** Whether it is sound, and only nobody has vouched for its device yet. */
        public boolean untrusted() {
            return why.code().equals("device-untrusted");
        }

        /** Whom it is from, where that is still to be said: the question whether to trust a tablet names it already. */
        public Optional<Sender> unsaid() {
            // Of what is no pack at all nobody asks which tablet it is from.
            return sender.filter(one -> !untrusted() && !why.code().equals("pack-not-zip"));
        }
    }
}
