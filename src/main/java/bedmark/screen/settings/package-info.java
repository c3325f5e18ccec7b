/** How one person likes the tablet, and by which limits the site judges. */
package bedmark.screen.settings;
