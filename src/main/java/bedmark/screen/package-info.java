/** The tablet app: views bind, models decide and know no scene. */
package bedmark.screen;
