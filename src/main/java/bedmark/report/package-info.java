/**
 * The office's report: a PDF that is read in two minutes with the working behind it, a workbook and CSV of the same
 * numbers. Content first ({@code ReportContent}), then who sets it.
 */
package bedmark.report;
