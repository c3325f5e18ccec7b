/**
 * Paper: pages of a PDF with tagged text, embedded faces and lines. Knows the marks and inks of a picture and nothing of
 * loading zones. Lengths are points (1/72 inch), x to the right and y downwards from the upper left corner.
 */
package bedmark.report.paper;
