/** What a site may fit from readings of its own drives. */
package bedmark.engine.fit;
