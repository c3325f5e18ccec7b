/** Readings with their standard uncertainty, and its exact first-order propagation (JCGM 100:2008, 5.1). */
package bedmark.engine.uncertainty;
