/**
 * The one visual language: colours in one token file, sizes in millimetres written out for the set density, the
 * typeface that ships with the app.
 */
package bedmark.screen.theme;
