/** The bed of material between the skirtboards: ways of reading its depth, its section, its profile along the zone. */
package bedmark.engine.bed;
