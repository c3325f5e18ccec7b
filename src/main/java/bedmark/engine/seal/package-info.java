/** Skirt seals by side and segment, and what they drag. */
package bedmark.engine.seal;
