package bedmark.office;

import bedmark.document.Refused;
import bedmark.index.office.OfficeTables;
import bedmark.journal.NotSaved;
import bedmark.survey.Entry;
import bedmark.survey.OfficeDeed;
import bedmark.survey.merge.ZoneId;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.Supplier;

/** Where the office's deeds are kept for good, and the tables over them. Used by one thread. */
interface Books extends AutoCloseable {

    /** What deeds need before they are kept, and what they make of the tables. */
    interface Effect {
        /** Whether nothing would come of a deed; asked when nobody else can write any more. */
        boolean needless(OfficeTables tables, Deed deed);

        /**
         * Proves that what a deed changes is what the person saw; asked when nobody else can write any more.
         *
         * @throws Refused {@code register-changed-since}
         */
        void prove(OfficeTables tables, Deed deed);

        /** Brings onto the medium what the deeds will name. */
        void prepare(List<Deed> deeds);

        /**
         * What deeds that follow one another make of the tables.
         *
         * @return the zones that still have to be stood anew
         */
        Set<ZoneId> of(OfficeTables tables, List<Done> deeds);

        /** Says what counts of zones by what the tables hold of them. */
        void stand(OfficeTables tables, Collection<ZoneId> zones);
    }

    /** A pack that lies in the store's folder and what it brings. */
    record Pack(PackShelf.Laid laid, Intake intake) {
    }

    /**
     * A deed that waits to be done.
     *
     * @param base the digest of the register that a change of it starts from, where that must hold still
     */
    record Deed(String person, OfficeDeed deed, Optional<Pack> pack, Optional<String> base) {
        Deed(String person, OfficeDeed deed, Optional<Pack> pack) {
            this(person, deed, pack, Optional.empty());
        }
    }

    /**
     * A deed that was done.
     *
     * @param intake what a pack brings, where that was read already
     */
    record Done(Entry entry, Optional<Intake> intake) {
    }

    /**
     * Does the first of some deeds, and as many of those that follow as go together with it: when this returns, they
     * are on the medium and in the tables. Each is whole or was not done, whenever the power is cut. How their zones
     * stand by then is known to whoever {@linkplain #ask asks}.
     *
     * @param deeds at least one, none of which makes another one needless
     * @return what came of them, fewer than there are deeds where some are left; nothing for one that was needless
     * @throws NotSaved where the first could not be done
     */
    List<Optional<Entry>> keep(List<Deed> deeds);

    /** Asks the tables, and makes them anew or connects again where they fail. */
    <T> T ask(Supplier<T> question);

    /** As {@link #ask}, for whoever needs no zone to stand as it does by what was kept last. */
    <T> T look(Supplier<T> question);

    OfficeTables tables();

    @Override
    void close();
}
