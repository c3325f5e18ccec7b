/**
 * What leaves the tablet and what comes back for it: the bundle that is made of surveys, the pack that carries it, the
 * office's receipt. Knows no screen and no command; both use it.
 */
package bedmark.dispatch;
