/** Rules with their limits, what was found against them, and the remedies. */
package bedmark.engine.verdict;
