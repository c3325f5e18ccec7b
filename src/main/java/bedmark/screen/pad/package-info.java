/**
 * The numeric pad: a model that edits the text of one field and emits commands, and the keys that are pressed. What the
 * text means is read elsewhere.
 */
package bedmark.screen.pad;
