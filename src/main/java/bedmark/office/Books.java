package bedmark.office;

import bedmark.index.office.OfficeTables;
import bedmark.survey.Entry;
import bedmark.survey.OfficeDeed;
import java.util.Optional;
import java.util.function.BooleanSupplier;
import java.util.function.Supplier;

/** Where the office's deeds are kept for good, and the tables over them. Used by one thread. */
interface Books extends AutoCloseable {

    /** What a deed makes of the tables. */
    @FunctionalInterface
    interface Effect {
        /** @param intake what a pack brings, where that was read already */
        void of(OfficeTables tables, Entry entry, Optional<Intake> intake);
    }

    /** A deed that waits to be done. */
    record Deed(String person, OfficeDeed deed, Optional<Intake> intake) {
    }

    /**
     * Does a deed: when this returns, it is on the medium and in the tables.
     *
     * @param needless asked when nobody else can write any more
     * @return nothing where it was needless
     */
    Optional<Entry> keep(BooleanSupplier needless, Deed deed);

    /** Asks the tables, and makes them anew or connects again where they fail. */
    <T> T ask(Supplier<T> question);

    OfficeTables tables();

    @Override
    void close();
}
