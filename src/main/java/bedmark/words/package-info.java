/** All words that a person reads, from resource bundles, in English and Spanish. Depends on no other package. */
package bedmark.words;
