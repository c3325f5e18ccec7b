package bedmark.report;

import bedmark.journal.Progress;
import bedmark.report.paper.PaperSize;
import bedmark.wording.Wording;

/**
 * How a report is set.
 *
 * @param wording  language and units of the reader
 * @param paper    size of the pages
 * @param photos   where photos come from
 * @param version  of the program
 * @param progress told of the pages with a working, and asked whether to stop
 */
public record ReportOptions(Wording wording, PaperSize paper, ReportPhotos photos, String version,
                            Progress progress) {
}
