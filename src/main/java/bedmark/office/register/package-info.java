/** A plant's register in the office: taken in from tables, written out as tables, changed as a whole or not at all. */
package bedmark.office.register;
