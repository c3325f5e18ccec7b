/**
 * Numbers with units at the edge of the program: UCUM codes, what people type, and the way into SI.
 * Depends on no other package; knows no screen, no file and no clock.
 */
package bedmark.quantity;
