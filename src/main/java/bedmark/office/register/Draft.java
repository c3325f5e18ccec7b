package bedmark.office.register;

import bedmark.document.Branch;
import bedmark.document.Defect;
import java.util.List;

/**
 * What tables would make of a register: nothing of it holds until it is taken over as a whole.
 *
 * @param base    what the register was when this was made
 * @param head    {@code plant}, {@code forms} and {@code rounds} as they would be
 * @param mapping each column that was found, in its order
 * @param defects every bad row and cell; where there is one, the draft can't be taken over
 * @param added   rows that the register did not have
 * @param changed rows that say something else than the register
 * @param same    rows that say the same
 */
public record Draft(Branch base, Branch head, List<Mapped> mapping, List<Defect> defects, int added, int changed,
                    int same) {
    public Draft {
        mapping = List.copyOf(mapping);
        defects = List.copyOf(defects);
    }

    /**
     * A column and what it was taken for.
     *
     * @param source file or sheet
     * @param head   the column's head
     * @param list   the register's list
     * @param key    what it holds; empty where it is not taken in
     * @param unit   the unit that the head names; empty where each cell names its own, or none is needed
     */
    public record Mapped(String source, String head, String list, String key, String unit) {
    }

    public boolean sound() {
        return defects.isEmpty();
    }
}
