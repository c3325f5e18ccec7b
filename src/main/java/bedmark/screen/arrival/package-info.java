/** The window in which a person looks at one file that came, and from which a pack goes to the office. */
package bedmark.screen.arrival;
