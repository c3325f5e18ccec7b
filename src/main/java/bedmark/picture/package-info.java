/**
 * The zone picture as pure geometry: a sketch of a loading zone in SI goes in, a list of marks with semantic inks comes
 * out, and the screen and a report draw the same marks. Knows no screen, no file, no words and no colour.
 */
package bedmark.picture;
