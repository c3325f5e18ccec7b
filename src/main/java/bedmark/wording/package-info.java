/**
 * Results, refusals and judgements in the words, numbers and units of one person: the same sentence on the screen, in
 * a command and in a report.
 */
package bedmark.wording;
