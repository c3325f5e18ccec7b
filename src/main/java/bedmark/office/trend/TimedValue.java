package bedmark.office.trend;

/**
 * A value at a time.
 *
 * @param time in days
 */
record TimedValue(double time, double value) {
}
