package bedmark.report;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.NamedPath;
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
     * @return whether it was written; where it was stopped, everything is as before
     * @throws Refused {@code file-is-folder}, {@code file-not-plain}, {@code report-unwritable}
     */
    public static boolean write(Path out, Kind kind, ReportContent content, ReportOptions options) {
        Path file = out.toAbsolutePath();
        NamedPath.requireTarget(out);
        Path part = file.resolveSibling(file.getFileName() + ".part");
        try {
            OutputStream opened = Files.newOutputStream(part);
            try {
                return write(kind, content, options, opened) && moved(part, file);
            } finally {
                // Whatever went wrong, no part is left.
                part.toFile().delete();
            }
        } catch (IOException e) {
            throw new Refused(Defect.in(out.toString(), "report-unwritable"), e);
        }
    }

    private static boolean moved(Path part, Path file) throws IOException {
        Files.move(part, file, StandardCopyOption.REPLACE_EXISTING);
        return true;
    }

    private static boolean write(Kind kind, ReportContent content, ReportOptions options, OutputStream opened)
            throws IOException {
        try (OutputStream target = new BufferedOutputStream(opened)) {
            return set(kind, content, options, target) && !options.progress().cancelled();
        }
    }

    /** Sets the report; whether it is whole. */
    private static boolean set(Kind kind, ReportContent content, ReportOptions options, OutputStream target)
            throws IOException {
        switch (kind) {
            case PDF -> {
                return new PdfReport(content, options).write(target);
            }
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
        return true;
    }
}
