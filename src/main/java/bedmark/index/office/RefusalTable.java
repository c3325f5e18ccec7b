package bedmark.index.office;

import java.util.Collection;
import java.util.List;

/** The packs that were refused and did not come in since; of many, the last ones. */
public final class RefusalTable {
    /** How many are kept. */
    public static final int MOST = 1000;

    private static final String ORDER = " order by last_at desc, pack";
    private static final String INSERT = "insert into refusal (" + RefusalRow.COLUMNS
            + ") values (?, ?, ?, ?, ?, ?, ?, ?, ?)";
    private static final String AGAIN = "update refusal set file = ?, device = ?, fingerprint = ?, why = ?, "
            + "last_at = ? where pack = ?";

    private final Link link;

    RefusalTable(Link link) {
        this.link = link;
    }

    /** All of them, those that were refused last at the head. */
    public List<RefusalRow> all() {
        return link.rows("select " + RefusalRow.COLUMNS + " from refusal" + ORDER, RefusalRow::read);
    }

    /** Notes one; of a pack that is noted, that it was refused again. */
    public void note(RefusalRow row) {
        if (link.run(AGAIN, row.file(), row.device().orElse(null), row.fingerprint().orElse(null), row.why(),
                row.last(), row.pack()) == 0) {
            link.run(INSERT, row.values());
        }
    }

    /** Drops what was refused last before a moment (ms since 1970), and the oldest where there are too many. */
    public void thin(long before) {
        link.run("delete from refusal where last_at < ?", before);
        link.run("delete from refusal where pack in (select pack from refusal" + ORDER + " offset " + MOST + " rows)");
    }

    /** Those packs are in. */
    public void settle(Collection<String> packs) {
        link.run("delete from refusal where pack = any(?)", link.texts(packs));
    }
}
