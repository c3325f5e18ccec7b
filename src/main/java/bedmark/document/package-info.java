/**
 * Documents as neutral, immutable trees. Every domain type that comes from a document is a typed view over such a
 * tree, so that what this version does not know survives every round trip. Knows no JSON library.
 */
package bedmark.document;
