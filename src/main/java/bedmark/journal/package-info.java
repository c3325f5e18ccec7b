/**
 * The append-only truth on disk: segments of hash-chained, checksummed entries, each forced before it counts as saved;
 * and the file layer under it, through which every byte goes that must survive.
 */
package bedmark.journal;
