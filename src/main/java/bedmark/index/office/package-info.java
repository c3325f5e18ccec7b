/**
 * The office's tables: what came from the tablets and what the office did, as an index over a folder's journal or as
 * the whole truth on a database server that several desks share.
 */
package bedmark.index.office;
