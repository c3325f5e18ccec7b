/**
 * The pack: a signed BagIt bag in one ZIP file, written from a bundle and its photos, and read back strictly. A pack
 * that arrives is believed in nothing until every view of it agrees; nothing is written to disk while it is judged.
 */
package bedmark.pack;
