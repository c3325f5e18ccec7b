/** Areas, flows and speeds: the belt's, the open belt's, the design's. */
package bedmark.engine.flow;
