package bedmark.report;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.report.table.CsvTable;
import bedmark.report.table.WorkbookFile;
import java.io.BufferedOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.io.OutputStreamWriter;
import java.io.Writer;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Stream;

/** The report as a file, which is there whole or not at all; one that was there before stays until then. */
public final class ReportFile {

    /** The kinds of file: to read, or to reckon with. */
    public enum Kind {
        PDF, XLSX, CSV;

        /** How the names of such files end. */
        public String ending() {
            return "." + name().toLowerCase(Locale.ROOT);
        }

        /** The kind that a file's name says. */
        public static Optional<Kind> of(Path file) {
            String name = String.valueOf(file.getFileName()).toLowerCase(Locale.ROOT);
            return Stream.of(values()).filter(kind -> name.endsWith(kind.ending())).findFirst();
        }
    }

    private ReportFile() {
    }

    /**
     * Writes a report.
     *
     * @throws Refused {@code report-unwritable}
     */
    public static void write(Path out, Kind kind, ReportContent content, ReportOptions options) {
        Path file = out.toAbsolutePath();
        Path part = file.resolveSibling(file.getFileName() + ".part");
        try {
            try (OutputStream target = new BufferedOutputStream(Files.newOutputStream(part))) {
                write(kind, content, options, target);
            }
            Files.move(part, file, StandardCopyOption.REPLACE_EXISTING);
        } catch (IOException e) {
            part.toFile().delete();
            throw new Refused(Defect.in(out.toString(), "report-unwritable"), e);
        }
    }

    private static void write(Kind kind, ReportContent content, ReportOptions options, OutputStream target)
            throws IOException {
        switch (kind) {
            case PDF -> new PdfReport(content, options).write(target);
            case XLSX -> {
                ReportTables tables = new ReportTables(content, options);
                WorkbookFile.write(tables.all(), tables.dictionary(), "1.0", target);
            }
            case CSV -> {
                Writer writer = new OutputStreamWriter(target, StandardCharsets.UTF_8);
                CsvTable.write(new ReportTables(content, options).zones(), writer);
                writer.flush();
            }
        }
    }
}
