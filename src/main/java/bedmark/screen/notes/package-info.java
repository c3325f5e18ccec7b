/** What is seen and to be done at a transfer point beside its readings: actions, photos, what the office says. */
package bedmark.screen.notes;
