/** Drag of the material on the skirtboards: one class for each published method. The methods do not see each other. */
package bedmark.engine.drag;
