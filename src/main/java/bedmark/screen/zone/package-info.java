/** Shows the zone picture and turns a finger on it into depths and places along the zone. */
package bedmark.screen.zone;
