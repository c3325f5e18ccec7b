/** What the program noted of its own running, for whoever has to find out why it failed: no answers, no names. */
package bedmark.diary;
