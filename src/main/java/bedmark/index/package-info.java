/**
 * The store of one device: the journal, the photos, and an H2 database over them that answers questions and can be
 * thrown away. The only package that knows SQL.
 */
package bedmark.index;
