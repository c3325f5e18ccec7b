package bedmark.bench;

import java.util.Locale;

/**
 * One measured figure beside its budget.
 *
 * @param what     what was measured
 * @param measured the figure
 * @param unit     of both
 * @param budget   that it must keep
 * @param most     whether the budget is the most that the figure may be, rather than the least
 */
record Row(String what, double measured, String unit, double budget, boolean most) {

    boolean passes() {
        return most ? measured <= budget : measured >= budget;
    }

    /** The row of a Markdown table. */
    String text() {
        return String.format(Locale.ROOT, "| %s | %s %s | %s %s %s | %s |", what, number(measured), unit,
                most ? "≤" : "≥", number(budget), unit, passes() ? "pass" : "MISS");
    }

    private static String number(double value) {
        return value >= 1000 ? String.format(Locale.ROOT, "%.0f", value) : String.format(Locale.ROOT, "%.3g", value);
    }
}
