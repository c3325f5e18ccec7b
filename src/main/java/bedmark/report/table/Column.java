package bedmark.report.table;

import java.util.function.Function;

/**
 * A column of a table.
 *
 * @param key   what scripts know it by; it never changes with the language
 * @param title in words, without the unit
 * @param kind  {@code text}, {@code code}, {@code number}, {@code flag} or {@code time}
 * @param unit  UCUM code; empty where there is none
 * @param cell  what stands in it, by the row
 * @param <R>   what a row is about
 */
public record Column<R>(String key, String title, String kind, String unit, Function<R, Cell> cell) {

    /** Title and unit, as it stands at the head of the column. */
    public String head() {
        return unit.isEmpty() ? title : title + " [" + unit + "]";
    }

    /** Key and unit, as it stands at the head of the column for scripts. */
    public String code() {
        return unit.isEmpty() ? key : key + " [" + unit + "]";
    }
}
