/** One loading zone over time: statistics that need no distribution, and what may not be read as a trend. */
package bedmark.office.trend;
