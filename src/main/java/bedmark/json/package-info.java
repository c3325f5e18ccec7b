/** JSON in and out: strict reading with places, stable writing, schemas, and the codec of journal entries. */
package bedmark.json;
