/** The end of a walk: what is overloaded, what is missing, what it costs, and the person's word for it. */
package bedmark.screen.finish;
