/** The report's numbers as tables of typed cells, and who writes them: a workbook, and CSV. */
package bedmark.report.table;
