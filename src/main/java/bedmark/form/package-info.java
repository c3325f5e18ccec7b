/**
 * Field forms: what is asked at a loading zone, in which order and words, under which conditions, and how an answer
 * is judged. A form is data; this package is what that data means. Knows no screen, no file and no JSON library.
 */
package bedmark.form;
