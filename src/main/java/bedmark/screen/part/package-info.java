/** The small parts that all screens are composed of. No part holds words or colours of its own. */
package bedmark.screen.part;
